import { residualTable } from '../../core/judge/residuals.ts';
import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const residuals: SheetFunction = {
  id: 'RESIDUALS',
  description: 'For every reading its residual, leverage and influence, and a finding where it stands out.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const rows = residualTable(fitOf(call)).map((row) => [
      row.reading,
      row.residual,
      row.standardised,
      row.leverage,
      row.influence,
      row.finding,
    ]);
    return [['reading', 'residual', 'standardised', 'leverage', 'influence', 'finding'], ...rows];
  },
};
