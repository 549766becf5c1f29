import { afterEach, beforeEach, describe, expect, test } from '@jest/globals';
import { excelWorkbook } from '../../../taskpane/host/excelWorkbook.ts';
import type { CellChange } from '../../../taskpane/host/workbook.ts';
import { rectOf } from '../../sheet/grid/address.ts';
import { type HeadlessSheet, openSheet } from '../../sheet/headless.ts';

let sheet: HeadlessSheet;
beforeEach(async () => {
  sheet = await openSheet({ functions: null, sheetName: 'Bottle test' });
  Object.assign(globalThis, sheet.host);
  sheet.set('A1', [
    ['Bottle test', null],
    ['time / h', 'C / (mg/L)'],
    [0, 1.02],
    [2, null],
    [4, '<0.02'],
    ['=A5+2', '=1/0'],
    [0, 0],
  ]);
  await sheet.settle();
});
afterEach(() => sheet.close());

function select(...addresses: string[]): void {
  const { grid } = sheet.book;
  grid.select(grid.activeSheet(), addresses.map(rectOf));
}

const at = (address: string) => ({ sheet: 'Bottle test', address });

describe('cells', () => {
  test('blanks, zeros, texts and errors are told apart', async () => {
    expect(await excelWorkbook.readCells(at('A3:B7'))).toEqual([
      [0, 1.02],
      [2, null],
      [4, '<0.02'],
      [6, { error: '#DIV/0!' }],
      [0, 0],
    ]);
  });

  test('whole columns mean the part in use', async () => {
    expect(await excelWorkbook.locate(at('A:A'))).toMatchObject({ address: 'A1:A7', row: 0, rows: 7 });
    expect(await excelWorkbook.readCells(at('A:A'))).toHaveLength(7);
  });

  test('long ranges are read in several requests, every row once', async () => {
    const rows = Array.from({ length: 45_000 }, (_, i) => [i]);
    sheet.set('D1', rows);
    const cells = await excelWorkbook.readCells(at('D1:D45000'));
    expect(cells).toHaveLength(45_000);
    expect([cells[0], cells[39_999], cells[40_000], cells[44_999]]).toEqual([
      [0],
      [39_999],
      [40_000],
      [44_999],
    ]);
  });

  test('cells above a range come farthest first, and none above the first row', async () => {
    expect(await excelWorkbook.cellsAbove(at('A3:B5'), 3)).toEqual([
      ['Bottle test', null],
      ['time / h', 'C / (mg/L)'],
    ]);
    expect(await excelWorkbook.cellsAbove(at('A1'), 3)).toEqual([]);
  });
});

describe('the selection', () => {
  test('is one area or several, in their order', async () => {
    select('A3:B6');
    expect(await excelWorkbook.selection()).toMatchObject([{ address: 'A3:B6', row: 2, columns: 2 }]);
    select('B3:B6', 'A3:A6');
    expect((await excelWorkbook.selection()).map(({ address }) => address)).toEqual(['B3:B6', 'A3:A6']);
  });

  test('of a single cell is the block around it', async () => {
    select('B4');
    expect(await excelWorkbook.selection()).toMatchObject([{ address: 'A1:B7' }]);
  });

  test('of whole columns ends where the longer of them ends', async () => {
    sheet.set('B8', [[5]]);
    select('A1:A2000', 'B1:B2000');
    expect((await excelWorkbook.selection()).map(({ address }) => address)).toEqual(['A1:A8', 'B1:B8']);
  });

  test('of blank cells is refused with a sentence', async () => {
    select('F1:G4');
    await expect(excelWorkbook.selection()).rejects.toMatchObject({
      name: 'HostTrouble',
      kind: 'selection',
      message: expect.stringContaining('blank'),
    });
  });
});

describe('what the host refuses', () => {
  test('a sheet that is gone', async () => {
    await expect(excelWorkbook.readCells({ sheet: 'Weir', address: 'A1' })).rejects.toMatchObject({
      kind: 'gone',
      message: expect.stringContaining("'Weir'"),
    });
  });

  test('a sheet with another name than before is found all the same', async () => {
    await excelWorkbook.readCells(at('A3'));
    sheet.book.grid.renameSheet(sheet.book.grid.activeSheet(), 'Bottle test 2');
    expect(await excelWorkbook.locate(at('A3:B4'))).toMatchObject({
      sheet: 'Bottle test 2',
      address: 'A3:B4',
    });
    expect(await excelWorkbook.readCells(at('A3'))).toEqual([[0]]);
  });

  test.each([
    ['AccessDenied', 'protected'],
    ['InvalidOperationInCellEditMode', 'busy'],
    ['ResponsePayloadSizeLimitExceeded', 'size'],
    ['GeneralException', 'other'],
  ])('%s is said in a sentence of its own', async (code, kind) => {
    sheet.book.failNext(code, 'The host says no.');
    await expect(excelWorkbook.readCells(at('A1'))).rejects.toMatchObject({ name: 'HostTrouble', kind });
  });

  test('a fault that is not the host’s stays what it is', async () => {
    const fault = new TypeError('ours');
    await expect(excelWorkbook.run(() => Promise.reject(fault))).rejects.toBe(fault);
  });
});

describe('settings and events', () => {
  test('a setting is found again, and null where there is none', async () => {
    expect(await excelWorkbook.loadSetting('tautline.panel')).toBeNull();
    await excelWorkbook.saveSetting('tautline.panel', 'x');
    expect(await excelWorkbook.loadSetting('tautline.panel')).toBe('x');
  });

  test('a change tells its sheet and cells until the subscription ends', async () => {
    const heard: CellChange[] = [];
    const end = excelWorkbook.onChange((change) => heard.push(change));
    await turn();
    sheet.set('B4', [[0.8]]);
    await sheet.settle();
    await turn();
    expect(heard).toEqual([{ sheet: 'Bottle test', address: 'B4', kind: 'cells' }]);
    end();
    await turn();
    sheet.set('B4', [[0.7]]);
    await turn();
    expect(heard).toHaveLength(1);
  });

  test('showing a place selects it', async () => {
    await excelWorkbook.select(at('B4'));
    expect(sheet.book.grid.selection().rects).toEqual([rectOf('B4')]);
  });
});

/** Gives the events of the host, which come one round trip later, the time to arrive. */
function turn(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 50));
}
