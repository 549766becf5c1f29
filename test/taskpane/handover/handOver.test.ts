import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, jest, test } from '@jest/globals';
import { freeCorner } from '../../../taskpane/handover/freeCorner.ts';
import { freeze, thaw } from '../../../taskpane/handover/freeze.ts';
import { type Ask, handOver } from '../../../taskpane/handover/handOver.ts';
import { liveBlock } from '../../../taskpane/handover/liveBlock.ts';
import { readsAs, writtenFor } from '../../../taskpane/handover/readsAs.ts';
import {
  type HandoverKind,
  handoverKinds,
  loadPlaced,
  type Placed,
  savePlaced,
} from '../../../taskpane/handover/records.ts';
import { takeBack } from '../../../taskpane/handover/takeBack.ts';
import { version } from '../../../taskpane/handover/version.ts';
import { wholeFit } from '../../../taskpane/handover/wholeFit.ts';
import { withRoom } from '../../../taskpane/handover/withRoom.ts';
import { excelWorkbook } from '../../../taskpane/host/excelWorkbook.ts';
import type { Choice } from '../../../taskpane/state/choice.ts';
import { expectDigits } from '../../expectDigits.ts';
import type { HeadlessSheet, ShownValue } from '../../sheet/headless.ts';
import { root } from '../../sheet/root.ts';
import { bottleTest, fitOf, openDemo } from './workbookOnSheet.ts';

jest.setTimeout(30_000);

let sheet: HeadlessSheet;
let asked: string[];
let agreed: boolean;
const ask: Ask = async (question) => {
  asked.push(question);
  return agreed;
};

beforeEach(async () => {
  asked = [];
  agreed = true;
  sheet = await openDemo();
});
afterEach(() => sheet?.close());

/** A PNG of a single dot. */
const DOT =
  'iVBORw0KGgoAAAANSUhEUgAAAAEAAAABCAYAAAAfFcSJAAAADUlEQVR42mNk+M9QDwADhgGAWjR9awAAAABJRU5ErkJggg==';

async function place(
  kind: HandoverKind,
  choice: Choice = bottleTest,
  corner = 'N5',
  number = 1,
): Promise<Placed> {
  const column = corner.charCodeAt(0) - 65;
  const row = Number(corner.slice(1)) - 1;
  const task = {
    kind,
    choice,
    of: choice,
    fit: await fitOf(choice),
    constant: 'k',
    corner: { sheet: choice.y.sheet, row, column },
    date: '2026-03-09',
    draw: async () => [{ base64: DOT, description: 'a dot' }],
    number,
  };
  const placed = await handOver(excelWorkbook, task, ask);
  if (placed === null) throw new Error('nothing was placed');
  await sheet.settle();
  return placed;
}

/** Every cell of an area, as a test compares it. */
function cellsOf({ sheet: name, address }: Pick<Placed, 'sheet' | 'address'>): ShownValue[][] {
  // A cell whose formula gave an empty text is blank once it is frozen.
  return sheet.block(`'${name}'!${address}`).map((row) => row.map((value) => (value === '' ? null : value)));
}

/** The cell to the right of a label in a column. */
function beside(name: string, column: string, label: string): string {
  for (let row = 1; row < 200; row++) {
    if (sheet.get(`'${name}'!${column}${row}`) === label) {
      return `'${name}'!${String.fromCharCode(column.charCodeAt(0) + 1)}${row}`;
    }
  }
  throw new Error(`no ${label} in column ${column} of ${name}`);
}

/** Errors in what was placed; among the data of charts #N/A says what is not plotted. */
function errorsIn(placed: Placed): ShownValue[] {
  const isError = placed.kind === 'charts' ? /^#(?!N\/A)/ : /^#/;
  return cellsOf(placed)
    .flat()
    .filter((value) => typeof value === 'string' && isError.test(value));
}

