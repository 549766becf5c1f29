import type { DirectResult } from '../fit/fit.ts';
import type { Law } from '../law/law.ts';
import type { Scale } from '../line/line.ts';
import { Problem } from '../problem.ts';
import { directWords } from '../words/directWords.ts';
import { directResult } from './directResult.ts';
import { lawModel, type WeightedReadings } from './lawModel.ts';
import { levenbergMarquardt } from './levenbergMarquardt.ts';
import { preferPositive } from './preferPositive.ts';
import { solveLinear } from './solveLinear.ts';

/** What every direct fit needs besides its start. */
export interface DirectProblem extends WeightedReadings {
  readonly law: Law;
  /** Whether ω states the readings' uncertainties or only their ratios. */
  readonly scale: Scale;
  /** Aligned with `law.constants`: the known ones filled in, the others ignored. */
  readonly constants: ArrayLike<number>;
}

/**
 * Settles a law's constants by least squares in the units of y: the least Σ ω (y − law(x; θ))².
 * Laws that are linear in their constants are solved directly; others iterate from `start`.
 * @param problem the law, n readings (n ≥ number of unknown constants), ω, scale and known constants
 * @param problem.start θ to begin with, aligned with `law.unknown`; not used by a law linear in its constants
 * @returns constants with covariance s²(JᵀωJ)⁻¹, s² = 1 when the scale is known; NaN when ν = n − p = 0
 * @throws Problem `tooFew` with fewer readings than constants; `noConvergence` when the constants do not settle;
 * `argument` when the law cannot be solved for y
 * @see Seber & Wild (1989), Nonlinear Regression, section 2.1 (covariance)
 */
export function directFit(problem: DirectProblem & { readonly start: ArrayLike<number> }): DirectResult {
  const { law, start } = problem;
  requireReadings(problem);
  const model = lawModel(law, problem, problem.constants);
  if (law.linearInConstants) return directResult(problem, model, solveLinear(model, law.unknown), []);
  const minimum = levenbergMarquardt(model, start, law.unknown);
  const theta = preferPositive(model, minimum.theta, minimum.sumOfSquares);
  const notes = minimum.atEdge ? [directWords.atEdge(law.unknown)] : [];
  return directResult(problem, model, { ...minimum, theta }, notes);
}

/** @throws Problem `tooFew` when there are fewer readings than unknown constants */
export function requireReadings({ law, x }: DirectProblem): void {
  const need = Math.max(1, law.unknown.length);
  if (x.length < need) throw new Problem('tooFew', 'x', directWords.tooFew(x.length, need, law.equation));
}
