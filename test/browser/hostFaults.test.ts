import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { builtFunctions } from '../sheet/functionsScript.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { openBrowser } from './openBrowser.ts';
import { PanelPage } from './panelPage.ts';

jest.setTimeout(90_000);

let server: StandInServer;
let browser: Browser;
let page: PanelPage;

beforeAll(async () => {
  builtFunctions(); // says at once what to do when nothing is built
  server = await startStandIn({ port: 0 });
  browser = await openBrowser();
});
afterAll(async () => {
  await browser?.close();
  await server?.close();
});

const used = () => page.panel.locator('.counts').getAttribute('data-used');

const waitForUsed = (count: number) =>
  page.panel.waitForFunction(
    (wanted) => document.querySelector('.counts')?.getAttribute('data-used') === wanted,
    String(count),
  );

/** The panel's k and the sheet's in F9 agree to the panel's last digit. */
async function expectSameConstant(): Promise<void> {
  await page.sheet.settle();
  await page.settled();
  const inSheet = await page.sheet.waitFor('Chlorine!F9', (value) => typeof value === 'number', 15_000);
  const { value, unit } = await page.constant('k');
  expect(Math.abs(value - Number(inSheet))).toBeLessThanOrEqual(0.5000001 * unit);
}

test('functions answer before the panel has loaded, and the panel comes up later', async () => {
  let release = (): void => undefined;
  const held = new Promise<void>((resolve) => {
    release = resolve;
  });
  // The panel's script waits; the page's load event waits with it, so the sheet is opened without the panel's help.
  const page = await browser.newPage({ viewport: { width: 1500, height: 860 }, reducedMotion: 'reduce' });
  const errors: string[] = [];
  page.on('pageerror', (error) => errors.push(String(error)));
  await page.route('**/taskpane.js*', async (route) => {
    await held;
    await route.continue();
  });
  await page.goto(`${server.address}?sheet=Chlorine`);
  const constantInSheet = () =>
    page.evaluate(() => {
      const grid = window.standIn?.grid;
      const value = grid?.read(grid.activeSheet(), 8, 5).value;
      return typeof value === 'number' ? value : null;
    });
  const frame = await (await page.waitForSelector('#panel-frame[src]')).contentFrame();
  // The functions are registered; the host has not been told yet that the page is ready.
  await page.waitForFunction(
    () => {
      const grid = window.standIn?.grid;
      grid?.recalculate();
      return typeof grid?.read(grid.activeSheet(), 8, 5).value === 'number';
    },
    undefined,
    { polling: 500 },
  );
  expect(await frame?.locator('main').count()).toBe(0);
  const early = await constantInSheet();
  release();
  await frame?.waitForSelector('main');
  await page.evaluate(() => window.standIn?.grid.settle(15_000));
  expect(await constantInSheet()).toBe(early);
  expect(errors).toEqual([]);
  await page.close();
});

