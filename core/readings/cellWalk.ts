import type { Cell } from './readings.ts';

/** A range of cells, row by row; rows may differ in length. */
export type CellRange = readonly (readonly Cell[])[];

/** A range whose cells are still as the host gave them. */
export type RawRange = readonly (readonly unknown[])[];

const NO_CELLS: readonly unknown[] = [];

/** Number of cells in a range. */
export function countCells(range: RawRange): number {
  let count = 0;
  for (const row of range) count += row.length;
  return count;
}

/** Whether a range is one column, its first rows being known to hold one cell each. */
export function isColumn(range: RawRange, known = 0): boolean {
  for (let row = known; row < range.length; row++) if (range[row]?.length !== 1) return false;
  return true;
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
  x: RawRange,
  y: RawRange,
  count: number,
  visit: (index: number, x: unknown, y: unknown) => boolean,
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
    if (!visit(index, rowX[atX++], rowY[atY++])) return false;
  }
  return true;
}
