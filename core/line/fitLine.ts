import { Problem } from '../problem.ts';
import { lineWords } from '../words/lineWords.ts';
import { type CentredSums, centredSums } from './centredSums.ts';
import type { Intercept, Line, Scale } from './line.ts';

/** A line with errors in y only. */
export interface LineInY extends Line {
  /** Writes the residuals into the first n places of `out`, n or longer, and returns it. */
  residualInto(out: Float64Array): Float64Array;
}

/**
 * Weighted least-squares line, vertical = slope · horizontal + intercept, through centred sums.
 * @param horizontal n finite values
 * @param vertical n finite values
 * @param lineWeight n weights above 0, or null for equal ones
 * @param scale `known` when weights are 1/u²; `estimated` when only their ratios are meant
 * @param intercept free, held at a value with a standard uncertainty, or absent (a line through the origin)
 * @returns the line; without degrees of freedom its variances and residual standard deviation are NaN
 * @throws Problem `tooFew` with fewer readings than free terms; `undefined` when all horizontal values are equal, or
 * when the unit of the readings puts a variance beyond the range of numbers
 * @see Bevington & Robinson (2003), Data Reduction and Error Analysis, 3rd ed., sections 6.3–6.4
 */
export function fitLine(
  horizontal: Float64Array,
  vertical: Float64Array,
  lineWeight: Float64Array | null,
  scale: Scale,
  intercept: Intercept | 'absent',
): LineInY {
  const n = horizontal.length;
  const terms = intercept === 'free' ? 2 : 1;
  if (n < terms) throw new Problem('tooFew', 'x', lineWords.tooFew(n, terms));
  const sums =
    intercept === 'free'
      ? centredSums(horizontal, vertical, lineWeight, null)
      : centredSums(horizontal, vertical, lineWeight, intercept === 'absent' ? 0 : intercept.held);
  if (!(sums.horizontalSquares > 0)) throw new Problem('undefined', 'x', lineWords.noSpread());
  return new FittedLine(horizontal, vertical, lineWeight, scale, intercept, sums);
}

class FittedLine implements LineInY {
  readonly slope: number;
  readonly intercept: number;
  readonly varianceSlope: number;
  readonly varianceIntercept: number;
  readonly covariance: number;
  readonly correlation: number;
  readonly degreesOfFreedom: number;
  readonly scale: Scale;
  readonly terms: 1 | 2;
  readonly weightedSumOfSquares: number;
  readonly residualStandardDeviation: number;
  readonly rSquared: number;
  private readonly horizontal: Float64Array;
  private readonly vertical: Float64Array;
  private readonly givenWeight: Float64Array | null;
  private readonly sums: CentredSums;
  /** Height of the line above the origin of the sums. */
  private readonly level: number;
  private fittedColumn: Float64Array | undefined;
  private residualColumn: Float64Array | undefined;
  private leverageColumn: Float64Array | undefined;
  private weights: Float64Array | undefined;

