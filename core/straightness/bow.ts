import { normalTwoSided } from '../distributions/normal.ts';
import { studentTwoSided } from '../distributions/student.ts';
import type { Line } from '../line/line.ts';

/** The curvature that a line leaves. */
export interface Bow {
  /** Sagitta of the fitted parabola over its chord as a share of the line's rise, signed, in percent. */
  readonly percent: number;
  /** Two-sided probability of so much curvature on a straight law. */
  readonly p: number;
}

const NONE: Bow = { percent: Number.NaN, p: Number.NaN };

/**
 * Fits Y = c0 + c1·X + c2·X² with the line's weights and tests c2 (t with n − 3 degrees of freedom, normal when the
 * scale is known). Absent (NaN) below four readings or three distinct horizontal values.
 * @param horizontal n values
 * @param vertical n values
 */
export function bow(line: Line, horizontal: Float64Array, vertical: Float64Array): Bow {
  const n = horizontal.length;
  if (n < 4) return NONE;
  const { lineWeight } = line;
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < n; i++) {
    const x = horizontal[i] as number; // i < n
    if (x < least) least = x;
    if (x > most) most = x;
  }
  const range = most - least;
  if (!(range > 0)) return NONE;
  const middle = least + range / 2;
  const heaviest = lineWeight.reduce((top, w) => Math.max(top, w), 0);
  // u in −½ … ½, and its square made orthogonal to 1 and u; weights relative to the heaviest.
  let [w0, w1, w2, w3] = [0, 0, 0, 0];
  for (let i = 0; i < n; i++) {
    const w = (lineWeight[i] as number) / heaviest;
    const u = ((horizontal[i] as number) - middle) / range;
    w0 += w;
    w1 += w * u;
    w2 += w * u * u;
    w3 += w * u * u * u;
  }
  const mean = w1 / w0;
  const spread = w2 - w1 * mean;
  const tilt = (w3 - w2 * mean) / spread;
  const level = w2 / w0;
  const orthogonal = (x: number): number => {
    const u = (x - middle) / range;
    return u * u - level - tilt * (u - mean);
  };
  let squares = 0;
  let products = 0;
  let [sumR, sumUR] = [0, 0];
  const left = line.residual;
  for (let i = 0; i < n; i++) {
    const w = (lineWeight[i] as number) / heaviest;
    const q = orthogonal(horizontal[i] as number);
    squares += w * q * q;
    products += w * q * (left[i] as number);
    sumR += w * (left[i] as number);
    sumUR += w * (((horizontal[i] as number) - middle) / range - mean) * (left[i] as number);
  }
  if (!(squares > 1e-14 * w0)) return NONE;
  const curvature = products / squares;
  // A held line's residuals still hold a level and a tilt, which the parabola takes up.
  const offset = sumR / w0;
  const slope = sumUR / spread;
  let rest = 0;
  let size = 0;
  for (let i = 0; i < n; i++) {
    const w = (lineWeight[i] as number) / heaviest;
    const u = ((horizontal[i] as number) - middle) / range - mean;
    const r = (left[i] as number) - offset - slope * u - curvature * orthogonal(horizontal[i] as number);
    rest += w * r * r;
    size += w * (vertical[i] as number) * (vertical[i] as number);
  }
  const rise = Math.abs(line.slope) * range;
  const percent = rise > 0 ? (100 * curvature) / (4 * rise) : Number.NaN;
  const freedom = n - 3;
  // Rounding alone is no curvature: an exact law has none.
  if (rest + curvature * curvature * squares <= 1e-30 * size) return { percent, p: 1 };
  const p =
    line.scale === 'known'
      ? normalTwoSided(curvature * Math.sqrt(squares * heaviest))
      : studentTwoSided(curvature / Math.sqrt(rest / freedom / squares), freedom);
  return { percent, p };
}
