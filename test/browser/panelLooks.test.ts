import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser } from 'playwright-core';
import { builtFunctions } from '../sheet/functionsScript.ts';
import { type StandInServer, startStandIn } from '../sheet/serve.ts';
import { accessibilityFaults } from './axe.ts';
import { openBrowser } from './openBrowser.ts';
import { PanelPage } from './panelPage.ts';

jest.setTimeout(60_000);

let server: StandInServer;
let browser: Browser;

beforeAll(async () => {
  builtFunctions(); // says at once what to do when nothing is built
  server = await startStandIn({ port: 0 });
  browser = await openBrowser();
});

afterAll(async () => {
  await browser?.close();
  await server?.close();
});

/** The panel with readings and a law in depth, everything folded out. */
async function inDepth(theme: 'light' | 'dark' | 'contrast', panel: number): Promise<PanelPage> {
  const page = await PanelPage.open(browser, server.address, { sheet: 'Chlorine', theme, panel });
  if (theme === 'contrast')
    await page.sheet.page.emulateMedia({ forcedColors: 'active', colorScheme: 'dark' });
  await page.take('A6:B19');
  await page.choose('exponential');
  await page.panel.locator('.reading').nth(4).click();
  await page.panel.evaluate(() => {
    for (const details of document.querySelectorAll('details')) details.open = true;
  });
  await page.settled();
  return page;
}

describe.each(['light', 'dark', 'contrast'] as const)('in the %s theme', (theme) => {
  test('nothing keeps anyone out', async () => {
    const start = await PanelPage.open(browser, server.address, { sheet: 'Chlorine', theme });
    expect(await accessibilityFaults(start.panel)).toEqual([]);
    await start.sheet.close();
    const page = await inDepth(theme, 350);
    expect(await accessibilityFaults(page.panel)).toEqual([]);
    await page.picture(`panel-${theme}-350`);
    expect(page.sheet.errors).toEqual([]);
    await page.sheet.close();
  });
});

describe('at every width', () => {
  test.each([320, 350, 600, 900])('%d pixels: nothing is cut off', async (width) => {
    const page = await inDepth('light', width);
    const wide = await page.panel.evaluate(() => {
      const edge = document.documentElement.clientWidth;
      return [...document.querySelectorAll('main *, .top *')]
        .filter((element) => {
          const box = element.getBoundingClientRect();
          return box.width > 1 && box.right > edge + 0.5 && element.closest('.reading-list') === null;
        })
        .map((element) => element.outerHTML.slice(0, 120));
    });
    expect(wide).toEqual([]);
    await page.picture(`panel-light-${width}`);
    await page.sheet.close();
  });

  test('the top right corner stays free for the host’s own button', async () => {
    const page = await inDepth('light', 320);
    const inCorner = await page.panel.evaluate(() => {
      const edge = document.documentElement.clientWidth;
      return [...document.querySelectorAll('.top button, .top a')]
        .map((element) => element.getBoundingClientRect())
        .filter((box) => box.right > edge - 34 && box.top < 32).length;
    });
    expect(inCorner).toBe(0);
    await page.sheet.close();
  });
});

describe('with the keyboard alone', () => {
  test('every control is reached in its order and shows that it has the focus', async () => {
    const page = await inDepth('light', 350);
    await page.panel.locator('.head button').first().focus();
    const seen: string[] = [];
    for (let i = 0; i < 120; i++) {
      await page.sheet.page.keyboard.press('Tab');
      const at = await page.panel.evaluate(() => {
        const element = document.activeElement;
        if (!(element instanceof Element) || element === document.body) return null;
        // A law's radio button is drawn as its card.
        const card = element.matches('input[type=radio]') ? element.closest('.card') : null;
        const style = getComputedStyle(card ?? element);
        const { top } = (card ?? element).getBoundingClientRect();
        return {
          name: element.getAttribute('aria-label') ?? element.id ?? element.textContent ?? '',
          outlined: style.outlineStyle !== 'none' && Number.parseFloat(style.outlineWidth) >= 2,
          inSight: top >= 0,
        };
      });
      if (at === null) break;
      expect(at).toMatchObject({ outlined: true, inSight: true });
      seen.push(at.name);
    }
    expect(seen.length).toBeGreaterThan(15);
    await page.sheet.close();
  });

  test('a link leads from the chosen law to its depth, and takes the focus along', async () => {
    const page = await inDepth('light', 350);
    const link = page.panel.getByRole('link', { name: 'See it in depth' });
    await link.focus();
    await link.press('Enter');
    expect(await page.panel.evaluate(() => document.activeElement?.id)).toBe('depth-title');
    const top = await page.panel
      .locator('#depth-title')
      .evaluate((heading) => heading.getBoundingClientRect().top);
    expect(top).toBeGreaterThan(40);
    expect(top).toBeLessThan(200);
    await page.sheet.close();
  });

  test('arrow keys go from law to law', async () => {
    const page = await inDepth('light', 350);
    const chosen = () => page.panel.locator('.card.chosen').getAttribute('data-law');
    await page.panel.locator('.card.chosen input').focus();
    await page.sheet.page.keyboard.press('ArrowDown');
    await page.settled();
    expect(await chosen()).not.toBe('exponential');
    await page.sheet.page.keyboard.press('ArrowUp');
    await page.settled();
    expect(await chosen()).toBe('exponential');
    await page.sheet.close();
  });
});
