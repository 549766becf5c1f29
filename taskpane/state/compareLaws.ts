import { rememberFit } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import { compareSteps } from '../../core/judge/compare.ts';
import { generalLaws } from '../../core/law/catalogue.ts';
import type { Choice } from './choice.ts';
import { cataloguedLaws, constantsOf } from './lawSymbols.ts';
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
export function tradeLaws(): ReturnType<typeof cataloguedLaws> {
  return cataloguedLaws().filter(({ name }) => !generalLaws.includes(name));
}

/**
 * Judges laws one by one on the same readings; each step is one law.
 * @param cards filled as it goes: first in the order of the laws, in the end the best supported first
 */
export function* compareLaws(
  keyed: KeyedReadings,
  laws: readonly string[],
  choice: Choice,
  cells: SheetCells,
  cards: LawCard[],
): Generator<void> {
  const settings = comparisonSettings(choice, laws.flatMap(constantsOf), cells, keyed.readings.count);
  const steps = compareSteps(keyed.readings, laws, settings);
  for (let step = steps.next(); ; step = steps.next()) {
    if (step.done === true) {
      const { rows } = step.value;
      cards.splice(
        0,
        cards.length,
        ...rows.map(({ law, support, bowPercent, misfit, reason }) => ({
          law,
          fit: reason === '' ? (valueIn(attempt(() => rememberFit(keyed, law, settings))) ?? null) : null,
          reason,
          support,
          bowPercent,
          misfit,
        })),
      );
      return;
    }
    yield;
  }
}
