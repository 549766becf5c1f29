/** Known constants: values that the user states, each with a standard uncertainty (0 when exact). */
export type Known = ReadonlyMap<string, { readonly value: number; readonly standardUncertainty: number }>;

/**
 * How uncertain the readings are in one direction. `none`, `equal` and `proportional` leave the scale to be
 * estimated from the scatter; the others state standard uncertainties that are taken as they are.
 */
export type Spread =
  | { readonly kind: 'none' }
  | { readonly kind: 'equal' }
  | { readonly kind: 'proportional' }
  | { readonly kind: 'absolute'; readonly value: number }
  | { readonly kind: 'relative'; readonly fraction: number }
  /** One per pair of input cells, indexed by position − 1; NaN where the cell holds none. */
  | { readonly kind: 'each'; readonly values: Float64Array };

/** The options that every fitting function shares, complete with their defaults. */
export interface Options {
  readonly coverage: number;
  readonly intercept: 'free' | 'held';
  /** 1-based number of the straight form. */
  readonly form: number;
  readonly fit: 'line' | 'direct';
  readonly band: 'curve' | 'reading';
  readonly outside: 'stop' | 'set aside';
  readonly interval: 'line' | 'montecarlo';
  readonly judge: 'line' | 'direct';
  /** How `STATEMENT` writes the result: a sentence, or the compact form 0.0412(13). */
  readonly style: 'sentence' | 'brackets';
}

/** Everything besides the readings and the law that a fit depends on. */
export interface FitSettings {
  readonly known: Known;
  readonly spreadY: Spread;
  readonly spreadX: Spread;
  readonly options: Options;
}
