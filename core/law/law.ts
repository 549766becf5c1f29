import type { Expression } from './expression.ts';

/**
 * A function of the readings and the constants, compiled from an expression and evaluated down whole columns.
 * `inputs` is aligned with the law's `symbols`; each entry is a column of `length` values or one number that
 * holds for every row. NaN marks rows outside the function's domain; nothing throws.
 */
export interface ColumnFunction {
  readonly expression: Expression;
  /** Indices into the law's `symbols` that the expression really uses. */
  readonly uses: readonly number[];
  /** Values, one per row. Writes into `out` when given (length ≥ `length`) and returns it. */
  evaluate(inputs: Inputs, length: number, out?: Float64Array): Float64Array;
  /** Values and exact partial derivatives with respect to the symbols at the indices `wrt`. */
  gradient(inputs: Inputs, length: number, wrt: readonly number[]): ColumnGradient;
  /** One value, for inputs that are all plain numbers. */
  at(values: ArrayLike<number>): number;
}

/** Columns or plain numbers, aligned with a law's `symbols`. */
export type Inputs = readonly (Float64Array | number)[];

export interface ColumnGradient {
  readonly value: Float64Array;
  /** Aligned with `wrt`. */
  readonly partials: readonly Float64Array[];
}

/** One way of drawing a law as a straight line: `plot` = slope · `against` + intercept. */
export interface StraightForm {
  /** 1-based, best first, as `TAUT.STRAIGHTEN` numbers them. */
  readonly number: number;
  /** The vertical axis in readable mathematics, in the law's own symbols: `ln C`. */
  readonly plot: string;
  /** The horizontal axis: `1/T − 1/T0`. */
  readonly against: string;
  /** The slope as an expression of the constants: `−k`. */
  readonly slope: string;
  /** The intercept as an expression of the constants; `0` for a line through the origin. */
  readonly intercept: string;
  /** Unknown constants that must be given a trial value for this form to be straight. */
  readonly trials: readonly string[];
  /** What a user should know about the form ("y stands on both axes", "only for x > x0"), or empty. */
  readonly note: string;
  /** True when the line has no intercept term at all. */
  readonly proportional: boolean;
  /** True when the horizontal axis contains the response. */
  readonly responseOnBothAxes: boolean;
  /** Vertical axis Y(x, y, constants) on its strict domain. */
  readonly vertical: ColumnFunction;
  /** Horizontal axis X(x, y, constants). */
  readonly horizontal: ColumnFunction;
  /** slope(constants): no dependence on the readings. */
  readonly slopeOf: ColumnFunction;
  /** intercept(constants); the constant zero for a proportional form. */
  readonly interceptOf: ColumnFunction;
  /** Unknown constants, trials excepted, that stand in the slope and in the intercept. */
  readonly inSlope: readonly string[];
  readonly inIntercept: readonly string[];
  /**
   * The response from a value of the vertical axis: the response's slot of the inputs holds Y instead of y.
   * Null when the response stands on both axes or cannot be isolated.
   */
  readonly responseFrom: ColumnFunction | null;
  /**
   * Solves slope(θ) = `slope` and/or intercept(θ) = `intercept` for the unknown constants that are no trials.
   * `constants` is aligned with the law's `constants`: known and trial entries hold their values, the others are
   * ignored. Returns every real solution as a full vector aligned with the law's `constants`
   * (positive branch first), or an empty list.
   */
  solve(slope: number, intercept: number, constants: ArrayLike<number>, use: LineTerms): Float64Array[];
  /**
   * For each trial constant, functions that give, reading by reading, the trial's value at which some sum inside
   * the axes becomes zero: the edges of the form's domain, where a search for the trial starts.
   */
  readonly trialEdges: readonly (readonly ColumnFunction[])[];
}

export type LineTerms = 'both' | 'slope' | 'intercept';

/** A law compiled from its equation, for a given set of known constants (their names, not their values). */
export interface Law {
  /** Catalogue name, or the empty string for the user's own law. */
  readonly name: string;
  /** The equation as printed from its tree, left side in function notation: `C(t) = C0*exp(-k*t)`. */
  readonly equation: string;
  readonly response: string;
  readonly predictor: string;
  /** All constants, in order of first appearance in the equation. */
  readonly constants: readonly string[];
  /** Those whose values are given, in the same order. */
  readonly known: readonly string[];
  /** The rest: what the readings must settle. */
  readonly unknown: readonly string[];
  /** `[predictor, response, ...constants]`: what every `ColumnFunction` of the law takes, in this order. */
  readonly symbols: readonly string[];
  /** Constants the equation builds in with a value (Rgas of `arrhenius`); their names also stand in `known`. */
  readonly builtIn: ReadonlyMap<string, number>;
  /** The response as a function of the predictor and the constants, on its true domain; null if it cannot be isolated. */
  readonly curve: ColumnFunction | null;
  /** The predictor as a function of the response and the constants; null if it cannot be isolated. */
  readonly inverse: ColumnFunction | null;
  /** True when the curve is linear in all unknown constants together (solved directly, no search). */
  readonly linearInConstants: boolean;
  /** Straight forms, best first; all need the same number of trial constants (0, 1 or 2). Never empty. */
  readonly forms: readonly StraightForm[];
  /** Quantities derived from the constants (half-life, …); see `catalogue.ts`. */
  readonly derived: readonly DerivedConstant[];
}

/** A quantity computed from one constant of a law, shown after the constants. */
export interface DerivedConstant {
  readonly name: string;
  /** The constant that it is computed from. */
  readonly from: string;
  /** Value for the constant's value; NaN where it does not exist (a half-life of a growth). Monotonic where defined. */
  readonly value: (constant: number) => number;
  /** Derivative of `value`. */
  readonly slope: (constant: number) => number;
}
