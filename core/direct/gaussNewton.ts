import {
  applyTransposed,
  type Factorisation,
  factorisationSpace,
  factorise,
  reciprocalCondition,
  solveRotated,
} from './qr.ts';
import type { ResidualModel } from './residualModel.ts';

/** The end of the endgame. */
export interface Ending {
  readonly theta: Float64Array;
  readonly sumOfSquares: number;
  readonly iterations: number;
  /** True when the last step was negligible against every constant. */
  readonly settled: boolean;
  /** Size of the last step, relative to the constants. */
  readonly lastStep: number;
}

const MAXIMUM_STEPS = 200;
/** A last step below this share of every constant counts as settled; most end near 1e−15. */
const SETTLED = 1e-7;
/** Below this, the columns of the Jacobian are dependent as far as double precision can tell. */
export const DEPENDENT = 1e-12;

/**
 * Undamped Gauss–Newton steps for as long as they shrink: what brings the last digits.
 * @param start θ near a minimum; not changed
 * @param startSum Σ r² at `start`, finite
 * @param nearby size that the first step must be below, relative to the constants
 * @see Björck (1996), Numerical Methods for Least Squares Problems, section 9.2.1
 */
export function closeIn(
  model: ResidualModel,
  start: ArrayLike<number>,
  startSum: number,
  nearby = Number.POSITIVE_INFINITY,
): Ending {
  const { readings, constants } = model;
  const theta = Float64Array.from(start);
  const next = Float64Array.from(start);
  const step = new Float64Array(constants);
  const residual = new Float64Array(readings);
  const jacobian = new Float64Array(readings * constants);
  const space = factorisationSpace(readings, constants);
  let sum = startSum;
  let lastStep = nearby;
  let slow = 0;
  let iterations = 0;
  let independent = true;
  for (; iterations < MAXIMUM_STEPS; iterations++) {
    const nextSum = model.jacobian(next, residual, jacobian);
    // A step may add rounding noise to the sum of squares, never more than that.
    if (!(nextSum <= sum + 1e-9 * sum + 1e-26 * model.responseLength ** 2)) break;
    factorise(space, jacobian);
    if (!(reciprocalCondition(space) > DEPENDENT)) {
      independent = false;
      break;
    }
    applyTransposed(space, residual);
    solveRotated(space, residual, step);
    const size = relativeSize(step, next, space, model.responseLength);
    slow = size < 0.5 * lastStep ? 0 : slow + 1;
    if (!(size < lastStep) || slow > 60) break;
    theta.set(next);
    sum = nextSum;
    lastStep = size;
    if (size === 0) break;
    for (let k = 0; k < constants; k++) next[k] = (theta[k] ?? 0) + (step[k] ?? 0);
  }
  return { theta, sumOfSquares: sum, iterations, settled: independent && lastStep < SETTLED, lastStep };
}

/**
 * Largest |δ| over the constants, each measured against its own size or, for a constant near zero, against a
 * millionth of what would move the fitted values by as much as the whole response.
 */
export function relativeSize(
  step: Float64Array,
  theta: Float64Array,
  { columnNorm }: Factorisation,
  responseLength: number,
): number {
  let largest = 0;
  for (let k = 0; k < step.length; k++) {
    const floor = (1e-6 * responseLength) / (columnNorm[k] ?? 1);
    const size = Math.abs(step[k] ?? 0) / Math.max(Math.abs(theta[k] ?? 0), floor);
    if (!(size <= largest)) largest = size;
  }
  return largest;
}
