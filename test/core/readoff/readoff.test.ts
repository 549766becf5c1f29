import { describe, expect, test } from '@jest/globals';
import { seededRandom } from '../../../core/constants/random.ts';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { beyondReadings } from '../../../core/readoff/beyondReadings.ts';
import { curveBand } from '../../../core/readoff/curveBand.ts';
import { predictorAt } from '../../../core/readoff/predictorAt.ts';
import { responseAt } from '../../../core/readoff/responseAt.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

const places = [0.5, 1, 1.5, 2, 3, 4, 5, 6, 8, 10];

/** Laws with a curve that rises or falls all along 0.5 … 10, with readings scattered by 1 %. */
const laws: readonly (readonly [string, (x: number) => number])[] = [
  ['straight line', (x) => 2 + 3 * x],
  ['power', (x) => 1.4 * x ** 1.5],
  ['exponential', (x) => 3 * Math.exp(-0.2 * x)],
  ['logarithmic', (x) => 4 + 1.5 * Math.log(x)],
  ['reciprocal', (x) => 1 / (0.2 + 0.05 * x)],
  ['saturation', (x) => (8 * x) / (3 + x)],
  ['hyperbolic', (x) => 2 + 3 / x],
  ['root', (x) => 1 + 2 * Math.sqrt(x)],
  ['square', (x) => 1 + 0.2 * x * x],
  ['inverse exponential', (x) => 5 * Math.exp(-1.2 / x)],
  ['proportional', (x) => 2.5 * x],
  ['first order', (x) => 2 * Math.exp(-0.15 * x)],
  ['second order', (x) => 1 / (0.4 + 0.1 * x)],
  ['langmuir', (x) => (5 * 0.4 * x) / (1 + 0.4 * x)],
  ['freundlich', (x) => 2 * x ** (1 / 2.4)],
  ['saturating rise', (x) => 6 * (1 - Math.exp(-0.3 * x))],
  ['y(x) = a*x + b*x^2', (x) => 0.5 * x + 0.2 * x * x],
];

function fitted(law: string, curve: (x: number) => number, given: GivenTexts = {}): Fit {
  const random = seededRandom(7);
  const y = places.map((x) => curve(x) * (1 + 0.01 * random.normal()));
  return fitLaw(readingsFrom(places, y), law, settingsFrom(given, places.length));
}

describe.each(laws)('%s', (law, curve) => {
  test.each(['', 'band=reading', 'fit=direct', 'coverage=0.8'])('there and back, %s', (options) => {
    const found = fitted(law, curve, { options });
    for (const x of [0.7, 2.2, 7]) {
      const there = responseAt(found, x);
      const back = predictorAt(found, there.value);
      expectDigits(back.value, x, 10);
      expect(there.low).toBeLessThan(there.value);
      expect(there.high).toBeGreaterThan(there.value);
      expect(back.low).toBeLessThan(x);
      expect(back.high).toBeGreaterThan(x);
    }
  });

  test('an end of the interval of x is where the response lies on the edge of its band', () => {
    const found = fitted(law, curve);
    const wanted = responseAt(found, 3.3).value;
    const { low, high } = predictorAt(found, wanted);
    for (const end of [low, high]) {
      const band = responseAt(found, end);
      const edge = Math.abs(band.low - wanted) < Math.abs(band.high - wanted) ? band.low : band.high;
      expectDigits(edge, wanted, 9);
    }
  });
});

