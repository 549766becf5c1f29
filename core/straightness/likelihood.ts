import type { Line } from '../line/line.ts';
import { sumOfLogarithms } from './sumOfLogarithms.ts';

/**
 * Gaussian log-likelihood of the readings in the units of y, so that laws whose response is transformed differently can
 * be compared: residuals on the straight axes, the scale at its maximum-likelihood value or known, and the Jacobian.
 * +∞ for readings exactly on a line whose scale is estimated.
 * @param verticalByY ∂Y/∂y at the observed readings, n
 * @see Box & Cox (1964), An analysis of transformations, J. R. Stat. Soc. B 26, 211
 */
export function logLikelihood(line: Line, verticalByY: Float64Array): number {
  const { lineWeight } = line;
  return logLikelihoodFrom(line, 0.5 * sumOfLogarithms(lineWeight) + sumOfLogarithms(verticalByY));
}

/**
 * As `logLikelihood`, with the sum of its logarithms at hand.
 * @param logarithms ½ Σ ln w + Σ ln |∂Y/∂y|
 */
export function logLikelihoodFrom(
  { scale, weightedSumOfSquares, residual: { length: n } }: Line,
  logarithms: number,
): number {
  const misfit =
    scale === 'known' ? weightedSumOfSquares / 2 : (n / 2) * (Math.log(weightedSumOfSquares / n) + 1);
  return -(n / 2) * Math.log(2 * Math.PI) - misfit + logarithms;
}

/**
 * Akaike's criterion corrected for few readings; NaN when n − k − 1 is not above 0.
 * @param k free constants, and one more when the scale is estimated
 * @see Hurvich & Tsai (1989), Biometrika 76, 297
 */
export function aicc(logL: number, k: number, n: number): number {
  const room = n - k - 1;
  return room > 0 ? -2 * logL + 2 * k + (2 * k * (k + 1)) / room : Number.NaN;
}

/**
 * Relative support of each law among those compared; they sum to 1.
 * @param criteria AICc of each
 * @see Burnham & Anderson (2002), Model Selection and Multimodel Inference, 2nd ed., section 2.9
 */
export function akaikeWeights(criteria: readonly number[]): number[] {
  const least = Math.min(...criteria);
  const relative = criteria.map((value) => (value === least ? 1 : Math.exp((least - value) / 2)));
  const total = relative.reduce((sum, value) => sum + value, 0);
  return relative.map((value) => value / total);
}
