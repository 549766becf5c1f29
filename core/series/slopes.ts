import { lineMoments } from '../constants/lineMoments.ts';
import { chiSquaredTail, fTail } from '../distributions/tails.ts';
import type { Line, Scale } from '../line/line.ts';

/** One series on its straight axes, with its own line. */
export interface SeriesLine {
  readonly horizontal: Float64Array;
  readonly line: Line;
}

/** Several series with one slope. */
export interface SharedSlope {
  readonly slope: number;
  readonly standardUncertainty: number;
  readonly degreesOfFreedom: number;
  /** The test that the slopes are equal; NaN with one series or without degrees of freedom. */
  readonly f: number;
  readonly p: number;
  /** Each series' intercept with the shared slope. */
  readonly intercepts: readonly { readonly value: number; readonly standardUncertainty: number }[];
}

/**
 * Analysis of covariance on the straight axes: one slope for all series, an intercept each (none where the lines have
 * no free intercept), and one residual variance pooled over all of them.
 * @param series two or more lines of the same kind, each with some spread in its horizontal values
 * @see Snedecor & Cochran (1989), Statistical Methods, 8th ed., chapter 18
 */
export function sharedSlope(series: readonly SeriesLine[], scale: Scale): SharedSlope {
  const free = series.every(({ line }) => line.terms === 2);
  const parts = series.map(({ horizontal, line }) => {
    const { total, mean, spread } = lineMoments(horizontal, line.lineWeight);
    return { line, total, mean, squares: free ? spread : spread + total * mean * mean };
  });
  const squares = parts.reduce((sum, part) => sum + part.squares, 0);
  const slope = parts.reduce((sum, part) => sum + (part.squares / squares) * part.line.slope, 0);
  const between = parts.reduce((sum, part) => sum + part.squares * (part.line.slope - slope) ** 2, 0);
  const within = parts.reduce((sum, part) => sum + part.line.weightedSumOfSquares, 0);
  const count = series.reduce((sum, { horizontal }) => sum + horizontal.length, 0);
  const terms = free ? 2 : 1;
  const ownFreedom = count - terms * series.length;
  const degreesOfFreedom = ownFreedom + series.length - 1;
  const pooled = scale === 'known' ? 1 : (within + between) / degreesOfFreedom;
  const variance = degreesOfFreedom > 0 ? pooled : Number.NaN;
  const { f, p } = equalSlopes(between, within, series.length - 1, ownFreedom, scale);
  return {
    slope,
    standardUncertainty: Math.sqrt(variance / squares),
    degreesOfFreedom,
    f,
    p,
    intercepts: parts.map(({ line, total, mean }) => ({
      value: free ? line.intercept + (line.slope - slope) * mean : line.intercept,
      standardUncertainty: free
        ? Math.sqrt(variance * (1 / total + (mean * mean) / squares))
        : Math.sqrt(line.varianceIntercept),
    })),
  };
}

function equalSlopes(
  between: number,
  within: number,
  betweenFreedom: number,
  withinFreedom: number,
  scale: Scale,
): { readonly f: number; readonly p: number } {
  if (betweenFreedom < 1) return { f: Number.NaN, p: Number.NaN };
  if (scale === 'known') {
    return { f: between / betweenFreedom, p: chiSquaredTail(between, betweenFreedom) };
  }
  if (withinFreedom < 1) return { f: Number.NaN, p: Number.NaN };
  const f = between / betweenFreedom / (within / withinFreedom);
  return { f, p: fTail(f, betweenFreedom, withinFreedom) };
}
