import type { Block } from './block.ts';

/** A line of ten-point text in pixels, and the width of one of its characters on average. */
const LINE = 17;
const CHARACTER = 6.2;
const POINTS_PER_PIXEL = 0.75;

/**
 * Makes rows as high as their wrapped texts need: a host does not do so for merged cells.
 * @param range the written block
 */
export async function fitHeights(
  context: Excel.RequestContext,
  range: Excel.Range,
  { cells, widths }: Block,
): Promise<void> {
  range.load('values');
  await context.sync();
  for (const { row, column, look, across = 0 } of cells) {
    if (look !== 'finding') continue;
    const value: unknown = range.values[row]?.[column];
    const width = widths.slice(column, column + across + 1).reduce<number>((sum, own) => sum + (own ?? 0), 0);
    const lines = Math.max(1, Math.ceil((String(value ?? '').length * CHARACTER) / width));
    range.getCell(row, column).format.rowHeight = (4 + LINE * lines) * POINTS_PER_PIXEL;
  }
  await context.sync();
}
