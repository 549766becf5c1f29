import { incompleteBeta } from './incompleteBeta.ts';
import { incompleteGamma } from './incompleteGamma.ts';

/** Probability above F of the F distribution. */
export function fTail(f: number, numeratorFreedom: number, denominatorFreedom: number): number {
  if (!(f > 0)) return Number.isNaN(f) ? Number.NaN : 1;
  if (f === Number.POSITIVE_INFINITY) return 0;
  const sum = denominatorFreedom + numeratorFreedom * f;
  const x = denominatorFreedom / sum;
  return incompleteBeta(x, (numeratorFreedom * f) / sum, denominatorFreedom / 2, numeratorFreedom / 2).lower;
}

/** Probability above χ² of the chi-squared distribution. */
export function chiSquaredTail(chiSquared: number, degreesOfFreedom: number): number {
  return incompleteGamma(degreesOfFreedom / 2, chiSquared / 2).upper;
}
