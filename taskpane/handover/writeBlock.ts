import type { Block, BlockCell, Look } from './block.ts';
import { looks } from './looks.ts';

/** Cells written between two synchronisations: well below the size of a request that hosts refuse. */
const CELLS_PER_SYNC = 12_000;
const POINTS_PER_PIXEL = 0.75;

/**
 * Writes a block with its looks.
 * @param corner its top left cell
 */
export async function writeBlock(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  corner: { readonly row: number; readonly column: number },
  block: Block,
): Promise<void> {
  const at = (row: number, column: number, rows = 1, columns = 1): Excel.Range =>
    sheet.getRangeByIndexes(corner.row + row, corner.column + column, rows, columns);
  for (const { row, column, across = 0, down = 0 } of block.cells) {
    if (across > 0 || down > 0) at(row, column, down + 1, across + 1).merge(false);
  }
  await writeContents(context, block, at);
  for (const area of areasOf(block)) format(at(area.row, area.column, area.rows, area.columns), area.look);
  block.widths.forEach((width, column) => {
    if (width !== null) at(0, column).format.columnWidth = width * POINTS_PER_PIXEL;
  });
  for (const [row, height] of block.heights ?? []) at(row, 0).format.rowHeight = height * POINTS_PER_PIXEL;
  await context.sync();
}

/** Text as it is typed into a cell so that it stays text, whatever it begins with. */
export function asTyped({ kind, content }: Pick<BlockCell, 'kind' | 'content'>): string | number {
  return kind === 'text' && content !== '' ? `'${content}` : content;
}

async function writeContents(
  context: Excel.RequestContext,
  block: Block,
  at: (row: number, column: number, rows: number, columns: number) => Excel.Range,
): Promise<void> {
  const rows: (string | number | null)[][] = Array.from({ length: block.rows }, () =>
    Array.from({ length: block.columns }, () => null),
  );
  for (const cell of block.cells) {
    const row = rows[cell.row];
    if (row !== undefined) row[cell.column] = asTyped(cell);
  }
  const step = Math.max(1, Math.floor(CELLS_PER_SYNC / block.columns));
  for (let from = 0; from < block.rows; from += step) {
    const part = rows.slice(from, from + step);
    // A null leaves a cell alone; the type of the declaration does not know it.
    at(from, 0, part.length, block.columns).formulas = part as string[][];
    await context.sync();
  }
}

interface Area {
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
  readonly look: Look;
}

/** Rectangles of cells with the same look, as few as go quickly. */
export function areasOf(block: Block): Area[] {
  const areas: Area[] = [];
  const open = new Map<string, Area>();
  const single = [...block.cells].sort((a, b) => a.row - b.row || a.column - b.column);
  for (const { row, column, look, spill, across = 0, down = 0 } of single) {
    if (spill !== undefined) {
      const { rows, columns, header, names } = spill;
      if (header) areas.push({ row, column, rows: 1, columns, look: 'header' });
      const top = row + (header ? 1 : 0);
      const left = column + (names ? 1 : 0);
      const below = row + rows - top;
      if (names) areas.push({ row: top, column, rows: below, columns: 1, look: 'label' });
      if (columns > left - column) {
        areas.push({ row: top, column: left, rows: below, columns: column + columns - left, look });
      }
      continue;
    }
    // Cells below one another with the same look become one area.
    const key = `${column} ${look} ${across}`;
    const above = open.get(key);
    if (above !== undefined && above.row + above.rows === row) {
      open.set(key, { ...above, rows: above.rows + 1 + down });
      continue;
    }
    if (above !== undefined) areas.push(above);
    open.set(key, { row, column, rows: 1 + down, columns: 1 + across, look });
  }
  return [...areas, ...open.values()];
}

function format(range: Excel.Range, look: Look): void {
  const { bold, italic, size, color, fill, align, vertical, wrap, indent, rule } = looks[look];
  const { font } = range.format;
  if (bold !== undefined) font.bold = bold;
  if (italic !== undefined) font.italic = italic;
  if (size !== undefined) font.size = size;
  if (color !== undefined) font.color = color;
  if (fill !== undefined) range.format.fill.color = fill;
  if (align !== undefined) range.format.horizontalAlignment = align;
  if (vertical !== undefined) range.format.verticalAlignment = vertical;
  if (wrap !== undefined) range.format.wrapText = wrap;
  if (indent !== undefined) range.format.indentLevel = indent;
  if (rule !== undefined) {
    const edge = range.format.borders.getItem('EdgeBottom');
    edge.style = 'Continuous';
    edge.color = rule;
  }
}
