import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';

const css = readFileSync('manifest-template/palette.css', 'utf8').replace(/\/\*[\s\S]*?\*\//g, '');
const blocks = [...css.matchAll(/([^{}]+)\{([^{}]*)\}/g)].map(([, selector = '', body = '']) => ({
  selector: selector.trim(),
  colours: new Map(
    [...body.matchAll(/--([\w-]+):\s*([^;]+);/g)].map(([, name = '', value = '']) => [name, value]),
  ),
}));
const [light, dark, ...others] = blocks.filter(({ colours }) => colours.size > 0);

/** Relative luminance of an sRGB colour. @see WCAG 2.2, "relative luminance" */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((start) => {
    const channel = Number.parseInt(hex.slice(start, start + 2), 16) / 255;
    return channel <= 0.04045 ? channel / 12.92 : ((channel + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** @see WCAG 2.2, "contrast ratio" */
function contrast(one = '', other = ''): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].sort((a, b) => a - b);
  return (high + 0.05) / (low + 0.05);
}

const PAPERS = ['paper', 'paper-raised', 'paper-sunken'];
const WORDS = ['ink', 'ink-soft', 'signal-ink', 'action', 'stop-ink', 'note-ink'];
const MARKS = ['edge', 'reading', 'reading-aside', 'signal', 'focus'];
const PAIRS = [
  ['on-action', 'action'],
  ['on-action', 'action-hover'],
  ['stop-ink', 'stop-wash'],
  ['note-ink', 'note-wash'],
  ['signal-ink', 'signal-wash'],
  ['ink', 'signal-wash'],
  ...PAPERS.flatMap((paper) => WORDS.map((word) => [word, paper])),
];

describe('the palette', () => {
  test('the measure itself: black on white has 21:1', () => {
    expect(contrast('#000000', '#ffffff')).toBeCloseTo(21, 10);
  });

  // WCAG 2.2 success criteria 1.4.3 (text, 4.5:1) and 1.4.11 (marks and controls, 3:1).
  describe.each([
    ['light', light],
    ['dark', dark],
  ])('%s', (_theme, block) => {
    test.each(PAIRS)('%s on %s can be read', (ink, paper) => {
      expect(contrast(block?.colours.get(ink ?? ''), block?.colours.get(paper ?? ''))).toBeGreaterThanOrEqual(
        4.5,
      );
    });

    test.each(PAPERS.flatMap((paper) => MARKS.map((mark) => [mark, paper])))(
      '%s on %s can be seen',
      (mark, paper) => {
        expect(
          contrast(block?.colours.get(mark ?? ''), block?.colours.get(paper ?? '')),
        ).toBeGreaterThanOrEqual(3);
      },
    );
  });

  test('the theme that the host asks for is the same dark', () => {
    const asked = others.find(({ selector }) => selector.includes('data-theme="dark"'));
    expect(asked?.colours).toEqual(dark?.colours);
  });

  test('forced colours replace every colour by one of the system', () => {
    const forced = blocks[blocks.length - 1]?.colours;
    expect([...(forced?.keys() ?? [])]).toEqual([...(light?.colours.keys() ?? [])]);
    for (const value of forced?.values() ?? []) expect(value).toMatch(/^[A-Z][A-Za-z]+$/);
  });
});
