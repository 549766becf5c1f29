import { straightness as judge } from '../../core/straightness/straightness.ts';
import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const straightness: SheetFunction = {
  id: 'STRAIGHTNESS',
  description: 'How straight the readings lie: scatter, bow, runs, misfit, likelihood.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const found = judge(fitOf(call));
    return [
      ['readings used', found.readingsUsed],
      ['readings set aside', found.readingsSetAside],
      ['degrees of freedom', found.degreesOfFreedom],
      ['r squared', found.rSquared],
      ['residual standard deviation', found.residualStandardDeviation],
      ['bow %', found.bowPercent],
      ['bow p', found.bowP],
      ['runs p', found.runsP],
      ['misfit', found.misfit],
      ['leave-one-out misfit', found.leaveOneOutMisfit],
      ['log-likelihood', found.logLikelihood],
      ['AICc', found.aicc],
      ['chi-squared p', found.chiSquaredP],
    ];
  },
};
