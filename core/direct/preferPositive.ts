import type { ResidualModel } from './residualModel.ts';

/** Constants up to which every combination of signs is tried. */
const MOST_CONSTANTS = 6;

/**
 * Among the sign changes of θ that leave the sum of squares as it is, the one with the fewest negative constants;
 * in a tie, the one whose earlier constants are positive.
 * @param sumOfSquares Σ r² at θ
 */
export function preferPositive(
  model: ResidualModel,
  theta: Float64Array,
  sumOfSquares: number,
): Float64Array {
  const p = theta.length;
  if (p > MOST_CONSTANTS || theta.every((value) => value >= 0)) return theta;
  const residual = new Float64Array(model.readings);
  const tolerance = 1e-12 * sumOfSquares + 1e-28 * model.responseLength ** 2;
  let best = theta;
  for (let mask = 1; mask < 2 ** p; mask++) {
    const flipped = theta.map((value, k) => ((mask >> k) & 1 ? -value : value));
    if (!isMorePositive(flipped, best)) continue;
    if (Math.abs(model.residuals(flipped, residual) - sumOfSquares) <= tolerance) best = flipped;
  }
  return best;
}

/** True when `candidate` has fewer negative constants, or as many and an earlier positive one. */
export function isMorePositive(candidate: Float64Array, current: Float64Array): boolean {
  const negatives = (values: Float64Array): number => values.filter((value) => value < 0).length;
  const difference = negatives(candidate) - negatives(current);
  if (difference !== 0) return difference < 0;
  const first = candidate.findIndex((value, k) => value < 0 !== (current[k] ?? 0) < 0);
  return first >= 0 && (candidate[first] ?? 0) >= 0;
}