  constructor(
    horizontal: Float64Array,
    vertical: Float64Array,
    givenWeight: Float64Array | null,
    scale: Scale,
    intercept: Intercept | 'absent',
    sums: CentredSums,
  ) {
    this.horizontal = horizontal;
    this.vertical = vertical;
    this.givenWeight = givenWeight;
    this.sums = sums;
    this.scale = scale;
    this.terms = intercept === 'free' ? 2 : 1;
    const { origin, beyond, slope, unitX, unitY, total, mean } = sums;
    this.slope = slope * (unitY / unitX);
    this.level = beyond.vertical - this.slope * beyond.horizontal;
    this.intercept =
      intercept === 'free' ? origin.vertical - this.slope * origin.horizontal + this.level : origin.vertical;
    this.degreesOfFreedom = horizontal.length - this.terms;
    const { residualSquares, verticalSquares, horizontalSquares } = sums;
    const freedom = this.degreesOfFreedom;
    // In units of unitY² · unitWeight, so that nothing leaves the range of numbers early.
    const scatter = freedom > 0 ? residualSquares / freedom : Number.NaN;
    this.weightedSumOfSquares = residualSquares * sums.unitWeight * unitY * unitY;
    this.residualStandardDeviation = Math.sqrt(scatter) * Math.sqrt(sums.unitWeight) * unitY;
    this.rSquared = verticalSquares > 0 ? Math.max(0, 1 - residualSquares / verticalSquares) : Number.NaN;
    // σ² per unit of (unitY)²: the scatter, or 1/unitWeight of stated uncertainties measured in unitY.
    const variance =
      freedom > 0 ? (scale === 'known' ? 1 / sums.unitWeight / unitY / unitY : scatter) : Number.NaN;
    const ratio = unitY / unitX;
    const ofSlope = variance / horizontalSquares;
    const held = intercept === 'free' || intercept === 'absent' ? 0 : intercept.standardUncertainty;
    if (this.terms === 2) {
      const x0 = (origin.horizontal + beyond.horizontal) / unitX;
      this.varianceSlope = ofSlope * ratio * ratio;
      this.varianceIntercept = (variance / total + ofSlope * x0 * x0) * unitY * unitY;
      this.covariance = -ofSlope * x0 * ratio * unitY;
      this.correlation = freedom > 0 ? -x0 / Math.sqrt(x0 * x0 + horizontalSquares / total) : Number.NaN;
    } else {
      // The slope through a held point falls by Σwx/Σwx² when the point rises by 1.
      const lever = (mean * total) / horizontalSquares;
      const inherited = (held / unitX) * lever;
      this.varianceSlope = ofSlope * ratio * ratio + inherited * inherited;
      this.varianceIntercept = freedom > 0 ? held * held : Number.NaN;
      this.covariance = freedom > 0 ? -held * inherited : Number.NaN;
      this.correlation = Number.NaN;
    }
    const lost =
      variance > 0 && (isLost(this.varianceSlope) || (this.terms === 2 && isLost(this.varianceIntercept)));
    if (lost || !Number.isFinite(this.slope) || !Number.isFinite(this.intercept)) {
      throw new Problem('undefined', 'y', lineWords.unitTooFar());
    }
  }

  get lineWeight(): Float64Array {
    this.weights ??= this.givenWeight ?? new Float64Array(this.horizontal.length).fill(1);
    return this.weights;
  }

  get fitted(): Float64Array {
    if (this.fittedColumn !== undefined) return this.fittedColumn;
    const { horizontal, slope, level } = this;
    const { origin } = this.sums;
    const fitted = new Float64Array(horizontal.length);
    for (let i = 0; i < fitted.length; i++) {
      fitted[i] = origin.vertical + (slope * ((horizontal[i] as number) - origin.horizontal) + level); // i < n
    }
    this.fittedColumn = fitted;
    return fitted;
  }

  get residual(): Float64Array {
    this.residualColumn ??= this.residualInto(new Float64Array(this.horizontal.length));
    return this.residualColumn;
  }

  residualInto(out: Float64Array): Float64Array {
    const { horizontal, vertical, slope, level } = this;
    const { origin } = this.sums;
    for (let i = 0; i < horizontal.length; i++) {
      const dx = (horizontal[i] as number) - origin.horizontal; // i < n
      out[i] = (vertical[i] as number) - origin.vertical - slope * dx - level;
    }
    return out;
  }

  get leverage(): Float64Array {
    if (this.leverageColumn !== undefined) return this.leverageColumn;
    const { horizontal, givenWeight } = this;
    const { origin, beyond, unitX, unitWeight, total, horizontalSquares } = this.sums;
    const leverage = new Float64Array(horizontal.length);
    const level = this.terms === 2 ? 1 / total : 0;
    for (let i = 0; i < leverage.length; i++) {
      const w = givenWeight === null ? 1 : (givenWeight[i] as number) / unitWeight; // i < n
      const scaled = ((horizontal[i] as number) - origin.horizontal - beyond.horizontal) / unitX;
      leverage[i] = w * (level + (scaled * scaled) / horizontalSquares);
    }
    this.leverageColumn = leverage;
    return leverage;
  }
}

/** The smallest number that carries all its digits. */
const SMALLEST = 2 ** -1022;

/** Whether a variance above 0 left the range of numbers that carry all their digits. */
function isLost(variance: number): boolean {
  return !(variance >= SMALLEST && variance < Number.POSITIVE_INFINITY);
}
