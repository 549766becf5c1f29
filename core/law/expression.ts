/**
 * An expression of a law as a tree of plain objects: what the printer, the translator to spreadsheet formulas and
 * the evaluator read. `exp(u)` is a power with base `e` (symbol `E` with a value), a square root is a power with
 * exponent ½. A symbol with a `value` is a number of mathematics (e or π), never a constant of the law, whatever
 * its name: a law may have a constant called `E` of its own.
 */
export type Expression =
  | { readonly kind: 'number'; readonly value: number }
  | { readonly kind: 'symbol'; readonly name: string; readonly value?: number }
  | { readonly kind: 'sum'; readonly terms: readonly Expression[] }
  | { readonly kind: 'product'; readonly factors: readonly Expression[] }
  | { readonly kind: 'power'; readonly base: Expression; readonly exponent: Expression }
  | { readonly kind: 'function'; readonly name: FunctionName; readonly argument: Expression };

/** Functions that remain in a tree; `exp`, `sqrt`, `log10`, `log2` are written with powers and `ln`. */
export type FunctionName =
  | 'ln'
  | 'abs'
  | 'sin'
  | 'cos'
  | 'tan'
  | 'asin'
  | 'acos'
  | 'atan'
  | 'sinh'
  | 'cosh'
  | 'tanh';

export const functionNames: readonly FunctionName[] = [
  'ln',
  'abs',
  'sin',
  'cos',
  'tan',
  'asin',
  'acos',
  'atan',
  'sinh',
  'cosh',
  'tanh',
];

/** Euler's number. */
export const euler: Expression = { kind: 'symbol', name: 'E', value: Math.E };
/** π. */
export const pi: Expression = { kind: 'symbol', name: 'π', value: Math.PI };

export function numberOf(value: number): Expression {
  return { kind: 'number', value };
}

export function symbolOf(name: string): Expression {
  return { kind: 'symbol', name };
}

/** Sum of terms; sums among them are opened. */
export function sumOf(...terms: readonly Expression[]): Expression {
  const flat = terms.flatMap((term) => (term.kind === 'sum' ? term.terms : [term]));
  const [only] = flat;
  return flat.length === 1 && only !== undefined ? only : { kind: 'sum', terms: flat };
}

/** Product of factors; products among them are opened and numbers −1 in front combined. */
export function productOf(...factors: readonly Expression[]): Expression {
  const flat = factors.flatMap((factor) => (factor.kind === 'product' ? factor.factors : [factor]));
  const signs = flat.filter((factor) => factor.kind === 'number' && factor.value === -1).length;
  const rest = flat.filter((factor) => !(factor.kind === 'number' && factor.value === -1));
  const [first, ...others] = rest;
  if (signs % 2 === 1) {
    if (first?.kind === 'number') rest.splice(0, 1, numberOf(-first.value));
    else rest.unshift(numberOf(-1));
    return rest.length === 1 ? (rest[0] ?? numberOf(-1)) : { kind: 'product', factors: rest };
  }
  if (first === undefined) return numberOf(1);
  return others.length === 0 ? first : { kind: 'product', factors: rest };
}

export function powerOf(base: Expression, exponent: Expression): Expression {
  return { kind: 'power', base, exponent };
}

export function negate(expression: Expression): Expression {
  if (expression.kind === 'sum') return { kind: 'sum', terms: expression.terms.map(negate) };
  return productOf(numberOf(-1), expression);
}

export function reciprocal(expression: Expression): Expression {
  return powerOf(expression, numberOf(-1));
}

export function functionOf(name: FunctionName, argument: Expression): Expression {
  return { kind: 'function', name, argument };
}

/** Names of the symbols in an expression, in order of first appearance; e and π left out. */
export function symbolsIn(expression: Expression, found: Set<string> = new Set()): Set<string> {
  switch (expression.kind) {
    case 'number':
      break;
    case 'symbol':
      if (expression.value === undefined) found.add(expression.name);
      break;
    case 'sum':
      for (const term of expression.terms) symbolsIn(term, found);
      break;
    case 'product':
      for (const factor of expression.factors) symbolsIn(factor, found);
      break;
    case 'power':
      symbolsIn(expression.base, found);
      symbolsIn(expression.exponent, found);
      break;
    case 'function':
      symbolsIn(expression.argument, found);
      break;
  }
  return found;
}
