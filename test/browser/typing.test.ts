import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { builtFunctions } from '../sheet/functionsScript.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { openBrowser } from './openBrowser.ts';
import { SheetPage } from './sheetPage.ts';

jest.setTimeout(60_000);

let server: StandInServer;
let browser: Browser;
let sheet: SheetPage;

beforeAll(async () => {
  builtFunctions(); // says at once what to do when nothing is built
  server = await startStandIn({ port: 0 });
  browser = await openBrowser();
  sheet = await SheetPage.open(browser, server.address, { sheet: 'Chlorine' });
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
});

describe('a reading typed into the sheet', () => {
  test('becomes part of the constant', async () => {
    // C0, k and the half-life under their header.
    await sheet.waitFor('E8', (value) => value === 'C0');
    const before = await sheet.get('F9');
    expect(typeof before).toBe('number');

    await sheet.type('A20', '30');
    await sheet.click('B20');
    await sheet.page.keyboard.type('0.15');
    const started = performance.now();
    await sheet.page.keyboard.press('Enter');
    const after = await sheet.waitFor('F9', (value) => value !== before);
    const took = performance.now() - started;

    expect(typeof after).toBe('number');
    process.stdout.write(`typed reading to changed constant: ${took.toFixed(0)} ms\n`);
    // Removing the reading brings the same constant back.
    await sheet.page.keyboard.press('ArrowUp');
    await sheet.page.keyboard.press('Delete');
    expect(await sheet.waitFor('F9', (value) => value !== after)).toBe(before);
    await sheet.page.screenshot({ path: 'test/browser/screenshots/chlorine.png' });
  });

  test('that is text is set aside, and one outside the law is named beside the cell', async () => {
    const before = await sheet.get('F9');
    await sheet.type('B20', 'spilt too');
    await sheet.settle();
    expect(await sheet.get('F9')).toBe(before);
    await sheet.type('B20', '-0.1');
    await sheet.waitFor('E7', (value) => value === '#N/A');
    const message = await sheet.message('E7');
    expect(message).toMatch(/^Reading 15 /);
    await sheet.click('E7');
    expect(await sheet.page.textContent('#why')).toBe(message);
    await sheet.page.screenshot({ path: 'test/browser/screenshots/refusal.png' });
  });

  test('no script failed on the way', () => {
    expect(sheet.errors).toEqual([]);
  });
});
