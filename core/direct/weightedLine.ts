import type { LineUse } from './lineTermsOf.ts';

/** Slope and intercept of a line. */
export interface LineTermsValue {
  readonly slope: number;
  readonly intercept: number;
}

/**
 * Weighted least-squares line through the readings whose coordinates and weight are finite, with centred sums.
 * @param held where the terms that are not free stand
 * @returns null when the readings do not determine the free terms
 * @see Bevington & Robinson (2003), Data Reduction and Error Analysis, 3rd ed., section 6.3
 */
export function weightedLine(
  horizontal: Float64Array,
  vertical: Float64Array,
  weight: Float64Array,
  free: LineUse['free'],
  held: LineTermsValue,
): LineTermsValue | null {
  const n = horizontal.length;
  let count = 0;
  let total = 0;
  let meanX = 0;
  let meanY = 0;
  for (let i = 0; i < n; i++) {
    const w = usable(horizontal, vertical, weight, i);
    if (!(w > 0)) continue;
    count++;
    total += w;
    meanX += (w / total) * ((horizontal[i] ?? 0) - meanX);
    meanY += (w / total) * ((vertical[i] ?? 0) - meanY);
  }
  if (free === 'neither') return held;
  if (free === 'intercept')
    return finite({ slope: held.slope, intercept: meanY - held.slope * meanX }, count, 1);
  const x0 = free === 'both' ? meanX : 0;
  const y0 = free === 'both' ? meanY : held.intercept;
  let products = 0;
  let squares = 0;
  let restX = 0;
  let restY = 0;
  for (let i = 0; i < n; i++) {
    const w = usable(horizontal, vertical, weight, i);
    if (!(w > 0)) continue;
    const x = (horizontal[i] ?? 0) - x0;
    const y = (vertical[i] ?? 0) - y0;
    products += w * x * y;
    squares += w * x * x;
    restX += w * x;
    restY += w * y;
  }
  if (free === 'slope') return finite({ slope: products / squares, intercept: y0 }, count, 1);
  // What rounding left of the sums about the means.
  const slope = (products - (restX * restY) / total) / (squares - restX ** 2 / total);
  return finite({ slope, intercept: y0 + restY / total - slope * (x0 + restX / total) }, count, 2);
}

/** A reading's weight; 0 when it cannot take part. */
function usable(horizontal: Float64Array, vertical: Float64Array, weight: Float64Array, i: number): number {
  const w = weight[i] ?? 0;
  return Number.isFinite((horizontal[i] ?? Number.NaN) * (vertical[i] ?? Number.NaN)) && Number.isFinite(w)
    ? w
    : 0;
}

function finite(line: LineTermsValue, count: number, need: number): LineTermsValue | null {
  return count >= need && Number.isFinite(line.slope) && Number.isFinite(line.intercept) ? line : null;
}
