import type { ICellData, IRange, IStyleData, Nullable } from '@univerjs/core';
import {
  BooleanNumber,
  CellValueType,
  Dimension,
  HorizontalAlign,
  VerticalAlign,
  WrapStrategy,
} from '@univerjs/core';
import type { FUniver } from '@univerjs/core/facade';
import { FormulaDataModel, IFunctionService } from '@univerjs/engine-formula';
import type { FWorkbook, FWorksheet } from '@univerjs/sheets/facade';
import type { Rect } from '../grid/address.ts';
import { type CellValue, isErrorText } from '../grid/cell.ts';
import type {
  CellFormat,
  CellInput,
  Grid,
  GridCell,
  GridEvent,
  Picture,
  Selection,
  SheetFunction,
} from '../grid/grid.ts';
import { HostFunction } from './hostFunction.ts';
import { MessageBook } from './messageBook.ts';
import { spilledColumns, spillVanished } from './spilledCells.ts';

/** What the engine's injector offers: a service for a token. */
export interface ServiceSource {
  get<T>(token: unknown): T;
}

export interface PictureLayer {
  show(sheet: string, id: string, picture: Picture): void;
  hide(sheet: string, id: string): void;
}

const SETTLE_TIMEOUT = 20_000;

/** A grid over the spreadsheet engine's workbook, in a browser or without one. */
export class UniverGrid implements Grid {
  readonly api: FUniver;
  readonly book: FWorkbook;
  readonly messages = new MessageBook();
  private readonly services: ServiceSource;
  private readonly pictures: PictureLayer;
  private readonly listeners = new Set<(event: GridEvent) => void>();
  private readonly registered = new Set<string>();
  private pending = false;
  /** Functions came that a calculation already running may not have met: the next pass is followed by another. */
  private unmetFunctions = false;
  private writing = 0;
  private quiet = 0;
  private lastActive: string | null = null;
  private lastSelection = '';
  private spilledBefore: ReadonlyMap<string, string[]> = new Map();

  constructor(api: FUniver, book: FWorkbook, services: ServiceSource, pictures: PictureLayer) {
    this.api = api;
    this.book = book;
    this.services = services;
    this.pictures = pictures;
    book.onCommandExecuted((command) => this.follow(command.id, command.params));
    // Reported while idle, so perhaps late: settle() looks for itself.
    api.getFormula().calculationResultApplied(() => this.calculated());
  }

  sheets() {
    return this.book.getSheets().map((sheet) => ({
      id: sheet.getSheetId(),
      name: sheet.getSheetName(),
      hidden: sheet.isSheetHidden(),
    }));
  }

  activeSheet(): string {
    return this.book.getActiveSheet().getSheetId();
  }

  addSheet(name: string): string {
    const previous = this.book.getActiveSheet();
    this.quiet++;
    try {
      const id = this.book.insertSheet(name).getSheetId();
      this.book.setActiveSheet(previous);
      this.emit({ type: 'added', sheet: id });
      return id;
    } finally {
      this.quiet--;
    }
  }

  deleteSheet(id: string): void {
    this.book.deleteSheet(this.sheet(id));
  }

  renameSheet(id: string, name: string): void {
    this.sheet(id).setName(name);
  }

  activateSheet(id: string): void {
    this.book.setActiveSheet(this.sheet(id));
  }

  read(sheet: string, row: number, column: number): GridCell {
    const raw = this.rawCell(sheet, row, column);
    const formula = this.formulas().getFormulaStringByCell(row, column, sheet, this.book.getId()) ?? null;
    const spilled = this.spilledCell(sheet, row, column);
    const holder = isBlank(raw) && !formula ? spilled : (raw ?? spilled);
    const value = this.valueOf(holder, formula !== null || holder === spilled, sheet, row, column);
    const spill = formula ? this.spillAt(sheet, row, column) : null;
    return {
      value,
      formula: formula || null,
      text: value === null ? '' : this.displayed(sheet, row, column, value),
      spill,
      spilledFrom: spill || value === null || holder !== spilled ? null : this.spillOver(sheet, row, column),
    };
  }