describe('each hand-over', () => {
  test('the live block follows its labelled cells and the readings', async () => {
    const placed = await place('block');
    expect(errorsIn(placed)).toEqual([]);
    const k = beside('Chlorine', 'N', 'k');
    const fit = await fitOf(bottleTest);
    expectDigits(Number(sheet.get(k)), fit.constants.find(({ name }) => name === 'k')?.value ?? 0, 15);
    sheet.set('Chlorine!B19', 0.25);
    await sheet.settle();
    const after = await fitOf(bottleTest);
    expectDigits(Number(sheet.get(k)), after.constants.find(({ name }) => name === 'k')?.value ?? 0, 15);
    // A wider interval by the coverage that stands in its cell.
    const low = k.replace('O', 'Q');
    const before = Number(sheet.get(low));
    sheet.set(beside('Chlorine', 'N', 'coverage'), 0.999);
    await sheet.settle();
    expect(Number(sheet.get(low))).toBeLessThan(before);
  });

  test('known constants and uncertainties stand in cells of their own', async () => {
    const choice: Choice = {
      ...bottleTest,
      known: [{ name: 'C0', text: '1.86±0.02' }],
      spreadY: { kind: 'text', text: '2%' },
      options: new Map([['coverage', '0.9']]),
    };
    await place('block', choice);
    const k = beside('Chlorine', 'N', 'k');
    const fit = await fitOf(choice);
    const [constant] = fit.constants;
    expectDigits(Number(sheet.get(k)), constant?.value ?? 0, 15);
    expectDigits(Number(sheet.get(k.replace('O', 'P'))), constant?.standardUncertainty ?? 0, 12);
    const known = beside('Chlorine', 'N', 'C0');
    expect(sheet.get(known)).toBe(1.86);
    expect(sheet.get(beside('Chlorine', 'N', 'Standard uncertainty of C'))).toBe('2%');
    sheet.set(known, 1.9);
    await sheet.settle();
    const moved = await fitOf({ ...choice, known: [{ name: 'C0', text: '1.9±0.02' }] });
    expectDigits(Number(sheet.get(k)), moved.constants[0]?.value ?? 0, 15);
  });

  test('charts are the host’s own, bound to cells that follow the readings', async () => {
    const placed = await place('charts');
    expect(placed.charts).toHaveLength(2);
    const [straight, curve] = sheet.book.charts;
    expect([straight?.title, straight?.x.title, straight?.y.title]).toEqual([
      'ln C against t',
      'time / h',
      'ln C   (C in mg/L)',
    ]);
    expect([curve?.x.title, curve?.y.title]).toEqual(['time / h', 'C / (mg/L)']);
    expect(straight?.series.map(({ name }) => name)).toEqual(['Readings', 'Line']);
    expect(curve?.series).toHaveLength(4);
    const fit = await fitOf(bottleTest);
    const source = straight?.series[1]?.ySource;
    const end = sheet.grid.read(source?.sheet ?? '', source?.rect.top ?? 0, source?.rect.left ?? 0).value;
    expectDigits(Number(end), fit.line.intercept, 14);
    sheet.set('Chlorine!B6', 1.9);
    await sheet.settle();
    const after = sheet.grid.read(source?.sheet ?? '', source?.rect.top ?? 0, source?.rect.left ?? 0).value;
    expectDigits(Number(after), (await fitOf(bottleTest)).line.intercept, 14);
  });

  test('the card shows the constant rounded to its uncertainty, with all that belongs to it', async () => {
    const placed = await place('card');
    const text = cellsOf(placed).flat().join('\n');
    expect(text).toContain('0.09393 ± 0.00077 1/h');
    expect(text).toContain('95 % interval: 0.09225 to 0.09562 1/h');
    expect(text).toContain('C / (mg/L) against time / h');
    expect(text).toContain('Readings: Chlorine!B6:B40 against Chlorine!A6:A40; 13 used, 1 set aside');
    expect(text).toContain('2026-03-09');
    expect(text).toContain(`Tautline ${version}`);
    expect(text).toContain('C(t) = C0*exp(-k*t)');
    expect(text).toContain('ln C against t');
    expect(errorsIn(placed)).toEqual([]);
    expect(sheet.book.shapes.map(({ name }) => name)).toEqual(placed.shapes);
    expect(placed.shapes).toHaveLength(1);
    sheet.set('Chlorine!B19', 0.25);
    await sheet.settle();
    expect(cellsOf(placed).flat().join('\n')).not.toContain('0.09393 ± 0.00077');
  });

  test('the workings say that they agree with the live function, also after a reading was edited and one added', async () => {
    const placed = await place('workings');
    const verdict = (): ShownValue[] =>
      cellsOf(placed)
        .flat()
        .filter((value) => /agree to \d+ digits/.test(String(value)));
    expect(verdict()).toEqual([expect.stringMatching(/agree to 1[0-5] digits\./)]);
    sheet.set('Chlorine!B19', 0.25);
    const each = cellsOf(placed)
      .flat()
      .filter((value) => /^agrees to \d+ digits$/.test(String(value)));
    expect(each).toHaveLength(19);
    sheet.set('Chlorine!A20', [[30, 0.14]]);
    await sheet.settle();
    expect(verdict()).toEqual([expect.stringMatching(/agree to 1[0-5] digits\./)]);
    const fit = await fitOf(bottleTest);
    expectDigits(Number(sheet.get(beside('Workings', 'A', 'k'))), fit.constants[1]?.value ?? 0, 13);
  });
});

