import { createRequire } from 'node:module';
import { type Context, createContext, Script } from 'node:vm';
import { headlessBundle } from './bundle.ts';
import type { DemoSheet } from './demo/demoSheet.ts';
import type * as HeadlessEngine from './engine/headlessGrid.ts';
import { builtFunctions, type FunctionsScript } from './functionsScript.ts';
import { columnName, parseAddress, type Rect } from './grid/address.ts';
import { type CellValue, isCellError } from './grid/cell.ts';
import { type BlankMode, type CustomFunctionsGlobal, createCustomFunctions } from './grid/customFunctions.ts';
import type { CellInput, Grid } from './grid/grid.ts';
import { attachCharts } from './office/attachCharts.ts';
import { Book } from './office/book.ts';
import { createHost, type HostGlobals } from './office/host.ts';

export interface OpenSheetOptions {
  /** What the host hands over for a blank cell of a range. Default `null`. */
  readonly blank?: BlankMode;
  /** The sheet functions to load; default: the built ones; null: none at all. */
  readonly functions?: FunctionsScript | null;
  readonly namespace?: string;
  /** Whether the functions find an `Excel` global, as they do where they share the panel's page. Default true. */
  readonly sharedPage?: boolean;
  /** What the workbook's settings hold at the start. */
  readonly settings?: Readonly<Record<string, unknown>>;
  readonly sheetName?: string;
  /** The sheets to open instead of one empty sheet. */
  readonly workbook?: readonly DemoSheet[];
}

/** What a cell shows to a test: a number, text, boolean, the text of an error such as `#N/A`, or null when blank. */
export type ShownValue = number | string | boolean | null;

export interface HeadlessSheet {
  readonly grid: Grid;
  /** The workbook behind the host's object model: settings, charts, and faults to inject. */
  readonly book: Book;
  /** `Office` and `Excel` over this sheet. */
  readonly host: HostGlobals;
  /** Puts a value, a formula (`=…`) or a block of them, with its top left cell at the address. */
  set(address: string, input: CellInput | readonly (readonly CellInput[])[]): void;
  /** Waits until everything is calculated. @throws when that takes longer than the time given (20 s). */
  settle(milliseconds?: number): Promise<void>;
  /** The value of one cell at full precision; an error as its text. */
  get(address: string): ShownValue;
  /** The values of a range, row by row. */
  block(address: string): ShownValue[][];
  /** The values of everything that the formula in this cell spills over. */
  spilled(address: string): ShownValue[][];
  /** The sentence that came with the error in a cell, or null. */
  message(address: string): string | null;
  close(): void;
}

/** How long one call of a sheet function may take before it is cut off. */
const CALL_TIMEOUT = 10_000;

/** Opens an empty sheet without a screen, with the sheet functions loaded as a host loads them. */
export async function openSheet(options: OpenSheetOptions = {}): Promise<HeadlessSheet> {
  const { blank = 'null', namespace = 'TAUT', sheetName = 'Sheet1' } = options;
  const functions = options.functions === undefined ? builtFunctions() : options.functions;
  const { grid, dispose } = engine().createHeadlessGrid(options.workbook ?? sheetName);
  let settings = { ...options.settings };
  const book = new Book(grid, {
    read: () => settings,
    write(next) {
      settings = next;
    },
  });
  attachCharts(book, 0);
  const host = createHost(book);
  const shared = options.sharedPage === false ? {} : host;
  if (functions) loadFunctions(grid, functions, namespace, blank, { ...shared });

  const place = (address: string): { sheet: string; rect: Rect } => {
    const parsed = parseAddress(address);
    const rect = parsed?.rects[0];
    if (!parsed || !rect) throw new RangeError(`not an address: ${address}`);
    const named = grid.sheets().find((one) => one.name === parsed.sheet)?.id;
    if (parsed.sheet !== null && named === undefined) throw new RangeError(`no sheet named ${parsed.sheet}`);
    return { sheet: named ?? grid.activeSheet(), rect };
  };
  const shown = (sheet: string, row: number, column: number): ShownValue =>
    show(grid.read(sheet, row, column).value);
  const block = (sheet: string, rect: Rect): ShownValue[][] =>
    span(rect.top, rect.bottom).map((row) =>
      span(rect.left, rect.right).map((column) => shown(sheet, row, column)),
    );

  return {
    grid,
    book,
    host,
    set(address, input) {
      const { sheet, rect } = place(address);
      grid.write(sheet, rect.top, rect.left, isBlock(input) ? input : [[input]]);
    },
    settle: (milliseconds) => grid.settle(milliseconds),
    get(address) {
      const { sheet, rect } = place(address);
      return shown(sheet, rect.top, rect.left);
    },
    block(address) {
      const { sheet, rect } = place(address);
      return block(sheet, rect);
    },
    spilled(address) {
      const { sheet, rect } = place(address);
      return block(sheet, grid.read(sheet, rect.top, rect.left).spill ?? rect);
    },
    message(address) {
      const { sheet, rect } = place(address);
      const { value } = grid.read(sheet, rect.top, rect.left);
      return isCellError(value) ? (value.message ?? null) : null;
    },
    // The engine has timers pending for a while after its last calculation.
    close: () => void setTimeout(dispose, 1_500).unref(),
  };
}

function loadFunctions(
  grid: Grid,
  functions: FunctionsScript,
  namespace: string,
  blank: BlankMode,
  shared: object,
): void {
  const host = createCustomFunctions(grid, namespace, functions.metadata, blank);
  const globals: { CustomFunctions: CustomFunctionsGlobal; call?: () => unknown } = {
    CustomFunctions: {
      associate(id, implementation) {
        const all = typeof id === 'string' ? { [id]: implementation } : id;
        for (const [each, fn] of Object.entries(all)) {
          if (fn) host.customFunctions.associate(each, (...values) => cutOff(() => fn(...values)));
        }
      },
    },
  };
  const page: Context = createContext(Object.assign(globals, shared, { console, setTimeout, clearTimeout }));
  const callAgain = new Script('call()');
  const cutOff = (call: () => unknown): unknown => {
    globals.call = call;
    return callAgain.runInContext(page, { timeout: CALL_TIMEOUT });
  };
  new Script(functions.text, { filename: 'functions.js' }).runInContext(page, { timeout: CALL_TIMEOUT });
  host.revealErrors();
  Object.assign(globals.CustomFunctions, {
    Error: host.customFunctions.Error,
    ErrorCode: host.customFunctions.ErrorCode,
  });
}

/** The engine, loaded outside the test runner's module registry so that it is loaded once a process. */
function engine(): typeof HeadlessEngine {
  const requireFromHere = process.getBuiltinModule?.('node:module').createRequire ?? createRequire;
  const path = headlessBundle();
  // The bundle is built from the very module that the type describes.
  return requireFromHere(path)(path) as typeof HeadlessEngine;
}

function show(value: CellValue): ShownValue {
  return isCellError(value) ? value.error : value;
}

function isBlock(
  input: CellInput | readonly (readonly CellInput[])[],
): input is readonly (readonly CellInput[])[] {
  return Array.isArray(input);
}

function span(from: number, to: number): number[] {
  return Array.from({ length: to - from + 1 }, (_, index) => from + index);
}

/** The address of the cell so many rows and columns from the top left one. */
export function cellAddress(row: number, column: number): string {
  return `${columnName(column)}${row + 1}`;
}
