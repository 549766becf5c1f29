import { pick } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { scaleOf, spreadOf } from '../fit/spread.ts';

/**
 * Gaussian log-likelihood of the readings about the directly fitted curve, with standard deviation σ (`none`, `equal`),
 * σ|y| (`proportional`) or u_y, σ at its maximum-likelihood value. +∞ for readings exactly on the curve whose scale is
 * estimated, NaN without a direct fit.
 * @see Seber & Wild (1989), Nonlinear Regression, section 2.2.1
 */
export function directLogLikelihood({ direct, readings, taking, settings }: Fit): number {
  if (direct === null) return Number.NaN;
  const { sumOfSquares } = direct;
  const n = taking.length;
  const y = pick(readings.y, taking);
  const position = taking.map((index) => readings.position[index] ?? 0);
  let logarithms = 0;
  for (const deviation of spreadOf(settings.spreadY, y, position, 'u_y')) logarithms -= Math.log(deviation);
  const rest =
    scaleOf(settings.spreadY) === 'known' ? sumOfSquares / 2 : (n / 2) * (Math.log(sumOfSquares / n) + 1);
  return logarithms - (n / 2) * Math.log(2 * Math.PI) - rest;
}
