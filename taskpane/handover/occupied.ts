import { standingAlone } from './spills.ts';

/** A cell that is not empty, as it would be typed, by its place in the area. */
export interface FilledCell {
  readonly row: number;
  readonly column: number;
  readonly content: string | number | boolean;
}

/** What stands in an area. */
export interface Occupation {
  /** Number of cells that are not empty. */
  readonly count: number;
  /** Those of them that were typed, as they were: not what other cells spill into them. */
  readonly filled: readonly FilledCell[];
  /** The area as the sheet names it. */
  readonly address: string;
}

/** The cells of an area that are not empty. */
export async function filledCells(context: Excel.RequestContext, range: Excel.Range): Promise<Occupation> {
  range.load('address,formulas,valueTypes');
  await context.sync();
  // What a cell may hold, as the host lists it.
  const formulas = range.formulas as (string | number | boolean)[][];
  const filled = formulas.flatMap((line, row) =>
    line.flatMap((content, column) =>
      range.valueTypes[row]?.[column] === 'Empty' && content === '' ? [] : [{ row, column, content }],
    ),
  );
  const { address } = range;
  return { count: filled.length, filled: await standingAlone(context, range, filled), address };
}
