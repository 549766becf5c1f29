import { describe, expect, test } from '@jest/globals';
import { Matrix, solve } from 'ml-matrix';
import { studentTwoSided } from '../../../core/distributions/student.ts';
import { fitLine } from '../../../core/line/fitLine.ts';
import { bow } from '../../../core/straightness/bow.ts';
import { probabilityOfRuns, runsP } from '../../../core/straightness/runsP.ts';
import { cooksDistance, leaveOneOut, standardisedResiduals } from '../../../core/straightness/studentised.ts';
import { expectDigits } from '../../expectDigits.ts';
import { referenceSets } from '../fit/rSets.ts';

const column = (values: readonly number[]): Float64Array => Float64Array.from(values);

describe('runs', () => {
  /** Every arrangement of the signs, counted. */
  function enumerated(above: number, below: number, runs: number): number {
    const n = above + below;
    let [all, few] = [0, 0];
    for (let bits = 0; bits < 2 ** n; bits++) {
      const signs = Array.from({ length: n }, (_, i) => (bits >> i) & 1);
      if (signs.reduce((sum, sign) => sum + sign, 0) !== above) continue;
      all++;
      const count = 1 + signs.filter((sign, i) => i > 0 && sign !== signs[i - 1]).length;
      if (count <= runs) few++;
    }
    return few / all;
  }

  test.each([
    [3, 4],
    [1, 6],
    [5, 5],
    [2, 8],
  ])('%p above and %p below, every number of runs', (above, below) => {
    for (let runs = 1; runs <= above + below; runs++) {
      expectDigits(probabilityOfRuns(above, below, runs), enumerated(above, below, runs), 12);
    }
  });

  test('many readings, against the normal approximation (within its own error)', () => {
    const [above, below] = [2000, 2100];
    const n = above + below;
    const mean = (2 * above * below) / n + 1;
    const sd = Math.sqrt(((mean - 1) * (mean - 2)) / (n - 1));
    const p = probabilityOfRuns(above, below, Math.round(mean - sd));
    expect(p).toBeGreaterThan(0.157);
    expect(p).toBeLessThan(0.167);
  });

  test('the order is that of the horizontal axis; zeros are left out', () => {
    const p = runsP(column([4, 1, 3, 2, 5]), column([-1, 1, -1, 1, 0]));
    expectDigits(p, enumerated(2, 2, 2), 14);
    expect(runsP(column([1, 2, 3]), column([1, 1, 1]))).toBeNaN();
  });

  test('signs are counted apart and runs by their changes; equal places keep the order of the readings', () => {
    const inOrder = column([1, -2, -1, 3, -1, -2, -3]);
    expectDigits(runsP(column([1, 2, 3, 4, 5, 6, 7]), inOrder), enumerated(2, 5, 4), 12);
    expectDigits(runsP(column([2, 1, 1, 1]), column([1, 1, 1, -1])), enumerated(3, 1, 3), 12);
    expectDigits(runsP(column([1, 1, 0, 1]), column([1, -1, 1, 1])), enumerated(3, 1, 3), 12);
  });

  test('more runs than are likely have a probability of nearly 1', () => {
    expectDigits(probabilityOfRuns(300, 300, 600), 1, 11);
    expectDigits(probabilityOfRuns(300, 300, 420), 1, 11);
  });
});