/** Choices that need other parts of the hand-overs: trial constants, direct fits, uncertainties, errors on both axes. */
const choices: readonly (readonly [string, Choice])[] = [
  ['a trial constant', { ...bottleTest, law: 'offset decay' }],
  [
    'a direct fit of a law of one’s own with a known constant',
    {
      ...bottleTest,
      law: 'C(t) = C0*exp(-k*t) + c',
      known: [{ name: 'c', text: '0.01' }],
      options: new Map([['fit', 'direct']]),
      spreadY: { kind: 'text', text: 'proportional' },
    },
  ],
  [
    'uncertainties in both directions, one in cells',
    {
      ...bottleTest,
      spreadY: { kind: 'range', place: { sheet: 'Errors of y', address: 'C3:C37' } },
      spreadX: { kind: 'text', text: '0.02' },
    },
  ],
];

describe.each(choices)('with %s', (_, choice) => {
  test('every hand-over calculates, and the workings agree', async () => {
    const errors = sheet.grid.addSheet('Errors of y');
    sheet.grid.write(
      errors,
      2,
      2,
      Array.from({ length: 35 }, (_unused, i) => [0.01 + 0.001 * (i % 3)]),
    );
    await sheet.settle();
    for (const [k, kind] of handoverKinds.entries()) {
      const placed = await place(kind, choice, 'N5', k + 1);
      const cells = cellsOf(placed);
      expect(errorsIn(placed)).toEqual([]);
      if (kind !== 'workings') continue;
      const text = cells.flat().join('\n');
      expect(text).toMatch(/The workings and the live function agree to \d+ digits\./);
      expect(Number(/agree to (\d+) digits\./.exec(text)?.[1])).toBeGreaterThanOrEqual(10);
    }
  });
});

