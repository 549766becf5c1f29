import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { Matrix, solve } from 'ml-matrix';
import { fitLine } from '../../../core/line/fitLine.ts';
import { fitLineBothAxes } from '../../../core/line/fitLineBothAxes.ts';
import type { Intercept, Scale } from '../../../core/line/line.ts';
import { expectDigits } from '../../expectDigits.ts';
import { problemOf } from '../../problemOf.ts';
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

/** Weighted least squares by a general-purpose matrix library, centred where its normal equations would lose digits. */
function byMatrix(x: Float64Array, y: Float64Array, w: Float64Array, terms: 1 | 2, scale: Scale) {
  const total = w.reduce((sum, value) => sum + value, 0);
  const centre = terms === 2 ? x.reduce((sum, value, i) => sum + (w[i] ?? 0) * value, 0) / total : 0;
  const rows = Array.from(x, (value) => (terms === 2 ? [value - centre, 1] : [value]));
  const design = new Matrix(rows);
  const weighted = new Matrix(rows.map((row, i) => row.map((entry) => entry * (w[i] ?? 0))));
  const normal = design.transpose().mmul(weighted);
  const inverse = solve(normal, Matrix.eye(terms));
  const right = weighted.transpose().mmul(Matrix.columnVector(Array.from(y)));
  const solution = solve(normal, right).to1DArray();
  const fitted = design.mmul(Matrix.columnVector(solution)).to1DArray();
  const residual = Array.from(y, (value, i) => value - (fitted[i] ?? 0));
  const squares = residual.reduce((sum, r, i) => sum + (w[i] ?? 0) * r * r, 0);
  const degreesOfFreedom = x.length - terms;
  const variance = scale === 'known' ? 1 : squares / degreesOfFreedom;
  const [slope = 0, level = 0] = solution;
  const ofSlope = inverse.get(0, 0);
  const ofLevel = terms === 2 ? inverse.get(1, 1) : 0;
  const varianceIntercept = variance * (ofLevel + centre * centre * ofSlope);
  return {
    slope,
    intercept: level - slope * centre,
    varianceSlope: variance * ofSlope,
    varianceIntercept,
    covariance: -variance * centre * ofSlope,
    correlation: (-centre * ofSlope * variance) / Math.sqrt(variance * ofSlope * varianceIntercept),
    weightedSumOfSquares: squares,
    residualStandardDeviation: Math.sqrt(squares / degreesOfFreedom),
    degreesOfFreedom,
    fitted,
    residual,
    leverage: rows.map((row, i) => {
      const vector = new Matrix([row]);
      return (w[i] ?? 0) * vector.mmul(inverse).mmul(vector.transpose()).get(0, 0);
    }),
  };
}

