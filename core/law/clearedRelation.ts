import { columnFunction } from './columnFunction.ts';
import {
  type Expression,
  negate,
  numberOf,
  powerOf,
  productOf,
  sumOf,
  symbolOf,
  symbolsIn,
} from './expression.ts';
import type { ColumnFunction } from './law.ts';

/** A curve P/Q multiplied through by its denominator: y·Q − P, linear in all unknown constants. */
export interface ClearedRelation {
  /** y·Q − P; zero on the curve. */
  readonly relation: ColumnFunction;
  /** Q: how much the relation changes per unit of the response. */
  readonly denominator: ColumnFunction;
}

interface Ratio {
  readonly above: Expression;
  readonly below: Expression;
}

const ONE = numberOf(1);

/**
 * Multiplies a curve through by the denominators that hold unknown constants.
 * @param curve the response as an expression of the predictor and the constants
 * @param symbols `[predictor, response, ...constants]`
 * @returns null when there is no such denominator, or when the result is not linear in the unknown constants
 */
export function clearedRelation(
  curve: Expression,
  symbols: readonly string[],
  unknown: readonly string[],
): ClearedRelation | null {
  const held = (expression: Expression): boolean => {
    const found = symbolsIn(expression);
    return unknown.some((name) => found.has(name));
  };
  const { above, below } = asRatio(curve, held);
  const response = symbols[1];
  if (below === ONE || response === undefined) return null;
  const relation = columnFunction(sumOf(productOf(symbolOf(response), below), negate(above)), symbols);
  const places = unknown.map((name) => symbols.indexOf(name));
  if (!isLinear(relation, symbols.length, places)) return null;
  return { relation, denominator: columnFunction(below, symbols) };
}

/** An expression as a ratio whose parts have no denominator with a held symbol. */
function asRatio(expression: Expression, held: (part: Expression) => boolean): Ratio {
  if (!held(expression)) return { above: expression, below: ONE };
  if (expression.kind === 'sum') {
    const ratios = expression.terms.map((term) => asRatio(term, held));
    const below = ratios.map((ratio) => ratio.below).filter((part) => part !== ONE);
    const terms = ratios.map((ratio) => times(ratio.above, ...without(below, ratio.below)));
    return { above: sumOf(...terms), below: times(...below) };
  }
  if (expression.kind === 'product') {
    const ratios = expression.factors.map((factor) => asRatio(factor, held));
    return {
      above: times(...ratios.map((ratio) => ratio.above)),
      below: times(...ratios.map((ratio) => ratio.below)),
    };
  }
  if (expression.kind === 'power' && expression.exponent.kind === 'number') {
    const exponent = expression.exponent.value;
    const inner = asRatio(expression.base, held);
    const raised = (part: Expression): Expression =>
      part === ONE || Math.abs(exponent) === 1 ? part : powerOf(part, numberOf(Math.abs(exponent)));
    if (exponent < 0) return { above: raised(inner.below), below: raised(inner.above) };
    return { above: raised(inner.above), below: raised(inner.below) };
  }
  return { above: expression, below: ONE };
}

/** A product without the ones. */
function times(...factors: readonly Expression[]): Expression {
  const kept = factors.filter((factor) => factor !== ONE);
  const [only] = kept;
  return kept.length === 1 && only !== undefined ? only : kept.length === 0 ? ONE : productOf(...kept);
}

/** The list without one occurrence of `part`. */
function without(list: readonly Expression[], part: Expression): Expression[] {
  const at = list.indexOf(part);
  return list.filter((_, i) => i !== at);
}

/** True when the derivatives by the symbols at `places` do not depend on those symbols, tried at irregular points. */
function isLinear(relation: ColumnFunction, count: number, places: readonly number[]): boolean {
  const rows = 7;
  const inputs = Array.from({ length: count }, (_, k) =>
    Float64Array.from({ length: rows }, (_, i) => 1.3 + Math.sin(1 + 2.3 * k + 3.1 * i)),
  );
  const shifted = inputs.map((column, k) =>
    places.includes(k) ? column.map((value, i) => value + 0.7 + 0.4 * Math.cos(k + 1.9 * i)) : column,
  );
  const before = relation.gradient(inputs, rows, places).partials.map((column) => Float64Array.from(column));
  const after = relation.gradient(shifted, rows, places).partials;
  return before.every((column, k) =>
    column.every(
      (value, i) => Math.abs(value - (after[k]?.[i] ?? Number.NaN)) <= 1e-10 * (1 + Math.abs(value)),
    ),
  );
}
