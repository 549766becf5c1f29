import type { Fit } from '../../core/fit/fit.ts';
import { fitLaw } from '../../core/fit/fitLaw.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice } from '../state/choice.ts';
import { readingsIn, readSheetCells } from '../state/sheetCells.ts';

/**
 * The fit of every reading in the cells: the panel's own unless the user leaves some out for a look, which no formula in
 * the sheet does.
 */
export async function wholeFit(workbook: Workbook, choice: Choice, fit: Fit): Promise<Fit> {
  if (choice.leftOut.length === 0) return fit;
  const cells = await readSheetCells(workbook, choice);
  return fitLaw(readingsIn(cells, []).readings, choice.law, fit.settings);
}
