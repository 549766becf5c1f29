import { logBeta } from './logGamma.ts';

const TINY = 1e-300;

/**
 * The regularised incomplete beta function and its complement, each to full relative accuracy.
 * @param x from 0 to 1
 * @param complement 1 − x, given apart so that it keeps its digits
 * @param a above 0
 * @param b above 0
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 26.5.8 (the continued fraction); Thompson & Barnett
 * (1986), J. Comput. Phys. 64, 490 (its evaluation)
 */
export function incompleteBeta(
  x: number,
  complement: number,
  a: number,
  b: number,
): { readonly lower: number; readonly upper: number } {
  if (x <= 0) return { lower: 0, upper: 1 };
  if (complement <= 0) return { lower: 1, upper: 0 };
  // The fraction converges quickly below the mean.
  if (x > (a + 1) / (a + b + 2)) {
    const { lower, upper } = incompleteBeta(complement, x, b, a);
    return { lower: upper, upper: lower };
  }
  const logX = x < 0.5 ? Math.log(x) : Math.log1p(-complement);
  const logComplement = complement < 0.5 ? Math.log(complement) : Math.log1p(-x);
  const front = Math.exp(a * logX + b * logComplement - logBeta(a, b)) / a;
  const lower = front / fraction(x, a, b);
  return { lower, upper: 1 - lower };
}

/** The continued fraction's denominator, by the modified method of Lentz. */
function fraction(x: number, a: number, b: number): number {
  let value = 1;
  let c = 1;
  let d = 0;
  for (let m = 1; m < 100_000; m++) {
    const half = Math.floor(m / 2);
    const numerator =
      (m % 2 === 0 ? half * (b - half) : -(a + half) * (a + b + half)) * (x / ((a + m - 1) * (a + m)));
    d = 1 + numerator * d;
    d = 1 / (Math.abs(d) < TINY ? TINY : d);
    c = 1 + numerator / (Math.abs(c) < TINY ? TINY : c);
    const factor = c * d;
    value *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return value;
}