  private displayed(sheet: string, row: number, column: number, value: CellValue): string {
    if (typeof value === 'object' && value !== null) return value.error;
    if (typeof value === 'boolean') return value ? 'TRUE' : 'FALSE';
    if (typeof value === 'string') return value;
    const shown = this.sheet(sheet).getRange(row, column).getDisplayValue();
    return shown === '' ? String(value) : shown;
  }

  private valueOf(
    cell: Nullable<ICellData>,
    calculated: boolean,
    sheet: string,
    row: number,
    column: number,
  ): CellValue {
    if (!cell || cell.v === null || cell.v === undefined) return null;
    if (cell.t === CellValueType.BOOLEAN) return cell.v === 1 || cell.v === true || cell.v === '1';
    if (typeof cell.v === 'boolean' || typeof cell.v === 'number') return cell.v;
    if (cell.t === CellValueType.NUMBER && cell.v !== '' && Number.isFinite(Number(cell.v)))
      return Number(cell.v);
    if (isErrorText(cell.v) && cell.t !== CellValueType.FORCE_STRING) {
      const message = calculated ? this.messageFor(sheet, row, column) : undefined;
      return message === undefined ? { error: cell.v } : { error: cell.v, message };
    }
    return cell.v === '' && !calculated ? null : cell.v;
  }

  private messageFor(sheet: string, row: number, column: number): string | undefined {
    const origin = this.spillOver(sheet, row, column);
    return this.messages.at(sheet, origin?.top ?? row, origin?.left ?? column, row, column);
  }

  write(sheet: string, row: number, column: number, cells: readonly (readonly CellInput[])[]): void {
    this.put(sheet, row, column, cells, (text) => text.startsWith('=') && text.length > 1);
  }

  writePlain(sheet: string, row: number, column: number, cells: readonly (readonly CellInput[])[]): void {
    this.put(sheet, row, column, cells, () => false);
  }

  private put(
    sheet: string,
    row: number,
    column: number,
    cells: readonly (readonly CellInput[])[],
    isFormula: (text: string) => boolean,
  ): void {
    const matrix: Record<number, Record<number, ICellData>> = {};
    let width = 0;
    cells.forEach((line, down) => {
      const target: Record<number, ICellData> = {};
      line.forEach((input, across) => {
        if (input !== undefined) target[column + across] = cellData(input, isFormula);
      });
      matrix[row + down] = target;
      width = Math.max(width, line.length);
    });
    if (cells.length === 0 || width === 0) return;
    const range = this.range(sheet, {
      top: row,
      left: column,
      bottom: row + cells.length - 1,
      right: column + width - 1,
    });
    this.asProgram(() => range.setValues(matrix));
  }

  clear(sheet: string, rect: Rect, what: 'contents' | 'formats' | 'all'): void {
    const range = this.range(sheet, this.clip(sheet, rect));
    this.asProgram(() => {
      if (what === 'contents') range.clearContent();
      else if (what === 'formats') range.clearFormat();
      else range.clear();
    });
  }

  insert(sheet: string, rect: Rect, shift: 'down' | 'right'): void {
    const range = this.range(sheet, this.clip(sheet, rect));
    this.asProgram(() => range.insertCells(shift === 'down' ? Dimension.ROWS : Dimension.COLUMNS));
  }

  remove(sheet: string, rect: Rect, shift: 'up' | 'left'): void {
    const range = this.range(sheet, this.clip(sheet, rect));
    this.asProgram(() => range.deleteCells(shift === 'up' ? Dimension.ROWS : Dimension.COLUMNS));
  }

  usedRect(sheet: string): Rect | null {
    let rect: Rect | null = null;
    const include = (row: number, column: number) => {
      rect = rect
        ? {
            top: Math.min(rect.top, row),
            left: Math.min(rect.left, column),
            bottom: Math.max(rect.bottom, row),
            right: Math.max(rect.right, column),
          }
        : { top: row, left: column, bottom: row, right: column };
    };
    const worksheet = this.sheet(sheet).getSheet();
    worksheet.getCellMatrix().forValue((row, column, cell) => {
      if (!isBlank(cell) || cell?.f || cell?.si) include(row, column);
    });
    for (const spill of this.spills(sheet)) {
      include(spill.top, spill.left);
      include(spill.bottom, spill.right);
    }
    return rect;
  }

