import type { Cell } from '../../core/readings/readings.ts';

/** A cell from what the host lists of it: its value and the type of its value. */
export function cellOf(value: unknown, type: unknown): Cell {
  if (type === 'Empty') return null;
  if (type === 'Error') return { error: String(value) };
  if (typeof value === 'number' || typeof value === 'boolean' || typeof value === 'string') return value;
  // A linked data type or a picture in a cell: its text is all there is.
  return String(value);
}
