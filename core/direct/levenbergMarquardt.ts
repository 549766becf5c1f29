import { Problem } from '../problem.ts';
import { directWords } from '../words/directWords.ts';
import { type DampingSpace, dampedStep, dampingSpace } from './dampedStep.ts';
import { closeIn } from './gaussNewton.ts';
import { applyTransposed, type Factorisation, factorisationSpace, factorise } from './qr.ts';
import type { ResidualModel } from './residualModel.ts';
import { unsettledAt } from './unsettledAt.ts';

/** Where an iteration came to rest. */
export interface Minimum {
  readonly theta: Float64Array;
  readonly sumOfSquares: number;
  readonly iterations: number;
  /** True when the law stops existing right beside θ, so that the steps towards the minimum were cut off. */
  readonly atEdge: boolean;
}

const MAXIMUM_STEPS = 400;
/** Relative improvement still in sight below which the undamped endgame takes over. */
const NEARLY_THERE = 1e-10;
/** A first undamped step of less than this share of the constants starts from so near that no damping is needed. */
const NEARBY = 0.01;
/** An improvement below this share of Σ ω y² is rounding noise. */
const ROUNDING = 1e-28;

/**
 * Minimises Σ r(θ)² from a start: damped steps with geodesic acceleration, then undamped Gauss–Newton steps for as
 * long as they shrink. Where the start is that near already, the undamped steps alone.
 * @param start finite θ where the law exists at every reading
 * @param names of the constants θ, for messages
 * @param origin where the search for the start began, against which a constant that runs away is recognised
 * @throws Problem `noConvergence` when the constants do not settle; the message names those that run away
 * @see Moré (1978), The Levenberg–Marquardt algorithm, in Watson (ed.), Numerical Analysis, Springer, 105; Transtrum & Sethna
 * (2012), arXiv:1201.5885 (acceleration); Nielsen (1999), IMM-REP-1999-05 (damping by the gain ratio)
 */
export function levenbergMarquardt(
  model: ResidualModel,
  start: ArrayLike<number>,
  names: readonly string[],
  origin: ArrayLike<number> = start,
): Minimum {
  const startSum = model.residuals(Float64Array.from(start), new Float64Array(model.readings));
  if (Number.isFinite(startSum)) {
    const { settled, theta, sumOfSquares, iterations } = closeIn(model, start, startSum, NEARBY);
    if (settled) return { theta, sumOfSquares, iterations, atEdge: false };
  }
  const descent = descend(model, start);
  if (!Number.isFinite(descent.sumOfSquares)) {
    throw new Problem('noConvergence', 'law', directWords.noStart(names, start));
  }
  const end = closeIn(model, descent.theta, descent.sumOfSquares);
  const iterations = descent.iterations + end.iterations;
  if (!end.settled && !descent.atEdge) {
    throw new Problem('noConvergence', 'law', unsettledAt(model, end.theta, origin, names, iterations));
  }
  return {
    theta: end.theta,
    sumOfSquares: end.sumOfSquares,
    iterations,
    atEdge: descent.atEdge && !end.settled,
  };
}

