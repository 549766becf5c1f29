import type { Fit } from '../fit/fit.ts';
import { scaleOf } from '../fit/spread.ts';
import { generalLaws } from '../law/catalogue.ts';
import { checkWords } from '../words/checkWords.ts';
import { type ComparedLaw, compare } from './compare.ts';
import { caution, type Finding, note } from './finding.ts';
import { disagreement } from './judgesDisagree.ts';

/** Differences of AICc from which another law is better supported, and this one has essentially no support. */
const BETTER = 4;
const FAR_BETTER = 10;
/** Readings up to which the slower judge by direct fits is asked as well. */
const JUDGED_BY_BOTH = 500;

/**
 * Whether a general law is supported better by the same readings, and whether the two judges disagree about the first.
 * @see Burnham & Anderson (2002), Model Selection and Multimodel Inference, 2nd ed., section 2.6
 */
export function otherLawsFindings(fit: Fit): Finding[] {
  const { law, readings, settings, taking } = fit;
  if (settings.spreadX.kind !== 'none') return [];
  const own = law.name || law.equation;
  const laws = [own, ...generalLaws.filter((name) => name !== own)];
  const judgedBy = (judge: 'line' | 'direct') =>
    compare(readings, laws, {
      ...settings,
      options: { ...settings.options, form: 1, intercept: 'free', interval: 'line', judge },
    });
  const line = judgedBy('line');
  const { rows } = line;
  const found: Finding[] = [];
  const better = betterBy(rows, own);
  if (better !== null) {
    const text = checkWords.betterLaw(better.law, law.name, better.difference);
    found.push(better.difference > FAR_BETTER ? caution(text) : note(text));
  }
  if (taking.length <= JUDGED_BY_BOTH) {
    const text = disagreement(line, judgedBy('direct'), scaleOf(settings.spreadY));
    if (text !== null) found.push(note(text));
  }
  return found;
}

function betterBy(rows: readonly ComparedLaw[], own: string): { law: string; difference: number } | null {
  const [best] = rows;
  const mine = rows.find((row) => row.law === own);
  if (best === undefined || mine === undefined || best.aicc === '' || mine.aicc === '') return null;
  const difference = mine.aicc - best.aicc;
  return difference > BETTER ? { law: best.law, difference } : null;
}
