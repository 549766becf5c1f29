import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { padded } from '../../../taskpane/plots/points.ts';
import { printColours } from '../../../taskpane/plots/printColours.ts';
import { type Point, thin } from '../../../taskpane/plots/thin.ts';
import { tickText } from '../../../taskpane/plots/tickText.ts';

describe('ticks', () => {
  test.each([
    [0, '0'],
    [0.1 + 0.2, '0.3'],
    [-2.5, '−2.5'],
    [12000, '12000'],
    [100000, '10⁵'],
    [-100000, '−10⁵'],
    [2.5e7, '2.5·10⁷'],
    [0.001, '0.001'],
    [0.0002, '2·10⁻⁴'],
  ])('%p reads %p', (value, text) => {
    expect(tickText(value)).toBe(text);
  });
});

describe('thinning', () => {
  const many = fc.array(
    fc.record({
      x: fc.integer({ min: 0, max: 5000 }),
      y: fc.integer({ min: -1000, max: 1000 }),
    }),
    { minLength: 500, maxLength: 3000 },
  );
  const numbered = (points: readonly { x: number; y: number }[]): Point[] =>
    points.map((point, i) => ({ ...point, position: i + 1 }));

  test('keeps the extremes of every column, at most four a column, and the one asked for', () => {
    fc.assert(
      fc.property(many, fc.integer({ min: 1, max: 500 }), (rows, keep) => {
        const points = numbered(rows);
        const columns = 100;
        const drawn = thin(points, columns, keep);
        expect(drawn.length).toBeLessThanOrEqual(4 * columns + 3);
        expect(drawn.some((point) => point.position === keep)).toBe(true);
        const extremes = (of: readonly Point[]) => [
          Math.min(...of.map(({ x }) => x)),
          Math.max(...of.map(({ x }) => x)),
          Math.min(...of.map(({ y }) => y)),
          Math.max(...of.map(({ y }) => y)),
        ];
        expect(extremes(drawn)).toEqual(extremes(points));
      }),
      { seed: 5 },
    );
  });

  test('leaves few points as they are', () => {
    const points = numbered([
      { x: 1, y: 2 },
      { x: 2, y: 3 },
    ]);
    expect(thin(points, 100)).toBe(points);
  });
});

test('a range of a single value still has a width', () => {
  const [from, to] = padded([5, 5]);
  expect(from).toBeLessThan(5);
  expect(to).toBeGreaterThan(5);
  expect(padded(null)).toEqual([0, 1]);
});

test('the colours of a printed picture are the palette’s light ones', () => {
  const palette = readFileSync('manifest-template/palette.css', 'utf8');
  for (const [name, colour] of Object.entries(printColours)) {
    expect(palette).toContain(`${name}: ${colour};`);
  }
});
