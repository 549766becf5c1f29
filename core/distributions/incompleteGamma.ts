import { logGamma } from './logGamma.ts';

/**
 * The regularised incomplete gamma functions P(a, x) and Q(a, x) = 1 − P(a, x), the smaller to full relative accuracy.
 * @param a above 0
 * @param x 0 or above
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 6.5.29 (series) and 6.5.31 (continued fraction)
 */
export function incompleteGamma(a: number, x: number): { readonly lower: number; readonly upper: number } {
  if (x <= 0) return { lower: 0, upper: 1 };
  const front = Math.exp(a * Math.log(x) - x - logGamma(a));
  if (x < a + 1) {
    let term = 1 / a;
    let sum = term;
    for (let n = 1; n < 100_000; n++) {
      term *= x / (a + n);
      sum += term;
      if (term < sum * 1e-17) break;
    }
    const lower = front * sum;
    return { lower, upper: 1 - lower };
  }
  let b = x + 1 - a;
  let c = 1e300;
  let d = 1 / b;
  let value = d;
  for (let n = 1; n < 100_000; n++) {
    const numerator = -n * (n - a);
    b += 2;
    d = 1 / (numerator * d + b);
    c = b + numerator / c;
    value *= c * d;
    if (Math.abs(c * d - 1) < 1e-16) break;
  }
  const upper = front * value;
  return { lower: 1 - upper, upper };
}
