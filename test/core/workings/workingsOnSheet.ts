import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import type { FitSettings } from '../../../core/given/given.ts';
import { parseKnown } from '../../../core/given/parseKnown.ts';
import { parseOptions } from '../../../core/given/parseOptions.ts';
import { parseSpread } from '../../../core/given/parseSpread.ts';
import { readCells } from '../../../core/readings/readCells.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import type { WorkingsSource } from '../../../core/workings/desk.ts';
import { workings } from '../../../core/workings/workings.ts';
import type { CellInput } from '../../sheet/grid/grid.ts';
import { type HeadlessSheet, openSheet, type ShownValue } from '../../sheet/headless.ts';

/** Readings, a law and settings as they are typed. */
export interface WorkingsCase {
  readonly law: string;
  readonly x: readonly Cell[];
  readonly y: readonly Cell[];
  readonly known?: string;
  readonly uY?: string | readonly number[];
  readonly uX?: string | readonly number[];
  readonly options?: string;
}

/** One line of the comparison at the end of the workings. */
export interface ComparedLine {
  readonly label: string;
  readonly live: ShownValue;
  readonly text: ShownValue;
  readonly digits: ShownValue;
}

export interface WorkingsOnSheet {
  readonly fit: Fit;
  readonly compared: readonly ComparedLine[];
  readonly verdict: ShownValue;
}

export function fitOfCase({ law, x, y, known = '', uY = '', uX = '', options = '' }: WorkingsCase): Fit {
  const column = (cells: readonly Cell[]): Cell[][] => cells.map((cell) => [cell]);
  const spread = (argument: 'u_y' | 'u_x', given: string | readonly number[]) =>
    parseSpread(argument, typeof given === 'string' ? given : column(given), x.length);
  const settings: FitSettings = {
    known: parseKnown(known),
    spreadY: spread('u_y', uY),
    spreadX: spread('u_x', uX),
    options: parseOptions(options),
  };
  return fitLaw(readCells(column(x), column(y)), law, settings);
}

/** A workbook without the add-in, with a sheet for each part of a case. */
export async function plainWorkbook(): Promise<HeadlessSheet> {
  const sheet = await openSheet({ functions: null, sheetName: 'Readings' });
  sheet.grid.addSheet('Live');
  sheet.grid.addSheet('Workings');
  return sheet;
}

/** The id of a sheet with nothing on it any more. */
function emptied({ grid }: HeadlessSheet, name: string): string {
  const id = grid.sheets().find((one) => one.name === name)?.id ?? '';
  const used = grid.usedRect(id);
  if (used !== null) grid.clear(id, used, 'all');
  return id;
}

/**
 * Writes a case's readings and workings in place of what stood there. In place of the live functions stand the fit's own
 * numbers, in cells; or nothing, as where the add-in is gone.
 */
export async function workingsOnSheet(
  sheet: HeadlessSheet,
  given: WorkingsCase,
  live: 'numbers' | 'absent' = 'numbers',
): Promise<WorkingsOnSheet> {
  const fit = fitOfCase(given);
  const own = emptied(sheet, 'Readings');
  const cell = (value: Cell): CellInput =>
    typeof value === 'object' && value !== null ? value.error : value;
  given.x.forEach((x, i) => {
    sheet.grid.write(own, i, 0, [[cell(x), cell(given.y[i] ?? null)]]);
    if (Array.isArray(given.uY)) sheet.grid.write(own, i, 2, [[given.uY[i]]]);
    if (Array.isArray(given.uX)) sheet.grid.write(own, i, 3, [[given.uX[i]]]);
  });
  const tables = liveTables(fit);
  writeLive(sheet, tables);
  const page = emptied(sheet, 'Workings');
  const at = (letter: string) => (position: number) => `Readings!$${letter}$${position}`;
  const source: WorkingsSource = {
    title: 'a test',
    x: at('A'),
    y: at('B'),
    uY: Array.isArray(given.uY) ? at('C') : null,
    uX: Array.isArray(given.uX) ? at('D') : null,
    call: (name, args) =>
      live === 'absent' ? `TAUT.${name}(${args.join(',')})` : liveReference(tables, name, args),
  };
  const plan = workings(fit, source);
  const rows: CellInput[][] = Array.from({ length: plan.rows }, () => []);
  for (const { row, column, kind, content } of plan.cells) {
    if (kind !== 'text') (rows[row] ?? [])[column] = content;
    else sheet.grid.writePlain(page, row, column, [[content]]);
  }
  sheet.grid.write(
    page,
    0,
    0,
    rows.map((row) => Array.from({ length: plan.columns }, (_, k) => row[k])),
  );
  await sheet.settle();
  const shown = (row: number, column: number): ShownValue =>
    sheet.get(`Workings!${String.fromCharCode(65 + column)}${row + 1}`);
  const verdictRow = Math.max(...plan.cells.filter(({ style }) => style === 'verdict').map(({ row }) => row));
  const compared: ComparedLine[] = [];
  for (let row = verdictRow - 1; shown(row, 3) !== null; row--) {
    compared.unshift({
      label: String(shown(row, 0)),
      live: shown(row, 1),
      text: shown(row, 2),
      digits: shown(row, 3),
    });
  }
  return { fit, compared, verdict: shown(verdictRow, 2) };
}

type Table = readonly (readonly CellInput[])[];

/** What the live functions return, one table below the other on a sheet of its own. */
function liveTables(fit: Fit): ReadonlyMap<string, { readonly top: number; readonly table: Table }> {
  const number = (value: number): CellInput => (Number.isFinite(value) ? value : '');
  const tables = new Map<string, { top: number; table: Table }>();
  let top = 0;
  const add = (name: string, table: Table): void => {
    tables.set(name, { top, table });
    top += table.length;
  };
  const lineOf = (): Table => {
    const { slope, intercept, varianceSlope, varianceIntercept } = fit.line;
    return [
      ['term', 'value', 'standard uncertainty'],
      ['slope', slope, number(Math.sqrt(varianceSlope))],
      ['intercept', intercept, number(Math.sqrt(varianceIntercept))],
    ];
  };
  add('LINE', lineOf());
  const straight = straightness(fit);
  add('STRAIGHTNESS', [
    ['', ''],
    ['', ''],
    ['', ''],
    ['r squared', number(straight.rSquared)],
    ['residual standard deviation', number(straight.residualStandardDeviation)],
    ['bow %', number(straight.bowPercent)],
  ]);
  add(
    'CONSTANT',
    fit.constants.map(({ value, standardUncertainty, low, high }) =>
      [value, standardUncertainty, low, high].map(number),
    ),
  );
  names.set(
    tables,
    fit.constants.map(({ name }) => name),
  );
  return tables;
}

const names = new WeakMap<object, readonly string[]>();

function writeLive(sheet: HeadlessSheet, tables: ReturnType<typeof liveTables>): void {
  const live = emptied(sheet, 'Live');
  for (const { top, table } of tables.values()) sheet.grid.write(live, top, 0, table);
}

function liveReference(tables: ReturnType<typeof liveTables>, name: string, args: readonly string[]): string {
  const found = tables.get(name);
  if (found === undefined) throw new Error(`no live ${name}`);
  const { top, table } = found;
  if (name !== 'CONSTANT') return `Live!$A$${top + 1}:$C$${top + table.length}`;
  const [constant = '', part = ''] = args.map((text) => text.slice(1, -1));
  const row = names.get(tables)?.indexOf(constant) ?? -1;
  return `Live!$${'ABCD'[['value', 'u', 'low', 'high'].indexOf(part)]}$${top + row + 1}`;
}
