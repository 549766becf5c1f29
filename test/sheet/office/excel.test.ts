import { afterEach, beforeEach, describe, expect, test } from '@jest/globals';
import { type HeadlessSheet, openSheet } from '../headless.ts';

/** The host's own types, for the members that the stand-in implements. */
type Host = { run<T>(batch: (context: Excel.RequestContext) => Promise<T>): Promise<T> };

let sheet: HeadlessSheet;
let host: Host;
beforeEach(async () => {
  sheet = await openSheet({ functions: null, sheetName: 'Bottle test' });
  // Written against the host's published types; the stand-in refuses what it lacks.
  host = sheet.host.Excel as Host;
  sheet.set('A1', [
    ['time / h', 'C / (mg/L)'],
    [0, 1.02],
    [2, null],
    [4, '<0.02'],
    ['=A4+2', '=1/0'],
  ]);
  await sheet.settle();
});
afterEach(() => sheet.close());

describe('load and sync', () => {
  test('a property is not there before load and sync', async () => {
    await host.run(async (context) => {
      const range = context.workbook.worksheets.getActiveWorksheet().getRange('A1:B2');
      expect(() => range.values).toThrow(/'values' is not available/);
      range.load('values');
      expect(() => range.values).toThrow(expect.objectContaining({ code: 'PropertyNotLoaded' }));
      await context.sync();
      expect(range.values).toEqual([
        ['time / h', 'C / (mg/L)'],
        [0, 1.02],
      ]);
      expect(() => range.formulas).toThrow(expect.objectContaining({ code: 'PropertyNotLoaded' }));
    });
  });

  test('blank, text, number and error are told apart by value type', async () => {
    await host.run(async (context) => {
      const range = context.workbook.worksheets.getItem('bottle TEST').getRange('A2:B5');
      range.load(['values', 'valueTypes', 'formulas', 'text', 'address', 'rowIndex', 'columnCount']);
      await context.sync();
      expect(range.valueTypes).toEqual([
        ['Double', 'Double'],
        ['Double', 'Empty'],
        ['Double', 'String'],
        ['Double', 'Error'],
      ]);
      expect(range.values).toEqual([
        [0, 1.02],
        [2, ''],
        [4, '<0.02'],
        [6, '#DIV/0!'],
      ]);
      expect(range.formulas[3]).toEqual(['=A4+2', '=1/0']);
      expect([range.address, range.rowIndex, range.columnCount]).toEqual(["'Bottle test'!A2:B5", 1, 2]);
    });
  });

  test('writes wait for sync, and formulas are calculated when they are read back', async () => {
    await host.run(async (context) => {
      const range = context.workbook.worksheets.getActiveWorksheet().getRange('D1:D2');
      range.values = [[3], ['=D1*2']];
      expect(sheet.get('D1')).toBeNull();
      range.load('values');
      await context.sync();
      expect(range.values).toEqual([[3], [6]]);
    });
  });

  test('text that looks like a formula stays text behind an apostrophe or in a text cell', async () => {
    await host.run(async (context) => {
      const active = context.workbook.worksheets.getActiveWorksheet();
      active.getRange('D1').values = [["'=1+1"]];
      active.getRange('D2').numberFormat = [['@']];
      active.getRange('D2').values = [['=1+1']];
      const both = active.getRange('D1:D2').load('formulas,valueTypes');
      await context.sync();
      expect(both.formulas).toEqual([['=1+1'], ['=1+1']]);
      expect(both.valueTypes).toEqual([['String'], ['String']]);
    });
    expect(sheet.grid.read(sheet.grid.activeSheet(), 0, 3).formula).toBeNull();
  });

  test('null objects answer isNullObject after sync only', async () => {
    await host.run(async (context) => {
      const missing = context.workbook.worksheets.getItemOrNullObject('none');
      const present = context.workbook.worksheets.getItemOrNullObject('Bottle test');
      expect(() => missing.isNullObject).toThrow(expect.objectContaining({ code: 'PropertyNotLoaded' }));
      await context.sync();
      expect([missing.isNullObject, present.isNullObject]).toEqual([true, false]);
    });
  });
});

describe('refusals', () => {
  const codeOf = (batch: (context: Excel.RequestContext) => void) =>
    host
      .run(async (context) => batch(context))
      .then(
        () => 'accepted',
        (error: { code: string }) => error.code,
      );

  test('each with the code of the host', async () => {
    expect(await codeOf((context) => context.workbook.worksheets.getItem('none').load('name'))).toBe(
      'ItemNotFound',
    );
    expect(
      await codeOf((context) => {
        context.workbook.worksheets.getActiveWorksheet().getRange('A1:B1').values = [[1]];
      }),
    ).toBe('InvalidArgument');
    expect(
      await codeOf((context) => context.workbook.worksheets.getActiveWorksheet().getRange('nonsense!')),
    ).toBe('InvalidArgument');
    expect(await codeOf((context) => context.workbook.worksheets.add('a/b'))).toBe('InvalidArgument');
    expect(await codeOf((context) => context.workbook.worksheets.add('Bottle test'))).toBe(
      'ItemAlreadyExists',
    );
    expect(
      await codeOf((context) => {
        const active = context.workbook.worksheets.getActiveWorksheet();
        active.protection.protect();
        active.getRange('A1').values = [[1]];
      }),
    ).toBe('AccessDenied');
  });

  test('one range cannot be read from a selection of several areas', async () => {
    const active = sheet.grid.activeSheet();
    sheet.grid.select(active, [
      { top: 1, left: 0, bottom: 3, right: 0 },
      { top: 1, left: 1, bottom: 3, right: 1 },
    ]);
    expect(await codeOf((context) => context.workbook.getSelectedRange())).toBe('InvalidSelection');
    await host.run(async (context) => {
      const areas = context.workbook.getSelectedRanges();
      areas.load('address,areaCount');
      areas.areas.load('items/address');
      await context.sync();
      expect(areas.areaCount).toBe(2);
      expect(areas.areas.items.map((area) => area.address)).toEqual([
        "'Bottle test'!A2:A4",
        "'Bottle test'!B2:B4",
      ]);
    });
  });

  test('a failing batch keeps what came before, and the next batch works', async () => {
    const wrote = await codeOf((context) => {
      const { worksheets } = context.workbook;
      worksheets.getActiveWorksheet().getRange('E1').values = [[1]];
      worksheets.getItem('none').getRange('A1').values = [[2]];
      worksheets.getActiveWorksheet().getRange('E2').values = [[3]];
    });
    expect(wrote).toBe('ItemNotFound');
    expect([sheet.get('E1'), sheet.get('E2')]).toEqual([1, null]);
    sheet.book.failNext('GeneralException', 'There was an internal error while processing the request.');
    expect(await codeOf(() => undefined)).toBe('GeneralException');
    expect(await codeOf(() => undefined)).toBe('accepted');
  });

  test('a member that the stand-in lacks says so', () => {
    const { Excel: excel } = sheet.host;
    expect(() => (excel as Record<string, unknown>)['postprocess']).toThrow(
      'not implemented in the stand-in: Excel.postprocess',
    );
  });
});

