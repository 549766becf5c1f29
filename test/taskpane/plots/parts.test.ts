import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { padded } from '../../../taskpane/plots/points.ts';
import { printColours } from '../../../taskpane/plots/printColours.ts';
import { type Point, thin } from '../../../taskpane/plots/thin.ts';
import { evenTicks, powerTicks } from '../../../taskpane/plots/ticks.ts';
import { powerTexts, tickText, tickTexts } from '../../../taskpane/plots/tickText.ts';

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

describe('the ticks of an axis', () => {
  test.each([
    [[0, 2.1], 4, ['0', '0.5', '1.0', '1.5', '2.0']],
    [[-0.16, 0.16], 4, ['−0.1', '0', '0.1']],
    [[-0.05, 3.3], 4, ['0', '1', '2', '3']],
    [[249_999.98, 250_000.22], 5, ['250000.00', '250000.05', '250000.10', '250000.15', '250000.20']],
    [[999_999.5, 1_000_010.5], 3, ['1000000', '1000005', '1000010']],
    [[0, 4.2e6], 4, ['0', '10⁶', '2·10⁶', '3·10⁶', '4·10⁶']],
    [[0, 1.7e6], 3, ['0', '5·10⁵', '10⁶', '1.5·10⁶']],
    [[0, 1.6e-7], 3, ['0', '5·10⁻⁸', '10⁻⁷', '1.5·10⁻⁷']],
    [[0.9e-7, 1.6e-7], 4, ['10⁻⁷', '1.2·10⁻⁷', '1.4·10⁻⁷', '1.6·10⁻⁷']],
    [[-1.2e5, 1.2e5], 3, ['−10⁵', '0', '10⁵']],
    [[7, 7], 4, ['7']],
  ] as const)('%p in about %p steps', (range, count, texts) => {
    expect(tickTexts(evenTicks(range, count))).toEqual(texts);
  });

  test('are never alike, lie within the axis and are not many more than asked for', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e9, max: 1e9, noNaN: true }),
        fc.integer({ min: -9, max: 9 }),
        fc.double({ min: 1, max: 10, noNaN: true }),
        fc.integer({ min: 3, max: 12 }),
        (middle, power, lead, count) => {
          const span = lead * 10 ** power;
          // Steps that two neighbouring numbers can still be told apart by.
          fc.pre(span > Math.abs(middle) * 1e-10);
          const range = [middle - span / 2, middle + span / 2] as const;
          const ticks = evenTicks(range, count);
          const texts = tickTexts(ticks);
          expect(new Set(texts).size).toBe(ticks.length);
          expect(ticks.length).toBeLessThanOrEqual(1.6 * count + 1);
          expect(ticks.length).toBeGreaterThanOrEqual(Math.floor(count / 1.6));
          for (const tick of ticks) {
            expect(tick).toBeGreaterThanOrEqual(range[0] - span * 1e-6);
            expect(tick).toBeLessThanOrEqual(range[1] + span * 1e-6);
          }
        },
      ),
      { seed: 11 },
    );
  });

  test('say the number that the tick is at', () => {
    const digits = '⁰¹²³⁴⁵⁶⁷⁸⁹';
    const read = (text: string): number => {
      const plain = text.replaceAll('−', '-');
      const [, lead, power] = /^(.*?)·?(10[⁻⁰¹²³⁴⁵⁶⁷⁸⁹]+)?$/.exec(plain) ?? [];
      if (power === undefined) return Number(plain);
      const exponent = [...power.slice(2)].map((c) => (c === '⁻' ? '-' : digits.indexOf(c))).join('');
      const mantissa = lead === '' ? 1 : lead === '-' ? -1 : Number(lead);
      return mantissa * 10 ** Number(exponent);
    };
    fc.assert(
      fc.property(
        fc.double({ min: -20, max: 20, noNaN: true }),
        fc.integer({ min: -12, max: 12 }),
        fc.integer({ min: 3, max: 9 }),
        (middle, power, count) => {
          const unit = 10 ** power;
          const ticks = evenTicks([(middle - 1) * unit, (middle + 1) * unit], count);
          const texts = tickTexts(ticks);
          ticks.forEach((tick, i) => {
            expect(Math.abs(read(texts[i] ?? '') - tick)).toBeLessThanOrEqual(unit * 1e-9);
          });
        },
      ),
      { seed: 12 },
    );
  });

  test('over decades are powers of ten, thinned evenly', () => {
    expect(powerTexts(powerTicks([0.7, 1.5e4], 8))).toEqual(['1', '10', '100', '1000', '10000']);
    expect(powerTexts(powerTicks([1e-9, 2e6], 4))).toEqual(['10⁻⁸', '10⁻⁴', '1', '10⁴']);
  });
});

describe('thinning', () => {
  const many = fc.array(
    fc.record({
      x: fc.integer({ min: 0, max: 5000 }),
      y: fc.integer({ min: -1000, max: 1000 }),
    }),
    { minLength: 200, maxLength: 900 },
  );
  const numbered = (points: readonly { x: number; y: number }[]): Point[] =>
    points.map((point, i) => ({ ...point, position: i + 1 }));

  test('keeps the extremes of every column, at most four a column, and the one asked for', () => {
    fc.assert(
      fc.property(many, fc.integer({ min: 1, max: 200 }), (rows, keep) => {
        const points = numbered(rows);
        const columns = 40;
        const drawn = thin(points, columns, keep);
        expect(drawn.length).toBeLessThanOrEqual(4 * columns + 1);
        expect(new Set(drawn).size).toBe(drawn.length);
        expect(drawn.some((point) => point.position === keep)).toBe(true);
        const extremes = (of: readonly Point[]) => [
          Math.min(...of.map(({ x }) => x)),
          Math.max(...of.map(({ x }) => x)),
          Math.min(...of.map(({ y }) => y)),
          Math.max(...of.map(({ y }) => y)),
        ];
        expect(extremes(drawn)).toEqual(extremes(points));
        if (drawn === points) return;
        const [least = 0, most = 0] = extremes(points);
        const columnOf = ({ x }: Point) =>
          Math.min(columns - 1, Math.floor((x - least) / ((most - least) / columns || 1)));
        for (let column = 0; column < columns; column++) {
          const all = points.filter((point) => columnOf(point) === column);
          const left = drawn.filter((point) => columnOf(point) === column && point.position !== keep);
          expect(left.length).toBeLessThanOrEqual(4);
          const kept = drawn.filter((point) => columnOf(point) === column);
          expect(extremes(kept)).toEqual(extremes(all));
        }
      }),
      { seed: 5, numRuns: 40 },
    );
  });

  test('of 100,000 points leaves four a column, the outlier among them', () => {
    const points = numbered(
      Array.from({ length: 100_000 }, (_, i) => ({ x: i, y: i === 77_777 ? 99 : Math.sin(i) })),
    );
    const drawn = thin(points, 300);
    expect(drawn.length).toBeLessThanOrEqual(1200);
    expect(drawn.some((point) => point.position === 77_778)).toBe(true);
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
