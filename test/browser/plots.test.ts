import { afterAll, beforeAll, describe, expect, jest, test } from '@jest/globals';
import type { Browser, Locator, Page } from 'playwright-core';
import { galleryFits } from '../taskpane/plots/gallery/fits.ts';
import { galleryPage } from '../taskpane/plots/gallery/page.ts';
import { accessibilityFaults } from './axe.ts';
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

type Theme = 'light' | 'dark' | 'contrast';

/** The gallery at a width; a fault on the page fails the test at its end. */
async function withGallery(width: number, theme: Theme, use: (page: Page) => Promise<void>): Promise<void> {
  const page = await browser.newPage({ viewport: { width, height: 900 } });
  const faults: string[] = [];
  page.on('pageerror', (error) => faults.push(error.message));
  await page.emulateMedia({
    colorScheme: theme === 'light' ? 'light' : 'dark',
    forcedColors: theme === 'contrast' ? 'active' : 'none',
  });
  await page.setContent(html);
  await page.waitForSelector('#many .curve svg');
  await use(page);
  await page.close();
  expect(faults).toEqual([]);
}

const plot = (page: Page, id: string, kind: 'straight' | 'residual' | 'curve'): Locator =>
  page.locator(`#${id} .${kind} .figure-drawing`);
const selected = (page: Page, id: string): Promise<string | null> =>
  page.locator(`#${id}`).getAttribute('data-selected');

describe.each(['light', 'dark', 'contrast'] as const)('in the %s theme', (theme) => {
  test.each([350, 600])('%d pixels: nothing keeps anyone out', (width) =>
    withGallery(width, theme, async (page) => {
      await plot(page, 'exponential', 'straight').focus();
      await page.keyboard.press('Home');
      expect(await accessibilityFaults(page.mainFrame())).toEqual([]);
      await page.screenshot({ path: `test/browser/screenshots/plots-${theme}-${width}.png`, fullPage: true });
    }),
  );
});

test('forced colours leave none of our own', () =>
  withGallery(350, 'contrast', async (page) => {
    const colours = await page.evaluate(() => {
      const probe = document.createElement('span');
      document.body.append(probe);
      const system = ['Canvas', 'CanvasText', 'GrayText', 'Highlight', 'ButtonText'].map((name) => {
        probe.style.color = name;
        return getComputedStyle(probe).color;
      });
      const marks = document.querySelectorAll('svg circle, svg path, svg line, svg text');
      const drawn = [...marks].flatMap((mark) => {
        const { fill, stroke } = getComputedStyle(mark);
        return [fill, stroke];
      });
      return [...new Set(drawn)].filter((colour) => colour !== 'none' && !system.includes(colour));
    });
    expect(colours).toEqual([]);
  }));

test.each([280, 350, 600, 900])('at %d pixels no text of a plot is cut off or lies on another', (width) =>
  withGallery(width, 'light', async (page) => {
    const faults = await page.evaluate(() => {
      const found: string[] = [];
      for (const svg of document.querySelectorAll('.figure-drawing svg')) {
        const where = `${svg.closest('section')?.id} ${svg.closest('.straight, .residual, .curve')?.className}`;
        const frame = svg.getBoundingClientRect();
        const texts = [...svg.querySelectorAll('text')].map((text) => ({
          text: text.textContent ?? '',
          box: text.getBoundingClientRect(),
        }));
        for (const [i, { text, box }] of texts.entries()) {
          if (
            box.left < frame.left - 0.5 ||
            box.right > frame.right + 0.5 ||
            box.top < frame.top - 0.5 ||
            box.bottom > frame.bottom + 0.5
          ) {
            found.push(`${where}: "${text}" is cut off`);
          }
          for (const other of texts.slice(i + 1)) {
            const apart =
              box.right <= other.box.left ||
              other.box.right <= box.left ||
              box.bottom <= other.box.top + 1 ||
              other.box.bottom <= box.top + 1;
            if (!apart) found.push(`${where}: "${text}" lies on "${other.text}"`);
          }
        }
      }
      return found;
    });
    expect(faults).toEqual([]);
  }),
);

