import { describe, expect, test } from '@jest/globals';
import { Matrix, solve } from 'ml-matrix';
import { chiSquaredTail, fTail } from '../../../core/distributions/tails.ts';
import { fitLine } from '../../../core/line/fitLine.ts';
import { sharedSlope } from '../../../core/series/slopes.ts';
import { expectDigits } from '../../expectDigits.ts';

// Three invented series; the reference is a general-purpose matrix library's least squares over dummy columns.
const series = [
  { x: [1, 2, 3, 5], y: [2.1, 4.2, 5.8, 10.3] },
  { x: [0, 2, 4, 6, 8], y: [1.2, 4.9, 9.3, 13.1, 16.8] },
  { x: [10, 11, 13], y: [5.2, 7.4, 11.1] },
];
const lines = series.map(({ x, y }) => {
  const horizontal = Float64Array.from(x);
  return { horizontal, line: fitLine(horizontal, Float64Array.from(y), null, 'estimated', 'free') };
});
const shared = sharedSlope(lines, 'estimated');

const design = (separate: boolean): Matrix =>
  new Matrix(
    series.flatMap(({ x }, k) =>
      x.map((value) => [
        ...series.map((_, j) => (j === k ? 1 : 0)),
        ...(separate ? series.map((_, j) => (j === k ? value : 0)) : [value]),
      ]),
    ),
  );
const response = Matrix.columnVector(series.flatMap(({ y }) => y));

function leastSquares(matrix: Matrix) {
  const solution = solve(matrix, response);
  const left = Matrix.sub(response, matrix.mmul(solution)).to1DArray();
  const squares = left.reduce((sum, r) => sum + r * r, 0);
  const freedom = matrix.rows - matrix.columns;
  const inverse = solve(matrix.transpose().mmul(matrix), Matrix.eye(matrix.columns));
  return { solution: solution.to1DArray(), squares, freedom, inverse };
}

describe('analysis of covariance', () => {
  const one = leastSquares(design(false));
  const each = leastSquares(design(true));

  test('the shared slope and the intercepts are those of the joint least squares', () => {
    expectDigits(shared.slope, one.solution[3] ?? 0, 12);
    const variance = one.squares / one.freedom;
    expectDigits(shared.standardUncertainty, Math.sqrt(variance * one.inverse.get(3, 3)), 11);
    shared.intercepts.forEach(({ value, standardUncertainty }, k) => {
      expectDigits(value, one.solution[k] ?? 0, 11);
      expectDigits(standardUncertainty, Math.sqrt(variance * one.inverse.get(k, k)), 11);
    });
  });

  test('F compares it with separate slopes', () => {
    const extra = one.freedom - each.freedom;
    const f = (one.squares - each.squares) / extra / (each.squares / each.freedom);
    expectDigits(shared.f, f, 9);
    expectDigits(shared.p, fTail(f, extra, each.freedom), 9);
  });

  test('with stated uncertainties the variance is theirs, and the test is chi-squared over its freedom', () => {
    const weight = 1 / 0.3 ** 2;
    const stated = series.map(({ x, y }) => {
      const horizontal = Float64Array.from(x);
      const lineWeight = new Float64Array(x.length).fill(weight);
      return { horizontal, line: fitLine(horizontal, Float64Array.from(y), lineWeight, 'known', 'free') };
    });
    const known = sharedSlope(stated, 'known');
    expectDigits(known.slope, shared.slope, 13);
    expectDigits(known.standardUncertainty, 0.3 * Math.sqrt(one.inverse.get(3, 3)), 11);
    known.intercepts.forEach(({ standardUncertainty }, k) => {
      expectDigits(standardUncertainty, 0.3 * Math.sqrt(one.inverse.get(k, k)), 11);
    });
    const statistic = (one.squares - each.squares) * weight;
    expectDigits(known.f, statistic / 2, 9);
    expectDigits(known.p, chiSquaredTail(statistic, 2), 9);
  });

  test('lines through the origin share a slope through the origin', () => {
    const through = series.map(({ x, y }) => {
      const horizontal = Float64Array.from(x);
      return { horizontal, line: fitLine(horizontal, Float64Array.from(y), null, 'estimated', 'absent') };
    });
    const common = sharedSlope(through, 'estimated');
    const all = leastSquares(new Matrix(series.flatMap(({ x }) => x.map((value) => [value]))));
    expectDigits(common.slope, all.solution[0] ?? 0, 13);
    expect(common.degreesOfFreedom).toBe(11);
    expectDigits(common.standardUncertainty, Math.sqrt((all.squares / 11) * all.inverse.get(0, 0)), 12);
    expect(common.intercepts).toEqual(series.map(() => ({ value: 0, standardUncertainty: 0 })));
  });

  test('one series, or series without scatter of their own, have no test', () => {
    const alone = sharedSlope(lines.slice(0, 1), 'estimated');
    expect([alone.f, alone.p]).toEqual([Number.NaN, Number.NaN]);
    expectDigits(alone.slope, lines[0]?.line.slope ?? 0, 15);
    expectDigits(alone.standardUncertainty, Math.sqrt(lines[0]?.line.varianceSlope ?? 0), 13);
    const pairs = series.slice(0, 2).map(({ x, y }) => {
      const horizontal = Float64Array.from(x.slice(0, 2));
      return {
        horizontal,
        line: fitLine(horizontal, Float64Array.from(y.slice(0, 2)), null, 'estimated', 'free'),
      };
    });
    const exact = sharedSlope(pairs, 'estimated');
    expect([exact.f, exact.p]).toEqual([Number.NaN, Number.NaN]);
    expect(exact.degreesOfFreedom).toBe(1);
    expect(exact.standardUncertainty).toBeGreaterThan(0);
    const single = sharedSlope(pairs.slice(0, 1), 'estimated');
    expect(single.standardUncertainty).toBeNaN();
  });
});
