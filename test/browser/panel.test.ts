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
  page = await PanelPage.open(browser, server.address, { sheet: 'Chlorine' });
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
});

/** Number of readings that the panel says it uses. */
const used = async (): Promise<number> =>
  Number(await page.panel.locator('.counts').getAttribute('data-used'));

/** The panel's k and the sheet's, which TAUT.CONSTANTS computes in F9, agree to the panel's last digit. */
async function expectSameConstant(): Promise<number> {
  const inSheet = await page.sheet.waitFor('F9', (value) => typeof value === 'number', 15_000);
  const { value, unit } = await page.constant('k');
  expect(Math.abs(value - Number(inSheet))).toBeLessThanOrEqual(0.5000001 * unit);
  return value;
}

describe('from two columns to a constant', () => {
  test('a new user is told what to do first, and what is selected', async () => {
    expect(await page.texts('.steps li')).toHaveLength(3);
    await page.sheet.select('A6:B19');
    await page.panel.waitForFunction(() =>
      document.body.textContent?.includes('A6:B19 (14 rows × 2 columns)'),
    );
    await page.picture('panel-start-350');
  });

  test('the selection becomes readings with names, units and reasons', async () => {
    await page.take('A6:B19');
    expect(await page.texts('.quantity')).toEqual(['time / h', 'C / (mg/L)']);
    expect(await used()).toBe(13);
    expect(await page.texts('.aside li')).toEqual([expect.stringMatching(/Reading 8 .*spilt/)]);
    await page.panel.locator('.aside li button').click();
    await page.sheet.page.waitForFunction(() =>
      document.querySelector('#where')?.textContent?.includes('13'),
    );
  });

  test('laws stand side by side, best supported first; impossible ones say why', async () => {
    const support = (await page.texts('.card .figure:first-child .number')).map((text) =>
      Number.parseFloat(text),
    );
    expect(support.length).toBeGreaterThanOrEqual(5);
    expect(support).toEqual([...support].sort((a, b) => b - a));
    expect(await page.text('.card .law-name')).toBe('exponential');
    expect(await page.panel.locator('.card svg').count()).toBe(support.length);
    await page.panel.locator('.impossible summary').click();
    const reasons = await page.text('.impossible');
    expect(reasons).toMatch(/power.*eading 1\b/);
  });

  test('a law of the trade is added, chosen and settled as in the sheet', async () => {
    await page.field('A law of the trade').selectOption('first order');
    await page.settled();
    expect(await page.text('.law-title')).toMatch(
      /C\(t\) = C0\s*\*\s*exp\(.*plot ln C against t; slope = −k/,
    );
    expect(await page.texts('.constant .symbol')).toEqual(['C0', 'k', 'half-life']);
    await expectSameConstant();
    expect(await page.texts('.checks li')).not.toHaveLength(0);
  });

  test('a unit goes into the sentence, which can be copied', async () => {
    await page.fill('Unit of k', '1/h');
    expect(await page.text('.sentence')).toMatch(/\bk\b.*1\/h/);
    await page.button('Copy the sentence').click();
    await page.panel.waitForFunction(() =>
      /Copied|keyboard/.test(document.querySelector('[role=status]')?.textContent ?? ''),
    );
  });
});

describe('the panel follows the sheet', () => {
  test('a reading typed below moves counts, constants and plots, and keeps the focus where it was', async () => {
    const before = await expectSameConstant();
    const plot = await page.panel.locator('.drawing svg').first().innerHTML();
    await page.sheet.type('A20', '30');
    await page.sheet.type('B20', '0.15');
    await page.panel.waitForFunction(
      () => document.querySelector('.counts')?.getAttribute('data-used') === '14',
    );
    await page.settled();
    await page.sheet.settle();
    expect(await expectSameConstant()).not.toBe(before);
    expect(await page.text('.columns-taken')).toContain('Chlorine!B6:B20');
    expect(await page.panel.locator('.drawing svg').first().innerHTML()).not.toBe(plot);
    expect(
      await page.panel.evaluate(() => document.hasFocus() && document.activeElement !== document.body),
    ).toBe(false);
  });

  test('an edited reading moves them too', async () => {
    await page.sheet.type('B20', '0.11');
    await page.sheet.settle();
    await page.settled();
    await expectSameConstant();
  });
});

describe('the user’s own law', () => {
  test('what is wrong with it stands under the field, at its place', async () => {
    await page.field('Your own law').fill('C(t) = C0*exp(-k*)');
    expect(await page.text('.own-law .wrong')).toMatch(/18/);
    expect(await page.text('.own-law mark')).toBe(')');
    expect(await page.button('Compare it').isDisabled()).toBe(true);
  });

  test('it is straightened while it is typed, and compared', async () => {
    await page.field('Your own law').fill('C(t) = C0*exp(-t/tau)');
    expect(await page.text('.own-law .straightened')).toMatch(
      /plot ln C against t; slope = −1\/tau; intercept = ln C0/,
    );
    await page.field('Your own law').press('Enter');
    await page.settled();
    expect(await page.panel.locator('.card.chosen').getAttribute('data-law')).toBe('C(t) = C0*exp(-t/tau)');
    const tau = await page.constant('tau');
    expect(tau.value * Number(await page.sheet.get('F9'))).toBeCloseTo(1, 2);
  });
});

describe('what is known beforehand', () => {
  test('a known constant is no longer sought', async () => {
    await page.fill('C0', '1.86±0.01');
    expect(await page.texts('.constant .symbol')).toEqual(['tau']);
  });

  test('what cannot be read is said beside its input, and the step can be taken back', async () => {
    await page.fill('C0', 'about 2');
    expect(await page.text('.known .wrong')).toMatch(/C0/);
    await page.button(/^Undo/).click();
    await page.settled();
    expect(await page.field('C0').inputValue()).toBe('1.86±0.01');
    expect(await page.texts('.constant .symbol')).toEqual(['tau']);
  });

  test('an uncertainty of the readings changes that of the constant', async () => {
    const before = await page.text('[data-constant="tau"]');
    await page.field('Standard uncertainty of C').selectOption('number');
    await page.fill('such as 0.05 or 2%', '5%');
    expect(await page.text('[data-constant="tau"]')).not.toBe(before);
    await page.field('Standard uncertainty of C').selectOption('none');
    await page.settled();
    expect(await page.text('[data-constant="tau"]')).toBe(before);
  });
});

describe('looking at single readings', () => {
  test('the list is walked with the keyboard, and Enter shows the cell', async () => {
    const list = page.panel.getByRole('listbox');
    await list.focus();
    await list.press('Home');
    await list.press('ArrowDown');
    expect(await page.text('.picked .strong')).toBe('Reading 2');
    await list.press('Enter');
    await page.sheet.page.waitForFunction(() =>
      document.querySelector('#where')?.textContent?.includes('A7'),
    );
  });

  test('a reading picked in a plot is shown in the list, and the other way round', async () => {
    const plot = page.panel.locator('.figure-drawing').first();
    await plot.focus();
    await plot.press('End');
    expect(await page.text('.picked .strong')).toBe('Reading 15');
    expect(await page.panel.locator('.reading[aria-selected="true"]').getAttribute('data-position')).toBe(
      '15',
    );
    await page.panel.locator('.reading[data-position="2"]').click();
    expect(await page.text('.picked .strong')).toBe('Reading 2');
    expect(await page.text('.figure-picked')).toMatch(/Reading 2\b/);
  });

  test('a reading left out for a look comes back with one undo', async () => {
    const before = await page.text('[data-constant="tau"] .result');
    const count = await used();
    await page.button('Leave out and see').click();
    await page.settled();
    expect(await used()).toBe(count - 1);
    expect(await page.text('.counts')).toContain('1 left out by you');
    expect(await page.text('[data-constant="tau"] .result')).not.toBe(before);
    await page.button(/^Undo: leave out reading 2/).click();
    await page.settled();
    expect(await used()).toBe(count);
    expect(await page.text('[data-constant="tau"] .result')).toBe(before);
  });

  test('the curve is read off both ways', async () => {
    await page.field(/^Given time/).fill('5');
    const y = Number.parseFloat((await page.text('.one-way:nth-child(1) .read-result')).replace(/^.*= /, ''));
    await page.field(/^Given C/).fill(String(y));
    const x = Number.parseFloat((await page.text('.one-way:nth-child(2) .read-result')).replace(/^.*= /, ''));
    expect(x).toBeCloseTo(5, 1);
    await page.field(/^Given time/).fill('500');
    expect(await page.text('.beyond')).toMatch(/0 to 30/);
  });

  test('the next reading is planned: where it tells the most, and how many are needed', async () => {
    await page.panel.locator('.plan summary').click();
    await page.fill('To in h', '48');
    expect(await page.text('.plan .read-result')).toBe('Take it at time = 48 h');
    const [now = Number.NaN, after = Number.NaN] =
      (await page.text('.plan .quiet')).match(/[\d.]+(?= |\.$)/g)?.map(Number) ?? [];
    expect(after).toBeLessThan(now);
    await page.fill(/^Wanted standard uncertainty of tau/, String(now / 2));
    expect(await page.text('.plan')).toMatch(/\d+ more readings spread like these, \d+ in all/);
    await page.fill(/^Wanted standard uncertainty of tau/, 'half');
    expect(await page.text('.plan .wrong')).toMatch(/half/);
    await page.fill(/^Wanted standard uncertainty of tau/, String(now / 3));
    await page.picture('panel-plan-350');
    await page.fill(/^Wanted standard uncertainty of tau/, '');
  });
});

describe('how to fit', () => {
  const interval = () => page.text('[data-constant="tau"] .quiet');

  test('a wider coverage widens the interval', async () => {
    expect(await interval()).toMatch(/^95 % interval/);
    await page.field('Coverage of intervals').selectOption('99 %');
    await page.settled();
    expect(await interval()).toMatch(/^99 % interval/);
  });

  test('the direct fit gives other constants than the line; the keyboard takes both steps back', async () => {
    const before = await page.text('[data-constant="tau"] .result');
    const tick = page.field('Fit the curve directly, in the units of y');
    await tick.check();
    await page.settled();
    expect(await page.text('[data-constant="tau"] .result')).not.toBe(before);
    await tick.press('Control+z');
    await page.settled();
    expect(await tick.isChecked()).toBe(false);
    expect(await page.text('[data-constant="tau"] .result')).toBe(before);
    await tick.press('Control+z');
    await page.settled();
    expect(await interval()).toMatch(/^95 % interval/);
    await tick.press('Control+y');
    await page.settled();
    expect(await interval()).toMatch(/^99 % interval/);
    await tick.press('Control+z');
    await page.settled();
  });

  test('an intercept that no known constant gives cannot be held, and the reason is said', async () => {
    await page.fill('C0', '');
    const tick = page.field('Hold the intercept at the value that the known constants give it');
    await tick.check();
    await page.settled();
    expect(await page.text('main .notice.stop')).toMatch(/intercept=held .* C0/);
    await page.button(/^Undo/).click();
    await page.button(/^Undo/).click();
    await page.settled();
    expect(await page.field('C0').inputValue()).toBe('1.86±0.01');
  });
});

describe('the workbook keeps the panel’s state', () => {
  test('opened again, the panel is where it was', async () => {
    await page.reopen();
    await page.panel.waitForSelector('[data-constant="tau"]');
    expect(await page.text('.columns-taken')).toContain('Chlorine!B6:B20');
    expect(await page.field('C0').inputValue()).toBe('1.86±0.01');
    expect(await page.panel.locator('.card.chosen').getAttribute('data-law')).toBe('C(t) = C0*exp(-t/tau)');
  });
});

describe('what the host refuses', () => {
  test('is said in a sentence, and reading again recovers without a reload', async () => {
    // The host goes on refusing, so that no recalculation has the cells read again before the button does.
    await page.sheet.page.evaluate(() =>
      window.standIn?.book.failNext('InvalidOperationInCellEditMode', 'busy', /^sync$/, 1e6),
    );
    await page.sheet.type('B7', '1.5');
    await page.panel.waitForSelector('.notice.stop');
    expect(await page.text('.notice.stop')).toContain('A cell is being edited');
    await page.sheet.settle();
    const before = await page.text('[data-constant="tau"] .result');
    await page.sheet.page.evaluate(() => window.standIn?.book.stopFailing());
    await page.button('Read the cells again').click();
    await page.panel.waitForSelector('.notice.stop', { state: 'detached' });
    await page.settled();
    expect(await page.texts('.constant .symbol')).toEqual(['tau']);
    expect(await page.text('[data-constant="tau"] .result')).not.toBe(before);
  });

  test('no script failed on the way', () => {
    expect(page.sheet.errors).toEqual([]);
  });
});
