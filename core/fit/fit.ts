import type { FitSettings } from '../given/given.ts';
import type { Law, StraightForm } from '../law/law.ts';
import type { Line } from '../line/line.ts';
import type { Readings, SetAside } from '../readings/readings.ts';

/** One law fitted to one set of readings: everything that tables, findings, plots and statements are made from. */
export interface Fit {
  readonly law: Law;
  readonly form: StraightForm;
  readonly readings: Readings;
  readonly settings: FitSettings;
  /** Indices into `readings.x` of the readings that take part at all, ascending: a direct fit uses all of them. */
  readonly taking: Int32Array;
  /** Indices into `readings.x` of the readings on the line, ascending. */
  readonly used: Int32Array;
  /** Everything that takes no part: what the cells excluded and what lies outside the law's domain. */
  readonly setAside: readonly SetAside[];
  readonly axes: StraightAxes;
  /** The line on the straight axes, trial constants at their final values. */
  readonly line: Line;
  /** The same line with a held intercept taken as exact: what the readings alone say. */
  readonly lineFromReadings: Line;
  /** Present when the constants come from least squares in the units of y (`fit=direct`, or trial constants). */
  readonly direct: DirectResult | null;
  /** Settled value of every constant, aligned with `law.constants` (known ones included). */
  readonly values: Float64Array;
  /** Covariance of the unknown constants, aligned with `law.unknown`; NaN without degrees of freedom. */
  readonly covariance: readonly Float64Array[];
  /** The part of `covariance` that comes from the readings' scatter or uncertainties, known constants taken as exact. */
  readonly covarianceFromReadings: readonly Float64Array[];
  /** What the fit becomes when one of the uncertain known constants is shifted. */
  readonly knownEffects: readonly KnownEffect[];
  /** The unknown constants in order of first appearance, then the derived ones. */
  readonly constants: readonly ConstantEstimate[];
  readonly coverage: Coverage;
  /** The line term that no unknown stands in, against what the known constants say of it; null when there is none. */
  readonly leftover: LeftoverTerm | null;
}

/** The readings on the straight axes, one entry per used reading. */
export interface StraightAxes {
  readonly horizontal: Float64Array;
  readonly vertical: Float64Array;
  /** ∂Y/∂y, ∂Y/∂x, ∂X/∂x and ∂X/∂y at the observed readings. */
  readonly verticalByY: Float64Array;
  readonly verticalByX: Float64Array;
  readonly horizontalByX: Float64Array;
  readonly horizontalByY: Float64Array;
}

/** A constant with its uncertainty; entries that do not exist (ν = 0) are NaN and shown as empty cells. */
export interface ConstantEstimate {
  readonly name: string;
  readonly value: number;
  readonly standardUncertainty: number;
  readonly low: number;
  readonly high: number;
  readonly derived: boolean;
}

/** How intervals are widened. */
export interface Coverage {
  readonly probability: number;
  /** NaN when there are no degrees of freedom to estimate the scatter with. */
  readonly factor: number;
  readonly distribution: 'normal' | 't';
  readonly degreesOfFreedom: number;
}

/** Least squares in the units of y. */
export interface DirectResult {
  /** Unknown constants, aligned with `law.unknown`. */
  readonly theta: Float64Array;
  readonly covariance: readonly Float64Array[];
  /** Σ ω (y − ŷ)². */
  readonly sumOfSquares: number;
  readonly degreesOfFreedom: number;
  readonly residualStandardDeviation: number;
  /** Fitted response and Jacobian by unknown constant, at every reading that takes part. */
  readonly fitted: Float64Array;
  readonly jacobian: readonly Float64Array[];
  readonly iterations: number;
  /** Plain remarks: "the search was cut after 2 s", "the optimum lies at the edge of the law's domain". */
  readonly notes: readonly string[];
}

/** Where a fit stands: all constants and, where one can be drawn, the line. */
export interface FitState {
  /** Aligned with `law.constants`. */
  readonly values: Float64Array;
  readonly slope: number;
  readonly intercept: number;
}

/** One uncertain known constant, and the fit repeated with its value shifted by −2, −1, +1 and +2 steps. */
export interface KnownEffect {
  readonly name: string;
  readonly standardUncertainty: number;
  readonly step: number;
  readonly shifted: readonly [FitState, FitState, FitState, FitState];
}

/** A term of the line that follows from known constants alone. */
export interface LeftoverTerm {
  readonly term: 'slope' | 'intercept';
  readonly fitted: number;
  readonly expected: number;
  /** Standard uncertainty of fitted − expected. */
  readonly standardUncertainty: number;
}
