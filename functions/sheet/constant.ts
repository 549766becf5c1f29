import type { ConstantEstimate } from '../../core/fit/fit.ts';
import { Problem } from '../../core/problem.ts';
import { functionWords } from '../../core/words/functionWords.ts';
import { constantOf, fitOf } from '../fitting.ts';
import { law, name, part, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

const parts: ReadonlyMap<string, (constant: ConstantEstimate) => number> = new Map([
  ['value', (constant: ConstantEstimate) => constant.value],
  ['u', (constant: ConstantEstimate) => constant.standardUncertainty],
  ['low', (constant: ConstantEstimate) => constant.low],
  ['high', (constant: ConstantEstimate) => constant.high],
]);

export const constant: SheetFunction = {
  id: 'CONSTANT',
  description: 'One constant of the law as a number, or its standard uncertainty, or an end of its interval.',
  parameters: [x, y, law, name, part, ...shared],
  result: 'scalar',
  compute(call) {
    const wanted = call.text('part');
    const take = parts.get(wanted === '' ? 'value' : wanted.toLowerCase());
    if (take === undefined)
      throw new Problem('argument', 'part', functionWords.part(wanted, [...parts.keys()]));
    return take(constantOf(call, fitOf(call)));
  },
};
