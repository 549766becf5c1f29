import type { CellInput } from '../grid/grid.ts';

/** How a range of a demo sheet looks. */
export type DemoStyle = 'title' | 'note' | 'header' | 'input' | 'heading' | 'result' | 'statement';

/** One sheet of the demo workbook. */
export interface DemoSheet {
  readonly name: string;
  /** Widths of the columns from A on, in pixels. */
  readonly columnWidths: readonly number[];
  /** Rows that stay in sight. */
  readonly frozenRows: number;
  /** Blocks of values and formulas by the address of their top left cell. */
  readonly blocks: Readonly<Record<string, readonly (readonly CellInput[])[]>>;
  readonly styles: Readonly<Record<string, DemoStyle>>;
  readonly numberFormats: Readonly<Record<string, string>>;
  /** What the headless demo follows. */
  readonly followed: DemoCase;
}

/** A relation to follow while its readings are typed in. */
export interface DemoCase {
  /** The cells that the crew types into, row by row. */
  readonly typed: string;
  readonly x: string;
  readonly y: string;
  /** Where `TAUT.CONSTANTS` stands on the sheet. */
  readonly constants: string;
  /** The laws to rank, as `TAUT.COMPARE` takes them; empty: its default. */
  readonly laws: string;
  /** What stands after the laws in `TAUT.COMPARE`: known constants, uncertainties. */
  readonly more: string;
}
