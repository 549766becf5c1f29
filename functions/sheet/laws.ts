import { listLaws } from '../../core/law/catalogue.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const laws: SheetFunction = {
  id: 'LAWS',
  description: 'The laws that can be asked for by name, with their equations, axes and uses.',
  parameters: [],
  result: 'matrix',
  compute() {
    return [
      ['law', 'equation', 'plot', 'against', 'slope', 'intercept', 'use'],
      ...listLaws().map((one) => [
        one.name,
        one.equation,
        one.plot,
        one.against,
        one.slope,
        one.intercept,
        one.use,
      ]),
    ];
  },
};