describe('bow', () => {
  /** The parabola by a general-purpose matrix library, with its t test. */
  function parabola(x: readonly number[], y: readonly number[], w: readonly number[]) {
    const root = w.map(Math.sqrt);
    const matrix = new Matrix(x.map((value, i) => [1, value, value * value].map((v) => v * (root[i] ?? 0))));
    const response = Matrix.columnVector(y.map((value, i) => value * (root[i] ?? 0)));
    const solution = solve(matrix, response);
    const left = Matrix.sub(response, matrix.mmul(solution)).to1DArray();
    const variance = left.reduce((sum, r) => sum + r * r, 0) / (x.length - 3);
    const inverse = solve(matrix.transpose().mmul(matrix), Matrix.eye(3));
    const c2 = solution.get(2, 0);
    return { c2, p: studentTwoSided(c2 / Math.sqrt(variance * inverse.get(2, 2)), x.length - 3) };
  }

  const x = [1, 2, 4, 5, 7, 9];
  const y = [2.2, 3.9, 8.5, 9.7, 15.2, 18.4];

  test.each([
    ['equal weights', [1, 1, 1, 1, 1, 1]],
    ['weights', [1, 3, 2, 5, 1, 0.5]],
  ])('is the parabola’s sagitta over the line’s rise, %s', (_, w) => {
    const line = fitLine(column(x), column(y), column(w), 'estimated', 'free');
    const { c2, p } = parabola(x, y, w);
    const found = bow(line, column(x), column(y));
    expectDigits(found.percent, (100 * c2 * 64) / (4 * Math.abs(line.slope) * 8), 11);
    expectDigits(found.p, p, 10);
  });

  test('of a line held at a point is measured on a free parabola', () => {
    const held = fitLine(column(x), column(y), null, 'estimated', { held: 1, standardUncertainty: 0 });
    const { c2, p } = parabola(x, y, [1, 1, 1, 1, 1, 1]);
    const found = bow(held, column(x), column(y));
    expectDigits(found.percent, (100 * c2 * 64) / (4 * Math.abs(held.slope) * 8), 11);
    expectDigits(found.p, p, 10);
  });

  test('exact readings of a line have none; three readings cannot tell', () => {
    const line = fitLine(column([1, 2, 3, 4]), column([2, 4, 6, 8]), null, 'estimated', 'free');
    expect(bow(line, column([1, 2, 3, 4]), column([2, 4, 6, 8]))).toEqual({ percent: 0, p: 1 });
    const three = fitLine(column([1, 2, 3]), column([2, 4, 7]), null, 'estimated', 'free');
    expect(bow(three, column([1, 2, 3]), column([2, 4, 7])).percent).toBeNaN();
  });
});

describe('single readings, against R 4.2.2', () => {
  const set = referenceSets().find(({ id }) => id === 'r-puromycin-treated');
  const reference = set?.laws.find(({ law }) => law === 'linear')?.ols;
  // The per-reading columns of the same record; see test/reference/README.md.
  const perPoint = (reference as unknown as { perPoint: Record<string, number[]> }).perPoint;
  const [x, y] = [column(set?.x ?? []), column(set?.y ?? [])];
  const line = fitLine(x, y, null, 'estimated', 'free');

  test.each([
    ['hat', line.leverage],
    ['standardizedResidual', standardisedResiduals(line)],
    ['cooksDistance', cooksDistance(line)],
  ])('%s', (name, values) => {
    expect(values).toHaveLength(perPoint[name]?.length ?? -1);
    perPoint[name]?.forEach((value, i) => {
      expectDigits(values[i] ?? Number.NaN, value, 10);
    });
  });

  test('leaving one out through the leverage is refitting without it', () => {
    const left = leaveOneOut(line, y);
    x.forEach((at, i) => {
      const others = (values: Float64Array) => values.filter((_, k) => k !== i);
      const without = fitLine(others(x), others(y), null, 'estimated', 'free');
      expectDigits(left[i] ?? Number.NaN, without.intercept + without.slope * at, 11);
    });
  });
});

describe('a reading that the line passes through by force', () => {
  const alone = fitLine(column([0, 0, 0, 5]), column([1, 1.2, 0.9, 7]), null, 'estimated', 'free');

  test('has no standardised residual, influence or value without it', () => {
    expect(standardisedResiduals(alone)[3]).toBeNaN();
    expect(cooksDistance(alone)[3]).toBeNaN();
    expect(leaveOneOut(alone, column([1, 1.2, 0.9, 7]))[3]).toBeNaN();
    expect(standardisedResiduals(alone)[0]).not.toBeNaN();
  });

  test('weights enter the standardised residual', () => {
    const weight = column([1, 4, 9, 16, 25]);
    const line = fitLine(
      column([1, 2, 3, 4, 5]),
      column([1.1, 1.9, 3.2, 3.9, 5.2]),
      weight,
      'estimated',
      'free',
    );
    standardisedResiduals(line).forEach((value, i) => {
      const h = line.leverage[i] ?? 0;
      const scaled = (line.residual[i] ?? 0) * Math.sqrt(weight[i] ?? 0);
      expectDigits(value, scaled / (line.residualStandardDeviation * Math.sqrt(1 - h)), 14);
    });
  });
});
