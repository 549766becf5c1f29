import type { Cell } from './readings.ts';

/** A value as a cell: nothing for undefined, text for what no cell can hold. */
export function asCell(value: unknown): Cell {
  if (value === undefined || value === null) return null;
  if (typeof value === 'number' || typeof value === 'string' || typeof value === 'boolean') return value;
  if (typeof value === 'object' && 'error' in value && typeof value.error === 'string') {
    return { error: value.error };
  }
  return String(value);
}
