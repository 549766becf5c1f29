import { responseAt } from '../../core/readoff/responseAt.ts';
import { fitOf } from '../fitting.ts';
import { at, law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';
import { readOffRows } from './readOffRows.ts';

export const yAt: SheetFunction = {
  id: 'Y.AT',
  description: 'y read off the fitted curve at given x: value, standard uncertainty, low, high.',
  parameters: [x, y, law, at, ...shared],
  result: 'matrix',
  compute: (call) => readOffRows(call, fitOf(call), responseAt),
};
