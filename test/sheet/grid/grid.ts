import type { Rect } from './address.ts';
import type { CellValue } from './cell.ts';

/** What the stand-in's `Office` and `Excel` objects need of a spreadsheet, whatever engine draws and calculates it. */
export interface Grid {
  sheets(): SheetInfo[];
  activeSheet(): string;
  /** Adds a sheet at the end without activating it and returns its id. */
  addSheet(name: string): string;
  deleteSheet(id: string): void;
  renameSheet(id: string, name: string): void;
  activateSheet(id: string): void;

  read(sheet: string, row: number, column: number): GridCell;
  /** Writes values, or formulas where a text starts with `=`; null clears; undefined leaves a cell alone. */
  write(sheet: string, row: number, column: number, cells: readonly (readonly CellInput[])[]): void;
  /** Writes values as they are: a text that starts with `=` stays text. */
  writePlain(sheet: string, row: number, column: number, cells: readonly (readonly CellInput[])[]): void;
  clear(sheet: string, rect: Rect, what: 'contents' | 'formats' | 'all'): void;
  insert(sheet: string, rect: Rect, shift: 'down' | 'right'): void;
  remove(sheet: string, rect: Rect, shift: 'up' | 'left'): void;
  /** The smallest rectangle around every cell with a value or formula, or null on an empty sheet. */
  usedRect(sheet: string): Rect | null;

  format(sheet: string, row: number, column: number): CellFormat;
  setFormat(sheet: string, rect: Rect, format: Partial<CellFormat>): void;
  columnWidth(sheet: string, column: number): number;
  setColumnWidth(sheet: string, column: number, pixels: number): void;
  rowHeight(sheet: string, row: number): number;
  setRowHeight(sheet: string, row: number, pixels: number): void;
  freezeRows(sheet: string, rows: number): void;
  freezeColumns(sheet: string, columns: number): void;
  merge(sheet: string, rect: Rect): void;
  unmerge(sheet: string, rect: Rect): void;
  showGridlines(sheet: string, shown: boolean): void;

  selection(): Selection;
  select(sheet: string, rects: readonly Rect[]): void;

  /** Puts a picture over the cells; the same id again replaces it. */
  showPicture(sheet: string, id: string, picture: Picture): void;
  hidePicture(sheet: string, id: string): void;

  names(): { name: string; formula: string }[];
  addName(name: string, formula: string): void;
  deleteName(name: string): void;

  /** Adds (or replaces) a sheet function; the id is compared without regard to case. */
  register(sheetFunction: SheetFunction): void;
  /** Recalculates every formula. */
  recalculate(): void;
  /** Resolves when nothing is left to calculate. @throws when that takes longer than the time given. */
  settle(milliseconds?: number): Promise<void>;
  /** Calls back on every event until the returned function is called. */
  listen(listener: (event: GridEvent) => void): () => void;
  undo(): Promise<boolean>;
}

export interface SheetInfo {
  readonly id: string;
  readonly name: string;
  readonly hidden: boolean;
}

export type CellInput = number | string | boolean | null | undefined;

export interface GridCell {
  /** The value at full precision, spilled cells included. */
  readonly value: CellValue;
  /** The formula with its `=`, or null. */
  readonly formula: string | null;
  /** The value as the cell shows it. */
  readonly text: string;
  /** The rectangle a formula in this cell spills over, itself included. */
  readonly spill: Rect | null;
  /** For a cell that shows part of another cell's spill: the rectangle of that spill. */
  readonly spilledFrom: Rect | null;
}

export interface CellFormat {
  readonly bold: boolean;
  readonly italic: boolean;
  readonly underline: boolean;
  readonly color: string | null;
  readonly fontSize: number;
  readonly fontName: string;
  readonly fill: string | null;
  readonly numberFormat: string;
  readonly horizontal: 'general' | 'left' | 'center' | 'right';
  readonly vertical: 'top' | 'middle' | 'bottom';
  readonly wrap: boolean;
  /** Steps of indentation at the left. */
  readonly indent: number;
  readonly borders: Partial<Record<'top' | 'bottom' | 'left' | 'right', string | null>>;
}

export interface Selection {
  readonly sheet: string;
  readonly rects: readonly Rect[];
}

export interface Picture {
  /** A data URL of an image. */
  readonly source: string;
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  readonly name: string;
}

export type GridEvent =
  | {
      readonly type: 'edited';
      readonly sheet: string;
      readonly rect: Rect;
      readonly source: 'user' | 'program';
    }
  /** Whole rows or columns were inserted or deleted. */
  | {
      readonly type: 'moved';
      readonly sheet: string;
      readonly rect: Rect;
      readonly change: 'RowInserted' | 'RowDeleted' | 'ColumnInserted' | 'ColumnDeleted';
    }
  | { readonly type: 'selected'; readonly selection: Selection }
  | { readonly type: 'activated'; readonly sheet: string; readonly previous: string | null }
  | { readonly type: 'added'; readonly sheet: string }
  | { readonly type: 'deleted'; readonly sheet: string; readonly name: string }
  | { readonly type: 'renamed'; readonly sheet: string; readonly name: string }
  | { readonly type: 'calculated' };

/** Where a formula stands and which ranges its arguments named, as a custom function may ask for. */
export interface CallPlace {
  readonly address: string;
  readonly argumentAddresses: readonly (string | null)[];
}

/** An argument as the engine hands it over. */
export type CallArgument =
  | { readonly kind: 'scalar'; readonly value: CellValue; readonly fromCell: boolean }
  | {
      readonly kind: 'matrix';
      readonly values: readonly (readonly CellValue[])[];
      readonly fromCell: boolean;
    };

export type CallResult = CellValue | readonly (readonly CellValue[])[];

export interface SheetFunction {
  readonly name: string;
  readonly description: string;
  readonly parameters: readonly {
    readonly name: string;
    readonly description: string;
    readonly optional: boolean;
    readonly repeating: boolean;
  }[];
  call(argumentsOfCall: readonly CallArgument[], place: CallPlace): CallResult | Promise<CallResult>;
}