describe('first-order uncertainty', () => {
  test('of y is that of x times the slope of the curve', () => {
    const found = fitted('power', (x) => 1.4 * x ** 1.5);
    const y = responseAt(found, 4);
    const x = predictorAt(found, y.value);
    const step = 1e-4;
    const slope = (responseAt(found, 4 + step).value - responseAt(found, 4 - step).value) / (2 * step);
    expectDigits(y.standardUncertainty, x.standardUncertainty * slope, 7);
  });

  test('a new reading adds its scatter by the rule of u_y', () => {
    const curve = (x: number): number => 3 * Math.exp(-0.2 * x);
    for (const [uY, scatter] of [
      [0.05, () => 0.05],
      ['2%', (y: number) => 0.02 * y],
    ] as const) {
      const line = responseAt(fitted('exponential', curve, { uY }), 4);
      const reading = responseAt(fitted('exponential', curve, { uY, options: 'band=reading' }), 4);
      const added = Math.sqrt(reading.standardUncertainty ** 2 - line.standardUncertainty ** 2);
      expectDigits(added, scatter(line.value), 9);
    }
  });

  test('a known constant’s uncertainty widens the reading off', () => {
    const curve = (t: number): number => 0.5 + 2 * Math.exp(-0.3 * t);
    const law = 'C(t) = Cinf + (C0 - Cinf)*exp(-k*t)';
    const exact = responseAt(fitted(law, curve, { known: 'Cinf=0.5' }), 3);
    const uncertain = responseAt(fitted(law, curve, { known: 'Cinf=0.5±0.05' }), 3);
    expect(uncertain.value).toBe(exact.value);
    const shifted = responseAt(fitted(law, curve, { known: 'Cinf=0.501' }), 3).value;
    const before = responseAt(fitted(law, curve, { known: 'Cinf=0.499' }), 3).value;
    const part = 0.05 * ((shifted - before) / 0.002);
    expectDigits(uncertain.standardUncertainty, Math.hypot(exact.standardUncertainty, part), 4);
  });
});

describe('refusals and absences', () => {
  test('a response that the fit does not reach', () => {
    const found = fitted('saturation', (x) => (8 * x) / (3 + x));
    expect(() => predictorAt(found, 50)).toThrow(/does not reach/);
  });

  test('a slope that cannot be told from zero leaves x unbounded', () => {
    const flat = fitLaw(
      readingsFrom([1, 2, 3, 4, 5], [2.1, 1.9, 2.05, 1.95, 2.02]),
      'straight line',
      settingsFrom(),
    );
    expect(() => predictorAt(flat, 2.2)).toThrow(/unbounded/);
  });

  test('a predictor outside the law', () => {
    const found = fitted('power', (x) => 1.4 * x ** 1.5);
    expect(() => responseAt(found, -1)).toThrow(/no value/);
  });

  test('a new reading when u_y is a range', () => {
    const found = fitted('power', (x) => 1.4 * x ** 1.5, {
      uY: places.map(() => 0.1),
      options: 'band=reading',
    });
    expect(() => responseAt(found, 2)).toThrow(/band=reading.*range/);
    expect(() => predictorAt(found, 2)).toThrow(/band=reading.*range/);
  });

  test('two readings: values alone', () => {
    const two = fitLaw(readingsFrom([1, 2], [3, 5]), 'straight line', settingsFrom());
    expect(responseAt(two, 3)).toEqual({
      value: 7,
      standardUncertainty: Number.NaN,
      low: Number.NaN,
      high: Number.NaN,
    });
    expect(predictorAt(two, 7).value).toBe(3);
    expect(predictorAt(two, 7).low).toBeNaN();
  });

  test('an end beyond a pole of the way back is absent, not wrong', () => {
    // 1/y falls towards 0: far out, the interval of 1/y reaches below it.
    const found = fitLaw(
      readingsFrom([1, 2, 3, 4], [0.5, 0.62, 0.74, 1.1]),
      'reciprocal',
      settingsFrom({ options: 'coverage=0.99' }),
    );
    const read = responseAt(found, 5);
    expect(Number.isNaN(read.low) || (read.low <= read.value && read.value <= read.high)).toBe(true);
    const band = curveBand(found, Float64Array.of(1, 2, 30));
    expect(band.fitted[0]).toBeCloseTo(responseAt(found, 1).value, 12);
  });
});

test('a value beyond the readings that take part is told with their range', () => {
  const fit = fitLaw(readingsFrom([1, 2, 3], [1, 2.1, 2.9]), 'straight line', settingsFrom());
  expect(beyondReadings(fit, 'x', 2.5)).toBeNull();
  expect(beyondReadings(fit, 'x', 3)).toBeNull();
  expect(beyondReadings(fit, 'x', 4)).toEqual({ low: 1, high: 3 });
  expect(beyondReadings(fit, 'y', 0.9)).toEqual({ low: 1, high: 2.9 });
});
