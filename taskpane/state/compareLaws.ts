import { rememberFit } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import type { Fit } from '../../core/fit/fit.ts';
import { type ComparedLaw, compareSteps } from '../../core/judge/compare.ts';
import { generalLaws, type NamedLaw, namedLaws } from '../../core/law/catalogue.ts';
import type { Choice } from './choice.ts';
import { constantsOf } from './lawSymbols.ts';
import { attempt, valueIn } from './outcome.ts';
import type { LawCard } from './panelState.ts';
import { comparisonSettings } from './settingsFor.ts';
import type { SheetCells } from './sheetCells.ts';

/** The laws that a choice compares: the general ones, the user's, and the chosen one. */
export function comparedLaws(choice: Choice): readonly string[] {
  const laws = [...generalLaws, ...choice.ownLaws];
  return choice.law === '' || laws.includes(choice.law) ? laws : [...laws, choice.law];
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
  const { count } = keyed.readings;
  const settings = comparisonSettings(choice, laws.flatMap(constantsOf), cells, count);
  const fits = new Map<string, Fit>();
  const steps = compareSteps(keyed.readings, laws, settings);
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done === true) {
      cards.splice(0, cards.length, ...step.value.rows.map((row) => cardOf(row, fits)));
      return;
    }
    yield;
    const { law, reason } = step.value;
    if (reason === '') {
      const own = comparisonSettings(choice, constantsOf(law), cells, count);
      const fit = valueIn(attempt(() => rememberFit(keyed, law, own)));
      if (fit !== undefined) fits.set(law, fit);
    }
    cards.push(cardOf({ ...step.value, support: '' }, fits));
    yield;
  }
}

function cardOf(
  row: Pick<ComparedLaw, 'law' | 'reason' | 'support' | 'bowPercent' | 'misfit'>,
  fits: ReadonlyMap<string, Fit>,
): LawCard {
  const { law, reason, support, bowPercent, misfit } = row;
  return { law, fit: fits.get(law) ?? null, reason, support, bowPercent, misfit };
}
