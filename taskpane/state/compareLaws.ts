import { rememberFit } from '../../core/cache/rememberFit.ts';
import type { KeyedReadings } from '../../core/cache/rememberReadings.ts';
import { compareSteps } from '../../core/judge/compare.ts';
import { generalLaws } from '../../core/law/catalogue.ts';
import type { Choice } from './choice.ts';
import { cataloguedLaws, constantsOf } from './lawSymbols.ts';
import { attempt, valueOf } from './outcome.ts';
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
