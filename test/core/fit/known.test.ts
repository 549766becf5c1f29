import { describe, expect, test } from '@jest/globals';
import type { ConstantEstimate, Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from './settings.ts';

// A bottle test: chlorine in mg/L against hours, with the scatter of a hand-held meter.
const hours = [0, 1, 2, 4, 6, 9, 12, 18];
const chlorine = [1.98, 1.83, 1.69, 1.46, 1.24, 0.96, 0.77, 0.47];
const decay = 'C(t) = C0*exp(-k*t)';
const decayToFloor = 'C(t) = Cinf + (C0 - Cinf)*exp(-k*t)';

function fitChlorine(law: string, given: GivenTexts = {}): Fit {
  return fitLaw(readingsFrom(hours, chlorine), law, settingsFrom(given, hours.length));
}

function constant(of: Fit, name: string): ConstantEstimate {
  const found = of.constants.find((one) => one.name === name);
  if (found === undefined) throw new Error(`no constant ${name}`);
  return found;
}

const sum = (values: readonly number[]): number => values.reduce((total, value) => total + value, 0);

describe('a constant that stands in the intercept is known', () => {
  test('with a free intercept the rate comes from the slope, and the intercept is compared', () => {
    const free = fitChlorine(decay);
    const known = fitChlorine(decay, { known: 'C0=2.1±0.02' });
    expect(known.constants.map((one) => one.name)).toEqual(['k']);
    expectDigits(constant(known, 'k').value, constant(free, 'k').value, 14);
    // C0 does not stand in the slope: its uncertainty does not reach k.
    expectDigits(constant(known, 'k').standardUncertainty, constant(free, 'k').standardUncertainty, 13);
    expect(known.leftover?.term).toBe('intercept');
    expectDigits(known.leftover?.expected ?? 0, Math.log(2.1), 15);
    expectDigits(known.leftover?.fitted ?? 0, free.line.intercept, 15);
    const variance = free.line.varianceIntercept + (0.02 / 2.1) ** 2;
    expectDigits(known.leftover?.standardUncertainty ?? 0, Math.sqrt(variance), 9);
    expect(free.leftover).toBeNull();
  });

  test('held: the line passes through it and inherits its uncertainty', () => {
    const held = fitChlorine(decay, { known: 'C0=2.1±0.02', options: 'intercept=held' });
    const logs = chlorine.map((value) => Math.log(value));
    const squares = sum(hours.map((t) => t * t));
    const slope = sum(hours.map((t, i) => t * ((logs[i] ?? 0) - Math.log(2.1)))) / squares;
    expectDigits(held.line.slope, slope, 13);
    expect(held.line.degreesOfFreedom).toBe(hours.length - 1);
    const residuals = hours.map((t, i) => (logs[i] ?? 0) - Math.log(2.1) - slope * t);
    const scatter = sum(residuals.map((r) => r * r)) / (hours.length - 1) / squares;
    const inherited = (((0.02 / 2.1) * sum(hours)) / squares) ** 2;
    expectDigits(constant(held, 'k').standardUncertainty, Math.sqrt(scatter + inherited), 9);
    expectDigits(Math.sqrt(held.line.varianceSlope), Math.sqrt(scatter + inherited), 12);
    expectDigits(Math.sqrt(held.line.varianceIntercept), 0.02 / 2.1, 12);
    expect(held.line.correlation).toBeNaN();
  });

  test('held with an unknown in the intercept is refused by name', () => {
    expect(() => fitChlorine(decay, { options: 'intercept=held' }).line).toThrow(/held.*C0/);
  });
});

describe('a constant inside the axes is known with uncertainty', () => {
  test.each(['fit=line', 'fit=direct'])(
    'the total derivative includes how the line changes, %s',
    (options) => {
      const given = fitChlorine(decayToFloor, { known: 'Cinf=0.12±0.01', options });
      const exact = fitChlorine(decayToFloor, { known: 'Cinf=0.12', options });
      const step = 1e-4;
      for (const name of ['C0', 'k']) {
        const above = constant(
          fitChlorine(decayToFloor, { known: `Cinf=${0.12 + step}`, options }),
          name,
        ).value;
        const below = constant(
          fitChlorine(decayToFloor, { known: `Cinf=${0.12 - step}`, options }),
          name,
        ).value;
        const derivative = (above - below) / (2 * step);
        const expected = Math.hypot(constant(exact, name).standardUncertainty, 0.01 * derivative);
        // The plain difference here has a relative error of about 1e-6.
        expectDigits(constant(given, name).standardUncertainty, expected, 5);
        expectDigits(constant(given, name).value, constant(exact, name).value, 13);
      }
    },
  );

  test('the interval is then value ± k·u', () => {
    const given = fitChlorine(decayToFloor, { known: 'Cinf=0.12±0.01' });
    const k = constant(given, 'k');
    expectDigits(k.high - k.value, given.coverage.factor * k.standardUncertainty, 12);
    expectDigits(k.value - k.low, given.coverage.factor * k.standardUncertainty, 12);
  });
});

describe('one unknown in both line terms', () => {
  // y = a x + a²: least squares over both terms is least squares over the lines that the law allows.
  const x = [1, 2, 3, 4, 5];
  const y = [10.3, 13.1, 15.8, 19.3, 22.1];
  const found = fitLaw(readingsFrom(x, y), 'y(x) = a*x + a^2', settingsFrom());

  test('is where the sum of squares is least', () => {
    const { value } = constant(found, 'a');
    const gradient = sum(x.map((xi, i) => ((y[i] ?? 0) - value * xi - value ** 2) * (xi + 2 * value)));
    expect(Math.abs(gradient)).toBeLessThan(1e-10);
  });

  test('its uncertainty follows from both terms', () => {
    const { value, standardUncertainty } = constant(found, 'a');
    const square = sum(x.map((xi) => (xi + 2 * value) ** 2));
    expectDigits(standardUncertainty, found.line.residualStandardDeviation / Math.sqrt(square), 10);
  });
});

describe('intervals', () => {
  test('a constant of one term has that term’s interval carried through', () => {
    const found = fitChlorine(decay);
    const width = found.coverage.factor * Math.sqrt(found.line.varianceIntercept);
    expectDigits(constant(found, 'C0').low, Math.exp(found.line.intercept - width), 13);
    expectDigits(constant(found, 'C0').high, Math.exp(found.line.intercept + width), 13);
    expectDigits(found.coverage.factor, 2.446911851144969, 12); // t table, 97.5 %, 6 degrees of freedom
  });

  test('a wider coverage is wider, and the half-life follows the rate', () => {
    const usual = fitChlorine('first order');
    const wide = fitChlorine('first order', { options: 'coverage=0.99' });
    expect(constant(wide, 'k').low).toBeLessThan(constant(usual, 'k').low);
    const half = constant(usual, 'half-life');
    expectDigits(half.value, Math.LN2 / constant(usual, 'k').value, 14);
    expectDigits(half.low, Math.LN2 / constant(usual, 'k').high, 14);
    expect(half.derived).toBe(true);
  });

  test('two readings give values and no uncertainty at all', () => {
    const two = fitLaw(readingsFrom([0, 4], [2, 1.5]), decay, settingsFrom());
    expectDigits(constant(two, 'k').value, Math.log(2 / 1.5) / 4, 14);
    for (const { standardUncertainty, low, high } of two.constants) {
      expect([standardUncertainty, low, high]).toEqual([Number.NaN, Number.NaN, Number.NaN]);
    }
    expect(two.line.varianceSlope).toBeNaN();
  });
});

describe('properties of stated uncertainties', () => {
  test('scaling all u by c scales u of the constants by c and leaves the values', () => {
    const once = fitChlorine(decay, { uY: 0.02 });
    const thrice = fitChlorine(decay, { uY: 0.06 });
    for (const name of ['C0', 'k']) {
      expectDigits(constant(thrice, name).value, constant(once, name).value, 13);
      expectDigits(
        constant(thrice, name).standardUncertainty,
        3 * constant(once, name).standardUncertainty,
        12,
      );
    }
  });

  test('one u for all in a range is the same as the number', () => {
    const number = fitChlorine(decay, { uY: 0.02 });
    const range = fitChlorine(decay, { uY: hours.map(() => 0.02) });
    expectDigits(constant(range, 'k').value, constant(number, 'k').value, 15);
    expectDigits(constant(range, 'k').standardUncertainty, constant(number, 'k').standardUncertainty, 15);
  });

  test('equal scatter on straight axes that are y itself changes nothing', () => {
    const plain = fitLaw(readingsFrom(hours, chlorine), 'straight line', settingsFrom());
    const equal = fitLaw(readingsFrom(hours, chlorine), 'straight line', settingsFrom({ uY: 'equal' }));
    expectDigits(equal.line.slope, plain.line.slope, 14);
    expectDigits(equal.line.varianceSlope, plain.line.varianceSlope, 13);
  });

  test('in proportion to x, a reading at x = 0 is exact in x', () => {
    const both = fitChlorine(decay, { uY: 0.02, uX: '1%' });
    const range = fitChlorine(decay, { uY: 0.02, uX: hours.map((t) => (t === 0 ? 1e-9 : 0.01 * t)) });
    expectDigits(constant(both, 'k').value, constant(range, 'k').value, 12);
    expectDigits(constant(both, 'k').standardUncertainty, constant(range, 'k').standardUncertainty, 12);
    expect(() =>
      fitLaw(readingsFrom([1, 2, 3], [0, 1, 2]), 'straight line', settingsFrom({ uY: '2%' })),
    ).toThrow(/u_y: reading 1 is 0/);
  });

  test('a reading without its own u is set aside and named', () => {
    const found = fitChlorine(decay, { uY: [0.02, 0.02, null, 0.02, 0.02, 0.02, 0.02, 0.02] });
    expect(found.used.length).toBe(7);
    expect(found.setAside).toEqual([
      { position: 3, reason: 'noUncertainty', message: expect.stringMatching(/Reading 3.*u_y/) },
    ]);
  });
});

describe('the scale of x and y', () => {
  test.each([1e-12, 1e12, 1e150])('readings × %p: constants scale exactly', (scale) => {
    const plain = fitChlorine(decay);
    const scaled = fitLaw(
      readingsFrom(
        hours,
        chlorine.map((value) => value * scale),
      ),
      decay,
      settingsFrom(),
    );
    expectDigits(constant(scaled, 'C0').value, constant(plain, 'C0').value * scale, 12);
    expectDigits(constant(scaled, 'k').value, constant(plain, 'k').value, 11);
  });
});

describe('readings that the axes cannot take', () => {
  const withZero = readingsFrom([0, 1, 2, 3, 4], [2, 1.6, 0, 1, 0.8]);

  test('stop the fit with their position, or are set aside when told so', () => {
    expect(() => fitLaw(withZero, decay, settingsFrom())).toThrow(/Reading 3/);
    const found = fitLaw(withZero, decay, settingsFrom({ options: 'outside=set aside' }));
    expect(Array.from(found.used)).toEqual([0, 1, 3, 4]);
    expect(found.setAside[0]).toMatchObject({ position: 3, reason: 'outsideDomain' });
  });

  test('stay in a direct fit', () => {
    const found = fitLaw(withZero, decay, settingsFrom({ options: 'outside=set aside; fit=direct' }));
    expect(found.direct?.fitted).toHaveLength(5);
    expect(found.used).toHaveLength(4);
    expect(found.setAside[0]?.message).toMatch(/not on the line/);
  });
});
