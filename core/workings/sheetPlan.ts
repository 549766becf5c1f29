/** What a planned cell is, which decides how it looks. */
export type PlanStyle =
  | 'title'
  | 'note'
  | 'section'
  | 'label'
  | 'given'
  | 'value'
  | 'explanation'
  | 'header'
  | 'reading'
  | 'entry'
  | 'verdict';

/** One cell of a planned sheet; rows and columns count from 0. */
export interface PlannedCell {
  readonly row: number;
  readonly column: number;
  /** A formula begins with `=`; text is written as it is, whatever it begins with. */
  readonly kind: 'text' | 'number' | 'formula';
  readonly content: string | number;
  readonly style: PlanStyle;
}

/** A sheet as it will be written: contents, looks and extent. */
export interface SheetPlan {
  readonly cells: readonly PlannedCell[];
  /** Widths of the columns from A on, in pixels. */
  readonly columnWidths: readonly number[];
  readonly rows: number;
  readonly columns: number;
  /** Rows that stay in sight. */
  readonly frozenRows: number;
}

/** A column of the table of readings: its cells in formulas. */
export interface PlanColumn {
  readonly letter: string;
  /** All its rows: `$F$8:$F$42`. */
  readonly range: string;
  /** Its cell in a row of the sheet, counted from 0: `$F8`. */
  at(row: number): string;
}

/** The letters of a column counted from 0. */
export function columnLetters(index: number): string {
  let letters = '';
  for (let rest = index + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    letters = String.fromCharCode(65 + ((rest - 1) % 26)) + letters;
  }
  return letters;
}
