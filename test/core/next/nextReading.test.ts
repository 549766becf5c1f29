import { describe, expect, test } from '@jest/globals';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { nextReading } from '../../../core/next/nextReading.ts';
import { readingsForTarget } from '../../../core/next/readingsForTarget.ts';
import { Problem } from '../../../core/problem.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

const x = [0.5, 1, 2, 3, 4, 6, 8];
const y = [1.77, 1.71, 1.55, 1.4, 1.28, 1.05, 0.87];

function fitOf(law: string, given: GivenTexts = {}): Fit {
  return fitLaw(readingsFrom(x, y), law, settingsFrom(given, x.length));
}

function uOf(fit: Fit, constant: string): number {
  return fit.constants.find(({ name }) => name === constant)?.standardUncertainty ?? Number.NaN;
}

/**
 * By brute force: the fit repeated with one more reading, which lies exactly on the curve so that the constants stay,
 * and its standard uncertainty brought back to the scatter of the first fit.
 */
function uAfter(law: string, given: GivenTexts, constant: string, at: number): number {
  const fit = fitOf(law, given);
  const on = fit.law.curve?.at([at, Number.NaN, ...fit.values]) ?? Number.NaN;
  const more = fitLaw(readingsFrom([...x, at], [...y, on]), law, settingsFrom(given, x.length + 1));
  const sOf = (one: Fit) => (one.direct ?? one.line).residualStandardDeviation;
  const known = /^[\d.]+%?$/.test(String(given.uY ?? ''));
  return uOf(more, constant) * (known ? 1 : sOf(fit) / sOf(more));
}

const cases: readonly (readonly [string, GivenTexts, string])[] = [
  ['exponential', {}, 'q'],
  ['exponential', {}, 'p'],
  ['exponential', {}, 'half-life'],
  ['exponential', { uY: 'equal' }, 'q'],
  ['exponential', { uY: 'proportional' }, 'p'],
  ['exponential', { uY: 0.02 }, 'q'],
  ['exponential', { uY: '3%' }, 'q'],
  ['reciprocal', { uY: 'equal' }, 'b'],
  ['saturation', {}, 'q'],
  ['proportional', {}, 'b'],
  ['exponential', { options: 'fit=direct' }, 'q'],
  ['offset decay', {}, 'k'],
];

describe('against refits with one more reading', () => {
  test.each(cases)('%s %o: %s', (law, given, constant) => {
    const found = nextReading(fitOf(law, given), constant, 0.25, 12);
    expect(found.now).toBe(uOf(fitOf(law, given), constant));
    expectDigits(found.after, uAfter(law, given, constant, found.x), 7);
    // No other place is better.
    for (let at = 0.25; at <= 12; at += 0.235) {
      expect(uAfter(law, given, constant, at)).toBeGreaterThan(found.after * (1 - 1e-9));
    }
    expect(found.after).toBeLessThan(found.now);
  });

  test('errors in both axes: the weight is that of Y − bX', () => {
    const given = { uY: 0.02, uX: 0.05 };
    const found = nextReading(fitOf('straight line', given), 'b', 0.25, 12);
    expect(found.x).toBe(12);
    // The adjusted points of York et al. move a little with every reading.
    expectDigits(found.after, uAfter('straight line', given, 'b', 12), 3);
  });
});

describe('the place', () => {
  test('an end of the range exactly, for a slope', () => {
    expect(nextReading(fitOf('straight line'), 'b', 0, 20).x).toBe(20);
    expect(nextReading(fitOf('straight line'), 'b', -20, 5).x).toBe(-20);
    expect(nextReading(fitOf('straight line'), 'b', 3, 3).x).toBe(3);
  });

  test('within the range, for a decay with the same scatter everywhere', () => {
    const { x: place } = nextReading(fitOf('exponential', { options: 'fit=direct' }), 'q', 0, 200);
    expect(place).toBeGreaterThan(5);
    expect(place).toBeLessThan(30);
  });

  test('outside the law there is none', () => {
    // ln x of what is not above 0.
    expect(nextReading(fitOf('power'), 'q', -5, 0.1).x).toBeGreaterThan(0);
    expect(() => nextReading(fitOf('power'), 'q', -5, -1)).toThrow(Problem);
  });

  test('two readings have no uncertainty, but a best place', () => {
    const fit = fitLaw(readingsFrom([1, 2], [3, 4]), 'straight line', settingsFrom());
    expect(nextReading(fit, 'b', 0, 9)).toEqual({ x: 9, now: Number.NaN, after: Number.NaN });
  });

  test.each([
    ['low', () => nextReading(fitOf('power'), 'q', 3, 2)],
    ['name', () => nextReading(fitOf('power'), 'z', 1, 2)],
    ['u_y', () => nextReading(fitOf('power', { uY: x.map(() => 0.1) }), 'q', 1, 2)],
  ] as const)('%s is refused', (argument, run) => {
    expect(run).toThrow(expect.objectContaining({ code: 'argument', argument }));
  });
});

describe('readings for a target', () => {
  test('as many sets of the same readings bring the scatter down by √n', () => {
    const fit = fitOf('exponential', { uY: '2%' });
    const now = uOf(fit, 'q');
    expect(readingsForTarget(fit, 'q', now)).toEqual({ total: 7, more: 0 });
    expect(readingsForTarget(fit, 'q', now / 2)).toEqual({ total: 28, more: 21 });
    const four = [1, 2, 3, 4];
    const repeated = fitLaw(
      readingsFrom(
        four.flatMap(() => x),
        four.flatMap(() => y),
      ),
      'exponential',
      settingsFrom({ uY: '2%' }),
    );
    expectDigits(uOf(repeated, 'q'), now / 2, 12);
  });

  test('what a known constant contributes stays', () => {
    const given = { known: 'p=1.9±0.05', options: 'intercept=held' };
    const fit = fitOf('y(x) = p*exp(q*x)', given);
    const exact = fitOf('y(x) = p*exp(q*x)', { ...given, known: 'p=1.9' });
    const limit = Math.sqrt(uOf(fit, 'q') ** 2 - uOf(exact, 'q') ** 2);
    expect(() => readingsForTarget(fit, 'q', 0.9 * limit)).toThrow(/known constants alone/);
    const { total } = readingsForTarget(fit, 'q', 1.1 * limit);
    expect(uOf(exact, 'q') ** 2 * (7 / total) + limit ** 2).toBeLessThanOrEqual(
      (1.1 * limit) ** 2 * (1 + 1e-9),
    );
  });

  test('without scatter nothing can be said', () => {
    const fit = fitLaw(readingsFrom([1, 2], [3, 4]), 'straight line', settingsFrom());
    expect(() => readingsForTarget(fit, 'b', 0.1)).toThrow(/no scatter to judge by/);
  });
});
