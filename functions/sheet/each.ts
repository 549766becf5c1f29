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
    const series = seriesOf(call);
    const { constants, rows } = eachSeries(series.keys, series.x, series.y, series.law, series.settings);
    const header = [
      'key',
      'readings',
      ...constants.flatMap((name) => [name, `u(${name})`]),
      'r squared',
      'bow %',
      'note',
    ];
    return [
      header,
      ...rows.map((row) => [
        row.key,
        row.readings,
        ...constants.flatMap((_name, index): readonly Answer[] => {
          const estimate = row.values[index];
          return estimate === undefined ? ['', ''] : [estimate.value, estimate.standardUncertainty];
        }),
        row.rSquared,
        row.bowPercent,
        row.note,
      ]),
    ];
  },
};