describe('with readings taken', () => {
  beforeEach(async () => {
    page = await PanelPage.open(browser, server.address, { sheet: 'Chlorine' });
    await page.take('A6:B19');
    await page.field('A law of the trade').selectOption('first order');
    await page.settled();
  });
  afterEach(async () => {
    expect(page.sheet.errors).toEqual([]);
    await page.sheet.page.evaluate(() => localStorage.clear());
    await page.sheet.close();
  });

  test('a reading typed while results are being written is in the results', async () => {
    await page.sheet.page.evaluate(() => {
      const book = window.standIn?.book;
      if (book) book.latency = 150;
    });
    await page.button('Write live block').click();
    await page.sheet.type('A20', '30');
    await page.sheet.type('B20', '0.15');
    await waitForUsed(14);
    await page.panel.waitForSelector('.placed li');
    await page.sheet.page.evaluate(() => {
      const book = window.standIn?.book;
      if (book) book.latency = 0;
    });
    await expectSameConstant();
    expect(await page.panel.locator('.hand-overs ~ .notice.stop').count()).toBe(0);
  });

  test('a protected sheet is said to be one, nothing is half written, and it works once unprotected', async () => {
    const protect = (on: boolean) =>
      page.sheet.page.evaluate((wanted) => {
        const standIn = window.standIn;
        if (!standIn) throw new Error('the stand-in is gone');
        const sheet = standIn.grid.activeSheet();
        if (wanted) standIn.book.protectedSheets.add(sheet);
        else standIn.book.protectedSheets.delete(sheet);
        return JSON.stringify(standIn.grid.usedRect(sheet));
      }, on);
    const before = await protect(true);
    await page.button('Write live block').click();
    await page.panel.waitForSelector('.notice.stop');
    expect(await page.text('.notice.stop')).toContain('The sheet is protected');
    expect(await used()).toBe('13');
    expect(await protect(false)).toBe(before);
    await page.button('Write live block').click();
    await page.panel.waitForSelector('.placed li');
    expect(await page.panel.locator('.notice.stop').count()).toBe(0);
    await expectSameConstant();
  });

  test('deleted rows make the readings fewer, and the panel follows', async () => {
    await page.sheet.page.evaluate(() => {
      const sheet = window.standIn?.grid.book.getActiveSheet();
      // Rows 18 and 19, the last two readings.
      sheet?.deleteRows(17, 2);
    });
    await waitForUsed(11);
    expect(await page.text('.columns-taken')).toContain('Chlorine!B6:B17');
    await expectSameConstant();
  });

  test('cells that are emptied count no more, down to none, and come back with the readings', async () => {
    const write = (rows: (readonly [number, number] | null)[]) =>
      page.sheet.page.evaluate((cells) => {
        const grid = window.standIn?.grid;
        grid?.write(
          grid.activeSheet(),
          5,
          0,
          cells.map((row) => row ?? [null, null]),
        );
      }, rows);
    await write(Array.from({ length: 14 }, () => null));
    await page.panel.waitForFunction(
      () => (document.querySelector('.counts')?.getAttribute('data-used') ?? '0') === '0',
    );
    await page.settled();
    await write([
      [0, 1.86],
      [2, 1.54],
      [6, 1.06],
      [12, 0.62],
    ]);
    await waitForUsed(4);
    await page.settled();
    expect(await page.texts('.constant .symbol')).toEqual(['C0', 'k', 'half-life']);
    await expectSameConstant();
  });

  test('another person’s edit is followed like one’s own', async () => {
    const before = await page.text('[data-constant="k"] .value');
    await page.sheet.page.evaluate(() =>
      window.standIn?.book.asCoauthor((grid) => grid.write(grid.activeSheet(), 18, 1, [[0.26]])),
    );
    await page.panel.waitForFunction(
      (text) => document.querySelector('[data-constant="k"] .value')?.textContent !== text,
      before,
    );
    await expectSameConstant();
  });

  test('a deleted sheet is said to be gone; other readings are taken without a reload', async () => {
    await page.sheet.page.evaluate(() => {
      const grid = window.standIn?.grid;
      if (grid) grid.deleteSheet(grid.activeSheet());
    });
    await page.panel.waitForSelector('[role=alert] .notice');
    expect(await page.text('[role=alert] .notice')).toContain("There is no sheet 'Chlorine'");
    await page.sheet.page.getByText('Pump', { exact: true }).first().click();
    await page.sheet.select('A6:B17');
    await page.panel
      .locator('[role=alert] .notice')
      .getByRole('button', { name: 'Use the selection instead' })
      .click();
    await waitForUsed(11);
    expect(await page.panel.locator('[role=alert] .notice').count()).toBe(0);
  });

  test.each(['GeneralException', 'ItemNotFound'])(
    'the host’s %s is said; the next reading brings everything back',
    async (code) => {
      await page.sheet.page.evaluate(
        (given) => window.standIn?.book.failNext(given, 'The host is tired.', /^sync$/, 4),
        code,
      );
      await page.sheet.type('A20', '30');
      await page.panel.waitForSelector('.notice.stop');
      // Whatever is left of the faults is used up by further readings.
      for (const value of ['0.16', '0.15']) {
        await page.sheet.type('B20', value);
        await page.sheet.settle();
        await page.settled();
      }
      const again = page.button('Read the cells again');
      for (let tries = 0; tries < 5 && (await page.panel.locator('.notice.stop').count()) > 0; tries++) {
        await again.click({ timeout: 2_000 }).catch(() => undefined);
        await page.settled();
      }
      await waitForUsed(14);
      expect(await page.panel.locator('.notice.stop').count()).toBe(0);
      await expectSameConstant();
    },
  );

  test('a write that fails half way leaves the sheet as it was, or takes back what it wrote', async () => {
    const cells = () =>
      page.sheet.page.evaluate(() => {
        const grid = window.standIn?.grid;
        return JSON.stringify(grid?.usedRect(grid.activeSheet()));
      });
    const before = await cells();
    await page.sheet.page.evaluate(() =>
      window.standIn?.book.failNext('GeneralException', 'The host is tired.', /^Range\.formulas=/, 1),
    );
    await page.button('Write live block').click();
    await page.panel.waitForSelector('.notice.stop');
    expect(await page.text('.notice.stop')).toContain('The host is tired.');
    await page.settled();
    expect(await cells()).toBe(before);
    await page.button('Write live block').click();
    await page.panel.waitForSelector('.placed li');
    await expectSameConstant();
  });
});