describe('what is handed over', () => {
  test('counts every reading in the cells, also those left out for a look', async () => {
    const looking = { ...bottleTest, leftOut: [14] };
    const whole = await wholeFit(excelWorkbook, looking);
    expect(whole.used).toHaveLength(13);
    expect(whole.constants).toEqual((await fitOf(bottleTest)).constants);
  });

  test('reads on over the blank cells below, so that readings typed later are in it', async () => {
    const typed: Choice = {
      ...bottleTest,
      x: { sheet: 'Chlorine', address: 'A6:A19' },
      y: { sheet: 'Chlorine', address: 'B6:B19' },
      spreadY: { kind: 'range', place: { sheet: 'Chlorine', address: 'D6:D19' } },
    };
    const roomy = await withRoom(excelWorkbook, typed);
    expect([roomy.x.address, roomy.y.address]).toEqual(['A6:A69', 'B6:B69']);
    // An uncertainty beside each reading goes along.
    expect(roomy.spreadY).toEqual({ kind: 'range', place: { sheet: 'Chlorine', address: 'D6:D69' } });
    const plain = { ...roomy, spreadY: typed.spreadX };
    await place('block', plain);
    const k = beside('Chlorine', 'N', 'k');
    const before = Number(sheet.get(k));
    sheet.set('Chlorine!A20', 30);
    sheet.set('Chlorine!B20', 0.15);
    await sheet.settle();
    expect(Number(sheet.get(k))).not.toBe(before);
    const after = await fitOf(plain);
    expectDigits(Number(sheet.get(k)), after.constants.find(({ name }) => name === 'k')?.value ?? 0, 15);
    expect(after.used).toHaveLength(14);
    const written = writtenFor(typed, roomy);
    const to = (row: number): Choice => ({
      ...typed,
      x: { sheet: 'Chlorine', address: `A6:A${row}` },
      y: { sheet: 'Chlorine', address: `B6:B${row}` },
    });
    expect([15, 19, 20, 69, 70].map((row) => readsAs(written, to(row)))).toEqual([
      false,
      true,
      true,
      true,
      false,
    ]);
    expect(readsAs(written, { ...to(20), law: 'power' })).toBe(false);
  });

  test('keeps a blank row before what stands further down, and leaves other arrangements as they are', async () => {
    const to = (x: string, y: string): Choice => ({
      ...bottleTest,
      x: { sheet: 'Chlorine', address: x },
      y: { sheet: 'Chlorine', address: y },
    });
    sheet.set('Chlorine!B30', 'mean');
    await sheet.settle();
    expect((await withRoom(excelWorkbook, to('A6:A19', 'B6:B19'))).y.address).toBe('B6:B28');
    sheet.set('Chlorine!A21', 'bottle 2');
    await sheet.settle();
    for (const choice of [
      to('A6:A19', 'B6:B19'),
      to('A6:F6', 'A7:F7'),
      to('A6:A19', 'B7:B20'),
      to('A:A', 'B:B'),
    ]) {
      expect(await withRoom(excelWorkbook, choice)).toBe(choice);
    }
  });

  test('names the version of the package', () => {
    const { version: ofPackage } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8')) as {
      version: string;
    };
    expect(version).toBe(ofPackage);
  });
});

describe('names and cells that are taken', () => {
  test('a sheet name that exists gets a number', async () => {
    await place('card');
    const second = await place('card', bottleTest, 'N5', 2);
    expect(second.sheet).toBe('Result 2');
    expect(sheet.grid.sheets().map(({ name }) => name)).toEqual(
      expect.arrayContaining(['Result', 'Result 2']),
    );
  });

  test('cells that are not empty are overwritten only when the user agrees, and come back', async () => {
    const before = sheet.block('Chlorine!A1:L60');
    const formula = sheet.grid.read(sheet.grid.activeSheet(), 6, 4).formula;
    agreed = false;
    await expect(place('block', bottleTest, 'E6')).rejects.toThrow('nothing was placed');
    expect(asked).toEqual([expect.stringMatching(/^\d+ cells in E6:I54 are not empty\. Overwrite them\?/)]);
    expect(sheet.block('Chlorine!A1:L60')).toEqual(before);
    agreed = true;
    const placed = await place('block', bottleTest, 'E6');
    expect(sheet.get('Chlorine!E6')).toBe('C / (mg/L) against time / h');
    expect(await takeBack(excelWorkbook, placed, ask)).toBe(true);
    await sheet.settle();
    expect(sheet.block('Chlorine!A1:L60')).toEqual(before);
    expect(sheet.grid.read(sheet.grid.activeSheet(), 6, 4).formula).toBe(formula);
  });

  test('an empty place is found to the right of the readings', async () => {
    const { block } = liveBlock(
      bottleTest,
      await fitOf(bottleTest),
      { sheet: 'Chlorine', row: 0, column: 0 },
      'k',
    );
    const corner = await freeCorner(excelWorkbook, bottleTest, block);
    expect(corner).toEqual({ sheet: 'Chlorine', row: 4, column: 13 });
    await place('block', bottleTest, 'N5');
    expect(asked).toEqual([]);
  });

  test.each([
    ['=HYPERLINK("x")', '@SUM(A1)'],
    ['+1', '-2+3'],
  ])('a heading %s in the unit %s stays text wherever it is written', async (name, unit) => {
    const choice = { ...bottleTest, yHeading: { name, unit }, xHeading: { name: unit, unit: name } };
    for (const [k, kind] of handoverKinds.entries()) {
      const placed = await place(kind, choice, 'N5', k + 1);
      const id = sheet.grid.sheets().find((one) => one.name === placed.sheet)?.id ?? '';
      const { top = 0, left = 0, bottom = 0, right = 0 } = sheet.grid.usedRect(id) ?? {};
      for (let row = top; row <= bottom; row++) {
        for (let column = left; column <= right; column++) {
          const { formula } = sheet.grid.read(id, row, column);
          const outsideText = (formula ?? '').replace(/"(?:[^"]|"")*"/g, '""');
          expect(outsideText).not.toMatch(/HYPERLINK|SUM\(A1\)|^=[+@]|^=-2\+3|^=1$/);
        }
      }
    }
  });
});