  format(sheet: string, row: number, column: number): CellFormat {
    this.grow(sheet, row, column);
    const style: IStyleData = this.sheet(sheet).getRange(row, column).getCellStyleData('row') ?? {};
    return {
      bold: style.bl === BooleanNumber.TRUE,
      italic: style.it === BooleanNumber.TRUE,
      underline: style.ul?.s === BooleanNumber.TRUE,
      color: style.cl?.rgb ?? null,
      fontSize: style.fs ?? 11,
      fontName: style.ff ?? 'Arial',
      fill: style.bg?.rgb ?? null,
      numberFormat: style.n?.pattern ?? 'General',
      horizontal: HORIZONTAL.find(([, value]) => value === style.ht)?.[0] ?? 'general',
      vertical: VERTICAL.find(([, value]) => value === style.vt)?.[0] ?? 'bottom',
      indent: Math.max(0, ((style.pd?.l ?? 2) - 2) / INDENT),
      wrap: style.tb === WrapStrategy.WRAP,
      borders: {
        top: style.bd?.t?.cl.rgb ?? null,
        bottom: style.bd?.b?.cl.rgb ?? null,
        left: style.bd?.l?.cl.rgb ?? null,
        right: style.bd?.r?.cl.rgb ?? null,
      },
    };
  }

  setFormat(sheet: string, rect: Rect, format: Partial<CellFormat>): void {
    const range = this.range(sheet, this.clip(sheet, rect));
    if (format.bold !== undefined) range.setFontWeight(format.bold ? 'bold' : null);
    if (format.italic !== undefined) range.setFontStyle(format.italic ? 'italic' : null);
    if (format.underline !== undefined) range.setFontLine(format.underline ? 'underline' : null);
    if (format.color !== undefined) range.setFontColor(format.color);
    if (format.fontSize !== undefined) range.setFontSize(format.fontSize);
    if (format.fontName !== undefined) range.setFontFamily(format.fontName);
    if (format.fill !== undefined) range.setBackgroundColor(format.fill ?? '');
    if (format.horizontal === 'general') this.setStyle(sheet, rect, 'ht', HorizontalAlign.UNSPECIFIED);
    else if (format.horizontal !== undefined) range.setHorizontalAlignment(ALIGNMENT[format.horizontal]);
    if (format.vertical !== undefined) range.setVerticalAlignment(format.vertical);
    if (format.wrap !== undefined) range.setWrap(format.wrap);
    if (format.indent !== undefined) this.setStyle(sheet, rect, 'pd', { l: 2 + INDENT * format.indent });
    if (format.numberFormat !== undefined) {
      range.setNumberFormat(format.numberFormat === 'General' ? '' : format.numberFormat);
    }
    for (const [side, color] of Object.entries(format.borders ?? {})) {
      const type = { top: 'TOP', bottom: 'BOTTOM', left: 'LEFT', right: 'RIGHT' }[side];
      if (type && color) {
        const { BorderType, BorderStyleTypes } = this.api.Enum;
        range.setBorder(BorderType[type as keyof typeof BorderType], BorderStyleTypes.THIN, color);
      }
    }
  }

  /** Sets one part of the style alone: setting a value with a style would take the results of formulas away. */
  private setStyle(sheet: string, rect: Rect, type: keyof IStyleData, value: unknown): void {
    this.api.syncExecuteCommand('sheet.command.set-style', {
      unitId: this.book.getId(),
      subUnitId: sheet,
      range: toRange(this.clip(sheet, rect)),
      style: { type, value },
    });
  }

  columnWidth(sheet: string, column: number): number {
    return this.sheet(sheet).getColumnWidth(column);
  }

  setColumnWidth(sheet: string, column: number, pixels: number): void {
    this.grow(sheet, 0, column);
    this.sheet(sheet).setColumnWidth(column, pixels);
  }

  rowHeight(sheet: string, row: number): number {
    return this.sheet(sheet).getRowHeight(row);
  }

  setRowHeight(sheet: string, row: number, pixels: number): void {
    this.grow(sheet, row, 0);
    this.sheet(sheet).setRowHeightsForced(row, 1, pixels);
  }

  freezeRows(sheet: string, rows: number): void {
    this.sheet(sheet).setFrozenRows(rows);
  }

