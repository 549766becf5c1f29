/** A cell that is not empty, as it would be typed, by its place in the area. */
export interface FilledCell {
  readonly row: number;
  readonly column: number;
  readonly content: string | number | boolean;
}

/** The cells of an area that are not empty, and the area as the sheet names it. */
export async function filledCells(
  context: Excel.RequestContext,
  range: Excel.Range,
): Promise<{ readonly filled: readonly FilledCell[]; readonly address: string }> {
  range.load('address,formulas,valueTypes');
  await context.sync();
  // What a cell may hold, as the host lists it.
  const formulas = range.formulas as (string | number | boolean)[][];
  const filled = formulas.flatMap((line, row) =>
    line.flatMap((content, column) =>
      range.valueTypes[row]?.[column] === 'Empty' && content === '' ? [] : [{ row, column, content }],
    ),
  );
  return { filled, address: range.address };
}
