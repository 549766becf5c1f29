import { describe, expect, test } from '@jest/globals';
import { Matrix, solve } from 'ml-matrix';
import { seededRandom } from '../../../core/constants/random.ts';
import { chiSquaredTail } from '../../../core/distributions/tails.ts';
import { scatterTest } from '../../../core/judge/scatter.ts';
import { fitLine } from '../../../core/line/fitLine.ts';
import type { Line } from '../../../core/line/line.ts';
import { expectDigits } from '../../expectDigits.ts';

const random = seededRandom(8);
const x = Float64Array.from({ length: 40 }, (_, i) => 1 + i);
const fan = x.map((value) => 3 + 0.5 * value + 0.05 * value * random.normal());
const weight = x.map((value) => 1 + (value % 3));

/** n R² of the squared weighted residuals on the fitted values, by a general-purpose matrix library. */
function byMatrix({ residual, fitted, lineWeight }: Line): number {
  const squares = Array.from(residual, (r, i) => r * r * (lineWeight[i] ?? 0));
  const design = new Matrix(Array.from(fitted, (value) => [1, value]));
  const predicted = design.mmul(solve(design, Matrix.columnVector(squares))).to1DArray();
  const mean = squares.reduce((sum, one) => sum + one, 0) / squares.length;
  const about = (values: readonly number[]): number =>
    values.reduce((sum, value) => sum + (value - mean) ** 2, 0);
  return (squares.length * about(predicted)) / about(squares);
}

describe('unequal scatter', () => {
  test.each([
    ['equal weights', null],
    ['weights', weight],
  ] as const)('the statistic is n R² of the squared residuals on the fitted values, %s', (_, given) => {
    const line = fitLine(x, fan, given, 'estimated', 'free');
    const found = scatterTest(line);
    expectDigits(found.statistic, byMatrix(line), 11);
    expectDigits(found.p, chiSquaredTail(byMatrix(line), 1), 10);
    expect(found.direction).toBe(1);
  });

  test('the direction is that in which the scatter grows', () => {
    const falling = fitLine(
      x,
      fan.map((value) => -value),
      null,
      'estimated',
      'free',
    );
    expect(scatterTest(falling).direction).toBe(-1);
  });

  test('the unit of the readings does not matter', () => {
    const scaled = fitLine(
      x,
      fan.map((value) => value * 1e-9),
      null,
      'estimated',
      'free',
    );
    expectDigits(
      scatterTest(scaled).statistic,
      scatterTest(fitLine(x, fan, null, 'estimated', 'free')).statistic,
      9,
    );
  });

  test('absent below five readings, without residuals, or where residuals or fitted values do not vary', () => {
    const absent = { statistic: Number.NaN, p: Number.NaN, direction: Number.NaN };
    const of = (...values: number[]) => Float64Array.from(values);
    const lineOf = (px: Float64Array, py: Float64Array) => fitLine(px, py, null, 'estimated', 'free');
    expect(scatterTest(lineOf(of(1, 2, 3, 4), of(1, 2.2, 2.9, 4.3)))).toEqual(absent);
    expect(scatterTest(lineOf(of(1, 2, 3, 4, 5), of(1, 2.2, 2.9, 4.3, 4.8))).p).toBeGreaterThan(0);
    expect(scatterTest(lineOf(of(1, 2, 3, 4, 5), of(1, 2, 3, 4, 5)))).toEqual(absent);
    // Residuals of one size; a level line.
    expect(scatterTest(lineOf(of(1, 1, 2, 2, 3, 3), of(0, 2, 1, 3, 2, 4)))).toEqual(absent);
    expect(scatterTest(lineOf(of(-2, -1, 0, 1, 2), of(1, -1, 0, -1, 1)))).toEqual(absent);
  });
});
