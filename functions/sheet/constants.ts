import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const constants: SheetFunction = {
  id: 'CONSTANTS',
  description: 'The constants of the law, with standard uncertainties and coverage intervals.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const rows = fitOf(call).constants.map((constant) => [
      constant.name,
      constant.value,
      constant.standardUncertainty,
      constant.low,
      constant.high,
    ]);
    return [['constant', 'value', 'standard uncertainty', 'low', 'high'], ...rows];
  },
};
