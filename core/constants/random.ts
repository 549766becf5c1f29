/** Random numbers that are the same on every machine and every run. */
export interface Random {
  /** Uniform between 0 and 1, both excluded. */
  uniform(): number;
  /** Standard normal. */
  normal(): number;
  /** Chi-squared with ν degrees of freedom. */
  chiSquared(degreesOfFreedom: number): number;
}

/**
 * A seeded generator.
 * @see Marsaglia (2003), Xorshift RNGs, J. Stat. Softw. 8, 14 (uniform); Marsaglia & Bray (1964), SIAM Rev. 6, 260 (normal);
 * Marsaglia & Tsang (2000), ACM Trans. Math. Softw. 26, 363 (gamma)
 */
export function seededRandom(seed: number): Random {
  let [x, y, z, w] = [seed >>> 0 || 1, 362436069, 521288629, 88675123];
  const bits = (): number => {
    const t = x ^ (x << 11);
    [x, y, z] = [y, z, w];
    w = (w ^ (w >>> 19) ^ t ^ (t >>> 8)) >>> 0;
    return w;
  };
  for (let i = 0; i < 32; i++) bits();
  const uniform = (): number => (bits() * 2097152 + (bits() >>> 11) + 0.5) / 2 ** 53;
  let spare: number | null = null;
  const normal = (): number => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    for (;;) {
      const u = 2 * uniform() - 1;
      const v = 2 * uniform() - 1;
      const square = u * u + v * v;
      if (square >= 1 || square === 0) continue;
      const factor = Math.sqrt((-2 * Math.log(square)) / square);
      spare = v * factor;
      return u * factor;
    }
  };
  const gamma = (shape: number): number => {
    if (shape < 1) return gamma(shape + 1) * uniform() ** (1 / shape);
    const d = shape - 1 / 3;
    const c = 1 / Math.sqrt(9 * d);
    for (;;) {
      const n = normal();
      const v = (1 + c * n) ** 3;
      if (v > 0 && Math.log(uniform()) < 0.5 * n * n + d * (1 - v + Math.log(v))) return d * v;
    }
  };
  return { uniform, normal, chiSquared: (degreesOfFreedom) => 2 * gamma(degreesOfFreedom / 2) };
}
