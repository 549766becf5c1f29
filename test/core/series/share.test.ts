import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { shareSlope } from '../../../core/series/share.ts';
import { expectDigits } from '../../expectDigits.ts';
import { problemOf } from '../../problemOf.ts';
import { readingsFrom, settingsFrom } from '../fit/settings.ts';
import { splitFrom } from './splitFrom.ts';

// Two tanks draining: the same rate, different starts, made up.
const keys = ['A', 'A', 'A', 'A', 'A', 'B', 'B', 'B', 'B', 'B'];
const x = [0, 1, 2, 3, 4, 0, 1, 2, 3, 4];
const y = [5.02, 3.66, 2.77, 2.01, 1.52, 3.01, 2.19, 1.68, 1.19, 0.92];

/** The same by least squares on dummy variables: normal equations of (slope, intercept A, intercept B), solved by hand. */
function byDummies() {
  const z = y.map(Math.log);
  const mean = (values: readonly number[]) => values.reduce((sum, one) => sum + one, 0) / values.length;
  const groups = [0, 1].map((g) => [...x.keys()].filter((i) => keys[i] === 'AB'[g]));
  let [products, squares] = [0, 0];
  const centres = groups.map((group) => {
    const [mx, mz] = [mean(group.map((i) => x[i] ?? 0)), mean(group.map((i) => z[i] ?? 0))];
    for (const i of group) {
      products += ((x[i] ?? 0) - mx) * ((z[i] ?? 0) - mz);
      squares += ((x[i] ?? 0) - mx) ** 2;
    }
    return { mx, mz };
  });
  const slope = products / squares;
  let rest = 0;
  groups.forEach((group, g) => {
    const { mx = 0, mz = 0 } = centres[g] ?? {};
    for (const i of group) rest += ((z[i] ?? 0) - mz - slope * ((x[i] ?? 0) - mx)) ** 2;
  });
  const s2 = rest / (x.length - 3);
  return {
    slope,
    u: Math.sqrt(s2 / squares),
    intercepts: centres.map(({ mx, mz }) => mz - slope * mx),
    rest,
  };
}

describe('SHARE', () => {
  const rows = shareSlope(splitFrom(keys, x, y), 'exponential', settingsFrom());

  test('has its rows in order', () => {
    expect(rows.map(({ term }) => term)).toEqual([
      'shared slope',
      'F',
      'p',
      'slope: A',
      'intercept: A',
      'slope: B',
      'intercept: B',
    ]);
  });

  test('the shared slope and intercepts are those of least squares on dummy variables', () => {
    const expected = byDummies();
    expectDigits(rows[0]?.value ?? Number.NaN, expected.slope, 13);
    expectDigits(rows[0]?.standardUncertainty ?? Number.NaN, expected.u, 12);
    expectDigits(rows[4]?.value ?? Number.NaN, expected.intercepts[0] ?? 0, 13);
    expectDigits(rows[6]?.value ?? Number.NaN, expected.intercepts[1] ?? 0, 12);
  });

  test("F compares it with the series' own lines, which are those of LINE", () => {
    const own = ['A', 'B'].map((key) => {
      const pick = (values: readonly number[]) => values.filter((_, i) => keys[i] === key);
      return fitLaw(readingsFrom(pick(x), pick(y)), 'exponential', settingsFrom()).line;
    });
    own.forEach((line, g) => {
      expect(rows[3 + 2 * g]?.value).toBe(line.slope);
      expect(rows[3 + 2 * g]?.standardUncertainty).toBe(Math.sqrt(line.varianceSlope));
    });
    const within = own.reduce((sum, line) => sum + line.weightedSumOfSquares, 0);
    expectDigits(rows[1]?.value ?? Number.NaN, (byDummies().rest - within) / (within / 6), 8);
    expect(rows[2]?.value).toBeGreaterThan(0.05);
    expect(rows[2]?.note).toMatch(/nothing speaks against one slope/);
    expect(rows[4]?.note).toMatch(/with the shared slope: p = .*, q = /);
  });

  test('slopes that differ are told', () => {
    const other = y.map((value, i) => (keys[i] === 'B' ? value * Math.exp(0.1 * (x[i] ?? 0)) : value));
    const rows = shareSlope(splitFrom(keys, x, other), 'exponential', settingsFrom());
    expect(rows[2]?.value).toBeLessThan(0.01);
    expect(rows[2]?.note).toMatch(/^the slopes differ/);
  });

  test('one series has no test; one that cannot be drawn keeps its rows with the reason', () => {
    const one = shareSlope(
      splitFrom(['A', 'A', 'A', 'C', 'C'], [0, 1, 2, 0, 1], [5, 4, 3.1, 1, -1]),
      'exponential',
      settingsFrom(),
    );
    expect(one[1]?.value).toBeNaN();
    expect(one.map(({ term }) => term).slice(-2)).toEqual(['slope: C', 'intercept: C']);
    expect(one.at(-1)?.note).toMatch(/^Reading 5 /);
  });

  test.each([
    ['offset decay', {}, 'law'],
    ['exponential', { options: 'fit=direct' }, 'options'],
    ['exponential', { uY: 0.1, uX: 0.1 }, 'u_x'],
  ] as const)('%s %o is refused', (law, given, argument) => {
    expect(problemOf(() => shareSlope(splitFrom(keys, x, y), law, settingsFrom(given)))).toMatchObject({
      code: 'argument',
      argument,
    });
  });
});
