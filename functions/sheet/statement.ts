import { statement as write } from '../../core/statement/statement.ts';
import { constantOf, fitOf } from '../fitting.ts';
import { law, name, shared, unit, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const statement: SheetFunction = {
  id: 'STATEMENT',
  description:
    'One sentence to paste into a report: the constant rounded to its uncertainty, interval and law.',
  parameters: [x, y, law, name, unit, ...shared],
  result: 'scalar',
  compute(call) {
    const fit = fitOf(call);
    return write(fit, constantOf(call, fit).name, call.text('unit'));
  },
};
