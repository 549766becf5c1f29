import { incompleteGamma } from './incompleteGamma.ts';

/** Probability above z of the standard normal distribution. */
export function normalTail(z: number): number {
  const { lower, upper } = incompleteGamma(0.5, (z * z) / 2);
  return z >= 0 ? upper / 2 : 0.5 + lower / 2;
}

/** Probability beyond ±z of the standard normal distribution. */
export function normalTwoSided(z: number): number {
  return incompleteGamma(0.5, (z * z) / 2).upper;
}

/**
 * The z that a standard normal value exceeds with probability `tail`, to 14 digits.
 * @param tail above 0, below 1
 */
export function normalQuantile(tail: number): number {
  if (tail > 0.5) return -normalQuantile(1 - tail);
  let z = roughQuantile(tail);
  for (let step = 0; step < 8; step++) {
    const density = Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
    const newton = (normalTail(z) - tail) / density;
    // Halley's correction: the density's logarithm falls by z.
    const change = newton / (1 + (newton * -z) / 2);
    z += change;
    if (Math.abs(change) < 1e-16 * Math.abs(z)) break;
  }
  return z;
}

/**
 * The quantile to three places, for a tail of at most one half.
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 26.2.23
 */
function roughQuantile(tail: number): number {
  const t = Math.sqrt(-2 * Math.log(tail));
  const top = 2.515517 + t * (0.802853 + t * 0.010328);
  const bottom = 1 + t * (1.432788 + t * (0.189269 + t * 0.001308));
  return t - top / bottom;
}
