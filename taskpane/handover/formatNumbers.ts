import { numberFormatFor } from './numberFormats.ts';

/** Times to look again while functions are still being calculated, and the pause between, in milliseconds. */
const TRIES = 20;
const PAUSE = 150;

/**
 * Gives the numbers of an area as many decimals as six significant digits need: cell by cell, or a column alike.
 * @param alike columns of the area in which all numbers get the same format, from a row on
 */
export async function formatNumbers(
  context: Excel.RequestContext,
  range: Excel.Range,
  alike: { readonly column: number; readonly row: number } | null,
): Promise<void> {
  const values = await settledValues(context, range);
  const formats: (string | null)[][] = values.map((line) => line.map(() => null));
  const first = alike?.column ?? Number.POSITIVE_INFINITY;
  values.forEach((line, row) => {
    line.forEach((value, column) => {
      const own = formats[row];
      if (typeof value === 'number' && column < first && own !== undefined)
        own[column] = numberFormatFor([value]);
    });
  });
  const [width] = values.map((line) => line.length);
  for (let column = first; column < (width ?? 0); column++) {
    const numbers = values.slice(alike?.row).flatMap((line) => {
      const value = line[column];
      return typeof value === 'number' ? [value] : [];
    });
    const format = numberFormatFor(numbers);
    values.forEach((line, row) => {
      const own = formats[row];
      if (typeof line[column] === 'number' && row >= (alike?.row ?? 0) && own !== undefined)
        own[column] = format;
    });
  }
  // A null leaves a cell's format alone; the type of the declaration does not know it.
  range.numberFormat = formats as string[][];
  await context.sync();
}

async function settledValues(context: Excel.RequestContext, range: Excel.Range): Promise<unknown[][]> {
  for (let attempt = 0; ; attempt++) {
    range.load('values');
    await context.sync();
    const values = range.values as unknown[][];
    const busy = values.some((line) => line.some((value) => value === '#BUSY!' || value === '#GETTING_DATA'));
    if (!busy || attempt === TRIES) return values;
    await new Promise((resolve) => setTimeout(resolve, PAUSE));
  }
}
