import { describe, expect, test } from '@jest/globals';
import { settleTrials } from '../../../core/direct/settleTrials.ts';
import { formlessLaw } from './formlessLaw.ts';
import { expectAllDigits, nistSet, standardUncertainties } from './nistSets.ts';

describe('ratios of polynomials, multiplied through by their denominators', () => {
  test.each(['Kirby2', 'Thurber'])('NIST StRD %s without starting values', (name) => {
    const set = nistSet(name);
    const law = formlessLaw(set.expression);
    expect(law.constants).toEqual(set.constants);
    const result = settleTrials({
      law,
      form: null,
      x: set.x,
      y: set.y,
      omega: set.y.map(() => 1),
      scale: 'estimated',
      constants: law.constants.map(() => NaN),
    });
    expectAllDigits(result.theta, set.parameters, 9);
    expectAllDigits(standardUncertainties(result), set.standardDeviations, 8);
    expectAllDigits([result.residualStandardDeviation], [set.residualStandardDeviation], 10);
  });
});
