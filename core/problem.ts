/**
 * What can go wrong, as a kind that the caller can act on:
 * - `argument`: an argument is wrong (unknown law, sizes that differ, a bad option);
 * - `cell`: an input cell holds an error, which is passed on as it is;
 * - `tooFew`: not enough readings so far;
 * - `unsettled`: the readings can settle only a combination of the constants;
 * - `notStraight`: the law cannot be made a straight line;
 * - `domain`: a reading lies outside the law's domain;
 * - `undefined`: a number does not exist for this legal input (no spread in x, an unbounded interval);
 * - `noConvergence`: an iteration did not settle.
 */
export type ProblemCode =
  | 'argument'
  | 'cell'
  | 'tooFew'
  | 'unsettled'
  | 'notStraight'
  | 'domain'
  | 'undefined'
  | 'noConvergence';

export interface ProblemDetails {
  /** 1-based character position in the law's text, or 1-based position of the reading at fault. */
  readonly position?: number;
  /** For `cell`: the error text that the cell held, such as `#DIV/0!`. */
  readonly cellError?: string;
}

/** The one error that core throws on purpose: a code, the argument at fault and a sentence for the user. */
export class Problem extends Error {
  readonly code: ProblemCode;
  readonly argument: string;
  readonly position: number | undefined;
  readonly cellError: string | undefined;

  constructor(code: ProblemCode, argument: string, message: string, details: ProblemDetails = {}) {
    super(message);
    this.name = 'Problem';
    this.code = code;
    this.argument = argument;
    this.position = details.position;
    this.cellError = details.cellError;
  }
}
