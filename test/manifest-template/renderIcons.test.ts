import { expect, test } from '@jest/globals';
import { ICON_SIZES, renderIcons } from '../../manifest-template/renderIcons.ts';

const icons = renderIcons('manifest-template');

test.each(ICON_SIZES)('the icon of %d pixels is a PNG of that width and height', (size) => {
  const png = Buffer.from(icons.get(`icon-${size}.png`) ?? []);
  // PNG (ISO/IEC 15948), 5.2 signature and 11.2.2 IHDR.
  expect(png.subarray(0, 8).toString('hex')).toBe('89504e470d0a1a0a');
  expect([png.readUInt32BE(16), png.readUInt32BE(20)]).toEqual([size, size]);
});

test('the smallest is drawn from its own drawing', () => {
  expect(icons.size).toBe(4);
  const lengths = [...icons.values()].map(({ length }) => length);
  expect(new Set(lengths).size).toBe(4);
});
