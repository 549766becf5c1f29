import type { Browser, Frame, Page } from 'playwright-core';
import { parseAddress } from '../sheet/grid/address.ts';
// For the type of `window.standIn`.
import type {} from '../sheet/page/standIn.ts';

export interface SheetPageOptions {
  readonly blank?: 'null' | 'zero';
  readonly theme?: 'light' | 'dark' | 'contrast' | 'none';
  /** The sheet to open at. */
  readonly sheet?: string;
  /** Width of the panel in pixels. */
  readonly panel?: number;
  readonly width?: number;
  readonly height?: number;
  /** Opens one empty sheet instead of the demo workbook. */
  readonly empty?: boolean;
  /** Leaves the add-in's page out. */
  readonly noaddin?: boolean;
}

/** Milliseconds after which two clicks are no double click. */
const DOUBLE_CLICK = 600;

export type Shown = number | string | boolean | null;

/** The stand-in's page in a browser, driven as a person would drive it. */
export class SheetPage {
  readonly page: Page;
  /** What the page and the panel wrote to the console as errors. */
  readonly errors: string[] = [];
  private lastClicked = '';

  private constructor(page: Page) {
    this.page = page;
    page.on('pageerror', (error) => this.errors.push(String(error.stack ?? error)));
    page.on('console', (message) => {
      if (message.type() === 'error') this.errors.push(message.text());
    });
  }

  /** Opens the page and waits until its first calculation is done. */
  static async open(browser: Browser, address: string, options: SheetPageOptions = {}): Promise<SheetPage> {
    const { width = 1500, height = 860, ...given } = options;
    const page = await browser.newPage({ viewport: { width, height }, reducedMotion: 'reduce' });
    page.setDefaultTimeout(15_000);
    const opened = new SheetPage(page);
    const url = new URL(address);
    for (const [name, value] of Object.entries(given))
      if (value !== false) url.searchParams.set(name, String(value));
    await page.goto(url.href);
    await page.waitForFunction(() => window.standIn !== undefined);
    if (!options.noaddin) await opened.panel();
    await opened.settle();
    return opened;
  }

  /** The add-in's page in its frame, with its scripts loaded. */
  async panel(): Promise<Frame> {
    const element = await this.page.waitForSelector('#panel-frame[src]');
    const frame = await element.contentFrame();
    if (!frame) throw new Error('the panel has no frame');
    await frame.waitForURL(/taskpane\.html/);
    await frame.waitForLoadState('load');
    return frame;
  }

  /** Waits until nothing is left to calculate. */
  async settle(): Promise<void> {
    await this.page.evaluate(() => window.standIn?.grid.settle(15_000));
  }

  async get(address: string): Promise<Shown> {
    const { sheet, row, column } = place(address);
    return this.page.evaluate(
      ([name, r, c]) => {
        const grid = window.standIn?.grid;
        if (!grid) throw new Error('the stand-in is gone');
        const id = grid.sheets().find((one) => one.name === name)?.id ?? grid.activeSheet();
        const { value } = grid.read(id, r, c);
        return typeof value === 'object' && value !== null ? value.error : value;
      },
      [sheet, row, column] as const,
    );
  }

  /** The sentence that came with an error, or null. */
  async message(address: string): Promise<string | null> {
    const { sheet, row, column } = place(address);
    return this.page.evaluate(
      ([name, r, c]) => {
        const grid = window.standIn?.grid;
        if (!grid) throw new Error('the stand-in is gone');
        const id = grid.sheets().find((one) => one.name === name)?.id ?? grid.activeSheet();
        const { value } = grid.read(id, r, c);
        return typeof value === 'object' && value !== null ? (value.message ?? null) : null;
      },
      [sheet, row, column] as const,
    );
  }

  /** Waits until a cell's value is one that the test accepts. */
  async waitFor(address: string, accept: (value: Shown) => boolean, milliseconds = 5_000): Promise<Shown> {
    const end = Date.now() + milliseconds;
    for (;;) {
      const value = await this.get(address);
      if (accept(value)) return value;
      if (Date.now() > end) throw new Error(`${address} still shows ${String(value)}`);
      await this.page.waitForTimeout(10);
    }
  }

  /** Clicks a cell of the sheet in sight. */
  async click(address: string, modifiers: ('Shift' | 'Control')[] = []): Promise<void> {
    const { x, y } = await this.point(address);
    // Two clicks on a cell in quick succession would open it for editing.
    if (this.lastClicked === address) await this.page.waitForTimeout(DOUBLE_CLICK);
    this.lastClicked = address;
    for (const key of modifiers) await this.page.keyboard.down(key);
    await this.page.mouse.click(x, y);
    for (const key of modifiers) await this.page.keyboard.up(key);
  }

  /** Drags the mouse from the first to the last cell of a range. */
  async select(address: string, modifiers: 'Control'[] = []): Promise<void> {
    const [from = address, to = from] = address.split(':');
    const [start, end] = [await this.point(from), await this.point(to)];
    for (const key of modifiers) await this.page.keyboard.down(key);
    await this.page.mouse.move(start.x, start.y);
    await this.page.mouse.down();
    await this.page.mouse.move(end.x, end.y, { steps: 4 });
    await this.page.mouse.up();
    for (const key of modifiers) await this.page.keyboard.up(key);
  }

  /** Clicks a cell and types into it, ending with Enter. */
  async type(address: string, text: string): Promise<void> {
    await this.click(address);
    await this.page.keyboard.type(text);
    await this.page.keyboard.press('Enter');
  }

  /** The middle of a cell on the page. */
  private async point(address: string): Promise<{ x: number; y: number }> {
    const { x, y, width, height } = await this.box(address);
    return { x: x + width / 2, y: y + height / 2 };
  }

  /** Where a cell of the sheet in sight is on the page. */
  async box(address: string): Promise<{ x: number; y: number; width: number; height: number }> {
    const { row, column } = place(address);
    return this.page.evaluate(
      ([r, c]) => {
        const book = window.standIn?.grid.book;
        const canvas = document.querySelector('canvas[id^="univer-sheet-main-canvas"]');
        const cell = book?.getActiveSheet().getRange(r, c).getCellRect();
        if (!canvas || !cell) throw new Error('the sheet is not drawn');
        const box = canvas.getBoundingClientRect();
        return { x: box.left + cell.x, y: box.top + cell.y, width: cell.width, height: cell.height };
      },
      [row, column] as const,
    );
  }

  async close(): Promise<void> {
    await this.page.close();
  }
}

function place(address: string): { sheet: string | null; row: number; column: number } {
  const parsed = parseAddress(address);
  const rect = parsed?.rects[0];
  if (!parsed || !rect) throw new RangeError(`not an address: ${address}`);
  return { sheet: parsed.sheet, row: rect.top, column: rect.left };
}
