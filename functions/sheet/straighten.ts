import { parseKnown } from '../../core/given/parseKnown.ts';
import { listForms } from '../../core/law/catalogue.ts';
import { compileLaw } from '../../core/law/compileLaw.ts';
import { lawOf } from '../fitting.ts';
import { known, law } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

export const straighten: SheetFunction = {
  id: 'STRAIGHTEN',
  description: 'Every way to draw the law as a straight line, best first: what to plot against what.',
  parameters: [law, known],
  result: 'matrix',
  compute(call) {
    const forms = listForms(compileLaw(lawOf(call), parseKnown(call.given('known')).keys()));
    return [
      ['form', 'plot', 'against', 'slope', 'intercept', 'trial', 'note'],
      ...forms.map((form) => [
        form.form,
        form.plot,
        form.against,
        form.slope,
        form.intercept,
        form.trial,
        form.note,
      ]),
    ];
  },
};
