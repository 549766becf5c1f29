import { nextReading } from '../../core/next/nextReading.ts';
import { constantOf, fitOf } from '../fitting.ts';
import { high, law, low, name, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const next: SheetFunction = {
  id: 'NEXT',
  description: 'Where one more reading cuts the uncertainty of a constant the most.',
  parameters: [x, y, law, name, low, high, ...shared],
  result: 'matrix',
  compute(call) {
    const from = call.number('low');
    const to = call.number('high');
    const fit = fitOf(call);
    const found = nextReading(fit, constantOf(call, fit).name, from, to);
    return [
      ['next x', 'u now', 'u after'],
      [found.x, found.now, found.after],
    ];
  },
};
