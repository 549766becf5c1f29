import { workingsWords } from '../words/workingsWords.ts';
import {
  columnLetters,
  type PlanColumn,
  type PlannedCell,
  type PlanStyle,
  type SheetPlan,
} from './sheetPlan.ts';

/** Columns of the steps: what, its value, how it comes about, digits agreed; then one left free, then the table. */
const WHAT = 0;
const VALUE = 1;
const HOW = 2;
const DIGITS = 3;
const FIRST_OF_TABLE = 5;

/** Rows of the title and its notes, and of the table's header; steps begin beside the header. */
const HEADER = 4;

const STEP_WIDTHS = [216, 128, 560, 46, 18];
const TABLE_WIDTH = 92;

/** Writes a plan from the top: steps one below the other, and beside them a table with one row per pair of cells. */
export class PlanWriter {
  private readonly cells: PlannedCell[] = [];
  private readonly count: number;
  private next = HEADER + 1;
  private columns = 0;

  /** @param count rows of the table */
  constructor(count: number) {
    this.count = count;
  }

  /** Up to four lines at the top, the first of them large. */
  title(lines: readonly string[]): void {
    lines.slice(0, HEADER).forEach((line, row) => {
      this.put(row, WHAT, 'text', line, row === 0 ? 'title' : 'note');
    });
    workingsWords.headers().forEach((text, column) => {
      this.put(HEADER, column, 'text', text, 'header');
    });
  }

  section(text: string): void {
    if (this.next > HEADER + 1) this.next++;
    for (let column = WHAT; column <= DIGITS; column++) {
      this.put(this.next, column, 'text', column === WHAT ? text : '', 'section');
    }
    this.next++;
  }

  /** Remarks beside no step, one in each row. */
  notes(texts: readonly string[]): void {
    for (const text of texts) this.put(this.next++, HOW, 'text', text, 'explanation');
  }

  /** A value that is stated, not computed. @returns its cell: `$B$12` */
  given(label: string, value: number | string, how: string): string {
    return this.line(label, typeof value === 'number' ? 'number' : 'text', value, how, 'given');
  }

  /** A step. @param formula without its `=` @returns its cell: `$B$12` */
  step(label: string, formula: string, how: string): string {
    return this.line(label, 'formula', `=${formula}`, how, 'value');
  }

  /** A comparison: the other value, and beside it a text and the digits that agree. @returns the cell of the digits */
  comparison(
    label: string,
    other: string,
    text: (value: string, digits: string) => string,
    digits: (value: string) => string,
  ): string {
    const row = this.next;
    const value = `$B$${row + 1}`;
    const count = `$D$${row + 1}`;
    this.put(row, WHAT, 'text', label, 'label');
    this.put(row, VALUE, 'formula', `=${other}`, 'value');
    this.put(row, HOW, 'formula', `=${text(value, count)}`, 'explanation');
    this.put(row, DIGITS, 'formula', `=${digits(value)}`, 'entry');
    this.next++;
    return count;
  }

  /** The closing line. @param formulas without `=` */
  verdict(label: string, value: string, text: (value: string) => string): void {
    const row = this.next++;
    this.put(row, WHAT, 'text', label, 'verdict');
    this.put(row, VALUE, 'formula', `=${value}`, 'verdict');
    this.put(row, HOW, 'formula', `=${text(`$B$${row + 1}`)}`, 'verdict');
  }

  /**
   * A column of the table.
   * @param entry of a row, by its place in the table (0, 1, …) and its row on the sheet; a text is a formula without `=`
   * @param how a line among the steps that explains it
   */
  column(
    header: string,
    how: string,
    entry: (index: number, row: number) => number | string,
    style: PlanStyle = 'entry',
  ): PlanColumn {
    const index = FIRST_OF_TABLE + this.columns;
    const letter = columnLetters(index);
    const first = HEADER + 1;
    this.put(HEADER, index, 'text', header, 'header');
    for (let i = 0; i < this.count; i++) {
      const content = entry(i, first + i);
      if (typeof content === 'number') this.put(first + i, index, 'number', content, style);
      else this.put(first + i, index, 'formula', `=${content}`, style);
    }
    this.columns++;
    if (how !== '') {
      this.put(this.next, WHAT, 'text', header, 'label');
      this.put(this.next, VALUE, 'text', workingsWords.column(letter), 'reading');
      this.put(this.next, HOW, 'text', how, 'explanation');
      this.next++;
    }
    return {
      letter,
      range: `$${letter}$${first + 1}:$${letter}$${first + this.count}`,
      at: (row) => `$${letter}${row + 1}`,
    };
  }

  /** The letters of the column that the table gets next. */
  nextColumn(): string {
    return columnLetters(FIRST_OF_TABLE + this.columns);
  }

  /** The finished plan. */
  plan(): SheetPlan {
    const columns = FIRST_OF_TABLE + this.columns;
    return {
      cells: this.cells,
      columnWidths: [...STEP_WIDTHS, ...Array.from({ length: this.columns }, () => TABLE_WIDTH)],
      rows: Math.max(this.next, HEADER + 1 + this.count),
      columns,
      frozenRows: HEADER + 1,
    };
  }

  private line(
    label: string,
    kind: PlannedCell['kind'],
    content: string | number,
    how: string,
    style: PlanStyle,
  ): string {
    const row = this.next++;
    this.put(row, WHAT, 'text', label, 'label');
    this.put(row, VALUE, kind, content, style);
    this.put(row, HOW, 'text', how, 'explanation');
    return `$B$${row + 1}`;
  }

  private put(
    row: number,
    column: number,
    kind: PlannedCell['kind'],
    content: string | number,
    style: PlanStyle,
  ): void {
    this.cells.push({ row, column, kind, content, style });
  }
}