describe('freeze, thaw and take back', () => {
  test.each(handoverKinds)(
    '%s: frozen it keeps its numbers, thawed it follows again, taken back it is gone',
    async (kind) => {
      const before = sheet.grid.sheets().map(({ name }) => name);
      const untouched = sheet.block('Chlorine!A1:Z70');
      const placed = await place(kind);
      const live = cellsOf(placed);
      const frozen = await freeze(excelWorkbook, placed);
      await sheet.settle();
      const still = cellsOf(placed);
      expect(still).toEqual(live);
      sheet.set('Chlorine!B19', 0.25);
      await sheet.settle();
      if (kind !== 'workings') expect(cellsOf(placed)).toEqual(live);
      const thawed = await thaw(excelWorkbook, frozen);
      expect(thawed.frozen).toBeNull();
      await sheet.settle();
      expect(cellsOf(placed)).not.toEqual(live);
      sheet.set('Chlorine!B19', 0.2);
      await sheet.settle();
      expect(cellsOf(placed)).toEqual(live);
      expect(await takeBack(excelWorkbook, thawed, ask)).toBe(true);
      await sheet.settle();
      expect(asked).toEqual([]);
      expect(sheet.grid.sheets().map(({ name }) => name)).toEqual(before);
      expect(sheet.block('Chlorine!A1:Z70')).toEqual(untouched);
      expect(sheet.book.charts).toHaveLength(0);
      expect(sheet.grid.names()).toEqual([]);
    },
  );

  test('rows inserted above the readings while it is frozen: thawing is refused, taking it back still works', async () => {
    const placed = await place('card');
    const frozen = await freeze(excelWorkbook, placed);
    await excelWorkbook.run(async (context) => {
      context.workbook.worksheets.getItem('Chlorine').getRange('4:4').insert('Down');
      await context.sync();
    });
    await sheet.settle();
    await expect(thaw(excelWorkbook, frozen)).rejects.toThrow(
      /Rows or columns were moved since this was frozen/,
    );
    expect(cellsOf(placed).flat().join('\n')).toContain('0.09393 ± 0.00077 1/h');
    expect(await takeBack(excelWorkbook, frozen, ask)).toBe(true);
    expect(sheet.grid.names()).toEqual([]);
  });

  test('a sheet on which someone else has written is deleted only when the user agrees', async () => {
    const placed = await place('card');
    sheet.set('Result!J5', 'seen, L. M.');
    await sheet.settle();
    agreed = false;
    expect(await takeBack(excelWorkbook, placed, ask)).toBe(false);
    expect(asked).toEqual([
      '1 cell on the sheet Result was added by someone else. Delete the whole sheet all the same?',
    ]);
    expect(sheet.get('Result!J5')).toBe('seen, L. M.');
  });

  test('what was placed is remembered with the workbook', async () => {
    const placed = await place('card');
    await savePlaced(excelWorkbook, [placed]);
    expect(await loadPlaced(excelWorkbook)).toEqual([placed]);
    // Until its sheet is deleted by hand; then it is gone without a question.
    sheet.grid.deleteSheet(sheet.grid.sheets().find(({ name }) => name === 'Result')?.id ?? '');
    sheet.grid.deleteName(placed.areaName);
    expect(await loadPlaced(excelWorkbook)).toEqual([]);
    // The names that it left behind are in nobody's way.
    const again = await place('card');
    expect(again.areaName).toBe(placed.areaName);
    expect(await takeBack(excelWorkbook, again, ask)).toBe(true);
    expect(sheet.grid.names()).toEqual([]);
  });
});
