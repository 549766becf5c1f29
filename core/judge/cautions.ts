import type { Law } from '../law/law.ts';
import { type CautionWord, cautionWords } from '../words/cautionWords.ts';

/** Laws of the catalogue whose constants people get hurt by, with what they are warned of. */
const cautions: ReadonlyMap<string, CautionWord> = new Map<string, CautionWord>([
  ['basquin', 'fatigue'],
  ['weibull', 'lifetime'],
  ['first order', 'drinkingWater'],
  ['second order', 'drinkingWater'],
  ['langmuir', 'drinkingWater'],
  ['freundlich', 'drinkingWater'],
  ['hill', 'dose'],
  ['antoine', 'pressure'],
  ['arrhenius', 'heat'],
  ['approach', 'storedEnergy'],
  ['offset decay', 'storedEnergy'],
  ['shifted power', 'flood'],
]);

/** The caution that goes with a law of the catalogue; null for others and for the user's own laws. */
export function cautionFor(law: Law): string | null {
  const key = cautions.get(law.name);
  return key === undefined ? null : cautionWords[key]();
}
