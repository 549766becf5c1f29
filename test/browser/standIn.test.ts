import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { root } from '../sheet/root.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { openBrowser } from './openBrowser.ts';
import { SheetPage } from './sheetPage.ts';

jest.setTimeout(60_000);

let server: StandInServer;
let browser: Browser;
let sheet: SheetPage;

beforeAll(async () => {
  server = await startStandIn({ port: 0, dist: join(root, 'test', 'browser', 'probe-add-in') });
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  await server?.close();
});
beforeEach(async () => {
  sheet = await SheetPage.open(browser, server.address);
});
afterEach(async () => {
  expect(sheet.errors).toEqual([]);
  await sheet.close();
});

describe('an add-in in the stand-in', () => {
  test('registers its functions from the panel’s page, whose error class comes late', async () => {
    const panel = await sheet.panel();
    expect(await panel.evaluate(() => Reflect.get(window, 'errorsWereLate'))).toBe(true);
    await sheet.waitFor('F8', (value) => value === 113.5);
    expect([await sheet.get('E13'), await sheet.message('E13')]).toEqual([
      '#N/A',
      'this add-in has no words',
    ]);
    await sheet.click('E13');
    await sheet.page.waitForFunction(
      () => document.querySelector('#why')?.textContent === 'this add-in has no words',
    );
  });

  test('sees selections of one and of several areas as the mouse makes them', async () => {
    const panel = await sheet.panel();
    const areas = () =>
      panel.evaluate(() =>
        Excel.run(async (context) => {
          const ranges = context.workbook.getSelectedRanges().load('address');
          await context.sync();
          const one = context.workbook.getSelectedRange().load('address');
          const single = await context.sync().then(
            () => one.address,
            (error: { code: string }) => error.code,
          );
          return [ranges.address, single];
        }),
      );
    await sheet.select('A6:B9');
    expect(await areas()).toEqual(['Chlorine!A6:B9', 'Chlorine!A6:B9']);
    await sheet.select('A6:A9');
    await sheet.select('B6:B9', ['Control']);
    expect(await areas()).toEqual(['Chlorine!A6:A9,Chlorine!B6:B9', 'InvalidSelection']);
  });

  test('hears of a reading typed with the keyboard once, as a local change', async () => {
    const panel = await sheet.panel();
    await panel.evaluate(() =>
      Excel.run(async (context) => {
        const heard: string[] = [];
        Reflect.set(window, 'heard', heard);
        context.workbook.worksheets.getActiveWorksheet().onChanged.add(async (event) => {
          heard.push(`${event.address} ${event.changeType} ${event.source}`);
        });
        await context.sync();
      }),
    );
    await sheet.type('B20', '0.15');
    await sheet.waitFor('F9', (value) => Math.abs(Number(value) - 13.89) < 1e-9);
    expect(await panel.evaluate(() => Reflect.get(window, 'heard'))).toEqual(['B20 RangeEdited Local']);
  });

  test('finds its settings again when the page is opened anew', async () => {
    const panel = await sheet.panel();
    await panel.evaluate(() =>
      Excel.run(async (context) => {
        context.workbook.settings.add('view', { law: 'power', width: 400 });
        await context.sync();
      }),
    );
    await sheet.page.reload();
    const again = await sheet.panel();
    const found = await again.evaluate(() =>
      Excel.run(async (context) => {
        const setting = context.workbook.settings.getItemOrNullObject('view').load('value');
        await context.sync();
        return setting.value as unknown;
      }),
    );
    expect(found).toEqual({ law: 'power', width: 400 });
  });

  test('gets errors of its own page’s classes, also those asked for by a test', async () => {
    const panel = await sheet.panel();
    const kinds = () =>
      panel.evaluate(() =>
        Excel.run(async (context) => {
          context.workbook.worksheets.getItem('none').load('name');
          await context.sync();
          return [];
        }).catch((error: unknown) => [
          error instanceof Error,
          error instanceof OfficeExtension.Error,
          error instanceof OfficeExtension.Error ? error.code : '',
        ]),
      );
    expect(await kinds()).toEqual([true, true, 'ItemNotFound']);
    await sheet.page.evaluate(() => window.standIn?.book.failNext('GeneralException', 'The host is tired.'));
    const tired = await panel.evaluate(() =>
      Excel.run(async () => undefined).catch((error: unknown) => [
        error instanceof OfficeExtension.Error,
        String(error),
      ]),
    );
    expect(tired).toEqual([true, expect.stringContaining('The host is tired.')]);
  });

  test('draws a chart over the cells it was given, on a sheet out of sight too, and keeps it up to date', async () => {
    const panel = await sheet.panel();
    await panel.evaluate(() =>
      Excel.run(async (context) => {
        for (const name of ['Chlorine', 'Pump']) {
          const active = context.workbook.worksheets.getItem(name);
          const chart = active.charts.add('XYScatter', active.getRange('A5:B40'), 'Columns');
          chart.title.text = `Readings of ${name}`;
          chart.axes.categoryAxis.title.text = name === 'Pump' ? 'hours run / h' : 'time / h';
          chart.axes.valueAxis.title.text = name === 'Pump' ? 'clearance / µm' : 'C / (mg/L)';
          chart.legend.visible = false;
          chart.setPosition('F17', 'H28');
        }
        await context.sync();
      }),
    );
    for (const name of ['Chlorine', 'Pump']) {
      await sheet.page.getByText(name, { exact: true }).first().click();
      const image = sheet.page.locator(`img[alt="Readings of ${name}"]`);
      await image.waitFor({ state: 'visible' });
      const cells = [await sheet.box('F17'), await sheet.box('H28')];
      const box = await image.boundingBox();
      const right = (place: { x: number; width: number } | null | undefined): number =>
        (place?.x ?? Number.NaN) + (place?.width ?? Number.NaN);
      // Within the width of a cell's border.
      expect(Math.abs((box?.x ?? Number.NaN) - (cells[0]?.x ?? 0))).toBeLessThanOrEqual(3);
      expect(Math.abs((box?.y ?? Number.NaN) - (cells[0]?.y ?? 0))).toBeLessThanOrEqual(3);
      expect(Math.abs(right(box) - right(cells[1]))).toBeLessThanOrEqual(3);
    }
    const image = sheet.page.locator('img[alt="Readings of Pump"]');
    const before = await image.getAttribute('src');
    await sheet.type('A18', '4600');
    await sheet.type('B18', '101');
    await sheet.page.waitForFunction(
      (source) => document.querySelector('img[alt="Readings of Pump"]')?.getAttribute('src') !== source,
      before,
    );
    await sheet.settle();
    await sheet.page.screenshot({ path: 'test/browser/screenshots/stand-in-chart.png' });
  });

  test('is told the blank mode and the theme of the host', async () => {
    const other = await SheetPage.open(browser, server.address, { theme: 'dark', blank: 'zero' });
    const panel = await other.panel();
    expect(await panel.evaluate(() => Office.context.officeTheme.bodyBackgroundColor)).toBe('#1F1F1F');
    expect(await other.page.evaluate(() => window.standIn?.blank)).toBe('zero');
    expect(await panel.evaluate(() => Office.context.requirements.isSetSupported('ExcelApi', '1.12'))).toBe(
      true,
    );
    expect(await panel.evaluate(() => Office.context.requirements.isSetSupported('ExcelApi', '1.20'))).toBe(
      false,
    );
    await other.close();
  });
});