  freezeColumns(sheet: string, columns: number): void {
    this.sheet(sheet).setFrozenColumns(columns);
  }

  merge(sheet: string, rect: Rect): void {
    this.range(sheet, rect).merge({ isForceMerge: true });
  }

  unmerge(sheet: string, rect: Rect): void {
    this.range(sheet, rect).breakApart();
  }

  showGridlines(sheet: string, shown: boolean): void {
    this.sheet(sheet).setHiddenGridlines(!shown);
  }

  selection(): Selection {
    const active = this.book.getActiveSheet();
    const ranges = active.getSelection()?.getActiveRangeList() ?? [];
    const rects = ranges.map((range) => toRect(range.getRange()));
    const bounds = { bottom: active.getMaxRows() - 1, right: active.getMaxColumns() - 1 };
    return { sheet: active.getSheetId(), rects: rects.map((rect) => openEnds(rect, bounds)) };
  }

  select(sheet: string, rects: readonly Rect[]): void {
    if (this.activeSheet() !== sheet) this.activateSheet(sheet);
    const selections = rects.map((rect, index) => {
      const range = toRange(this.clip(sheet, rect));
      const first = { ...range, endRow: range.startRow, endColumn: range.startColumn };
      const primary = {
        ...first,
        actualRow: range.startRow,
        actualColumn: range.startColumn,
        isMerged: false,
        isMergedMainCell: false,
      };
      return { range, primary: index === rects.length - 1 ? primary : null, style: null };
    });
    this.api.syncExecuteCommand('sheet.operation.set-selections', {
      unitId: this.book.getId(),
      subUnitId: sheet,
      selections,
    });
  }

  showPicture(sheet: string, id: string, picture: Picture): void {
    this.pictures.show(sheet, id, picture);
  }

  hidePicture(sheet: string, id: string): void {
    this.pictures.hide(sheet, id);
  }

  names() {
    return this.book
      .getDefinedNames()
      .map((one) => ({ name: one.getName(), formula: one.getFormulaOrRefString() }));
  }

  addName(name: string, formula: string): void {
    this.book.insertDefinedName(name, formula.replace(/^=/, ''));
  }

  deleteName(name: string): void {
    this.book.deleteDefinedName(name);
  }

  register(sheetFunction: SheetFunction): void {
    const { name, description, parameters } = sheetFunction;
    this.unmetFunctions = true;
    if (!this.registered.has(name)) {
      this.registered.add(name);
      // For the formula bar's completion; the executor registered next replaces the placeholder's calculation.
      this.api.getFormula().registerFunction(name, () => 0, {
        description: {
          functionName: name,
          functionType: 16,
          description,
          abstract: description,
          functionParameter: parameters.map((parameter) => ({
            name: parameter.name,
            detail: parameter.description,
            example: '',
            require: parameter.optional ? 0 : 1,
            repeat: parameter.repeating ? 1 : 0,
          })),
        },
      });
    }
    const executor = new HostFunction(sheetFunction, {
      sheetName: (id) => this.book.getSheetBySheetId(id)?.getSheetName() ?? id,
      called: (from, result) => this.messages.keep(from, result),
    });
    this.services
      .get<{ registerExecutors(one: HostFunction): void }>(IFunctionService)
      .registerExecutors(executor);
  }

  recalculate(): void {
    this.pending = true;
    this.api.getFormula().executeCalculation();
  }

  async settle(milliseconds = SETTLE_TIMEOUT): Promise<void> {
    const end = Date.now() + milliseconds;
    while (this.pending) {
      const left = end - Date.now();
      if (left <= 0) throw new Error(`the sheet did not finish calculating within ${milliseconds} ms`);
      await this.api.getFormula().onCalculationResultApplied(left);
      this.calculated();
    }
  }

  listen(listener: (event: GridEvent) => void): () => void {
    this.listeners.add(listener);
    return () => this.listeners.delete(listener);
  }

  undo(): Promise<boolean> {
    return this.api.undo();
  }

