import type { CellRange, RawRange } from '../core/readings/cellWalk.ts';
import type { Cell } from '../core/readings/readings.ts';
import { functionWords } from '../core/words/functionWords.ts';

/** Whether core can take a value from the host as it is. */
function isPlain(value: unknown): value is Cell {
  return (
    value === null || typeof value === 'number' || typeof value === 'string' || typeof value === 'boolean'
  );
}

/** The text of an error value, such as `#N/A`; undefined for anything else. */
function errorText(value: object): string | undefined {
  return 'code' in value && typeof value.code === 'string' && value.code.startsWith('#')
    ? value.code
    : undefined;
}

/** A value from the host as a cell: an error as its text, a data type that is none of core's as text. */
export function toCell(value: unknown): Cell {
  if (isPlain(value)) return value;
  if (value === undefined) return null;
  const error = typeof value === 'object' && value !== null ? errorText(value) : undefined;
  return error === undefined ? functionWords.dataType() : { error };
}

/** Whether a value is a list of rows; the first speaks for all, as the host makes no mixed lists. */
export function isRows(value: unknown): value is RawRange {
  return Array.isArray(value) && Array.isArray(value[0]);
}

/** Whether every part of a value is a row of cells that core can take as they are. */
function isPlainRange(rows: readonly unknown[]): rows is Cell[][] {
  for (const row of rows) {
    if (!Array.isArray(row)) return false;
    const cells: unknown[] = row;
    for (let column = 0; column < cells.length; column++) if (!isPlain(cells[column])) return false;
  }
  return true;
}

/** A range from the host as cells, copied only when something in it must be translated. */
export function toRange(value: unknown): CellRange {
  if (!Array.isArray(value)) return [[toCell(value)]];
  const rows: unknown[] = value;
  if (isPlainRange(rows)) return rows;
  if (rows.every((row) => !Array.isArray(row))) return [rows.map(toCell)];
  return rows.map((row) => (Array.isArray(row) ? row.map(toCell) : [toCell(row)]));
}

/** Whether the host has shown in a range that a blank cell does not arrive as 0. */
export function showsBlanks(range: CellRange): boolean {
  for (const row of range) if (row.includes(null)) return true;
  return false;
}

/** Whether a value is nothing: omitted, a blank cell, or empty text. */
export function isNothing(value: unknown): boolean {
  if (Array.isArray(value)) return value.every((row) => isNothing(row));
  return value === undefined || value === null || value === '';
}
