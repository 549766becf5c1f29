import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../core/fit/fitLaw.ts';
import { Problem } from '../../core/problem.ts';
import { seeded } from '../bench/readingsToTime.ts';
import { readingsFrom, settingsFrom } from '../core/fit/settings.ts';
import { expectDigits } from '../expectDigits.ts';
import { problemOf } from '../problemOf.ts';
import { decimalText, exactLine, rootText } from './exactLine.ts';

// The reference is arithmetic in whole numbers of any length, of the very numbers that the line is given: see exactLine.ts.

function readings(count: number, of: (i: number, e: number) => readonly [number, number]) {
  const random = seeded(3);
  const pairs = Array.from({ length: count }, (_, i) => of(i + 1, random()));
  return { x: pairs.map(([x]) => x), y: pairs.map(([, y]) => y) };
}

describe('a straight line far from zero, on short spans and in odd units, against exact arithmetic', () => {
  test.each<[string, (i: number, e: number) => readonly [number, number]]>([
    ['plain', (i, e) => [i, 3 + 2 * i + e]],
    ['x from 1e10', (i, e) => [1e10 + i, 3 + 2 * i + e]],
    ['y from 1e10', (i, e) => [i, 1e10 + 2 * i + e]],
    ['both from 1e10', (i, e) => [1e10 + i, 1e10 + 2 * i + e]],
    ['y from 1e10, scatter near its last digit', (i, e) => [i, 1e10 + i * 1e-4 + e * 1e-5]],
    ['x over 1e-11 of its size', (i, e) => [1 + i * 1e-12, 3 + 2 * i + e]],
    ['x from 1e10 in steps of 1e-5', (i, e) => [1e10 + i * 1e-5, 1e10 + i * 1e-4 + e * 1e-5]],
    ['y in units of 1e-150', (i, e) => [i, 1e-150 * (3 + 2 * i + e)]],
    ['y in units of 1e150', (i, e) => [i, 1e150 * (3 + 2 * i + e)]],
    ['x and y in units of 1e140', (i, e) => [1e140 * i, 1e140 * (3 + 2 * i + e)]],
    ['x in units of 1e-140', (i, e) => [1e-140 * i, 3 + 2 * i + e]],
  ])('%s', (_, of) => {
    const { x, y } = readings(20, of);
    const exact = exactLine(x, y);
    const { line } = fitLaw(readingsFrom(x, y), 'straight line', settingsFrom());
    expectDigits(line.slope, decimalText(exact.slope), 13);
    expectDigits(line.intercept, decimalText(exact.intercept), 13);
    expectDigits(Math.sqrt(line.varianceSlope), rootText(exact.varianceSlope), 12);
    expectDigits(Math.sqrt(line.varianceIntercept), rootText(exact.varianceIntercept), 12);
  });

  test('scatter of a forty-billionth of y', () => {
    const { x, y } = readings(20, (i, e) => [i, 3 + 2 * i + 1e-9 * e]);
    const exact = exactLine(x, y);
    const { line } = fitLaw(readingsFrom(x, y), 'straight line', settingsFrom());
    expectDigits(line.slope, decimalText(exact.slope), 14);
    // The residuals are what 2·10 less 20 leaves: of 16 digits, 10.6 cancel.
    expectDigits(Math.sqrt(line.varianceSlope), rootText(exact.varianceSlope), 5);
  });

  test('100,000 repeats at one x and two readings elsewhere', () => {
    const random = seeded(11);
    const x = [...Array.from({ length: 100_000 }, () => 5), 1, 9];
    const y = x.map((value) => 3 + 2 * value + random());
    const exact = exactLine(x, y);
    const { line } = fitLaw(readingsFrom(x, y), 'straight line', settingsFrom());
    expectDigits(line.slope, decimalText(exact.slope), 12);
    expectDigits(line.intercept, decimalText(exact.intercept), 12);
    expectDigits(Math.sqrt(line.varianceSlope), rootText(exact.varianceSlope), 12);
  });
});

