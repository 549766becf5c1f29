import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser, Page } from 'playwright-core';
import { galleryPage } from '../taskpane/plots/gallery/page.ts';
import { openBrowser } from './openBrowser.ts';

jest.setTimeout(60_000);

let browser: Browser;
let html: string;

beforeAll(async () => {
  html = await galleryPage();
  browser = await openBrowser();
});

afterAll(async () => {
  await browser?.close();
});

const FAULTS = new WeakMap<Page, string[]>();

async function gallery(width: number, theme: 'light' | 'dark' | 'contrast'): Promise<Page> {
  const page = await browser.newPage({ viewport: { width, height: 900 } });
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(error.message));
  FAULTS.set(page, faults);
  await page.emulateMedia({
    colorScheme: theme === 'light' ? 'light' : 'dark',
    forcedColors: theme === 'contrast' ? 'active' : 'none',
  });
  await page.setContent(html);
  await page.waitForSelector('#many .curve svg');
  return page;
}

describe.each(['light', 'dark', 'contrast'] as const)('in the %s theme', (theme) => {
  test.each([350, 600])('%d pixels', async (width) => {
    const page = await gallery(width, theme);
    await page.screenshot({ path: `test/browser/screenshots/plots-${theme}-${width}.png`, fullPage: true });
    expect(FAULTS.get(page)).toEqual([]);
    await page.close();
  });
});
