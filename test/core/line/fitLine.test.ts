import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { fitLine } from '../../../core/line/fitLine.ts';
import { fitLineBothAxes } from '../../../core/line/fitLineBothAxes.ts';
import type { Intercept } from '../../../core/line/line.ts';
import { expectDigits } from '../../expectDigits.ts';
import { calibrationLine, columnOf } from '../fit/calibrationLines.ts';

interface LinearSet {
  readonly id: string;
  readonly columns: readonly { readonly name: string; readonly values: readonly number[] }[];
  readonly highPrecision: {
    readonly parameters: readonly string[];
    readonly standardDeviations: readonly string[];
    readonly residualStandardDeviation: string;
    readonly rSquared: string;
  };
}

// NIST StRD, linear least squares: data as certified, results recomputed with 80-digit arithmetic.
const nist = JSON.parse(
  readFileSync(new URL('../../reference/A-nist-linear.json', import.meta.url), 'utf8'),
) as LinearSet[]; // The file's shape is described in test/reference/README.md.

function nistSet(id: string) {
  const set = nist.find((one) => one.id === id);
  if (set === undefined) throw new Error(`no set ${id}`);
  const values = (name: string) =>
    Float64Array.from(set.columns.find((column) => column.name === name)?.values ?? []);
  return { x: values('x'), y: values('y'), certified: set.highPrecision };
}

const of = (...values: number[]): Float64Array => Float64Array.from(values);
const plainLine = (x: Float64Array, y: Float64Array, intercept: Intercept | 'absent' = 'free') =>
  fitLine(x, y, null, 'estimated', intercept);

describe('NIST StRD', () => {
  test('Norris: slope, intercept, standard deviations, r squared', () => {
    const { x, y, certified } = nistSet('nist-strd-lls-norris');
    const line = plainLine(x, y);
    expectDigits(line.intercept, certified.parameters[0] ?? '', 12);
    expectDigits(line.slope, certified.parameters[1] ?? '', 14);
    expectDigits(Math.sqrt(line.varianceIntercept), certified.standardDeviations[0] ?? '', 13);
    expectDigits(Math.sqrt(line.varianceSlope), certified.standardDeviations[1] ?? '', 13);
    expectDigits(line.residualStandardDeviation, certified.residualStandardDeviation, 13);
    expectDigits(line.rSquared, certified.rSquared, 14);
  });

  test('NoInt1: a line without intercept', () => {
    const { x, y, certified } = nistSet('nist-strd-lls-noint1');
    const line = plainLine(x, y, 'absent');
    expectDigits(line.slope, certified.parameters[0] ?? '', 15);
    expectDigits(Math.sqrt(line.varianceSlope), certified.standardDeviations[0] ?? '', 14);
    expectDigits(line.rSquared, certified.rSquared, 15);
    expect([line.intercept, line.varianceIntercept]).toEqual([0, 0]);
    expect(line.correlation).toBeNaN();
  });
});

describe('both axes uncertain', () => {
  test('without errors in x it is the weighted line', () => {
    const line = calibrationLine('iso28037-6-equal');
    const [x, y, u] = ['x', 'y', 'u_y'].map((name) => Float64Array.from(columnOf(line, name)));
    if (x === undefined || y === undefined || u === undefined) throw new Error('columns are missing');
    const both = fitLineBothAxes(x, y, new Float64Array(x.length), u, null, 'free');
    const one = fitLine(
      x,
      y,
      u.map((value) => 1 / value ** 2),
      'known',
      'free',
    );
    expectDigits(both.slope, one.slope, 13);
    expectDigits(both.varianceIntercept, one.varianceIntercept, 12);
    expectDigits(both.weightedSumOfSquares, one.weightedSumOfSquares, 12);
  });

  test('exchanging the axes inverts the slope', () => {
    const line = calibrationLine('pearson-york');
    const [x, y] = ['x', 'y'].map((name) => Float64Array.from(columnOf(line, name)));
    const [ux, uy] = ['w_x', 'w_y'].map((name) =>
      Float64Array.from(columnOf(line, name), (weight) => 1 / Math.sqrt(weight)),
    );
    if (!x || !y || !ux || !uy) throw new Error('columns are missing');
    const straight = fitLineBothAxes(x, y, ux, uy, null, 'free');
    const exchanged = fitLineBothAxes(y, x, uy, ux, null, 'free');
    expectDigits(exchanged.slope, 1 / straight.slope, 12);
    expectDigits(exchanged.intercept, -straight.intercept / straight.slope, 12);
    expectDigits(exchanged.weightedSumOfSquares, straight.weightedSumOfSquares, 12);
  });

  test('a correlation of the errors that follows a transform of one axis', () => {
    // Y' = Y + 3 X has error e_Y + 3 e_X: the same points on a line that is 3 steeper.
    const x = of(1, 2, 3, 4, 5, 6);
    const y = of(2.1, 2.9, 4.2, 4.8, 6.1, 7.2);
    const ux = of(0.1, 0.2, 0.1, 0.2, 0.1, 0.2);
    const uy = of(0.2, 0.1, 0.2, 0.1, 0.2, 0.1);
    const plain = fitLineBothAxes(x, y, ux, uy, null, 'free');
    const sheared = fitLineBothAxes(
      x,
      y.map((value, i) => value + 3 * (x[i] ?? 0)),
      ux,
      uy.map((u, i) => Math.hypot(u, 3 * (ux[i] ?? 0))),
      ux.map((u) => 3 * u * u),
      'free',
    );
    expectDigits(sheared.slope, plain.slope + 3, 12);
    expectDigits(sheared.intercept, plain.intercept, 11);
    expectDigits(sheared.varianceSlope, plain.varianceSlope, 11);
    expectDigits(sheared.weightedSumOfSquares, plain.weightedSumOfSquares, 11);
  });
});

