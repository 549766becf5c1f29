import { Problem } from '../problem.ts';
import { directWords } from '../words/directWords.ts';
import { closeIn } from './gaussNewton.ts';
import { applyTransposed, factorisationSpace, factorise, reciprocalCondition, solveRotated } from './qr.ts';
import type { ResidualModel } from './residualModel.ts';
import { looseConstants } from './unsettledAt.ts';

/** Dependence that even a linear law cannot be solved through. */
const SINGULAR = 1e-14;

/**
 * Least squares for a law that is linear in its constants: one factorisation, then refinement of the last digits.
 * @throws Problem `noConvergence` when the readings cannot tell the constants apart
 * @see Björck (1996), Numerical Methods for Least Squares Problems, sections 2.4 and 2.9
 */
export function solveLinear(
  model: ResidualModel,
  names: readonly string[],
): { readonly theta: Float64Array; readonly iterations: number } {
  const { readings, constants } = model;
  const theta = new Float64Array(constants);
  if (constants === 0) return { theta, iterations: 0 };
  const origin = originOf(model);
  const residual = new Float64Array(readings);
  const jacobian = new Float64Array(readings * constants);
  if (!Number.isFinite(model.jacobian(origin, residual, jacobian))) {
    throw new Problem('noConvergence', 'law', directWords.noStart(names, origin));
  }
  const space = factorise(factorisationSpace(readings, constants), jacobian);
  if (!(reciprocalCondition(space) > SINGULAR)) {
    const loose = looseConstants(model, origin, names);
    throw new Problem('noConvergence', 'law', directWords.dependent(loose.length > 0 ? loose : names));
  }
  applyTransposed(space, residual);
  solveRotated(space, residual, theta);
  for (let k = 0; k < constants; k++) theta[k] = (theta[k] ?? 0) + (origin[k] ?? 0);
  const sum = model.residuals(theta, residual);
  const refined = closeIn(model, theta, sum);
  return { theta: refined.theta, iterations: 1 + refined.iterations };
}

/** Zeros, or ones where the law does not exist at zero. */
function originOf(model: ResidualModel): Float64Array {
  const zeros = new Float64Array(model.constants);
  const exists = Number.isFinite(model.residuals(zeros, new Float64Array(model.readings)));
  return exists ? zeros : zeros.fill(1);
}
