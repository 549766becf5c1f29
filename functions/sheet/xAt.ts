import { predictorAt } from '../../core/readoff/predictorAt.ts';
import { fitOf } from '../fitting.ts';
import { at, law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';
import { readOffRows } from './readOffRows.ts';

export const xAt: SheetFunction = {
  id: 'X.AT',
  description: 'x at which the fitted curve reaches given y: value, standard uncertainty, low, high.',
  parameters: [x, y, law, at, ...shared],
  result: 'matrix',
  compute: (call) => readOffRows(call, fitOf(call), predictorAt),
};
