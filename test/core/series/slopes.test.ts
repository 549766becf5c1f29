import { describe, test } from '@jest/globals';
import { Matrix, solve } from 'ml-matrix';
import { fTail } from '../../../core/distributions/tails.ts';
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
});
