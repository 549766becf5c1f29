/** How the covariance of a line is scaled: from stated uncertainties, or from the scatter about the line. */
export type Scale = 'known' | 'estimated';

/** The intercept of a line: fitted, or held at a value that is itself uncertain (0 when exact). */
export type Intercept = 'free' | { readonly held: number; readonly standardUncertainty: number };

/** A fitted line vertical = slope · horizontal + intercept. */
export interface Line {
  readonly slope: number;
  readonly intercept: number;
  /** Variances and covariance, scaled as `scale` says; NaN when there are no degrees of freedom to scale with. */
  readonly varianceSlope: number;
  readonly varianceIntercept: number;
  readonly covariance: number;
  /** NaN when the intercept is held or absent. */
  readonly correlation: number;
  readonly degreesOfFreedom: number;
  readonly scale: Scale;
  /** 2 for a free intercept, 1 for a held one. */
  readonly terms: 1 | 2;
  /** Σ w r². */
  readonly weightedSumOfSquares: number;
  /** √(Σ w r² / ν); NaN when ν = 0. */
  readonly residualStandardDeviation: number;
  /** NaN for a line with errors in both axes. */
  readonly rSquared: number;
  /** Vertical values on the line at each horizontal value, and observed minus fitted. */
  readonly fitted: Float64Array;
  readonly residual: Float64Array;
  /** Diagonal of the hat matrix. */
  readonly leverage: Float64Array;
  /** Weights in use, one per reading. */
  readonly lineWeight: Float64Array;
}
