import { describe, expect, test } from '@jest/globals';
import { settleTrials } from '../../../core/direct/settleTrials.ts';
import type { DirectResult } from '../../../core/fit/fit.ts';
import type { Law } from '../../../core/law/law.ts';
import { handMadeLaw, peakLaw, riseLaw, withForms } from './handMadeLaw.ts';
import { expectAllDigits, nistSet, standardUncertainties } from './nistSets.ts';

function settle(law: Law, x: Float64Array, y: Float64Array): DirectResult {
  const form = law.forms[0];
  if (!form) throw new Error('no form');
  const constants = law.constants.map(() => Number.NaN);
  return settleTrials({ law, form, x, y, omega: y.map(() => 1), scale: 'estimated', constants });
}

const edgeAtResponse = (_: number, y: number): number => y;
const edgeAtPredictor = (x: number): number => x;

const rise = withForms(riseLaw, [
  {
    trials: ['b1'],
    inSlope: ['b2'],
    inIntercept: [],
    vertical: (_x, y, [b1 = NaN]) => Math.log(1 - y / b1),
    horizontal: (x) => x,
    responseFrom: (_x, v, [b1 = NaN]) => b1 * (1 - Math.exp(v)),
    solve: (slope, _intercept, [b1 = NaN]) => [b1, -slope],
    trialEdges: [[edgeAtResponse]],
  },
]);

const peak = withForms(peakLaw, [
  {
    trials: ['b3'],
    inSlope: ['b2'],
    inIntercept: ['b1', 'b2'],
    vertical: (_x, y) => Math.log(y),
    horizontal: (x, _y, [, , b3 = NaN]) => (x - b3) ** 2,
    responseFrom: (_x, v) => Math.exp(v),
    solve: (slope, intercept, [, , b3 = NaN]) => {
      const b2 = Math.sqrt(-1 / (2 * slope));
      return [b2 * Math.exp(intercept), b2, b3];
    },
    trialEdges: [[edgeAtPredictor]],
  },
]);

const logistic = withForms(
  handMadeLaw('y(x) = b1/(1 + exp(b2 - b3*x))', ['b1', 'b2', 'b3'], (x, [b1 = NaN, b2 = NaN, b3 = NaN]) => {
    const e = Math.exp(b2 - b3 * x);
    const y = b1 / (1 + e);
    return [y, 1 / (1 + e), (-y * e) / (1 + e), (y * e * x) / (1 + e)];
  }),
  [
    {
      trials: ['b1'],
      inSlope: ['b3'],
      inIntercept: ['b2'],
      vertical: (_x, y, [b1 = NaN]) => Math.log(b1 / y - 1),
      horizontal: (x) => x,
      responseFrom: (_x, v, [b1 = NaN]) => b1 / (1 + Math.exp(v)),
      solve: (slope, intercept, [b1 = NaN]) => [b1, intercept, -slope],
      trialEdges: [[edgeAtResponse]],
    },
  ],
);

const ratio = withForms(
  handMadeLaw(
    'y(x) = b1*(x^2 + b2*x)/(x^2 + b3*x + b4)',
    ['b1', 'b2', 'b3', 'b4'],
    (x, [b1 = NaN, b2 = NaN, b3 = NaN, b4 = NaN]) => {
      const q = x * x + b3 * x + b4;
      const p = x * x + b2 * x;
      return [(b1 * p) / q, p / q, (b1 * x) / q, (-b1 * p * x) / q ** 2, (-b1 * p) / q ** 2];
    },
  ),
  [
    {
      trials: ['b3', 'b4'],
      inSlope: ['b1'],
      inIntercept: ['b1', 'b2'],
      vertical: (x, y, [, , b3 = NaN, b4 = NaN]) => (y * (x * x + b3 * x + b4)) / x,
      horizontal: (x) => x,
      responseFrom: (x, v, [, , b3 = NaN, b4 = NaN]) => (v * x) / (x * x + b3 * x + b4),
      solve: (slope, intercept, [, , b3 = NaN, b4 = NaN]) => [slope, intercept / slope, b3, b4],
      trialEdges: [[], []],
    },
  ],
);

describe('settleTrials on NIST StRD nonlinear sets, without starting values', () => {
  test.each([
    ['BoxBOD', rise],
    ['Misra1a', rise],
    ['Eckerle4', peak],
    ['Rat42', logistic],
    ['MGH09', ratio],
  ] as const)('%s', (name, law) => {
    const set = nistSet(name);
    const result = settle(law, set.x, set.y);
    expectAllDigits(result.theta, set.parameters, 9);
    expectAllDigits(standardUncertainties(result), set.standardDeviations, 8);
    expect(result.notes).toEqual([]);
  });
});
