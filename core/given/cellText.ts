import { Problem } from '../problem.ts';
import type { CellRange } from '../readings/cellWalk.ts';
import type { Cell } from '../readings/readings.ts';
import { argumentWords } from '../words/argumentWords.ts';

/** What an argument may arrive as: nothing, one cell, or a range. */
export type Given = Cell | undefined | CellRange;

/**
 * A cell as trimmed text; the empty string for a blank.
 * @throws Problem `cell` when it holds an error
 */
export function cellText(cell: Cell | undefined, argument: string): string {
  if (cell === null || cell === undefined) return '';
  if (typeof cell === 'object') {
    throw new Problem('cell', argument, argumentWords.cellError(argument, cell.error), {
      cellError: cell.error,
    });
  }
  return String(cell).trim();
}

/** Whether an argument is a range rather than one cell. */
export function isRange(given: Given): given is CellRange {
  return Array.isArray(given);
}

/** A range of one cell as that cell; anything else as it is. */
export function single(given: Given): Given {
  if (!isRange(given)) return given;
  const first = given[0];
  return given.length === 1 && first?.length === 1 ? first[0] : given;
}
