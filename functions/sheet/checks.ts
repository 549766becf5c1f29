import { sharedCache } from '../../core/cache/cache.ts';
import { fitKey, rememberFit } from '../../core/cache/rememberFit.ts';
import { checks as findingsOf } from '../../core/judge/checks.ts';
import { Problem } from '../../core/problem.ts';
import type { Readings } from '../../core/readings/readings.ts';
import { readingWords } from '../../core/words/readingWords.ts';
import { lawOf, readingsOf, settingsOf } from '../fitting.ts';
import { law, shared, x, y } from '../parameters.ts';
import type { Answer, SheetFunction } from '../sheetFunction.ts';

/** What can still be said of the readings when no fit came of them. */
function withoutFit(problem: Problem, readings: Readings): Answer[][] {
  return [
    ['stop', problem.message],
    ...readings.setAside.map((one) => ['caution', one.message]),
    ...(readings.trailingZeros > 0 ? [['note', readingWords.trailingZeros(readings.trailingZeros)]] : []),
  ];
}

export const checks: SheetFunction = {
  id: 'CHECKS',
  description: 'What a careful engineer would say about this fit, one sentence each, most serious first.',
  parameters: [x, y, law, ...shared],
  result: 'matrix',
  compute(call) {
    const header = ['level', 'finding'];
    const keyed = readingsOf(call);
    const text = lawOf(call);
    const settings = settingsOf(call, keyed.readings.count);
    try {
      const found = sharedCache.remember(`checks|${fitKey(keyed, text, settings)}`, () =>
        findingsOf(rememberFit(keyed, text, settings)),
      );
      return [header, ...found.map((finding) => [finding.level, finding.text])];
    } catch (error) {
      // A wrong argument stays an error; anything else is a finding about these readings and this law.
      if (!(error instanceof Problem) || error.code === 'argument' || error.code === 'cell') throw error;
      return [header, ...withoutFit(error, keyed.readings)];
    }
  },
};