  private calculated(): void {
    this.pending = false;
    const spilled = spilledColumns(this.formulas().getArrayFormulaCellData()[this.book.getId()] ?? {});
    const stale = spillVanished(this.spilledBefore, spilled);
    this.spilledBefore = spilled;
    // The engine leaves dependents of vanished spill cells as they were; a full pass mends them.
    const again = stale || this.unmetFunctions;
    this.unmetFunctions = false;
    if (again) this.recalculate();
    this.emit({ type: 'calculated' });
  }

  /** The engine may report one selection several times. */
  private selected(): void {
    const selection = this.selection();
    const key = JSON.stringify(selection);
    if (key === this.lastSelection) return;
    this.lastSelection = key;
    this.emit({ type: 'selected', selection });
  }

  private asProgram(write: () => void): void {
    this.writing++;
    try {
      write();
    } finally {
      this.writing--;
    }
  }

  private follow(id: string, params: unknown): void {
    // The parameters of the engine's commands, each as its own documentation gives it.
    const given = (params ?? {}) as {
      subUnitId?: string;
      trigger?: string;
      cellValue?: Record<string, Record<string, unknown> | undefined>;
      selections?: { range: IRange }[];
      range?: IRange;
      type?: number;
      sheet?: { id: string };
      subUnitName?: string;
      name?: string;
    };
    const sheet = given.subUnitId ?? '';
    if (id === 'sheet.mutation.set-range-values' && given.trigger !== undefined) {
      const rect = rectOfKeys(given.cellValue);
      const styleOnly = /style|border|numfmt/i.test(given.trigger);
      if (rect && !styleOnly) {
        this.pending = true;
        this.emit({ type: 'edited', sheet, rect, source: this.writing > 0 ? 'program' : 'user' });
      }
    } else if (id === 'sheet.operation.set-selections') {
      const moving = given.type === 0 || given.type === 1;
      if (!moving) this.selected();
    } else if (id === 'sheet.operation.set-worksheet-active') {
      if (sheet !== this.lastActive) this.emit({ type: 'activated', sheet, previous: this.lastActive });
      this.lastActive = sheet;
    } else if (id === 'sheet.mutation.insert-sheet') {
      if (this.quiet === 0) this.emit({ type: 'added', sheet: given.sheet?.id ?? '' });
    } else if (id === 'sheet.mutation.remove-sheet') {
      this.pending = true;
      this.emit({ type: 'deleted', sheet, name: given.subUnitName ?? '' });
    } else if (id === 'sheet.mutation.set-worksheet-name') {
      this.emit({ type: 'renamed', sheet, name: given.name ?? '' });
    } else if (/^sheet\.mutation\.(insert|remove|move)-(row|col|range)/.test(id)) {
      this.pending = true;
      const change = MOVES[id];
      if (change && given.range) this.emit({ type: 'moved', sheet, rect: toRect(given.range), change });
    }
  }

  private emit(event: GridEvent): void {
    if (this.quiet > 0 && (event.type === 'activated' || event.type === 'selected')) return;
    for (const listener of [...this.listeners]) listener(event);
  }

  private sheet(id: string): FWorksheet {
    const sheet = this.book.getSheetBySheetId(id);
    if (!sheet) throw new RangeError(`no sheet ${id}`);
    return sheet;
  }

  private range(sheet: string, rect: Rect) {
    this.grow(sheet, rect.bottom, rect.right);
    return this.sheet(sheet).getRange(toRange(rect));
  }

  private grow(sheet: string, row: number, column: number): void {
    const worksheet = this.sheet(sheet);
    if (row >= worksheet.getMaxRows()) worksheet.setRowCount(row + 100);
    if (column >= worksheet.getMaxColumns()) worksheet.setColumnCount(column + 10);
  }

  /** Whole rows and columns stop where the engine's sheet stops. */
  private clip(sheet: string, rect: Rect): Rect {
    const worksheet = this.sheet(sheet);
    const bottom = rect.bottom >= 100_000 ? worksheet.getMaxRows() - 1 : rect.bottom;
    const right = rect.right >= 1_000 ? worksheet.getMaxColumns() - 1 : rect.right;
    return { ...rect, bottom, right };
  }

  private formulas(): FormulaDataModel {
    return this.services.get<FormulaDataModel>(FormulaDataModel);
  }

  private rawCell(sheet: string, row: number, column: number): Nullable<ICellData> {
    return this.sheet(sheet).getSheet().getCellMatrix().getValue(row, column);
  }