describe('a general-purpose matrix library gives the same line', () => {
  // Means that no binary number holds, weights from 0.3 to 30, and enough rows for more than two chunks of them.
  const wave = (i: number): number => Math.sin(12.9898 * i) * 43758.5453;
  const part = (i: number): number => wave(i) - Math.floor(wave(i));
  const readings = (n: number, offset: number) => ({
    x: Float64Array.from({ length: n }, (_, i) => offset + 10 * part(i)),
    y: Float64Array.from({ length: n }, (_, i) => 3.7 - 13 * (offset + 10 * part(i)) + part(i + 0.5)),
    w: Float64Array.from({ length: n }, (_, i) => 0.3 * 100 ** part(i + 0.25)),
  });

  test.each<[number, number, boolean, Scale, 1 | 2]>([
    [7, 0, false, 'estimated', 2],
    [7, 31, true, 'estimated', 2],
    [40, 2.2, true, 'known', 2],
    [40, 2.2, false, 'known', 2],
    [40, 2.2, true, 'estimated', 1],
    [12, 1.1, false, 'known', 1],
    [4500, 5.5, true, 'estimated', 2],
    [4500, 5.5, true, 'known', 1],
  ])('%p readings from %p on, weighted %p, scale %s, %p terms', (n, offset, isWeighted, scale, terms) => {
    const { x, y, w } = readings(n, offset);
    const weight = isWeighted ? w : null;
    const line = fitLine(x, y, weight, scale, terms === 2 ? 'free' : 'absent');
    const wanted = byMatrix(x, y, weight ?? new Float64Array(n).fill(1), terms, scale);
    expect([line.terms, line.scale]).toEqual([terms, scale]);
    expect(line.degreesOfFreedom).toBe(wanted.degreesOfFreedom);
    expectDigits(line.slope, wanted.slope, 11);
    expectDigits(line.varianceSlope, wanted.varianceSlope, 11);
    expectDigits(line.weightedSumOfSquares, wanted.weightedSumOfSquares, 11);
    expectDigits(line.residualStandardDeviation, wanted.residualStandardDeviation, 11);
    if (terms === 2) {
      expectDigits(line.intercept, wanted.intercept, 10);
      expectDigits(line.varianceIntercept, wanted.varianceIntercept, 11);
      expectDigits(line.covariance, wanted.covariance, 10);
      expectDigits(line.correlation, wanted.correlation, 10);
    } else expect([line.intercept, line.varianceIntercept, line.covariance]).toEqual([0, 0, -0]);
    expect(Array.from(line.lineWeight)).toEqual(Array.from(weight ?? new Float64Array(n).fill(1)));
    const into = line.residualInto(new Float64Array(n + 1).fill(Number.NaN));
    expect(into[n]).toBeNaN();
    for (let i = 0; i < n; i++) {
      expect(Math.abs((line.fitted[i] ?? 0) - (wanted.fitted[i] ?? 0))).toBeLessThan(1e-11 * (offset + 40));
      expect(Math.abs((line.residual[i] ?? 0) - (wanted.residual[i] ?? 0))).toBeLessThan(
        1e-11 * (offset + 40),
      );
      expect(into[i]).toBe(line.residual[i]);
      expectDigits(line.leverage[i] ?? 0, wanted.leverage[i] ?? 0, 10);
    }
  });

  test('r squared is about the weighted mean with an intercept, about zero without', () => {
    const { x, y, w } = readings(40, 2.2);
    const total = w.reduce((sum, value) => sum + value, 0);
    const mean = y.reduce((sum, value, i) => sum + (w[i] ?? 0) * value, 0) / total;
    const about = (origin: number): number =>
      y.reduce((sum, value, i) => sum + (w[i] ?? 0) * (value - origin) ** 2, 0);
    const free = fitLine(x, y, w, 'known', 'free');
    const absent = fitLine(x, y, w, 'known', 'absent');
    expectDigits(free.rSquared, 1 - free.weightedSumOfSquares / about(mean), 12);
    expectDigits(absent.rSquared, 1 - absent.weightedSumOfSquares / about(0), 12);
    expect(fitLine(of(1, 2, 4), of(5, 5, 5), null, 'estimated', 'free').rSquared).toBeNaN();
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

  test('so far out that no number holds the means, everything about the line is as it is near zero', () => {
    // Whole numbers, which stay exact: the means, 2.2 and 6.6, do not.
    const x = of(0, 1, 2, 3, 5);
    const y = of(3, 5, 4, 9, 12);
    const near = plainLine(x, y);
    const far = plainLine(
      x.map((value) => value + 4e15),
      y.map((value) => value + 4e15),
    );
    expectDigits(far.slope, near.slope, 15);
    expectDigits(far.varianceSlope, near.varianceSlope, 15);
    expectDigits(far.weightedSumOfSquares, near.weightedSumOfSquares, 15);
    expectDigits(far.rSquared, near.rSquared, 15);
    for (let i = 0; i < x.length; i++) {
      expect(Math.abs((far.residual[i] ?? 0) - (near.residual[i] ?? 0))).toBeLessThan(1e-14);
      expect(Math.abs((far.leverage[i] ?? 0) - (near.leverage[i] ?? 0))).toBeLessThan(1e-15);
      // To the unit in which numbers stand there.
      expect(Math.abs((far.fitted[i] ?? 0) - 4e15 - (near.fitted[i] ?? 0))).toBeLessThanOrEqual(0.25);
    }
    // The line passes through the means: 4e15 + 6.6 at 4e15 + 2.2.
    expectDigits(far.intercept, 4e15 + 6.6 - near.slope * (4e15 + 2.2), 15);
    const weighted = fitLine(
      x.map((value) => value + 4e15),
      y.map((value) => value + 4e15),
      of(1, 2, 1, 3, 2),
      'known',
      'free',
    );
    expectDigits(weighted.slope, fitLine(x, y, of(1, 2, 1, 3, 2), 'known', 'free').slope, 14);
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
    expect(problemOf(() => plainLine(of(1), of(1)))).toMatchObject({ code: 'tooFew', argument: 'x' });
    expect(plainLine(of(2), of(6), 'absent').slope).toBe(3);
    expect(() => plainLine(of(0.1, 0.1, 0.1), of(1, 2, 3))).toThrow(/two different values/);
    expect(problemOf(() => plainLine(of(0.1, 0.1, 0.1), of(1, 2, 3)))).toMatchObject({
      code: 'undefined',
      argument: 'x',
    });
    expect(problemOf(() => plainLine(of(1, 2, 3), of(1e-200, 3e-200, 4e-200)))).toMatchObject({
      code: 'undefined',
      argument: 'y',
    });
    expect(() => fitLineBothAxes(of(0.1, 0.1), of(1, 2), of(1, 1), of(1, 1), null, 'free')).toThrow(
      /different/,
    );
  });

  test('two readings: a line without any uncertainty', () => {
    const line = plainLine(of(1, 3), of(2, 8));
    expect([line.slope, line.intercept]).toEqual([3, -1]);
    const { varianceSlope, varianceIntercept, covariance, correlation, residualStandardDeviation } = line;
    for (const one of [
      varianceSlope,
      varianceIntercept,
      covariance,
      correlation,
      residualStandardDeviation,
    ]) {
      expect(one).toBeNaN();
    }
    const known = fitLine(of(1, 3), of(2, 8), of(4, 4), 'known', 'free');
    expect([known.varianceSlope, known.varianceIntercept]).toEqual([Number.NaN, Number.NaN]);
    const held = plainLine(of(2), of(6), { held: 1, standardUncertainty: 0.1 });
    expect([held.slope, held.varianceSlope, held.varianceIntercept, held.covariance]).toEqual([
      2.5,
      Number.NaN,
      Number.NaN,
      Number.NaN,
    ]);
  });
});