test('sheets, names, settings, formats and tables', async () => {
  await host.run(async (context) => {
    const { workbook } = context;
    const added = workbook.worksheets.add('Workings');
    added.getRange('A1:B1').values = [['slope', 2]];
    const font = added.getRange('A1').format.font;
    font.bold = true;
    font.color = '#123456';
    added.getRange('A1').format.fill.color = '#ffeeaa';
    added.getRange('A:A').format.columnWidth = 90;
    added.getRange('B1').numberFormat = [['0.00']];
    workbook.names.add('k_decay', added.getRange('B1'));
    workbook.settings.add('panel', { law: 'power' });
    const table = workbook.tables.add("'Bottle test'!A1:B5", true);
    table.name = 'Readings';
    workbook.worksheets.load('items/name');
    const back = added.getRange('A1');
    back.load({ format: { font: { bold: true, color: true }, fill: { color: true } } });
    const text = added.getRange('B1').load('text');
    const setting = workbook.settings.getItemOrNullObject('panel').load('value');
    const column = workbook.tables
      .getItem('Readings')
      .columns.getItem('time / h')
      .getDataBodyRange()
      .load('address');
    const named = workbook.names.getItem('k_decay').getRange().load('address');
    await context.sync();
    expect(workbook.worksheets.items.map((one) => one.name)).toEqual(['Bottle test', 'Workings']);
    expect([back.format.font.bold, back.format.font.color, back.format.fill.color]).toEqual([
      true,
      '#123456',
      '#ffeeaa',
    ]);
    expect(text.text).toEqual([['2.00']]);
    expect(setting.value).toEqual({ law: 'power' });
    expect(column.address).toBe("'Bottle test'!A2:A5");
    expect(named.address).toBe('Workings!B1');
    added.delete();
    await context.sync();
  });
  expect(sheet.grid.sheets().map((one) => one.name)).toEqual(['Bottle test']);
});

test('events reach the handler with the address of the change, and stop after remove', async () => {
  const seen: string[] = [];
  const turn = () => new Promise((resolve) => setTimeout(resolve, 20));
  await host.run(async (context) => {
    const active = context.workbook.worksheets.getActiveWorksheet();
    const change = active.onChanged.add(async (event) => void seen.push(`${event.address} ${event.source}`));
    active.onSelectionChanged.add(async (event) => void seen.push(`selected ${event.address}`));
    await context.sync();
    sheet.set('B6', 0.7);
    sheet.grid.select(sheet.grid.activeSheet(), [{ top: 5, left: 1, bottom: 5, right: 1 }]);
    await turn();
    expect(seen).toEqual(['B6 Local', 'selected B6']);
    change.remove();
    await context.sync();
    sheet.set('B7', 0.6);
    await turn();
    expect(seen).toHaveLength(2);
  });
});

test('a chart is drawn as a picture of its series and follows the cells', async () => {
  const pictures: string[] = [];
  const { grid } = sheet;
  grid.showPicture = (_sheet, _id, picture) => void pictures.push(atob(picture.source.split(',')[1] ?? ''));
  await host.run(async (context) => {
    const active = context.workbook.worksheets.getActiveWorksheet();
    const chart = active.charts.add('XYScatter', active.getRange('A1:B5'));
    chart.title.text = 'Chlorine';
    chart.axes.categoryAxis.title.text = 'time / h';
    chart.series.load('items/name');
    const line = chart.series.add('fitted');
    line.setXAxisValues(active.getRange('A2:A5'));
    line.setValues(active.getRange('A2:A5'));
    line.markerStyle = 'None';
    line.format.line.color = '#b4552d';
    await context.sync();
    expect(chart.series.items.map((one) => one.name)).toEqual(['C / (mg/L)']);
  });
  await new Promise((resolve) => setTimeout(resolve, 20));
  const first = pictures.at(-1) ?? '';
  expect(first).toContain('>Chlorine</text>');
  expect(first.match(/<circle/g)?.length).toBe(2); // one reading so far, and its mark in the legend
  sheet.set('B3', 0.8);
  await new Promise((resolve) => setTimeout(resolve, 20));
  expect(pictures.at(-1)?.match(/<circle/g)?.length).toBe(3);
});
