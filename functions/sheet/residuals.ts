import { residualTable } from '../../core/judge/residuals.ts';
import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { Answer, SheetFunction } from '../sheetFunction.ts';

export const residuals: SheetFunction = {
  id: 'RESIDUALS',
  description: 'For every reading its residual, leverage and influence, and a finding where it stands out.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const table: Answer[][] = [['reading', 'residual', 'standardised', 'leverage', 'influence', 'finding']];
    for (const { reading, residual, standardised, leverage, influence, finding } of residualTable(
      fitOf(call),
    )) {
      table.push([reading, residual, standardised, leverage, influence, finding]);
    }
    return table;
  },
};
