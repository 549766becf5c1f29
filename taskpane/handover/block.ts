/** How a cell that the panel writes looks. */
export type Look =
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
  | 'verdict'
  | 'statement'
  | 'eyebrow'
  | 'large'
  | 'heading'
  | 'level'
  | 'date'
  | 'finding';

/** One cell to write, by its place in the block; rows and columns count from 0. */
export interface BlockCell {
  readonly row: number;
  readonly column: number;
  /** A formula begins with `=`; text is written as text, whatever it begins with. */
  readonly kind: 'text' | 'number' | 'formula';
  readonly content: string | number;
  readonly look: Look;
  /** The rows and columns that a formula spills over: a header row and a first column of names stand apart. */
  readonly spill?: {
    readonly rows: number;
    readonly columns: number;
    readonly header: boolean;
    readonly names: boolean;
  };
  /** Further columns that the cell is merged with. */
  readonly across?: number;
  /** Further rows that the cell is merged with. */
  readonly down?: number;
}

/** A rectangular block of cells to write. */
export interface Block {
  readonly cells: readonly BlockCell[];
  readonly rows: number;
  readonly columns: number;
  /** Widths of its columns in pixels; left alone where none is given. */
  readonly widths: readonly (number | null)[];
  /** Heights of rows in pixels, by row. */
  readonly heights?: ReadonlyMap<number, number>;
}

/** Builds a block from the top down. */
export class BlockBuilder {
  readonly cells: BlockCell[] = [];
  readonly heights = new Map<number, number>();
  row = 0;

  text(column: number, content: string, look: Look, more: Partial<BlockCell> = {}): void {
    this.cells.push({ row: this.row, column, kind: 'text', content, look, ...more });
  }

  number(column: number, content: number, look: Look): void {
    this.cells.push({ row: this.row, column, kind: 'number', content, look });
  }

  /** @param formula without `=` */
  formula(column: number, formula: string, look: Look, more: Partial<BlockCell> = {}): void {
    this.cells.push({ row: this.row, column, kind: 'formula', content: `=${formula}`, look, ...more });
  }
}
