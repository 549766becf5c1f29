import { join } from 'node:path';
import { openBrowser } from '../browser/openBrowser.ts';
import { PanelPage } from '../browser/panelPage.ts';
import { startStandIn } from '../sheet/serve.ts';

const folder = join('test', 'docs', 'pictures');

/** Takes the README's pictures from the stand-in sheet with the demo workbook. */
export async function takePictures(): Promise<void> {
  const server = await startStandIn({ port: 0 });
  const browser = await openBrowser();
  try {
    const page = await PanelPage.open(browser, server.address, {
      sheet: 'Chlorine',
      theme: 'light',
      panel: 400,
      width: 1500,
      height: 940,
    });
    await page.take('A6:B19');
    await page.choose('exponential');
    await page.sheet.settle();
    await page.sheet.page.screenshot({ path: join(folder, 'start.png') });
    // Tall enough for a part of the panel to be seen whole.
    await page.sheet.page.setViewportSize({ width: 1500, height: 3200 });
    await page.settled();
    const part = async (heading: RegExp, name: string, most: number): Promise<void> => {
      const section = page.panel.locator('section', {
        has: page.panel.getByRole('heading', { name: heading }),
      });
      const box = await section.first().boundingBox();
      if (box === null) throw new Error(`the panel has no part ${name}`);
      const clip = { ...box, height: Math.min(box.height, most) };
      await page.sheet.page.screenshot({ path: join(folder, `${name}.png`), clip });
    };
    await part(/Laws side by side/, 'laws', 760);
    await part(/One law in depth/, 'depth', 1180);
    await page.sheet.close();
  } finally {
    await browser.close();
    await server.close();
  }
}
