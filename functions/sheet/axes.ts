import { fitOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { Answer, SheetFunction } from '../sheetFunction.ts';

export const axes: SheetFunction = {
  id: 'AXES',
  description:
    'The readings on the straight axes, to plot: horizontal, vertical, fitted and residual, row by row.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const fit = fitOf(call);
    const { form, readings, used, axes: straight, line } = fit;
    const { horizontal, vertical } = straight;
    const { fitted, residual } = line;
    const table: Answer[][] = [[form.against, form.plot, 'fitted', 'residual']];
    used.forEach((index, row) => {
      const position = readings.position[index] ?? 0;
      while (table.length < position) table.push(['', '', '', '']);
      table.push([horizontal[row] ?? '', vertical[row] ?? '', fitted[row] ?? '', residual[row] ?? '']);
    });
    while (table.length <= readings.count) table.push(['', '', '', '']);
    return table;
  },
};
