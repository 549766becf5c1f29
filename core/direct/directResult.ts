import type { DirectResult } from '../fit/fit.ts';
import type { DirectProblem } from './directFit.ts';
import type { LawModel } from './lawModel.ts';
import { factorisationSpace, factorise, inverseNormal } from './qr.ts';
import { sumOfSquaresOf } from './residualModel.ts';

/** Dresses settled constants as a result: covariance, residual standard deviation, fitted values and Jacobian. */
export function directResult(
  { x, y, omega, scale }: DirectProblem,
  model: LawModel,
  settled: { readonly theta: Float64Array; readonly iterations: number },
  notes: readonly string[],
): DirectResult {
  const { theta, iterations } = settled;
  const n = x.length;
  const p = theta.length;
  const { value, partials } = model.derivatives(theta);
  const sumOfSquares = sumOfSquaresOf(
    y.map((response, i) => Math.sqrt(omega[i] ?? 0) * (response - (value[i] ?? 0))),
  );
  const degreesOfFreedom = n - p;
  const variance = degreesOfFreedom > 0 ? sumOfSquares / degreesOfFreedom : Number.NaN;
  const jacobian = new Float64Array(n * p);
  partials.forEach((column, k) => {
    for (let i = 0; i < n; i++) jacobian[k * n + i] = Math.sqrt(omega[i] ?? 0) * (column[i] ?? 0);
  });
  const factor = degreesOfFreedom === 0 ? Number.NaN : scale === 'known' ? 1 : variance;
  const covariance = p === 0 ? [] : inverseNormal(factorise(factorisationSpace(n, p), jacobian));
  return {
    theta,
    covariance: covariance.map((row) => row.map((entry) => factor * entry)),
    sumOfSquares,
    degreesOfFreedom,
    residualStandardDeviation: Math.sqrt(variance),
    fitted: value,
    jacobian: partials,
    iterations,
    notes,
  };
}
