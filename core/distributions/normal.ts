import { jStat } from 'jstat';
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
  let z = -jStat.normal.inv(tail, 0, 1);
  if (!Number.isFinite(z)) z = Math.sqrt(-2 * Math.log(tail));
  for (let step = 0; step < 6; step++) {
    const density = Math.exp((-z * z) / 2) / Math.sqrt(2 * Math.PI);
    const newton = (normalTail(z) - tail) / density;
    // Halley's correction: the density's logarithm falls by z.
    const change = newton / (1 + (newton * -z) / 2);
    z += change;
    if (Math.abs(change) < 1e-16 * Math.abs(z)) break;
  }
  return z;
}
