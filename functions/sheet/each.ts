import { eachSeries } from '../../core/series/each.ts';
import { key, law, shared, x, y } from '../parameters.ts';
import type { Answer, SheetFunction } from '../sheetFunction.ts';
import { seriesOf } from './seriesOf.ts';

export const each: SheetFunction = {
  id: 'EACH',
  description: 'Many series at once: the constants of the law for each key, one row each.',
  parameters: [key, x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const { split, law: text, settings } = seriesOf(call);
    const { constants, rows } = eachSeries(split, text, settings);
    const names = constants.flatMap((name) => [name, `u(${name})`]);
    const table: Answer[][] = [['key', 'readings', ...names, 'r squared', 'bow %', 'note']];
    for (const { key, readings, values, rSquared, bowPercent, note } of rows) {
      const row: Answer[] = [key, readings];
      for (const { value, standardUncertainty } of values) row.push(value, standardUncertainty);
      while (row.length < names.length + 2) row.push('');
      row.push(rSquared, bowPercent, note);
      table.push(row);
    }
    return table;
  },
};
