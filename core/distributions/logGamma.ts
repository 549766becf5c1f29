/** Coefficients B₂ₖ / (2k (2k − 1)) of Stirling's series. */
const SERIES = [1 / 12, -1 / 360, 1 / 1260, -1 / 1680, 1 / 1188, -691 / 360360, 1 / 156, -3617 / 122400];

/**
 * ln Γ(x), to about 15 digits.
 * @param x above 0
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 6.1.40 and 6.1.15
 */
export function logGamma(x: number): number {
  let shift = 1;
  let z = x;
  while (z < 10) {
    shift *= z;
    z += 1;
  }
  const square = 1 / (z * z);
  let series = 0;
  for (let k = SERIES.length - 1; k >= 0; k--) series = series * square + (SERIES[k] ?? 0);
  return (z - 0.5) * Math.log(z) - z + 0.5 * Math.log(2 * Math.PI) + series / z - Math.log(shift);
}

/**
 * ln B(a, b) without the cancellation of three large logarithms of Γ.
 * @see Didonato & Morris (1992), Algorithm 708, ACM Trans. Math. Softw. 18, 360 (for the difference of Stirling's series)
 */
export function logBeta(a: number, b: number): number {
  const [small, large] = a < b ? [a, b] : [b, a];
  if (large < 10) return logGamma(small) + logGamma(large) - logGamma(small + large);
  const sum = small + large;
  const difference = stirlingRest(large) - stirlingRest(sum);
  if (small >= 10) {
    const ratio = small / large;
    return (
      -0.5 * Math.log(large) +
      0.5 * Math.log(2 * Math.PI) +
      stirlingRest(small) +
      difference +
      (small - 0.5) * Math.log(ratio / (1 + ratio)) -
      large * Math.log1p(ratio)
    );
  }
  // ln Γ(small) + ln Γ(large) − ln Γ(small + large)
  return (
    logGamma(small) + difference - (large - 0.5) * Math.log1p(small / large) - small * Math.log(sum) + small
  );
}

/** What Stirling's formula leaves of ln Γ(x), for x of 10 or more. */
function stirlingRest(x: number): number {
  const square = 1 / (x * x);
  let series = 0;
  for (let k = SERIES.length - 1; k >= 0; k--) series = series * square + (SERIES[k] ?? 0);
  return series / x;
}
