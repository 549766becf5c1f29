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

/** The parabola beside a line: u = (X − middle)/range, and q = u² made orthogonal to 1 and u. */
interface Parabola {
  readonly middle: number;
  readonly range: number;
  readonly mean: number;
  readonly spread: number;
  readonly tilt: number;
  readonly level: number;
  /** Weights are taken relative to the heaviest; Σw, Σw q² and Σw q r in these. */
  readonly heaviest: number;
  readonly total: number;
  readonly squares: number;
  /** Coefficient of q. */
  readonly curvature: number;
}

/**
 * Fits Y = c0 + c1·X + c2·X² with the line's weights and tests c2 (t with n − 3 degrees of freedom, normal when the
 * scale is known). Absent (NaN) below four readings or three distinct horizontal values.
 * @param horizontal n values
 * @param vertical n values
 */
export function bow(line: Line, horizontal: Float64Array, vertical: Float64Array): Bow {
  const parabola = parabolaOf(line, horizontal);
  if (parabola === null) return NONE;
  const n = horizontal.length;
  const { middle, range, mean, spread, tilt, level, heaviest, total, squares, curvature } = parabola;
  const { lineWeight, residual } = line;
  let sumR = 0;
  let sumUR = 0;
  for (let i = 0; i < n; i++) {
    // i < n throughout.
    const w = (lineWeight[i] as number) / heaviest;
    sumR += w * (residual[i] as number);
    sumUR += w * (((horizontal[i] as number) - middle) / range - mean) * (residual[i] as number);
  }
  // A held line's residuals still hold a level and a tilt, which the parabola takes up.
  const offset = sumR / total;
  const slope = sumUR / spread;
  let rest = 0;
  let size = 0;
  for (let i = 0; i < n; i++) {
    const w = (lineWeight[i] as number) / heaviest;
    const u = ((horizontal[i] as number) - middle) / range;
    const q = u * u - level - tilt * (u - mean);
    const r = (residual[i] as number) - offset - slope * (u - mean) - curvature * q;
    rest += w * r * r;
    size += w * (vertical[i] as number) * (vertical[i] as number);
  }
  const percent = percentOf(line, parabola);
  const freedom = n - 3;
  // Rounding alone is no curvature: an exact law has none.
  if (rest + curvature * curvature * squares <= 1e-30 * size) return { percent, p: 1 };
  const p =
    line.scale === 'known'
      ? normalTwoSided(curvature * Math.sqrt(squares * heaviest))
      : studentTwoSided(curvature / Math.sqrt(rest / freedom / squares), freedom);
  return { percent, p };
}

/**
 * The bow in percent alone, as `bow` gives it.
 * @param weighted false when all weights are known to be 1
 * @param residual the line's, where they stand elsewhere
 */
export function bowPercent(
  line: Line,
  horizontal: Float64Array,
  weighted = true,
  residual = line.residual,
): number {
  const parabola = parabolaOf(line, horizontal, weighted, residual);
  return parabola === null ? Number.NaN : percentOf(line, parabola);
}

function percentOf({ slope }: Line, { curvature, range }: Parabola): number {
  const rise = Math.abs(slope) * range;
  return rise > 0 ? (100 * curvature) / (4 * rise) : Number.NaN;
}

function parabolaOf(
  line: Line,
  horizontal: Float64Array,
  weighted = true,
  residual = line.residual,
): Parabola | null {
  const lineWeight = weighted ? line.lineWeight : null;
  const n = horizontal.length;
  if (n < 4) return null;
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  let heaviest = lineWeight === null ? 1 : 0;
  for (let i = 0; i < n; i++) {
    const x = horizontal[i] as number; // i < n throughout
    if (x < least) least = x;
    if (x > most) most = x;
    if (lineWeight !== null && (lineWeight[i] as number) > heaviest) heaviest = lineWeight[i] as number;
  }
  const range = most - least;
  if (!(range > 0)) return null;
  const middle = least + range / 2;
  const perRange = 1 / range;
  if (!Number.isFinite(perRange)) return null;
  let total = 0;
  let w1 = 0;
  let w2 = 0;
  let w3 = 0;
  for (let i = 0; i < n; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) / heaviest;
    const u = ((horizontal[i] as number) - middle) * perRange;
    const wu = w * u;
    total += w;
    w1 += wu;
    w2 += wu * u;
    w3 += wu * u * u;
  }
  const mean = w1 / total;
  const spread = w2 - w1 * mean;
  const tilt = (w3 - w2 * mean) / spread;
  const level = w2 / total;
  let squares = 0;
  let products = 0;
  for (let i = 0; i < n; i++) {
    const u = ((horizontal[i] as number) - middle) * perRange;
    const q = u * u - level - tilt * (u - mean);
    const wq = lineWeight === null ? q : ((lineWeight[i] as number) / heaviest) * q;
    squares += wq * q;
    products += wq * (residual[i] as number);
  }
  if (!(squares > 1e-14 * total)) return null;
  return {
    middle,
    range,
    mean,
    spread,
    tilt,
    level,
    heaviest,
    total,
    squares,
    curvature: products / squares,
  };
}