describe('held intercept', () => {
  test('its uncertainty reaches the slope to first order', () => {
    const x = of(1, 2, 3, 5);
    const y = of(3.1, 4.9, 7.2, 10.9);
    const slopeFor = (held: number) => plainLine(x, y, { held, standardUncertainty: 0 }).slope;
    const exact = plainLine(x, y, { held: 1, standardUncertainty: 0 });
    const uncertain = plainLine(x, y, { held: 1, standardUncertainty: 0.2 });
    const moved = slopeFor(1.2) - slopeFor(1);
    expectDigits(uncertain.varianceSlope, exact.varianceSlope + moved ** 2, 12);
    expectDigits(uncertain.covariance, moved * 0.2, 12);
    expectDigits(uncertain.varianceIntercept, 0.04, 15);
    expect(uncertain.degreesOfFreedom).toBe(3);
  });
});

describe('laws of the subject', () => {
  const columns = fc
    .array(fc.tuple(fc.integer({ min: -1000, max: 1000 }), fc.integer({ min: -1000, max: 1000 })), {
      minLength: 4,
      maxLength: 30,
    })
    .filter((pairs) => new Set(pairs.map(([x]) => x)).size > 1)
    .map((pairs) => ({ x: of(...pairs.map(([x]) => x)), y: of(...pairs.map(([, y]) => y)) }));

  test('leverages sum to the number of terms, residuals to zero', () => {
    fc.assert(
      fc.property(columns, ({ x, y }) => {
        const line = plainLine(x, y);
        expect(line.leverage.reduce((a, b) => a + b, 0)).toBeCloseTo(2, 10);
        expect(Math.abs(line.residual.reduce((a, b) => a + b, 0))).toBeLessThan(1e-8);
      }),
      { seed: 11 },
    );
  });

  test('shifting and rescaling by powers of two changes the terms exactly as it should', () => {
    fc.assert(
      fc.property(columns, fc.integer({ min: -40, max: 40 }), ({ x, y }, power) => {
        const scale = 2 ** power;
        const line = plainLine(x, y);
        const scaled = plainLine(
          x.map((value) => value * scale),
          y.map((value) => value / scale),
        );
        expect(scaled.slope).toBe(line.slope / scale / scale);
        expect(scaled.intercept).toBe(line.intercept / scale);
        expect(scaled.rSquared).toBe(line.rSquared);
      }),
      { seed: 12 },
    );
  });

  test('the order of the readings does not matter', () => {
    fc.assert(
      fc.property(columns, ({ x, y }) => {
        const line = plainLine(x, y);
        const reversed = plainLine(x.slice().reverse(), y.slice().reverse());
        expect(Math.abs(reversed.slope - line.slope)).toBeLessThanOrEqual(1e-12 * (1 + Math.abs(line.slope)));
      }),
      { seed: 13 },
    );
  });

  test('refitting the fitted values changes nothing', () => {
    const { x, y } = nistSet('nist-strd-lls-norris');
    const line = plainLine(x, y);
    const again = plainLine(x, line.fitted);
    expectDigits(again.slope, line.slope, 14);
    expect(again.residualStandardDeviation).toBeLessThan(1e-11);
  });

  test('inputs are not changed', () => {
    const x = of(1, 2, 3);
    const y = of(1, 3, 4);
    fitLine(x, y, of(1, 2, 1), 'known', 'free').residual.fill(0);
    expect([Array.from(x), Array.from(y)]).toEqual([
      [1, 2, 3],
      [1, 3, 4],
    ]);
  });
});

describe('hard numbers', () => {
  test('an offset of 1e10 in x keeps the digits that the readings carry', () => {
    const x = of(0, 1, 2, 3, 4);
    const y = of(1.1, 2.9, 5.2, 7.1, 8.8);
    const line = plainLine(x, y);
    const shifted = plainLine(
      x.map((value) => value + 1e10),
      y,
    );
    expectDigits(shifted.slope, line.slope, 14);
    expectDigits(shifted.varianceSlope, line.varianceSlope, 12);
  });

  test.each([1e-150, 1e-30, 1e30, 1e150])('units of %p', (unit) => {
    const x = of(1, 2, 3, 4);
    const y = of(2.1, 3.9, 6.2, 7.8);
    const line = plainLine(x, y);
    const scaled = plainLine(
      x,
      y.map((value) => value * unit),
    );
    expectDigits(scaled.slope, line.slope * unit, 13);
    expectDigits(Math.sqrt(scaled.varianceSlope), Math.sqrt(line.varianceSlope) * unit, 12);
  });

  test('a unit that puts the variance beyond the range of numbers is refused, not turned into 0', () => {
    const x = of(1, 2, 3, 4);
    const y = of(2.1e-200, 3.9e-200, 6.2e-200, 7.8e-200);
    expect(() => plainLine(x, y)).toThrow(/another unit/);
  });

  test('refusals: too few readings, no spread in x', () => {
    expect(() => plainLine(of(1), of(1))).toThrow(/1 reading .* at least 2/);
    expect(() => plainLine(of(0.1, 0.1, 0.1), of(1, 2, 3))).toThrow(/two different values/);
    expect(() => fitLineBothAxes(of(0.1, 0.1), of(1, 2), of(1, 1), of(1, 1), null, 'free')).toThrow(
      /different/,
    );
  });

  test('two readings: a line without any uncertainty', () => {
    const line = plainLine(of(1, 3), of(2, 8));
    expect([line.slope, line.intercept]).toEqual([3, -1]);
    expect([line.varianceSlope, line.varianceIntercept, line.residualStandardDeviation]).toEqual([
      Number.NaN,
      Number.NaN,
      Number.NaN,
    ]);
  });
});
