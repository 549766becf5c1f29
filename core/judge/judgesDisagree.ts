import { scaleOf } from '../fit/spread.ts';
import type { FitSettings } from '../given/given.ts';
import type { Scale } from '../line/line.ts';
import type { Readings } from '../readings/readings.ts';
import { judgeWords } from '../words/judgeWords.ts';
import { type ComparedLaw, type Comparison, compare } from './compare.ts';

/** Difference of AICc below which two laws are supported alike. */
const LEVEL = 2;

/**
 * A finding when the two judges put different laws first: the one takes the scatter as it is on each law's own straight
 * axes, the other as the same in y for all laws.
 * @returns null when they agree, hold the two laws level (AICc less than 2 apart), or one of them has no law to rank
 * @throws what `compare` throws
 * @see Burnham & Anderson (2002), Model Selection and Multimodel Inference, 2nd ed., section 2.6 (differences below 2)
 */
export function judgesDisagree(
  readings: Readings,
  laws: readonly string[],
  settings: FitSettings,
): string | null {
  if (settings.spreadX.kind !== 'none') return null;
  const by = (judge: 'line' | 'direct'): Comparison =>
    compare(readings, laws, { ...settings, options: { ...settings.options, judge } });
  return disagreement(by('line'), by('direct'), scaleOf(settings.spreadY));
}

/** As `judgesDisagree`, for two comparisons that are at hand. */
export function disagreement(line: Comparison, direct: Comparison, scale: Scale): string | null {
  const [byLine] = line.rows;
  const [byDirect] = direct.rows;
  if (byLine === undefined || byDirect === undefined || byLine.law === byDirect.law) return null;
  if (byLine.reason !== '' || byDirect.reason !== '') return null;
  // Laws that are the same curve are level: which of them stands first means nothing.
  const level = (first: ComparedLaw, { rows }: Comparison, other: string): boolean => {
    const second = rows.find((row) => row.law === other)?.aicc ?? '';
    return first.aicc === '' || (second !== '' && second - first.aicc < LEVEL);
  };
  if (level(byLine, line, byDirect.law) || level(byDirect, direct, byLine.law)) return null;
  const supportOf = ({ rows }: Comparison, law: string): ComparedLaw['support'] =>
    rows.find((row) => row.law === law)?.support ?? '';
  return judgeWords.judgesDisagree(
    { law: byLine.law, support: byLine.support },
    { law: byDirect.law, support: byDirect.support },
    supportOf(direct, byLine.law),
    scale === 'known',
  );
}
