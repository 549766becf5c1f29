import { Problem } from '../core/problem.ts';
import { functionWords } from '../core/words/functionWords.ts';
import type { Answer } from './sheetFunction.ts';

export type HostCell = number | string | boolean | CustomFunctions.Error;

/** The longest text a cell holds. */
const LONGEST_TEXT = 32_767;

/** Errors that a custom function may return; the host lets only #VALUE! and #N/A carry a sentence. */
const returnable: ReadonlySet<string> = new Set(['#DIV/0!', '#NUM!', '#NULL!']);

/** A problem as the error a cell shows. Touches `CustomFunctions.Error`, so call it only while a function runs. */
export function toHostError(problem: Problem): CustomFunctions.Error {
  const { ErrorCode } = CustomFunctions;
  switch (problem.code) {
    case 'argument':
    case 'unsettled':
    case 'notStraight':
      return new CustomFunctions.Error(ErrorCode.invalidValue, problem.message);
    case 'tooFew':
    case 'domain':
    case 'undefined':
    case 'noConvergence':
      return new CustomFunctions.Error(ErrorCode.notAvailable, problem.message);
    case 'cell':
      return passedOn(problem);
  }
}

/** The error of an input cell; #REF! and others that a function may not return become #VALUE! with a sentence. */
function passedOn(problem: Problem): CustomFunctions.Error {
  const { ErrorCode } = CustomFunctions;
  const error = problem.cellError ?? '';
  if (error === '#N/A') return new CustomFunctions.Error(ErrorCode.notAvailable, problem.message);
  // The codes of the host are the texts of its errors.
  if (returnable.has(error)) return new CustomFunctions.Error(error as CustomFunctions.ErrorCode);
  return new CustomFunctions.Error(ErrorCode.invalidValue, problem.message);
}

/** Anything thrown as the error a cell shows; what is not a Problem says only that the fault is Tautline's. */
export function thrownToHost(thrown: unknown, id: string): CustomFunctions.Error {
  return toHostError(
    thrown instanceof Problem ? thrown : new Problem('argument', id, functionWords.unexpected(id)),
  );
}

/** An answer as a legal cell: a number that does not exist is an empty text. */
export function toHostCell(answer: Answer | undefined): HostCell {
  if (typeof answer === 'number') return Number.isFinite(answer) ? answer + 0 : '';
  if (typeof answer === 'string')
    return answer.length > LONGEST_TEXT ? answer.slice(0, LONGEST_TEXT) : answer;
  if (typeof answer === 'boolean') return answer;
  return answer instanceof Problem ? toHostError(answer) : '';
}

/** A table of answers as cells, every row as long as the longest; rows that are legal cells already are handed on. */
export function toHostTable(table: readonly (readonly Answer[])[]): HostCell[][] {
  const width = table.reduce((widest, row) => Math.max(widest, row.length), 1);
  if (table.length === 0) return [['']];
  return table.map((row) => {
    // What was just found legal needs no translation.
    if (isLegalRow(row, width)) return row as HostCell[];
    const cells: HostCell[] = [];
    for (let column = 0; column < width; column++) cells.push(toHostCell(row[column]));
    return cells;
  });
}

/** Whether every cell of a row is what `toHostCell` would make of it. */
function isLegalRow(row: readonly Answer[], width: number): boolean {
  if (row.length !== width) return false;
  for (let column = 0; column < width; column++) {
    const cell = row[column];
    const legal = typeof cell === 'number' ? Number.isFinite(cell) && !Object.is(cell, -0) : isShort(cell);
    if (!legal) return false;
  }
  return true;
}

function isShort(cell: Answer | undefined): boolean {
  return typeof cell === 'boolean' || (typeof cell === 'string' && cell.length <= LONGEST_TEXT);
}
