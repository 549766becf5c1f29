import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { Resvg } from '@resvg/resvg-js';

/** Widths in pixels: 16, 32 and 80 for the ribbon, 32 and 64 for the list of add-ins. */
export const ICON_SIZES = [16, 32, 64, 80] as const;

/**
 * Our icon as PNG files, by name.
 *
 * @param folder the manifest-template folder, which holds `icon.svg` and, for 16 pixels, `icon-small.svg`
 */
export function renderIcons(folder: string): Map<string, Uint8Array> {
  const icons = new Map<string, Uint8Array>();
  for (const size of ICON_SIZES) {
    const drawing = readFileSync(join(folder, size === 16 ? 'icon-small.svg' : 'icon.svg'), 'utf8');
    const image = new Resvg(drawing, { fitTo: { mode: 'width', value: size } }).render();
    icons.set(`icon-${size}.png`, image.asPng());
  }
  return icons;
}
