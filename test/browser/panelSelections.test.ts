import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { builtFunctions } from '../sheet/functionsScript.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { openBrowser } from './openBrowser.ts';
import { PanelPage } from './panelPage.ts';

jest.setTimeout(60_000);

let server: StandInServer;
let browser: Browser;
let page: PanelPage;

beforeAll(async () => {
  builtFunctions(); // says at once what to do when nothing is built
  server = await startStandIn({ port: 0 });
  browser = await openBrowser();
  page = await PanelPage.open(browser, server.address, { sheet: 'Weir' });
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
});

const use = async (): Promise<void> => {
  await page.button('Use the selection instead').click();
  await page.settled();
};

/** x and y as the section on readings shows them. */
const taken = async (): Promise<string[]> => page.texts('.columns-taken dd:last-child');

describe('whatever is selected', () => {
  test('a single column is refused with what to do instead', async () => {
    await page.sheet.select('B6:B17');
    await page.button('Use the selection').click();
    expect(await page.text('.use-selection .wrong')).toMatch(/only one of the selected columns/);
  });

  test('one cell stands for the table around it; its third column can be the uncertainty', async () => {
    await page.sheet.click('B9');
    await page.button('Use the selection').click();
    await page.panel.waitForSelector('.counts');
    await page.settled();
    expect(await taken()).toEqual(['Weir!A6:A17', 'Weir!B6:B17']);
    await page.choose('power');
    await page.field('Standard uncertainty of flow Q').selectOption('in the column u(Q) / (m³/s)');
    await page.settled();
    expect(await page.field('cells, such as D4:D60').inputValue()).toBe('Weir!C6:C17');
    expect(await page.text('.sentence')).toMatch(/11 readings/);
  });

  test('a reading typed below takes its uncertainty along', async () => {
    await page.sheet.type('A18', '0.702');
    await page.sheet.type('B18', '0.668');
    await page.sheet.type('C18', '0.014');
    await page.settled();
    expect(await taken()).toEqual(['Weir!A6:A18', 'Weir!B6:B18']);
    expect(await page.field('cells, such as D4:D60').inputValue()).toBe('Weir!C6:C18');
    expect(await page.text('.counts')).toContain('12 used');
  });

  test('two areas, the first selected being x', async () => {
    await page.panel.locator('summary', { hasText: 'Ranges, names and units' }).click();
    await page.sheet.select('B6:B17');
    await page.sheet.select('A6:A17', ['Control']);
    await use();
    expect(await taken()).toEqual(['Weir!B6:B17', 'Weir!A6:A17']);
    expect(await page.texts('.quantity')).toEqual(['flow Q / (m³/s)', 'stage h / m']);
  });

  test('uncertainties in cells stay with the readings they stood beside, which is said', async () => {
    expect(await page.text('[role=alert] .notice')).toMatch(/uncertainties in cells .* were left there/);
    await page.button('Dismiss').click();
    expect(await page.field('Standard uncertainty of stage h').inputValue()).toBe('none');
  });

  test('columns the wrong way round are swapped with one button', async () => {
    await page.button('Swap x and y').click();
    await page.settled();
    expect(await taken()).toEqual(['Weir!A6:A17', 'Weir!B6:B17']);
    expect(await page.texts('.quantity')).toEqual(['stage h / m', 'flow Q / (m³/s)']);
  });

  test('ranges can be typed; what is none is said beside the field', async () => {
    await page.fill('Cells of y', 'nonsense');
    expect(await page.text('.range-fields .wrong')).toMatch(/'nonsense' is not a range/);
    await page.fill('Cells of y', 'B7:B17');
    expect(await page.text('#readings > .wrong')).toMatch(/x has 12 and y has 11/);
    await page.fill('Cells of x', 'A7:A17');
    expect(await page.text('.counts')).toContain('10 used');
  });
});

describe('when the readings’ sheet goes', () => {
  test('the panel says so, and takes other readings without a reload', async () => {
    await page.sheet.page.evaluate(() => {
      const grid = window.standIn?.grid;
      const weir = grid?.sheets().find(({ name }) => name === 'Weir');
      if (weir) grid?.deleteSheet(weir.id);
    });
    await page.panel.waitForSelector('[role=alert] .notice');
    expect(await page.text('[role=alert] .notice')).toContain("There is no sheet 'Weir'");
    await page.sheet.page.getByText('Carbon', { exact: true }).first().click();
    await page.sheet.select('A6:B16');
    await page.panel
      .locator('[role=alert] .notice')
      .getByRole('button', { name: 'Use the selection instead' })
      .click();
    await page.settled();
    expect(await page.panel.locator('[role=alert] .notice').count()).toBe(0);
    expect(await taken()).toEqual(['Carbon!A6:A16', 'Carbon!B6:B16']);
    expect(await page.texts('.card .law-name')).toContain('saturation');
  });

  test('another straight form of a law draws it on other axes', async () => {
    await page.choose('saturation');
    expect(await page.text('.law-title .straightened')).toMatch(/plot 1\/y against 1\/x/);
    await page.field('Straight axes').selectOption({ index: 1 });
    await page.settled();
    expect(await page.text('.law-title .straightened')).toMatch(/plot (x\/y against x|y against y\/x)/);
  });

  test('no script failed on the way', () => {
    expect(page.sheet.errors).toEqual([]);
  });
});

describe('a host that tells no blanks from zeros', () => {
  test('blank cells below the readings are not there yet, not zeros', async () => {
    const other = await PanelPage.open(browser, server.address, { sheet: 'Chlorine', blank: 'zero' });
    await other.take('A6:B25');
    expect(await other.text('.counts')).toMatch(/13 used.*6 not there yet/);
    await other.sheet.close();
  });
});