  private spilledCell(sheet: string, row: number, column: number): Nullable<ICellData> {
    return this.formulas().getArrayFormulaCellData()[this.book.getId()]?.[sheet]?.[row]?.[column];
  }

  private spillAt(sheet: string, row: number, column: number): Rect | null {
    const range = this.formulas().getArrayFormulaRange()[this.book.getId()]?.[sheet]?.[row]?.[column];
    return range ? toRect(range) : null;
  }

  private spillOver(sheet: string, row: number, column: number): Rect | null {
    const over = (rect: Rect) =>
      row >= rect.top && row <= rect.bottom && column >= rect.left && column <= rect.right;
    return this.spills(sheet).find(over) ?? null;
  }

  private spills(sheet: string): Rect[] {
    const rows = this.formulas().getArrayFormulaRange()[this.book.getId()]?.[sheet] ?? {};
    const rects: Rect[] = [];
    for (const row of Object.values(rows)) {
      for (const range of Object.values<Nullable<IRange>>(row ?? {})) if (range) rects.push(toRect(range));
    }
    return rects;
  }
}

const MOVES: Readonly<Record<string, Extract<GridEvent, { type: 'moved' }>['change']>> = {
  'sheet.mutation.insert-row': 'RowInserted',
  'sheet.mutation.remove-rows': 'RowDeleted',
  'sheet.mutation.insert-col': 'ColumnInserted',
  'sheet.mutation.remove-col': 'ColumnDeleted',
};

/** Width of one step of indentation in pixels. */
const INDENT = 9;

const HORIZONTAL = [
  ['left', HorizontalAlign.LEFT],
  ['center', HorizontalAlign.CENTER],
  ['right', HorizontalAlign.RIGHT],
] as const;

const ALIGNMENT = { left: 'left', center: 'center', right: 'normal' } as const;

const VERTICAL = [
  ['top', VerticalAlign.TOP],
  ['middle', VerticalAlign.MIDDLE],
  ['bottom', VerticalAlign.BOTTOM],
] as const;

function isBlank(cell: Nullable<ICellData>): boolean {
  return !cell || cell.v === null || cell.v === undefined || cell.v === '';
}

function cellData(input: CellInput, isFormula: (text: string) => boolean): ICellData {
  const empty = { f: null, si: null, p: null };
  if (input === null || input === undefined || input === '') return { ...empty, v: null, t: null };
  if (typeof input === 'number') return { ...empty, v: input, t: CellValueType.NUMBER };
  if (typeof input === 'boolean') return { ...empty, v: input ? 1 : 0, t: CellValueType.BOOLEAN };
  if (isFormula(input)) return { f: input, si: null, p: null, v: null, t: null };
  return { ...empty, v: input, t: CellValueType.STRING };
}

function toRange(rect: Rect): IRange {
  return { startRow: rect.top, endRow: rect.bottom, startColumn: rect.left, endColumn: rect.right };
}

function toRect(range: IRange): Rect {
  return { top: range.startRow, left: range.startColumn, bottom: range.endRow, right: range.endColumn };
}

/** Selecting a column's or row's header gives a range with no ends. */
function openEnds(rect: Rect, bounds: { bottom: number; right: number }): Rect {
  const or = (value: number, instead: number) => (Number.isFinite(value) ? value : instead);
  return {
    top: or(rect.top, 0),
    left: or(rect.left, 0),
    bottom: or(rect.bottom, bounds.bottom),
    right: or(rect.right, bounds.right),
  };
}

function rectOfKeys(cells: Record<string, Record<string, unknown> | undefined> | undefined): Rect | null {
  const rows = Object.keys(cells ?? {}).map(Number);
  const columns = Object.values(cells ?? {}).flatMap((row) => Object.keys(row ?? {}).map(Number));
  if (rows.length === 0 || columns.length === 0) return null;
  let [top, bottom, left, right] = [Infinity, -1, Infinity, -1];
  for (const row of rows) [top, bottom] = [Math.min(top, row), Math.max(bottom, row)];
  for (const column of columns) [left, right] = [Math.min(left, column), Math.max(right, column)];
  return { top, left, bottom, right };
}
