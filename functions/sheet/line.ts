import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const line: SheetFunction = {
  id: 'LINE',
  description:
    'Slope and intercept of the line on the straight axes, with standard uncertainties and correlation.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const fitted = fitOf(call).line;
    return [
      ['term', 'value', 'standard uncertainty'],
      ['slope', fitted.slope, Math.sqrt(fitted.varianceSlope)],
      ['intercept', fitted.intercept, Math.sqrt(fitted.varianceIntercept)],
      ['correlation', fitted.correlation, ''],
    ];
  },
};
