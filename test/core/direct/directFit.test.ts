import { describe, expect, test } from '@jest/globals';
import { directFit } from '../../../core/direct/directFit.ts';
import type { DirectResult } from '../../../core/fit/fit.ts';
import type { Law } from '../../../core/law/law.ts';
import { expectDigits } from '../../expectDigits.ts';
import { problemOf } from '../../problemOf.ts';
import {
  exponentialLaw,
  handMadeLaw,
  parabolaLaw,
  peakLaw,
  riseLaw,
  shiftedPowerLaw,
  withKnown,
} from './handMadeLaw.ts';
import { expectAllDigits, nistSet, standardUncertainties } from './nistSets.ts';

interface Settings {
  readonly omega?: ArrayLike<number>;
  readonly scale?: 'known' | 'estimated';
  readonly constants?: readonly number[];
}

function settle(
  law: Law,
  x: ArrayLike<number>,
  y: ArrayLike<number>,
  start: number[],
  more: Settings = {},
): DirectResult {
  return directFit({
    law,
    x: Float64Array.from(x),
    y: Float64Array.from(y),
    omega: Float64Array.from(more.omega ?? Array.from(x, () => 1)),
    scale: more.scale ?? 'estimated',
    constants: more.constants ?? law.constants.map(() => NaN),
    start,
  });
}

const range = (count: number, first: number, step: number): number[] =>
  Array.from({ length: count }, (_, i) => first + i * step);

describe('directFit on NIST StRD nonlinear sets, from both of their published starts', () => {
  test.each([
    ['BoxBOD', riseLaw],
    ['Misra1a', riseLaw],
    ['Eckerle4', peakLaw],
  ] as const)('%s', (name, law) => {
    const set = nistSet(name);
    for (const start of [set.start1, set.start2]) {
      const result = settle(law, set.x, set.y, start);
      expectAllDigits(result.theta, set.parameters, 10);
      expectAllDigits(standardUncertainties(result), set.standardDeviations, 9);
      expectDigits(result.sumOfSquares, set.residualSumOfSquares, 10);
      expectDigits(result.residualStandardDeviation, set.residualStandardDeviation, 10);
      expect(result.degreesOfFreedom).toBe(set.y.length - law.unknown.length);
    }
  });
});

describe('directFit', () => {
  const x = range(9, 0, 0.5);
  const y = [5.1, 3.8, 3.2, 2.2, 1.9, 1.3, 1.2, 0.8, 0.75];

  test('readings that lie on the law give its constants and no residuals', () => {
    const exact = x.map((value) => 4 * Math.exp(-0.7 * value));
    const result = settle(exponentialLaw, x, exact, [1, -0.1]);
    expectDigits(result.theta[0] ?? NaN, 4, 14);
    expectDigits(result.theta[1] ?? NaN, -0.7, 14);
    expect(result.sumOfSquares).toBeLessThan(1e-28);
  });

  test('at the minimum the residuals are square to every column of the Jacobian', () => {
    const omega = y.map((value) => 1 / value ** 2);
    const { fitted, jacobian } = settle(exponentialLaw, x, y, [4, -0.5], { omega });
    for (const column of jacobian) {
      const products = y.map((value, i) => (omega[i] ?? 0) * (value - (fitted[i] ?? 0)) * (column[i] ?? 0));
      const size = Math.hypot(...products);
      expect(Math.abs(products.reduce((sum, value) => sum + value, 0)) / size).toBeLessThan(1e-12);
    }
  });

  test('stated uncertainties: the covariance follows from them alone', () => {
    const omega = y.map(() => 1 / 0.1 ** 2);
    const known = settle(exponentialLaw, x, y, [4, -0.5], { omega, scale: 'known' });
    const doubled = settle(exponentialLaw, x, y, [4, -0.5], {
      omega: omega.map((w) => w / 4),
      scale: 'known',
    });
    const estimated = settle(exponentialLaw, x, y, [4, -0.5], { omega });
    for (let k = 0; k < 2; k++) {
      expectDigits((doubled.covariance[k]?.[k] ?? NaN) / (known.covariance[k]?.[k] ?? NaN), 4, 12);
      const ratio = (estimated.covariance[k]?.[k] ?? NaN) / (known.covariance[k]?.[k] ?? NaN);
      expectDigits(ratio, estimated.residualStandardDeviation ** 2, 12);
    }
  });

  test('a known constant stays where it is', () => {
    const law = withKnown(exponentialLaw, ['p']);
    const result = settle(law, x, y, [-0.1], { constants: [5, NaN] });
    expect(result.theta).toHaveLength(1);
    expect(result.degreesOfFreedom).toBe(8);
    const sum = (q: number): number =>
      y.reduce((total, value, i) => total + (value - 5 * Math.exp(q * (x[i] ?? 0))) ** 2, 0);
    const q = result.theta[0] ?? NaN;
    expect(sum(q)).toBeLessThan(Math.min(sum(q * 1.0001), sum(q * 0.9999)));
    expectDigits(result.sumOfSquares, sum(q), 13);
  });

  test('a law linear in its constants needs no start', () => {
    // NIST StRD linear set Wampler1's idea: integers on a polynomial are returned exactly.
    const places = range(21, 0, 1);
    const result = settle(
      parabolaLaw,
      places,
      places.map((v) => 1 + v + v * v),
      [NaN, NaN, NaN],
    );
    for (const value of result.theta) expectDigits(value, 1, 12);
  });

  test('a linear law far from its origin keeps its digits', () => {
    const line = handMadeLaw(
      'y(x) = a + b*x',
      ['a', 'b'],
      (v, [a = NaN, b = NaN]) => [a + b * v, 1, v],
      true,
    );
    const far = range(10, 1e8, 1);
    const result = settle(
      line,
      far,
      far.map((v, i) => 2 * (v - 1e8) + (i % 2 ? 0.25 : -0.25)),
      [0, 0],
    );
    // By hand: slope = Sxy/Sxx = 2 + 1.25/82.5.
    expectDigits(result.theta[1] ?? NaN, 2 + 1.25 / 82.5, 8);
  });

  test('of two signs that fit alike the positive one is returned', () => {
    const set = nistSet('Eckerle4');
    const result = settle(peakLaw, set.x, set.y, [-1.5, -5, 450]);
    expect(result.theta[0]).toBeGreaterThan(0);
    expect(result.theta[1]).toBeGreaterThan(0);
    expectAllDigits(result.theta, set.parameters, 10);
  });

  test('as many readings as constants: values without uncertainty', () => {
    const result = settle(exponentialLaw, [0, 1], [2, 1], [1, -0.5]);
    expectDigits(result.theta[0] ?? NaN, 2, 13);
    expectDigits(result.theta[1] ?? NaN, -Math.LN2, 13);
    expect(result.degreesOfFreedom).toBe(0);
    expect(result.residualStandardDeviation).toBeNaN();
    expect(result.covariance.flatMap((row) => Array.from(row)).every(Number.isNaN)).toBe(true);
    const known = settle(exponentialLaw, [0, 1], [2, 1], [1, -0.5], { scale: 'known' });
    expect(known.covariance[0]?.[0]).toBeNaN();
  });

  test.each([1e-12, 1e12])('y in units %p times as small scales p alone', (unit) => {
    const plain = settle(exponentialLaw, x, y, [4, -0.5]);
    const scaled = settle(
      exponentialLaw,
      x,
      y.map((value) => value * unit),
      [4 * unit, -0.5],
    );
    expectDigits((scaled.theta[0] ?? NaN) / unit, plain.theta[0] ?? NaN, 13);
    expectDigits(scaled.theta[1] ?? NaN, plain.theta[1] ?? NaN, 13);
    expectDigits(
      Math.sqrt(scaled.covariance[0]?.[0] ?? NaN) / unit,
      Math.sqrt(plain.covariance[0]?.[0] ?? NaN),
      12,
    );
  });

  test('does not change its arguments', () => {
    const inputs = { x: Float64Array.from(x), y: Float64Array.from(y), omega: new Float64Array(9).fill(1) };
    const constants = Float64Array.from([NaN, NaN]);
    const start = Float64Array.from([4, -0.5]);
    directFit({ law: exponentialLaw, ...inputs, scale: 'estimated', constants, start });
    expect(inputs).toEqual({
      x: Float64Array.from(x),
      y: Float64Array.from(y),
      omega: new Float64Array(9).fill(1),
    });
    expect(Array.from(constants)).toEqual([NaN, NaN]);
    expect(Array.from(start)).toEqual([4, -0.5]);
  });

  test('a step that leaves the domain is not taken', () => {
    const h = range(12, 1, 0.25);
    const discharge = h.map((value, i) => 3 * (value - 0.8) ** 1.7 * (1 + 0.02 * Math.sin(7 * i)));
    const result = settle(shiftedPowerLaw, h, discharge, [1, 0.99, 1]);
    expect(result.sumOfSquares).toBeLessThan(h.length * (0.02 * 60) ** 2);
    expect(result.theta[1]).toBeLessThan(1);
    expect(result.notes).toEqual([]);
  });
});

