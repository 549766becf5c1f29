/** Readings with errors in both axes, scaled so that neither axis leaves the range of numbers. */
export interface BothAxes {
  readonly horizontal: Float64Array;
  readonly vertical: Float64Array;
  readonly uHorizontal: Float64Array;
  readonly uVertical: Float64Array;
  readonly covariance: Float64Array;
  /** The value at horizontal 0 that the line passes through, or null when it is free. */
  readonly held: number | null;
}

/** What one slope makes of the readings. */
export interface SlopeSums {
  /** W, one per reading. */
  readonly weight: Float64Array;
  /** Horizontal values of the points on the line, one per reading. */
  readonly adjusted: Float64Array;
  /** Weighted means; 0 and the held value when the intercept is held. */
  readonly meanX: number;
  readonly meanY: number;
  /** S = Σ W (Y − a − bX)². */
  readonly sumOfSquares: number;
  /** The slope that the iteration goes to next. */
  readonly nextSlope: number;
}

/** @see York et al. (2004), Am. J. Phys. 72, 367, equations 13b, 13c, 13e and 14 */
export function slopeSums(axes: BothAxes, slope: number): SlopeSums {
  const { horizontal, vertical, uHorizontal, uVertical, covariance, held } = axes;
  const n = horizontal.length;
  const weight = new Float64Array(n);
  const adjusted = new Float64Array(n);
  const x0 = held === null ? (horizontal[0] ?? 0) : 0;
  const y0 = held ?? vertical[0] ?? 0;
  let total = 0;
  let sumX = 0;
  let sumY = 0;
  for (let i = 0; i < n; i++) {
    const ux = uHorizontal[i] ?? 0;
    const uy = uVertical[i] ?? 0;
    const w = 1 / (uy * uy + slope * slope * ux * ux - 2 * slope * (covariance[i] ?? 0));
    weight[i] = w;
    total += w;
    sumX += w * ((horizontal[i] ?? 0) - x0);
    sumY += w * ((vertical[i] ?? 0) - y0);
  }
  const meanX = held === null ? x0 + sumX / total : 0;
  const meanY = held === null ? y0 + sumY / total : held;
  let top = 0;
  let bottom = 0;
  let sumOfSquares = 0;
  for (let i = 0; i < n; i++) {
    const w = weight[i] ?? 0;
    const u = (horizontal[i] ?? 0) - meanX;
    const v = (vertical[i] ?? 0) - meanY;
    const ux = uHorizontal[i] ?? 0;
    const uy = uVertical[i] ?? 0;
    const beta = w * (u * uy * uy + slope * v * ux * ux - (slope * u + v) * (covariance[i] ?? 0));
    adjusted[i] = meanX + beta;
    top += w * beta * v;
    bottom += w * beta * u;
    sumOfSquares += w * (v - slope * u) ** 2;
  }
  return { weight, adjusted, meanX, meanY, sumOfSquares, nextSlope: top / bottom };
}
