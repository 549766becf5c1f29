import type { CellRange } from '../core/readings/cellWalk.ts';
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

/** A range from the host as cells, copied only when something in it must be translated. */
export function toRange(value: unknown): CellRange {
  if (!Array.isArray(value)) return [[toCell(value)]];
  const rows: unknown[] = value;
  if (rows.every((row) => Array.isArray(row))) {
    const ranges: unknown[][] = rows;
    if (ranges.every((row) => row.every(isPlain))) return ranges as Cell[][]; // every cell was looked at
    return ranges.map((row) => row.map(toCell));
  }
  return [rows.map(toCell)];
}

/** Whether the host has shown in these ranges that a blank cell does not arrive as 0. */
export function showsBlanks(...ranges: readonly CellRange[]): boolean {
  return ranges.some((range) => range.some((row) => row.includes(null)));
}

/** Whether a value is nothing: omitted, a blank cell, or empty text. */
export function isNothing(value: unknown): boolean {
  if (Array.isArray(value)) return value.every((row) => isNothing(row));
  return value === undefined || value === null || value === '';
}
