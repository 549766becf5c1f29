/**
 * An expression of a law as a tree of plain objects: what the printer, the translator to spreadsheet formulas and
 * the evaluator read. `exp(u)` is a power with base `e` (symbol `E`), a square root is a power with exponent ½.
 */
export type Expression =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'symbol'; readonly name: string }
  | { readonly kind: 'sum'; readonly terms: readonly Expression[] }
  | { readonly kind: 'product'; readonly factors: readonly Expression[] }
  | { readonly kind: 'power'; readonly base: Expression; readonly exponent: Expression }
  | { readonly kind: 'function'; readonly name: FunctionName; readonly argument: Expression };

/** Functions that remain in a tree; `exp`, `sqrt`, `log10`, `log2` are written with powers and `ln`. */
export type FunctionName =
  | 'ln' | 'abs' | 'sin' | 'cos' | 'tan' | 'asin' | 'acos' | 'atan' | 'sinh' | 'cosh' | 'tanh';
