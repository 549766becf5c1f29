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
    const table: Answer[][] = Array.from({ length: readings.count + 1 }, () => ['', '', '', '']);
    table[0] = [form.against, form.plot, 'fitted', 'residual'];
    used.forEach((index, row) => {
      table[readings.position[index] ?? 0] = [
        straight.horizontal[row] ?? '',
        straight.vertical[row] ?? '',
        line.fitted[row] ?? '',
        line.residual[row] ?? '',
      ];
    });
    return table;
  },
};