test('every plot says its finding in a sentence, and no two ticks of an axis read the same', () =>
  withGallery(350, 'light', async (page) => {
    const name = (kind: 'straight' | 'residual' | 'curve') =>
      plot(page, 'exponential', kind).getAttribute('aria-label');
    const { line } = galleryFits().find(({ id }) => id === 'exponential')?.fit ?? {};
    const six = (value = Number.NaN): string => String(Number(value.toPrecision(6))).replace('-', '−');
    expect(await name('straight')).toMatch(/^ln C against t: 13 readings and the line .*, bow \d.* %\. /);
    expect(await name('straight')).toContain(
      `slope ${six(line?.slope)} and intercept ${six(line?.intercept)}`,
    );
    expect(await name('residual')).toMatch(
      /^What the line leaves of ln C at 13 readings, residual standard deviation 0\.0\d+; reading \d+ lies farthest/,
    );
    expect(await name('curve')).toMatch(
      /^13 readings and the curve C\(t\) = C0\*exp\(-k\*t\) with its 95 % band for the curve\./,
    );
    for (const image of await page.getByRole('img').all()) {
      expect((await image.getAttribute('aria-label'))?.length).toBeGreaterThan(10);
    }
    const alike = await page.evaluate(() =>
      [...document.querySelectorAll('[aria-label$="axis tick label"]')]
        .map((axis) => [...axis.querySelectorAll('text')].map((text) => text.textContent))
        .filter((texts) => new Set(texts).size !== texts.length),
    );
    expect(alike).toEqual([]);
  }));

describe('picking a reading', () => {
  test('with the keys, in order along the axis; Escape lets go', () =>
    withGallery(350, 'light', async (page) => {
      // 1/c falls as c grows: the last reading of the sheet comes first.
      await plot(page, 'isotherm', 'straight').focus();
      const seen: (string | null)[] = [];
      for (const key of [
        'Home',
        'ArrowRight',
        'ArrowUp',
        'ArrowLeft',
        'End',
        'ArrowRight',
        'Escape',
        'ArrowLeft',
      ]) {
        await page.keyboard.press(key);
        seen.push(await selected(page, 'isotherm'));
      }
      expect(seen).toEqual(['8', '7', '6', '7', '1', '1', '', '1']);
      expect(await page.locator('#isotherm .straight .figure-picked').textContent()).toMatch(
        /^Reading 1: 2, 0\.\d+$/,
      );
      expect(await page.locator('#isotherm .picked-reading').count()).toBe(3);
    }));

  test('with the pointer: the nearest within reach, else none', () =>
    withGallery(350, 'light', async (page) => {
      const place = plot(page, 'linear', 'curve');
      await place.scrollIntoViewIfNeeded();
      const dot = await place.locator('circle').nth(4).boundingBox();
      if (dot === null) throw new Error('there is no fifth reading');
      await page.mouse.click(dot.x + dot.width / 2 + 4, dot.y + dot.height / 2 - 5);
      expect(await selected(page, 'linear')).toBe('5');
      const box = await place.boundingBox();
      if (box === null) throw new Error('there is no plot');
      await page.mouse.click(box.x + box.width - 20, box.y + box.height - 70);
      expect(await selected(page, 'linear')).toBe('');
    }));

  test('rings it without drawing anew, the residual right below its reading', () =>
    withGallery(350, 'light', async (page) => {
      for (const id of ['exponential', 'offset', 'aside']) {
        await page.evaluate((name) => {
          for (const svg of document.querySelectorAll(`#${name} svg`)) svg.setAttribute('data-first', '');
        }, id);
        await plot(page, id, 'straight').focus();
        await page.keyboard.press('Home');
        await page.keyboard.press('ArrowRight');
        expect(await page.locator(`#${id} svg[data-first]`).count()).toBe(3);
        const across = async (kind: 'straight' | 'residual') =>
          Number(await plot(page, id, kind).locator('.picked-reading').getAttribute('cx'));
        const above = await across('straight');
        expect(above).toBeGreaterThan(0);
        expect(Math.abs((await across('residual')) - above)).toBeLessThan(0.01);
      }
    }));

  test('reaches the readings that are set aside on the axes of the sheet', () =>
    withGallery(350, 'light', async (page) => {
      await plot(page, 'aside', 'curve').focus();
      await page.keyboard.press('Home');
      expect(await selected(page, 'aside')).toBe('1');
      expect(await page.locator('#aside .curve .picked-reading').count()).toBe(1);
      expect(await page.locator('#aside .straight .picked-reading').count()).toBe(0);
    }));
});

