import { incompleteBeta } from './incompleteBeta.ts';
import { logBeta } from './logGamma.ts';
import { normalQuantile } from './normal.ts';

/** Probability beyond ±t of Student's distribution with ν degrees of freedom. */
export function studentTwoSided(t: number, degreesOfFreedom: number): number {
  const square = t * t;
  if (square === Number.POSITIVE_INFINITY) return 0;
  const sum = degreesOfFreedom + square;
  return incompleteBeta(degreesOfFreedom / sum, square / sum, degreesOfFreedom / 2, 0.5).lower;
}

/** Probability above t of Student's distribution. */
export function studentTail(t: number, degreesOfFreedom: number): number {
  const half = studentTwoSided(t, degreesOfFreedom) / 2;
  return t >= 0 ? half : 1 - half;
}

/**
 * The t that Student's distribution exceeds with probability `tail`, to 13 digits.
 * @param tail above 0, below 1
 */
export function studentQuantile(tail: number, degreesOfFreedom: number): number {
  if (tail > 0.5) return -studentQuantile(1 - tail, degreesOfFreedom);
  if (tail === 0.5) return 0;
  const nu = degreesOfFreedom;
  let t = roughQuantile(tail, nu);
  const level = -0.5 * Math.log(nu) - logBeta(nu / 2, 0.5);
  for (let step = 0; step < 60; step++) {
    const density = Math.exp(level - ((nu + 1) / 2) * Math.log1p((t * t) / nu));
    const newton = (studentTail(t, nu) - tail) / density;
    const curvature = ((nu + 1) * t) / (nu + t * t);
    const change = newton / (1 - (newton * curvature) / 2);
    t = Math.max(t + change, t / 8);
    if (Math.abs(change) < 2e-16 * t) break;
  }
  return t;
}

/**
 * A start: exact with one and two degrees of freedom, else the normal quantile with its first two corrections, or the
 * power law of the tail where that is larger.
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 26.7.5
 */
function roughQuantile(tail: number, nu: number): number {
  if (nu === 1) return 1 / Math.tan(Math.PI * tail);
  if (nu === 2) return (1 - 2 * tail) / Math.sqrt(2 * tail * (1 - tail));
  const z = normalQuantile(tail);
  const cube = z ** 3;
  return z + (cube + z) / (4 * nu) + (5 * z ** 5 + 16 * cube + 3 * z) / (96 * nu * nu);
}
