import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { builtFunctions } from '../sheet/functionsScript.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { accessibilityFaults } from './axe.ts';
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
  page = await PanelPage.open(browser, server.address, { sheet: 'Chlorine', panel: 350 });
  await page.take('A6:B19');
  await page.field('A law of the trade').selectOption('first order');
  await page.settled();
  await page.fill('Unit of k', '1/h');
});

afterAll(async () => {
  expect(page?.sheet.errors).toEqual([]);
  await browser?.close();
  await server?.close();
});

/** Presses a button of the section and waits until the panel has said what came of it. */
async function press(name: string | RegExp, said: RegExp): Promise<void> {
  await page.button(name).click();
  await page.panel.waitForFunction(
    (pattern) => new RegExp(pattern).test(document.querySelector('[role=status]')?.textContent ?? ''),
    said.source,
  );
  await page.sheet.settle();
}

const tabs = (): Promise<string[]> =>
  page.sheet.page.evaluate(() => (window.standIn?.grid.sheets() ?? []).map(({ name }) => name));

/** Every text and number on a sheet, row by row. */
function textOn(name: string): Promise<string> {
  return page.sheet.page.evaluate((wanted) => {
    const grid = window.standIn?.grid;
    const id = grid?.sheets().find((one) => one.name === wanted)?.id;
    if (!grid || id === undefined) return '';
    const { bottom, right } = grid.usedRect(id) ?? { bottom: -1, right: -1 };
    const rows = Array.from({ length: bottom + 1 }, (_, row) =>
      Array.from({ length: right + 1 }, (_unused, column) => {
        const { value } = grid.read(id, row, column);
        return typeof value === 'object' && value !== null ? value.error : String(value ?? '');
      }).join('\t'),
    );
    return rows.join('\n');
  }, name);
}

const picturesOf = (name: string) => page.sheet.page.locator(`img[alt^="${name}"]`);

async function openTab(name: string): Promise<void> {
  await page.sheet.page.getByText(name, { exact: true }).first().click();
}

describe('a result is handed over from the panel', () => {
  test('as a live block beside the readings', async () => {
    await press('Write live block', /^Live block written to Chlorine!N5:/);
    expect(await textOn('Chlorine')).toMatch(/\tk\t0\.0939\d*\t0\.00076\d*/);
  });

  test('as charts of the host', async () => {
    await press('Draw charts', /^Charts written to 'Tautline charts'!/);
    await picturesOf('ln C against t').waitFor({ state: 'visible' });
    await page.sheet.page.screenshot({ path: 'test/browser/screenshots/handover-charts.png' });
  });

  test('as a result card with its pictures', async () => {
    await press('Write result card', /^Result card written to Result!/);
    expect(await textOn('Result')).toContain('0.09393 ± 0.00077 1/h');
    await picturesOf('Tautline card').first().waitFor({ state: 'visible' });
    expect(await picturesOf('Tautline card').count()).toBe(2);
    await page.sheet.page.screenshot({ path: 'test/browser/screenshots/handover-card.png' });
  });

  test('as workings that agree with the live function', async () => {
    await press('Write workings', /^Workings written to Workings!/);
    expect(await textOn('Workings')).toMatch(/The workings and the live function agree to 1[0-5] digits\./);
    await page.sheet.page.screenshot({ path: 'test/browser/screenshots/handover-workings.png' });
  });

  test('and an edited reading moves them all', async () => {
    await openTab('Result');
    const before = await picturesOf('Tautline card').first().getAttribute('src');
    await openTab('Chlorine');
    await page.sheet.type('B19', '0.25');
    await page.sheet.settle();
    expect(await textOn('Chlorine')).not.toMatch(/\tk\t0\.0939/);
    expect(await textOn('Result')).not.toContain('0.09393 ± 0.00077 1/h');
    expect(await textOn('Workings')).toMatch(/The workings and the live function agree to 1[0-5] digits\./);
    await openTab('Result');
    await page.sheet.page.waitForFunction(
      (source) => document.querySelector('img[alt^="Tautline card"]')?.getAttribute('src') !== source,
      before,
    );
  });

  test('a frozen card keeps its numbers; thawed it follows again', async () => {
    await press(/^Freeze Result card/, /^Result card: values now stand/);
    const frozen = await textOn('Result');
    await openTab('Chlorine');
    await page.sheet.type('B19', '0.2');
    await page.sheet.settle();
    expect(await textOn('Result')).toBe(frozen);
    await press(/^Thaw Result card/, /^Result card: the formulas are back/);
    expect(await textOn('Result')).toContain('0.09393 ± 0.00077 1/h');
  });

  test('cells that are taken are asked about in the panel, and left alone on request', async () => {
    const before = await textOn('Chlorine');
    await page.fill('Top left cell', 'E6');
    await page.button('Write live block').click();
    const question = page.panel.getByRole('alertdialog');
    expect(await question.textContent()).toMatch(/^\d+ cells in E6:I\d+ are not empty\. Overwrite them\?/);
    expect(await page.panel.evaluate(() => document.activeElement?.textContent)).toBe('Leave them');
    await page.panel.locator('.handover').screenshot({ path: 'test/browser/screenshots/handover-panel.png' });
    expect(await accessibilityFaults(page.panel)).toEqual([]);
    await page.button('Leave them').click();
    await page.settled();
    expect(await textOn('Chlorine')).toBe(before);
  });

  test('everything that was placed can be taken back', async () => {
    expect(await page.panel.locator('.placed li').count()).toBe(4);
    for (const what of ['Live block', 'Charts', 'Result card', 'Workings']) {
      await press(new RegExp(`^Take back ${what}`), new RegExp(`^${what} is taken back`));
    }
    expect(await tabs()).toEqual(['Chlorine', 'Chlorine 48 h', 'Weir', 'Cold room', 'Carbon', 'Pump']);
    expect(await textOn('Chlorine')).not.toContain('Given (change these cells');
  });
});
