import { sharedCache } from '../../core/cache/cache.ts';
import { fitKey } from '../../core/cache/rememberFit.ts';
import { cellText, isRange } from '../../core/given/cellText.ts';
import { compare as judge } from '../../core/judge/compare.ts';
import { generalLaws } from '../../core/law/catalogue.ts';
import { Problem } from '../../core/problem.ts';
import { flatten } from '../../core/readings/cellWalk.ts';
import { functionWords } from '../../core/words/functionWords.ts';
import type { Call } from '../call.ts';
import { readingsOf, settingsOf } from '../fitting.ts';
import { laws, shared, x, y } from '../parameters.ts';
import type { SheetFunction } from '../sheetFunction.ts';

/** More would keep the sheet waiting. */
const MOST_LAWS = 100;

function lawsOf(call: Call): readonly string[] {
  if (call.omitted('laws')) return generalLaws;
  const given = call.given('laws');
  const cells = isRange(given) ? flatten(given) : [given];
  const names = cells
    .flatMap((cell) => cellText(cell, 'laws').split(';'))
    .map((text) => text.trim())
    .filter((text) => text !== '');
  if (names.length === 0) throw new Problem('argument', 'laws', functionWords.noLaws());
  if (names.length > MOST_LAWS) {
    throw new Problem('argument', 'laws', functionWords.tooManyLaws(names.length, MOST_LAWS));
  }
  return names;
}

export const compare: SheetFunction = {
  id: 'COMPARE',
  description: 'Laws ranked on the same readings, with the support each has and why others cannot be judged.',
  parameters: [x, y, laws, ...shared],
  result: 'matrix',
  compute(call) {
    const keyed = readingsOf(call);
    const names = lawsOf(call);
    const settings = settingsOf(call, keyed.readings.count);
    const { rows } = sharedCache.remember(`compare|${fitKey(keyed, names.join('\n'), settings)}`, () =>
      judge(keyed.readings, names, settings),
    );
    return [
      ['rank', 'law', 'support %', 'AICc', 'r squared', 'bow %', 'misfit', 'reason'],
      ...rows.map((row) => [
        row.rank,
        row.law,
        row.support,
        row.aicc,
        row.rSquared,
        row.bowPercent,
        row.misfit,
        row.reason,
      ]),
    ];
  },
};
