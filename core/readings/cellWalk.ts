import type { Cell } from './readings.ts';

/** A range of cells, row by row; rows may differ in length. */
export type CellRange = readonly (readonly Cell[])[];

const NO_CELLS: readonly Cell[] = [];

/** Number of cells in a range. */
export function countCells(range: CellRange): number {
  let count = 0;
  for (const row of range) count += row.length;
  return count;
}

/** Cells of a range, read row by row. */
export function flatten(range: CellRange): Cell[] {
  const cells: Cell[] = [];
  for (const row of range) for (const cell of row) cells.push(cell);
  return cells;
}

/**
 * Visits the pairs of two ranges with the same number of cells, read row by row, until the visitor returns false.
 * Allocates nothing.
 * @returns whether every pair was visited
 */
export function everyPair(
  x: CellRange,
  y: CellRange,
  count: number,
  visit: (index: number, x: Cell, y: Cell) => boolean,
): boolean {
  let rowX = x[0] ?? NO_CELLS;
  let rowY = y[0] ?? NO_CELLS;
  let atX = 0;
  let atY = 0;
  let nextX = 1;
  let nextY = 1;
  for (let index = 0; index < count; index++) {
    while (atX >= rowX.length && nextX < x.length) {
      rowX = x[nextX++] ?? NO_CELLS;
      atX = 0;
    }
    while (atY >= rowY.length && nextY < y.length) {
      rowY = y[nextY++] ?? NO_CELLS;
      atY = 0;
    }
    if (!visit(index, rowX[atX++] ?? null, rowY[atY++] ?? null)) return false;
  }
  return true;
}
