import { lawInputs } from '../fit/columns.ts';
import type { StraightForm } from '../law/law.ts';
import type { LineMoments } from './lineMoments.ts';

/** A single unknown constant that stands in both line terms, and how it follows the terms. */
export interface CombinedConstant {
  readonly value: number;
  readonly bySlope: number;
  readonly byIntercept: number;
}

/** Steps after which a constant that still changes is taken as lost. */
const MOST_STEPS = 100;
/** Relative step below which the objective can no longer tell two values apart. */
const NEAR = 1e-6;

/**
 * The constant θ for which slope(θ) and intercept(θ) come closest to the fitted terms, measured by their inverse
 * covariance: the least-squares line among those that the law allows, to first order.
 * @param place index of the constant among the law's symbols
 * @param starts full vectors of constants to start from
 * @returns null when no start settles
 * @see Seber & Wild (1989), Nonlinear Regression, section 2.1 (Gauss–Newton steps)
 */
export function combinedConstant(
  form: StraightForm,
  line: { readonly slope: number; readonly intercept: number },
  moments: LineMoments,
  place: number,
  starts: readonly Float64Array[],
): CombinedConstant | null {
  let best: (CombinedConstant & { readonly objective: number }) | null = null;
  for (const start of starts) {
    const found = settle(form, line, moments, place, start);
    if (found !== null && (best === null || found.objective < best.objective * (1 - 1e-12))) best = found;
  }
  return best;
}

function settle(
  form: StraightForm,
  line: { readonly slope: number; readonly intercept: number },
  { total, mean, spread }: LineMoments,
  place: number,
  start: Float64Array,
): (CombinedConstant & { readonly objective: number }) | null {
  const rootSpread = Math.sqrt(spread);
  const rootTotal = Math.sqrt(total);
  const values = Float64Array.from(start);
  const at = (theta: number) => {
    values[place - 2] = theta;
    const inputs = lawInputs(0, 0, values);
    const slope = form.slopeOf.gradient(inputs, 1, [place]);
    const intercept = form.interceptOf.gradient(inputs, 1, [place]);
    const slopeLeft = line.slope - (slope.value[0] ?? Number.NaN);
    const interceptLeft = line.intercept - (intercept.value[0] ?? Number.NaN);
    const slopeBy = slope.partials[0]?.[0] ?? Number.NaN;
    const interceptBy = intercept.partials[0]?.[0] ?? Number.NaN;
    const residual = [rootSpread * slopeLeft, rootTotal * (interceptLeft + mean * slopeLeft)] as const;
    const derivative = [rootSpread * slopeBy, rootTotal * (interceptBy + mean * slopeBy)] as const;
    return {
      objective: residual[0] ** 2 + residual[1] ** 2,
      step:
        (derivative[0] * residual[0] + derivative[1] * residual[1]) /
        (derivative[0] ** 2 + derivative[1] ** 2),
      derivative,
    };
  };
  let theta = start[place - 2] ?? Number.NaN;
  let here = at(theta);
  for (let count = 0; count < MOST_STEPS; count++) {
    if (!Number.isFinite(here.step)) return null;
    if (Math.abs(here.step) <= 4e-16 * Math.abs(theta)) break;
    if (Math.abs(here.step) <= NEAR * Math.abs(theta)) {
      // The objective is flat here: whole steps, as long as they shrink.
      const closer = at(theta + here.step);
      if (!(Math.abs(closer.step) < Math.abs(here.step) / 2)) break;
      theta += here.step;
      here = closer;
      continue;
    }
    let factor = 1;
    let next = at(theta + here.step);
    while (!(next.objective <= here.objective) && factor > 1e-6) {
      factor /= 2;
      next = at(theta + factor * here.step);
    }
    // No step makes it smaller: only rounding is left.
    if (!(next.objective < here.objective)) break;
    theta += factor * here.step;
    here = next;
  }
  const [first, second] = here.derivative;
  const square = first ** 2 + second ** 2;
  if (!Number.isFinite(theta) || !(square > 0)) return null;
  return {
    value: theta,
    bySlope: (first * rootSpread + second * rootTotal * mean) / square,
    byIntercept: (second * rootTotal) / square,
    objective: here.objective,
  };
}
