/** A cell as core sees it: a number, text, a boolean, nothing, or an error. */
export type Cell = number | string | boolean | null | CellError;

/** An error that stands in a cell, such as `#DIV/0!`. */
export interface CellError {
  readonly error: string;
}

/** Readings as they came from the cells: complete ones as columns, the others accounted for. */
export interface Readings {
  /** Predictor of each complete reading, in the order of the cells. */
  readonly x: Float64Array;
  /** Response of each complete reading. */
  readonly y: Float64Array;
  /** 1-based position of each complete reading among the input cells, read row by row. */
  readonly position: Int32Array;
  /** Number of pairs of cells, complete or not. */
  readonly count: number;
  /** Pairs that hold something that is not a reading, each with its reason. */
  readonly setAside: readonly SetAside[];
  /** Number of pairs that are not there yet (blank, empty text or #N/A). */
  readonly waiting: number;
  /** Number of pairs at the end that were taken as not there yet because their y was zero; 0 as a rule. */
  readonly trailingZeros: number;
}

export type SetAsideReason = 'text' | 'boolean' | 'belowDetection' | 'outsideDomain' | 'noUncertainty';

/** A reading that takes no part in the fit. */
export interface SetAside {
  /** 1-based position among the input cells. */
  readonly position: number;
  readonly reason: SetAsideReason;
  /** A sentence that names the reading and says why. */
  readonly message: string;
}
