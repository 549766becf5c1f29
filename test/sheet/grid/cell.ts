/** The error values that a cell can show. */
export const CELL_ERRORS = [
  '#DIV/0!',
  '#N/A',
  '#NAME?',
  '#NULL!',
  '#NUM!',
  '#REF!',
  '#VALUE!',
  '#SPILL!',
  '#CALC!',
  '#BUSY!',
] as const;

export type CellErrorText = (typeof CELL_ERRORS)[number];

/** An error in a cell, with the sentence that came with it, if one did. */
export interface CellError {
  readonly error: CellErrorText;
  readonly message?: string;
}

/** What a cell holds: a number, a text, a boolean, an error, or nothing (null). */
export type CellValue = number | string | boolean | CellError | null;

export function isCellError(value: unknown): value is CellError {
  return typeof value === 'object' && value !== null && 'error' in value;
}

/** Tells whether a text is one of the error values, as it would be when typed into a cell. */
export function isErrorText(text: unknown): text is CellErrorText {
  return typeof text === 'string' && (CELL_ERRORS as readonly string[]).includes(text);
}
