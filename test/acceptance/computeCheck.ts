import { createContext, runInContext } from 'node:vm';
import type { AcceptanceCheck, Argument } from './acceptanceChecks.ts';
import { acceptanceData, type DataCell } from './acceptanceData.ts';

export type Expected = number | string;

/** An error as the host makes it; its code is what the cell shows. */
class CellError extends Error {
  readonly code: string;
  constructor(code: string, message = '') {
    super(message);
    this.code = code;
  }
}

const ERROR_CODES = {
  invalidValue: '#VALUE!',
  notAvailable: '#N/A',
  divisionByZero: '#DIV/0!',
  invalidNumber: '#NUM!',
  nullReference: '#NULL!',
};

/**
 * Loads built sheet functions and returns what computes a check's cell with them.
 *
 * @param script text of functions.js
 */
export function checkComputer(script: string): (check: AcceptanceCheck) => Expected {
  const functions = new Map<string, (...given: unknown[]) => unknown>();
  const associate = (id: string, compute: (...given: unknown[]) => unknown) => functions.set(id, compute);
  const CustomFunctions = { associate, Error: CellError, ErrorCode: ERROR_CODES };
  runInContext(script, createContext({ CustomFunctions }), { filename: 'functions.js' });
  const data = acceptanceData();

  const given = (argument: Argument): unknown => {
    if (typeof argument !== 'object') return argument === '' ? null : argument;
    const column: readonly DataCell[] = data[argument.cells][argument.column];
    return column.slice(0, argument.first).map((cell) => [cell]);
  };

  return ({ what, id, arguments: list, cell = [1, 1] }) => {
    const compute = functions.get(id);
    if (compute === undefined) throw new Error(`functions.js has no ${id}`);
    let answer: unknown;
    try {
      answer = compute(...list.map(given), {});
    } catch (thrown) {
      answer = thrown;
    }
    const [row, column] = cell;
    const one: unknown = Array.isArray(answer) ? answer[row - 1]?.[column - 1] : answer;
    if (one instanceof CellError) return one.code;
    if (typeof one === 'number' || typeof one === 'string') return one;
    throw new Error(`${what}: ${id} answered ${String(one)}`);
  };
}