/** The damped phase: stops near a minimum, at the law's edge, or when it runs out of steps. */
export function descend(
  model: ResidualModel,
  start: ArrayLike<number>,
  maximumSteps = MAXIMUM_STEPS,
): Minimum {
  const work = descentSpace(model);
  const { theta, trial, residual, trialResidual, jacobian, space, damping } = work;
  theta.set(start);
  let sum = model.jacobian(theta, residual, jacobian);
  let lambda = 1e-3;
  let growth = 2;
  let iterations = 0;
  let blocked = 0;
  for (; iterations < maximumSteps && Number.isFinite(sum) && sum > 0; iterations++) {
    factorise(space, jacobian);
    for (let k = 0; k < theta.length; k++) {
      work.scale[k] = Math.max(work.scale[k] ?? 0, space.columnNorm[k] ?? 0);
    }
    work.rotated.set(residual);
    applyTransposed(space, work.rotated);
    let accepted = false;
    while (!accepted && lambda < 1e20) {
      const promised = dampedStep(space, damping, work.rotated, lambda, work.scale, work.step);
      if (!(promised > NEARLY_THERE * sum + ROUNDING * model.responseLength ** 2)) {
        // Heavy damping promises little too: only a nearly undamped step tells that the minimum is near.
        if (lambda <= 1) return { theta, sumOfSquares: sum, iterations, atEdge: false };
        if (!(promised > 0)) break;
      }
      const trusted = accelerate(model, work, lambda);
      for (let k = 0; k < theta.length; k++)
        trial[k] = (theta[k] ?? 0) + (work.step[k] ?? 0) + (work.bend[k] ?? 0);
      const trialSum = trusted ? model.residuals(trial, trialResidual) : Number.POSITIVE_INFINITY;
      const gain = (sum - trialSum) / promised;
      const next =
        gain > 0 ? model.jacobian(trial, trialResidual, work.trialJacobian) : Number.POSITIVE_INFINITY;
      if (next < sum) {
        theta.set(trial);
        residual.set(trialResidual);
        jacobian.set(work.trialJacobian);
        sum = next;
        lambda = Math.max(1e-15, lambda * Math.max(1 / 3, 1 - (2 * gain - 1) ** 3));
        growth = 2;
        blocked = 0;
        accepted = true;
      } else {
        if (trusted && !Number.isFinite(trialSum)) blocked++;
        lambda *= growth;
        growth = Math.min(growth * 2, 1024);
      }
    }
    if (!accepted) break;
  }
  return { theta, sumOfSquares: sum, iterations, atEdge: blocked > 3 };
}

/** Everything the damped phase writes to, allocated once. */
interface DescentSpace {
  readonly theta: Float64Array;
  readonly trial: Float64Array;
  readonly step: Float64Array;
  readonly bend: Float64Array;
  readonly scale: Float64Array;
  readonly residual: Float64Array;
  readonly trialResidual: Float64Array;
  readonly rotated: Float64Array;
  readonly bendRotated: Float64Array;
  readonly jacobian: Float64Array;
  readonly trialJacobian: Float64Array;
  readonly space: Factorisation;
  readonly damping: DampingSpace;
}

function descentSpace({ readings, constants }: ResidualModel): DescentSpace {
  return {
    theta: new Float64Array(constants),
    trial: new Float64Array(constants),
    step: new Float64Array(constants),
    bend: new Float64Array(constants),
    scale: new Float64Array(constants),
    residual: new Float64Array(readings),
    trialResidual: new Float64Array(readings),
    rotated: new Float64Array(readings),
    bendRotated: new Float64Array(readings),
    jacobian: new Float64Array(readings * constants),
    trialJacobian: new Float64Array(readings * constants),
    space: factorisationSpace(readings, constants),
    damping: dampingSpace(constants),
  };
}

/**
 * Writes half the acceleration along the step into `work.bend`; false where the path bends so much that neither
 * can be trusted. The second derivative along the step is a difference of residuals.
 */
function accelerate(model: ResidualModel, work: DescentSpace, lambda: number): boolean {
  const { theta, trial, step, bend, scale, residual, trialResidual, jacobian, bendRotated } = work;
  const n = residual.length;
  const h = 0.1;
  for (let k = 0; k < theta.length; k++) trial[k] = (theta[k] ?? 0) + h * (step[k] ?? 0);
  if (!Number.isFinite(model.residuals(trial, trialResidual))) {
    bend.fill(0);
    return true;
  }
  for (let i = 0; i < n; i++) {
    let along = 0;
    for (let k = 0; k < theta.length; k++) along += (jacobian[k * n + i] ?? 0) * (step[k] ?? 0);
    bendRotated[i] = -(1 / h) * (((residual[i] ?? 0) - (trialResidual[i] ?? 0)) / h - along);
  }
  applyTransposed(work.space, bendRotated);
  dampedStep(work.space, work.damping, bendRotated, lambda, scale, bend);
  let bendSquares = 0;
  let stepSquares = 0;
  for (let k = 0; k < theta.length; k++) {
    bendSquares += ((scale[k] ?? 0) * (bend[k] ?? 0)) ** 2;
    stepSquares += ((scale[k] ?? 0) * (step[k] ?? 0)) ** 2;
  }
  return 4 * bendSquares <= 0.75 ** 2 * stepSquares;
}
