/**
 * Matching significant digits, −log₁₀ of the relative error (absolute where `certified` is 0), capped at 17.
 * The score that the NIST StRD collection uses.
 */
export function digitsAgreed(actual: number, certified: number): number {
  if (actual === certified) return 17;
  const error = certified === 0 ? Math.abs(actual) : Math.abs(actual - certified) / Math.abs(certified);
  return Number.isFinite(error) ? Math.min(17, Math.max(0, -Math.log10(error))) : 0;
}

/** Fails unless `actual` agrees with `certified` to `digits` significant digits; says how many were reached. */
export function expectDigits(actual: number, certified: number | string, digits: number): void {
  const reference = Number(certified);
  const reached = digitsAgreed(actual, reference);
  if (!(reached >= digits)) {
    throw new Error(
      `${actual} agrees with ${certified} to ${reached.toFixed(1)} digits, ${digits} are wanted`,
    );
  }
}