describe('what cannot be settled is refused', () => {
  test('100,000 repeats of one x', () => {
    const random = seeded(12);
    const x = Array.from({ length: 100_000 }, () => 1e10 + 0.1);
    const y = x.map(() => random());
    const problem = problemOf(() => fitLaw(readingsFrom(x, y), 'straight line', settingsFrom()));
    expect([problem.code, problem.argument]).toEqual(['undefined', 'x']);
  });

  test.each([1e-300, 1e300, 1e-170, 1e170])(
    'a straight line in units of %p, whose variances are no numbers',
    (unit) => {
      const { x, y } = readings(20, (i, e) => [i, unit * (3 + 2 * i + e)]);
      const problem = problemOf(() => fitLaw(readingsFrom(x, y), 'straight line', settingsFrom()));
      expect([problem.code, problem.argument]).toEqual(['undefined', 'y']);
    },
  );

  test.each([1e-300, 1e-200, 1e200, 1e300])(
    'a direct fit in units of %p, whose squares are no numbers',
    (unit) => {
      const { x, y } = readings(8, (i, e) => [i, unit * 3 * Math.exp(-0.3 * i) * (1 + 0.05 * e)]);
      for (const [law, options] of [
        ['exponential', 'fit=direct'],
        ['offset decay', ''],
      ] as const) {
        const problem = problemOf(() => fitLaw(readingsFrom(x, y), law, settingsFrom({ options })));
        expect([problem.code, problem.argument]).toEqual(['undefined', 'y']);
      }
    },
  );
});

test.each([1e-300, 1e-200, 1e-12, 1e200, 1e300])(
  'an exponential in units of %p of y keeps its digits',
  (unit) => {
    const { x, y } = readings(12, (i, e) => [i, 3 * Math.exp(-0.3 * i) * (1 + 0.05 * e)]);
    const constantsOf = (values: number[]) =>
      fitLaw(readingsFrom(x, values), 'exponential', settingsFrom()).constants;
    const [plainP, plainQ] = constantsOf(y);
    const [p, q] = constantsOf(y.map((value) => unit * value));
    // ln y is a hundred times larger in these units, and loses as much.
    for (const key of ['value', 'standardUncertainty', 'low', 'high'] as const) {
      expectDigits((p?.[key] ?? Number.NaN) / unit, plainP?.[key] ?? Number.NaN, 11);
      expectDigits(q?.[key] ?? Number.NaN, plainQ?.[key] ?? Number.NaN, 11);
    }
  },
);

test('a factor of exactly 1 is found, though its logarithm is nothing but rounding', () => {
  const x = [0, 60, 120, 180, 240, 300];
  const y = x.map((t) => Math.exp(-t / 221));
  const [p, q] = fitLaw(readingsFrom(x, y), 'exponential', settingsFrom()).constants;
  expectDigits(p?.value ?? Number.NaN, 1, 14);
  expectDigits(q?.value ?? Number.NaN, -1 / 221, 14);
});

describe('constants that the readings hardly tell apart: the truth lies within the uncertainty, or nothing is said', () => {
  // Saturation far below its half-way point is nearly a straight line through the origin, and so on.
  test.each<[string, string, (x: number) => number, Readonly<Record<string, number>>]>([
    ['saturation', 'saturation', (x) => (5 * x) / (400 + x), { p: 5, q: 400 }],
    ['offset decay', 'offset decay', (x) => 1 + 4 * Math.exp(-0.002 * x), { c: 1, a: 4, k: 0.002 }],
    ['saturating rise', 'saturating rise', (x) => 6 * (1 - Math.exp(-0.004 * x)), { m: 6, k: 0.004 }],
    ['logistic', 'logistic', (x) => 9 / (1 + Math.exp(3 - 0.02 * x)), { L: 9, a: 3, b: 0.02 }],
    ['hill', 'hill', (x) => (7 * x ** 1.1) / (300 ** 1.1 + x ** 1.1), { m: 7, n: 1.1, K: 300 }],
  ])('%s', (_, law, curve, truth) => {
    let settled = 0;
    for (let seed = 1; seed <= 6; seed++) {
      const random = seeded(seed);
      const x = Array.from({ length: 15 }, (_unused, i) => 1 + i);
      const y = x.map((value) => curve(value) * (1 + 2e-4 * (random() + random() + random() - 1.5)));
      try {
        const { constants } = fitLaw(readingsFrom(x, y), law, settingsFrom());
        for (const { name, value, standardUncertainty, derived } of constants) {
          if (derived) continue;
          const known = truth[name] ?? Number.NaN;
          // First-order uncertainty of a curved problem: ten times is generous, but 0 or a millionth would not pass.
          expect(Math.abs(value - known)).toBeLessThan(10 * standardUncertainty);
        }
        settled++;
      } catch (error) {
        if (!(error instanceof Problem)) throw error;
        expect(['noConvergence', 'undefined']).toContain(error.code);
      }
    }
    process.stdout.write(`${law}: settled ${settled} of 6 times\n`);
  });
});