describe('directFit refuses', () => {
  test('fewer readings than constants', () => {
    const problem = problemOf(() => settle(exponentialLaw, [1], [2], [1, 1]));
    expect(problem.code).toBe('tooFew');
    expect(problem.argument).toBe('x');
    expect(problem.message).toBe('There is 1 reading, but y(x) = p*exp(q*x) needs at least 2.');
  });

  test('a law that cannot be solved for y', () => {
    const problem = problemOf(() => settle({ ...exponentialLaw, curve: null }, [1, 2, 3], [1, 2, 3], [1, 1]));
    expect(problem.code).toBe('argument');
    expect(problem.argument).toBe('law');
  });

  test('a start at which the law does not exist', () => {
    const problem = problemOf(() => settle(shiftedPowerLaw, [1, 2, 3, 4], [1, 2, 4, 6], [1, 1.5, 2]));
    expect(problem.code).toBe('noConvergence');
    expect(problem.message).toContain('h0 = 1.5');
  });

  test('constants that run away, by name', () => {
    // Straight readings ask the saturating rise for an infinite ceiling.
    const x = range(8, 1, 1);
    const problem = problemOf(() =>
      settle(
        riseLaw,
        x,
        x.map((v) => 2 * v + 0.001 * v * v),
        [40, 0.05],
      ),
    );
    expect(problem.code).toBe('noConvergence');
    expect(problem.argument).toBe('law');
    expect(problem.message).toContain('do not settle b1');
  });

  test('constants that the readings cannot tell apart, by name', () => {
    const product = handMadeLaw('y(x) = R*C*x + d', ['R', 'C', 'd'], (x, [R = NaN, C = NaN, d = NaN]) => [
      R * C * x + d,
      C * x,
      R * x,
      1,
    ]);
    const problem = problemOf(() => settle(product, [1, 2, 3, 4], [2, 4.1, 5.9, 8], [1, 1, 0]));
    expect(problem.code).toBe('noConvergence');
    expect(problem.message).toContain('do not settle R and C separately');
  });

  test('a linear law when all x are equal', () => {
    const problem = problemOf(() => settle(parabolaLaw, [0.1, 0.1, 0.1, 0.1], [1, 2, 3, 4], [0, 0, 0]));
    expect(problem.code).toBe('noConvergence');
    expect(problem.message).toContain('do not settle a, b and c separately');
  });
});
