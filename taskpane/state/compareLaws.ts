import { rememberFit } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import type { Fit } from '../../core/fit/fit.ts';
import { type ComparedLaw, ranked } from '../../core/judge/compare.ts';
import { type JudgedLaw, judgeLaw } from '../../core/judge/judgeLaw.ts';
import { generalLaws, type NamedLaw, namedLaws } from '../../core/law/catalogue.ts';
import type { Choice } from './choice.ts';
import { constantsOf, isGeneral } from './lawSymbols.ts';
import { attempt, valueIn } from './outcome.ts';
import type { LawCard } from './panelState.ts';
import { comparisonSettings } from './settingsFor.ts';
import type { SheetCells } from './sheetCells.ts';

/** The laws that a choice compares: the general ones, the user's, and the chosen one. */
export function comparedLaws(choice: Choice): readonly string[] {
  const laws = [...generalLaws, ...choice.ownLaws, choice.law];
  return [...new Set(laws)].filter((law) => law !== '');
}

/** Named laws of the trade, which are compared when asked for. */
export const tradeLaws: readonly NamedLaw[] = namedLaws.filter(({ general }) => !general);

/**
 * Judges laws one by one on the same readings; each law takes two steps, one to judge it and one to draw it.
 * @param cards filled as it goes: first in the order of the laws, in the end the best supported first
 * @throws Problem `argument` for settings that cannot be read
 */
export function* compareLaws(
  keyed: KeyedReadings,
  laws: readonly string[],
  choice: Choice,
  cells: SheetCells,
  cards: LawCard[],
): Generator<void> {
  const { readings } = keyed;
  const fits = new Map<string, Fit>();
  const judged: JudgedLaw[] = [];
  for (const law of laws) {
    const settings = comparisonSettings(choice, givenIn(law, choice), cells, readings.count);
    const one = judgeLaw(readings, law, settings);
    judged.push(one);
    yield;
    const fit = one.reason === '' ? attempt(() => rememberFit(keyed, law, settings)) : null;
    const drawn = valueIn(fit);
    if (drawn !== undefined) fits.set(law, drawn);
    cards.push(cardOf({ ...one, support: '' }, fits));
    yield;
  }
  cards.splice(0, cards.length, ...ranked(judged).rows.map((row) => cardOf(row, fits)));
}

/**
 * The constants of a law that may be given when it is compared. The general laws' letters mean something else in each
 * of them, so that what is given for one holds for that one only.
 */
export function givenIn(law: string, choice: Choice): readonly string[] {
  return law !== choice.law && isGeneral(law) ? [] : constantsOf(law);
}

function cardOf(
  row: Pick<ComparedLaw, 'law' | 'reason' | 'support' | 'bowPercent' | 'misfit'>,
  fits: ReadonlyMap<string, Fit>,
): LawCard {
  const { law, reason, support, bowPercent, misfit } = row;
  return { law, fit: fits.get(law) ?? null, reason, support, bowPercent, misfit };
}
