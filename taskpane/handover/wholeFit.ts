import type { Fit } from '../../core/fit/fit.ts';
import { fitLaw } from '../../core/fit/fitLaw.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice } from '../state/choice.ts';
import { constantsOf } from '../state/lawSymbols.ts';
import { settingsFor } from '../state/settingsFor.ts';
import { readingsIn, readSheetCells } from '../state/sheetCells.ts';

/** The fit of every reading in the cells of a choice, also of those that the user leaves out for a look: no formula in the sheet does. */
export async function wholeFit(workbook: Workbook, choice: Choice): Promise<Fit> {
  const cells = await readSheetCells(workbook, choice);
  const { readings } = readingsIn(cells, []);
  return fitLaw(readings, choice.law, settingsFor(choice, constantsOf(choice.law), cells, readings.count));
}
