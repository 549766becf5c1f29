import { rectOf } from '../grid/address.ts';
import type { HeadlessSheet, ShownValue } from '../headless.ts';
import type { DemoSheet } from './demoSheet.ts';

/** What a sheet says after one more reading. */
export interface FollowedStep {
  /** What was typed: the cells of one row, with their text where the crew left none. */
  readonly typed: readonly ShownValue[];
  readonly constants: readonly {
    readonly name: string;
    readonly value: ShownValue;
    readonly uncertainty: ShownValue;
  }[];
  /** Laws with their support, best first; empty until they can be ranked. */
  readonly ranking: readonly { readonly law: string; readonly support: ShownValue }[];
  /** Why there are no constants yet, or null. */
  readonly reason: string | null;
}

/** Where the ranking is put: out of sight of everything that the sheet itself says. */
const RANKING_COLUMN = 'Z';

/** Empties a demo sheet of its readings, types them again one by one, and tells what the sheet says after each. */
export async function* follow(sheet: HeadlessSheet, demo: DemoSheet): AsyncGenerator<FollowedStep> {
  const { typed, x, y, constants, laws, more } = demo.followed;
  const on = (address: string) => `'${demo.name}'!${address}`;
  const rect = rectOf(typed);
  const rows = sheet.block(on(typed));
  const typedColumns =
    rows[0]?.map((_, index) => index).filter((index) => !isFormula(sheet, demo, rect, index)) ?? [];
  const put = (row: number, column: number, value: ShownValue) =>
    sheet.grid.write(sheetId(sheet, demo), rect.top + row, rect.left + column, [[value]]);
  rows.forEach((_, row) => {
    for (const column of typedColumns) put(row, column, null);
  });
  const ranking = `${RANKING_COLUMN}1`;
  const lawsGiven = laws === '' ? '' : `"${laws}"`;
  sheet.set(on(ranking), `=TAUT.COMPARE(${x},${y},${lawsGiven}${more})`);
  await sheet.settle();
  for (const [row, cells] of rows.entries()) {
    for (const column of typedColumns) put(row, column, cells[column] ?? null);
    await sheet.settle();
    yield {
      typed: typedColumns.map((column) => cells[column] ?? null),
      constants: constantsAt(sheet, on(constants)),
      ranking: rankingAt(sheet, on(ranking)),
      reason: sheet.message(on(constants)),
    };
  }
}

function sheetId(sheet: HeadlessSheet, demo: DemoSheet): string {
  const found = sheet.grid.sheets().find((one) => one.name === demo.name);
  if (!found) throw new Error(`the workbook has no sheet ${demo.name}`);
  return found.id;
}

function isFormula(
  sheet: HeadlessSheet,
  demo: DemoSheet,
  rect: { top: number; left: number },
  column: number,
): boolean {
  return sheet.grid.read(sheetId(sheet, demo), rect.top, rect.left + column).formula !== null;
}

function constantsAt(sheet: HeadlessSheet, address: string): FollowedStep['constants'] {
  const [, ...rows] = sheet.spilled(address);
  return rows.map(([name, value = null, uncertainty = null]) => ({ name: String(name), value, uncertainty }));
}

function rankingAt(sheet: HeadlessSheet, address: string): FollowedStep['ranking'] {
  const [header, ...rows] = sheet.spilled(address);
  const law = header?.indexOf('law') ?? -1;
  const support = header?.indexOf('support %') ?? -1;
  if (law < 0 || support < 0) return [];
  return rows
    .filter((row) => typeof row[support] === 'number')
    .map((row) => ({ law: String(row[law]), support: row[support] ?? null }));
}
