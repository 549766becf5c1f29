import type { Coverage } from '../fit/fit.ts';
import { normalQuantile } from './normal.ts';
import { studentQuantile } from './student.ts';

/**
 * The factor k for which ±k standard uncertainties hold a value with the given probability.
 * @param probability above 0, below 1
 * @param degreesOfFreedom 1 or more; not used by the normal distribution
 * @see JCGM 100:2008, annex G
 */
export function coverageFactor(
  probability: number,
  distribution: Coverage['distribution'],
  degreesOfFreedom: number,
): number {
  const tail = (1 - probability) / 2;
  return distribution === 'normal' ? normalQuantile(tail) : studentQuantile(tail, degreesOfFreedom);
}
