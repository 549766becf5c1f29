import { shareSlope } from '../../core/series/share.ts';
import { key, law, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';
import { seriesOf } from './seriesOf.ts';

export const share: SheetFunction = {
  id: 'SHARE',
  description: 'Do several series share a slope? The shared slope, the test, and the lines of each.',
  parameters: [key, x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const { split, law: text, settings } = seriesOf(call);
    const rows = shareSlope(split, text, settings);
    return [
      ['term', 'value', 'standard uncertainty', 'note'],
      ...rows.map((row) => [row.term, row.value, row.standardUncertainty, row.note]),
    ];
  },
};
