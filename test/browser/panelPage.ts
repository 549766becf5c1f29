import type { Browser, Frame, Locator } from 'playwright-core';
import { SheetPage, type SheetPageOptions } from './sheetPage.ts';

/** The side panel beside the sheet, used as a person would use it. */
export class PanelPage {
  readonly sheet: SheetPage;
  panel: Frame;

  private constructor(sheet: SheetPage, panel: Frame) {
    this.sheet = sheet;
    this.panel = panel;
  }

  static async open(browser: Browser, address: string, options: SheetPageOptions = {}): Promise<PanelPage> {
    const sheet = await SheetPage.open(browser, address, options);
    const panel = await sheet.panel();
    const opened = new PanelPage(sheet, panel);
    await panel.waitForSelector('main');
    return opened;
  }

  /** Loads the page anew, as when the workbook is opened again. */
  async reopen(): Promise<void> {
    await this.sheet.page.reload();
    this.panel = await this.sheet.panel();
    await this.panel.waitForSelector('main');
    await this.sheet.settle();
  }

  /** Selects cells in the sheet and takes them as readings. */
  async take(address: string): Promise<void> {
    await this.sheet.select(address);
    await this.button('Use the selection').click();
    await this.panel.waitForSelector('.counts');
    await this.settled();
  }

  button(name: string | RegExp): Locator {
    return this.panel.getByRole('button', { name });
  }

  field(label: string | RegExp): Locator {
    // A text names the whole label: a constant's symbol may stand in others.
    return this.panel.getByLabel(label, { exact: typeof label === 'string' });
  }

  /** Chooses a law by its card. */
  async choose(law: string): Promise<void> {
    await this.panel.locator(`.card[data-law="${law}"] label`).click();
    await this.panel.waitForFunction(
      (name) => document.querySelector('.card.chosen')?.getAttribute('data-law') === name,
      law,
    );
    await this.settled();
  }

  /** Types into a field and leaves it. */
  async fill(label: string | RegExp, text: string): Promise<void> {
    const field = this.field(label);
    await field.fill(text);
    await field.press('Tab');
    await this.settled();
  }

  /** Waits until nothing in the panel changes any more. */
  async settled(): Promise<void> {
    await this.panel.evaluate(
      () =>
        new Promise<void>((resolve) => {
          const done = () => {
            observer.disconnect();
            resolve();
          };
          let timer = setTimeout(done, 400);
          const observer = new MutationObserver(() => {
            clearTimeout(timer);
            timer = setTimeout(done, 400);
          });
          observer.observe(document.body, {
            subtree: true,
            childList: true,
            characterData: true,
            attributes: true,
          });
        }),
    );
  }

  /** The text of an element as it is shown. */
  async text(selector: string): Promise<string> {
    return ((await this.panel.locator(selector).first().textContent()) ?? '').replace(/\s+/g, ' ').trim();
  }

  async texts(selector: string): Promise<string[]> {
    return (await this.panel.locator(selector).allTextContents()).map((text) =>
      text.replace(/\s+/g, ' ').trim(),
    );
  }

  /** The value of a constant as the panel shows it, with the place of its last digit. */
  async constant(name: string): Promise<{ readonly value: number; readonly unit: number }> {
    const shown = await this.text(`[data-constant="${name}"] .value`);
    const text = shown.replace('−', '-');
    const decimals = text.split('.')[1]?.length ?? 0;
    return { value: Number(text), unit: 10 ** -decimals };
  }

  /** A picture of the whole panel, however long it is. */
  async picture(name: string): Promise<void> {
    const { page } = this.sheet;
    const before = page.viewportSize();
    const height = await this.panel.evaluate(() => document.documentElement.scrollHeight);
    await page.setViewportSize({ width: before?.width ?? 1500, height: height + 80 });
    await page.waitForTimeout(200);
    await page.locator('#panel-frame').screenshot({ path: `test/browser/screenshots/${name}.png` });
    if (before) await page.setViewportSize(before);
  }
}
