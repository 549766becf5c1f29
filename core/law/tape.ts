import type { Expression } from './expression.ts';
import { type Operation, operations } from './operations.ts';

/** One step: `a` and `b` are earlier steps (`b` is −1 for one operand). */
export interface Step {
  readonly operation: Operation;
  readonly a: number;
  readonly b: number;
  /** Number for `constant`, index of the symbol for `input`. */
  readonly value: number;
}

/** Writes an expression as a list of steps in which equal subexpressions stand once. The last step is the result. */
export function recordTape(expression: Expression, indexOf: (name: string) => number): readonly Step[] {
  const steps: Step[] = [];
  const seen = new Map<string, number>();
  const put = (operation: Operation, a: number, b: number, value = 0): number => {
    const key = `${operation},${a},${b},${value}`;
    const old = seen.get(key);
    if (old !== undefined) return old;
    const at = steps.push({ operation, a, b, value }) - 1;
    seen.set(key, at);
    return at;
  };
  const constant = (value: number): number => put(operations.constant, -1, -1, value);

  const product = (factors: readonly Expression[]): number => {
    let above = -1;
    let below = -1;
    let negative = false;
    for (const factor of factors) {
      if (factor.kind === 'number' && factor.value === -1) {
        negative = !negative;
      } else if (isInverse(factor)) {
        const divisor = record(inverse(factor));
        below = below < 0 ? divisor : put(operations.multiply, below, divisor);
      } else {
        const one = record(factor);
        above = above < 0 ? one : put(operations.multiply, above, one);
      }
    }
    let result = above;
    if (below >= 0)
      result = above < 0 ? put(operations.invert, below, -1) : put(operations.divide, above, below);
    if (result < 0) return constant(negative ? -1 : 1);
    return negative ? put(operations.negate, result, -1) : result;
  };

  /** exp(u) − 1 without cancellation. */
  const exponentialLessOne = (terms: readonly Expression[]): number | undefined => {
    const [first, second] = terms;
    if (terms.length !== 2 || first === undefined || second === undefined) return undefined;
    for (const [one, other] of [
      [first, second],
      [second, first],
    ] as const) {
      if (one.kind !== 'number' || Math.abs(one.value) !== 1) continue;
      const sign = -one.value;
      const exponent = exponentOfEuler(sign === 1 ? other : negated(other));
      if (exponent === undefined) continue;
      const result = put(operations.expm1, record(exponent), -1);
      return sign === 1 ? result : put(operations.negate, result, -1);
    }
    return undefined;
  };

  const sum = (terms: readonly Expression[]): number => {
    const short = exponentialLessOne(terms);
    if (short !== undefined) return short;
    let result = -1;
    const negatives: number[] = [];
    for (const term of terms) {
      const opposite = negated(term);
      if (opposite !== undefined) negatives.push(record(opposite));
      else {
        const one = record(term);
        result = result < 0 ? one : put(operations.add, result, one);
      }
    }
    for (const one of negatives) {
      result = result < 0 ? put(operations.negate, one, -1) : put(operations.subtract, result, one);
    }
    return result < 0 ? constant(0) : result;
  };

  const power = (base: Expression, exponent: Expression): number => {
    if (base.kind === 'symbol' && base.value === Math.E) return put(operations.exp, record(exponent), -1);
    if (exponent.kind === 'number') {
      if (exponent.value === 2) return put(operations.square, record(base), -1);
      if (exponent.value === 0.5) return put(operations.sqrt, record(base), -1);
      if (exponent.value === -1) return put(operations.invert, record(base), -1);
      if (exponent.value === 1) return record(base);
    }
    return put(operations.power, record(base), record(exponent));
  };

  const record = (part: Expression): number => {
    switch (part.kind) {
      case 'number':
        return constant(part.value);
      case 'symbol':
        return part.value === undefined
          ? put(operations.input, -1, -1, indexOf(part.name))
          : constant(part.value);
      case 'sum':
        return sum(part.terms);
      case 'product': {
        const log10 = argumentOfLog10(part.factors);
        return log10 === undefined ? product(part.factors) : put(operations.log10, record(log10), -1);
      }
      case 'power':
        return power(part.base, part.exponent);
      case 'function':
        if (part.name === 'ln' && part.argument.kind === 'sum') {
          const rest = lessOne(part.argument.terms);
          if (rest !== undefined) return put(operations.log1p, record(rest), -1);
        }
        return put(operations[part.name], record(part.argument), -1);
    }
  };
  record(expression);
  return steps;
}

function isInverse(
  factor: Expression,
): factor is { readonly kind: 'power'; readonly base: Expression; readonly exponent: Expression } {
  return (
    factor.kind === 'power' &&
    factor.exponent.kind === 'number' &&
    factor.exponent.value < 0 &&
    factor.base.kind !== 'number'
  );
}

function inverse(factor: Expression): Expression {
  if (!isInverse(factor) || factor.exponent.kind !== 'number') return factor;
  if (factor.exponent.value === -1) return factor.base;
  return { ...factor, exponent: { kind: 'number', value: -factor.exponent.value } };
}

/** The term without its minus sign; undefined for a term without one. */
function negated(term: Expression): Expression | undefined {
  if (term.kind === 'number') return term.value < 0 ? { ...term, value: -term.value } : undefined;
  const first = term.kind === 'product' ? term.factors[0] : undefined;
  if (term.kind !== 'product' || first?.kind !== 'number' || first.value >= 0) return undefined;
  const rest = term.factors.slice(1);
  const [only] = rest;
  if (first.value !== -1) return { ...term, factors: [{ ...first, value: -first.value }, ...rest] };
  return rest.length === 1 && only !== undefined ? only : { ...term, factors: rest };
}

function exponentOfEuler(term: Expression | undefined): Expression | undefined {
  return term?.kind === 'power' && term.base.kind === 'symbol' && term.base.value === Math.E
    ? term.exponent
    : undefined;
}

/** u of 1 + u, for two terms. */
function lessOne(terms: readonly Expression[]): Expression | undefined {
  if (terms.length !== 2) return undefined;
  const at = terms.findIndex((term) => term.kind === 'number' && term.value === 1);
  return at < 0 ? undefined : terms[1 - at];
}

/** u of ln u / ln 10, for exactly these two factors. */
export function argumentOfLog10(factors: readonly Expression[]): Expression | undefined {
  const isLn10 = (factor: Expression): boolean =>
    isInverse(factor) &&
    factor.base.kind === 'function' &&
    factor.base.name === 'ln' &&
    factor.base.argument.kind === 'number' &&
    factor.base.argument.value === 10;
  if (factors.length !== 2) return undefined;
  const logarithm = factors.find((factor) => factor.kind === 'function' && factor.name === 'ln');
  return logarithm?.kind === 'function' && factors.some(isLn10) ? logarithm.argument : undefined;
}
