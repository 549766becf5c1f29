import type { Fit } from '../fit/fit.ts';
import { Problem } from '../problem.ts';
import { quadraticForm } from '../readoff/quadraticForm.ts';
import { nextWords } from '../words/nextWords.ts';
import { estimateOf } from './nextReading.ts';
import { byUnknown } from './varianceCut.ts';

/** How many readings a target takes. */
export interface ReadingsNeeded {
  /** All readings, those at hand included. */
  readonly total: number;
  readonly more: number;
}

/**
 * How many readings bring the standard uncertainty of a constant down to a target when further ones are spread as those
 * at hand and scatter as much: the readings' variance falls as 1/n, what known constants contribute stays.
 * @param target standard uncertainty to reach, above 0, in the unit of the constant
 * @throws Problem `argument` for another name or target; `undefined` when there is no scatter to judge by or known
 * constants alone contribute more
 */
export function readingsForTarget(fit: Fit, constant: string, target: number): ReadingsNeeded {
  if (!(target > 0)) throw new Problem('argument', 'target', nextWords.target(target));
  const now = estimateOf(fit, constant);
  if (!Number.isFinite(now)) throw new Problem('undefined', 'name', nextWords.noScatter(constant));
  const count = (fit.direct === null ? fit.used : fit.taking).length;
  const fromReadings = quadraticForm(byUnknown(fit, constant), fit.covarianceFromReadings);
  const fromKnown = Math.max(0, now * now - fromReadings);
  const room = target * target - fromKnown;
  if (now > target && !(room > 0)) {
    throw new Problem('undefined', 'target', nextWords.knownLimit(constant, target, Math.sqrt(fromKnown)));
  }
  // A count that is whole but for rounding stays as it is.
  const total = now <= target ? count : Math.ceil((fromReadings / room) * count * (1 - 1e-12));
  return { total, more: total - count };
}
