import { Problem } from '../problem.ts';
import { lineWords } from '../words/lineWords.ts';
import { type BothAxes, slopeSums } from './bothAxesSums.ts';
import type { Intercept, Line } from './line.ts';

/** A line with errors in both axes, with the points on it that the readings were moved to. */
export interface LineBothAxes extends Line {
  readonly adjustedHorizontal: Float64Array;
  readonly adjustedVertical: Float64Array;
}

/** Directions tried, evenly over the half circle, so that the lowest of several minima is found. */
const DIRECTIONS = 180;
const MOST_STEPS = 1000;

/**
 * The line with known uncertainties in both axes, uncertainties of its terms at the adjusted points.
 * @param horizontal n values
 * @param vertical n values
 * @param uHorizontal n standard uncertainties, 0 or above
 * @param uVertical n standard uncertainties, 0 or above, not both 0 at one reading
 * @param covariance n covariances of the two errors of a reading, or null
 * @throws Problem `tooFew`; `undefined` when all horizontal values are equal; `noConvergence`
 * @see York, Evensen, Martínez & Delgado (2004), Am. J. Phys. 72, 367, equations 13a–13h
 */
export function fitLineBothAxes(
  horizontal: Float64Array,
  vertical: Float64Array,
  uHorizontal: Float64Array,
  uVertical: Float64Array,
  covariance: Float64Array | null,
  intercept: Intercept | 'absent',
): LineBothAxes {
  const n = horizontal.length;
  const free = intercept === 'free';
  const terms = free ? 2 : 1;
  if (n < terms) throw new Problem('tooFew', 'x', lineWords.tooFew(n, terms));
  const first = horizontal[0] ?? 0;
  if (free && horizontal.every((value) => value === first)) {
    throw new Problem('undefined', 'x', lineWords.noSpread());
  }
  const held = free || intercept === 'absent' ? 0 : intercept.held;
  const heldUncertainty = free || intercept === 'absent' ? 0 : intercept.standardUncertainty;
  // Powers of two that bring both axes near 1.
  const unitX = unitOf(horizontal, free);
  const unitY = unitOf(vertical, free);
  const scaled = (column: Float64Array, unit: number): Float64Array => column.map((value) => value / unit);
  const axes: BothAxes = {
    horizontal: scaled(horizontal, unitX),
    vertical: scaled(vertical, unitY),
    uHorizontal: scaled(uHorizontal, unitX),
    uVertical: scaled(uVertical, unitY),
    covariance: covariance === null ? new Float64Array(n) : covariance.map((value) => value / unitX / unitY),
    held: free ? null : held / unitY,
  };
  const slope = settledSlope(axes);
  const sums = slopeSums(axes, slope);
  const { weight, adjusted, meanX, meanY } = sums;
  let total = 0;
  let moment = 0;
  for (let i = 0; i < n; i++) {
    total += weight[i] ?? 0;
    moment += (weight[i] ?? 0) * (adjusted[i] ?? 0);
  }
  const mean = free ? moment / total : 0;
  let squares = 0;
  for (let i = 0; i < n; i++) squares += (weight[i] ?? 0) * ((adjusted[i] ?? 0) - mean) ** 2;
  const ratio = unitY / unitX;
  const freedom = n - terms;
  const one = freedom > 0 ? 1 : Number.NaN;
  const ofSlope = one / squares;
  const inherited = free ? 0 : (heldUncertainty / unitY) * (moment / squares);
  const varianceSlope = (ofSlope + inherited ** 2) * ratio * ratio;
  const varianceIntercept = free
    ? (one / total + mean * mean * ofSlope) * unitY * unitY
    : one * heldUncertainty ** 2;
  const termCovariance = free ? -mean * ofSlope * ratio * unitY : -one * heldUncertainty * inherited * ratio;
  const a = free ? meanY - slope * meanX : held / unitY;
  const fitted = new Float64Array(n);
  const residual = new Float64Array(n);
  const leverage = new Float64Array(n);
  const level = free ? 1 / total : 0;
  let weightedSumOfSquares = 0;
  for (let i = 0; i < n; i++) {
    const dx = (axes.horizontal[i] ?? 0) - meanX;
    const left = (axes.vertical[i] ?? 0) - (free ? meanY : a) - slope * dx;
    const w = weight[i] ?? 0;
    weightedSumOfSquares += w * left * left;
    residual[i] = left * unitY;
    fitted[i] = (vertical[i] ?? 0) - left * unitY;
    leverage[i] = w * (level + ((adjusted[i] ?? 0) - mean) ** 2 / squares);
  }
  return {
    slope: slope * ratio,
    intercept: free ? a * unitY : held,
    varianceSlope,
    varianceIntercept,
    covariance: termCovariance,
    correlation: free ? termCovariance / Math.sqrt(varianceSlope * varianceIntercept) : Number.NaN,
    degreesOfFreedom: freedom,
    scale: 'known',
    terms,
    weightedSumOfSquares,
    residualStandardDeviation: freedom > 0 ? Math.sqrt(weightedSumOfSquares / freedom) : Number.NaN,
    rSquared: Number.NaN,
    fitted,
    residual,
    leverage,
    lineWeight: weight.map((w) => w / unitY / unitY),
    adjustedHorizontal: adjusted.map((value) => value * unitX),
    adjustedVertical: adjusted.map((value) => (a + slope * value) * unitY),
  };
}

function unitOf(column: Float64Array, free: boolean): number {
  const from = free ? (column[0] ?? 0) : 0;
  const most = column.reduce((size, value) => Math.max(size, Math.abs(value - from)), 0);
  return most > 0 ? 2 ** Math.floor(Math.log2(most)) : 1;
}

/** The slope of the lowest minimum of S, where York's iteration no longer changes it. */
function settledSlope(axes: BothAxes): number {
  const cost = (slope: number): number => slopeSums(axes, slope).sumOfSquares;
  const slopes = Array.from({ length: DIRECTIONS }, (_, k) =>
    Math.tan(Math.PI * ((k + 0.5) / DIRECTIONS - 0.5)),
  );
  const costs = slopes.map(cost);
  let best: { readonly slope: number; readonly cost: number } | null = null;
  for (const [k, here] of costs.entries()) {
    const before = costs[(k + DIRECTIONS - 1) % DIRECTIONS] ?? here;
    const after = costs[(k + 1) % DIRECTIONS] ?? here;
    if (!(here <= before && here <= after)) continue;
    const slope = iterated(axes, slopes[k] ?? 0);
    const reached = slope === null ? Number.POSITIVE_INFINITY : cost(slope);
    if (slope !== null && (best === null || reached < best.cost)) best = { slope, cost: reached };
  }
  if (best === null) throw new Problem('noConvergence', 'x', lineWords.notSettled(MOST_STEPS));
  return best.slope;
}

function iterated(axes: BothAxes, start: number): number | null {
  let slope = start;
  let smallest = Number.POSITIVE_INFINITY;
  let idle = 0;
  for (let step = 0; step < MOST_STEPS; step++) {
    const next = slopeSums(axes, slope).nextSlope;
    if (!Number.isFinite(next)) return null;
    const change = Math.abs(next - slope);
    slope = next;
    if (change <= 2e-16 * Math.abs(slope)) return slope;
    idle = change < smallest ? 0 : idle + 1;
    smallest = Math.min(smallest, change);
    // Steps that no longer shrink and are rounding alone.
    if (idle > 3 && smallest <= 1e-13 * Math.abs(slope)) return slope;
  }
  return null;
}