test('over decades the vertical axis is logarithmic, until it is not wanted', () =>
  withGallery(350, 'light', async (page) => {
    const ticks = () =>
      plot(page, 'decades', 'curve').locator('[aria-label="y-axis tick label"] text').allTextContents();
    expect(await ticks()).toEqual(expect.arrayContaining(['10²', '10⁶']));
    await page.getByLabel('logarithmic vertical axis').click();
    expect(await ticks()).toContain('0');
    expect(await page.getByLabel('logarithmic vertical axis').count()).toBe(1);
  }));

test('a plot follows the width of its place', () =>
  withGallery(350, 'light', async (page) => {
    const width = async () =>
      Number(await plot(page, 'linear', 'straight').locator('svg').getAttribute('width'));
    const before = await width();
    await page.setViewportSize({ width: 500, height: 900 });
    await page.waitForFunction(
      (narrow) =>
        Number(document.querySelector('#linear .straight svg')?.getAttribute('width')) === narrow + 150,
      before,
    );
    expect(before).toBeLessThanOrEqual(350);
  }));

test('100,000 readings are drawn as at most four for each column of pixels', () =>
  withGallery(350, 'light', async (page) => {
    const place = plot(page, 'many', 'straight');
    const columns = Number(await place.locator('svg').getAttribute('width'));
    const drawn = await place.locator('circle').count();
    expect(drawn).toBeLessThanOrEqual(4 * columns);
    expect(drawn).toBeGreaterThan(columns);
  }));

describe('the picture for a document', () => {
  test.each([
    ['exponential', 'straight'],
    ['exponential', 'curve'],
    ['decades', 'curve'],
    ['aside', 'curve'],
    ['many', 'straight'],
  ] as const)('%s, %s: stands alone', (id, kind) =>
    withGallery(350, 'dark', async (page) => {
      const { text, root, size } = await page.evaluate(
        ([name, of]) => {
          // Put there by the gallery.
          const asked = Reflect.get(window, 'gallery') as { picture(id: string, kind: string): string };
          const svg = asked.picture(name, of);
          const parsed = new DOMParser().parseFromString(svg, 'image/svg+xml').documentElement;
          return { text: svg, root: parsed.nodeName, size: parsed.getAttribute('width') };
        },
        [id, kind] as const,
      );
      expect([root, size]).toEqual(['svg', '440']);
      expect(text).not.toMatch(/var\(|prefers-color-scheme|url\(http/);
      expect(text).toContain('#c26d1f');
    }),
  );

  test('titles from cells cannot break it', () =>
    withGallery(350, 'light', async (page) => {
      const titles = await page.evaluate(() => {
        // Put there by the gallery.
        const asked = Reflect.get(window, 'gallery') as { hostilePicture(): string };
        const parsed = new DOMParser().parseFromString(asked.hostilePicture(), 'image/svg+xml');
        return [...parsed.querySelectorAll('text')].map((text) => text.textContent);
      });
      expect(titles).toEqual(expect.arrayContaining(['a < b & "c"\u00a0/ s', '</svg>']));
    }));
});
