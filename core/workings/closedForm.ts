import { Algebra, type Node } from '../law/algebra.ts';
import { columnFunction } from '../law/columnFunction.ts';
import { type Expression, type FunctionName, numberOf } from '../law/expression.ts';
import { isolate } from '../law/isolate.ts';
import { nodeValue, substitute, toNode } from '../law/nodes.ts';
import { plain } from './plainExpression.ts';

/** What stands for the line's terms in a closed form: names that no law can use. */
export const SLOPE = '(slope)';
export const INTERCEPT = '(intercept)';

/** A constant written out from the line's terms, the known constants and constants written out before it. */
export interface ClosedForm {
  readonly name: string;
  readonly expression: Expression;
}

/** The equations slope(θ) = slope and intercept(θ) = intercept; null for one that is not used. */
export interface LineEquations {
  readonly slope: Expression | null;
  readonly intercept: Expression | null;
}

/** Agreement asked of a branch with the settled constants. */
const TOLERANCE = 1e-7;

/**
 * Solves the line's equations for the unknown constants in closed form.
 * @param unknown names to solve for, at most as many as equations
 * @param values the settled values of every symbol, `SLOPE` and `INTERCEPT` included; they choose among branches
 * @returns the constants in an order in which each needs only those before it; null when no closed form was found
 */
export function closedForms(
  equations: LineEquations,
  unknown: readonly string[],
  values: ReadonlyMap<string, number>,
): readonly ClosedForm[] | null {
  const names = [...values.keys()];
  const indexOf = (name: string): number => names.indexOf(name);
  // Symbols are single bits in the algebra, of which there are thirty.
  if (names.length > 30) return null;
  const g = new Algebra();
  const point = Float64Array.from(values.values());
  const zero = (side: Expression, term: string): Node =>
    g.subtract(toNode(g, side, indexOf), g.symbol(indexOf(term)));
  const own: Node[] = [];
  if (equations.slope !== null) own.push(zero(equations.slope, SLOPE));
  if (equations.intercept !== null) own.push(zero(equations.intercept, INTERCEPT));

  const solved = (equation: Node, name: string): ClosedForm | null => {
    for (const node of isolate(g, equation, indexOf(name))) {
      const expression = plain(expressionOf(node, names, point));
      const value = columnFunction(expression, names).at(point);
      const wanted = values.get(name) ?? Number.NaN;
      if (Math.abs(value - wanted) <= TOLERANCE * Math.abs(wanted) + 1e-300) return { name, expression };
    }
    return null;
  };
  const has = (node: Node, name: string): boolean => (node.mask & (1 << indexOf(name))) !== 0;

  const solve = (left: readonly Node[], names: readonly string[]): readonly ClosedForm[] | null => {
    if (names.length === 0) return [];
    // An equation with a single unknown settles it.
    for (const equation of left) {
      const inside = names.filter((name) => has(equation, name));
      const [only] = inside;
      if (inside.length !== 1 || only === undefined) continue;
      const form = solved(equation, only);
      if (form === null) continue;
      const rest = solve(
        left.filter((other) => other !== equation),
        names.filter((name) => name !== only),
      );
      if (rest !== null) return [form, ...rest];
    }
    // Otherwise one unknown is taken out of another equation.
    const [first, second] = left;
    if (first === undefined || second === undefined) return null;
    for (const [from, into] of [
      [first, second],
      [second, first],
    ] as const) {
      for (const name of names.filter((one) => has(from, one))) {
        for (const node of isolate(g, from, indexOf(name))) {
          const without = substitute(g, into, indexOf(name), node);
          const others = names.filter((one) => one !== name);
          const rest = solve([without], others);
          const form = rest === null ? null : solved(from, name);
          if (rest !== null && form !== null) return [...rest, form];
        }
      }
    }
    return null;
  };
  const { slope, intercept } = equations;
  if (slope !== null && intercept !== null && unknown.length === 2) {
    // The quotient of the terms often drops an unknown that stands in both.
    const quotient = g.subtract(
      g.divide(toNode(g, slope, indexOf), toNode(g, intercept, indexOf)),
      g.divide(g.symbol(indexOf(SLOPE)), g.symbol(indexOf(INTERCEPT))),
    );
    const plainly = solve(own, unknown);
    if (plainly !== null) return plainly;
    for (const one of own) {
      const found = solve([quotient, one], unknown);
      if (found !== null) return found;
    }
    return null;
  }
  return solve(own, unknown);
}

/** A node as an expression; the argument of a logarithm gets the sign that it has at the point. */
function expressionOf(node: Node, names: readonly string[], point: Float64Array): Expression {
  const write = (part: Node): Expression => {
    const [first, second] = part.parts;
    switch (part.kind) {
      case 'number':
        return numberOf(part.value);
      case 'symbol':
        return part.name === ''
          ? { kind: 'symbol', name: names[part.value] ?? '' }
          : { kind: 'symbol', name: part.name, value: part.value };
      case 'sum':
        return { kind: 'sum', terms: positiveFirst(part.parts.map(write)) };
      case 'product':
        return { kind: 'product', factors: part.parts.map(write) };
      case 'power':
        if (first === undefined || second === undefined) return numberOf(Number.NaN);
        return { kind: 'power', base: write(first), exponent: write(second) };
      case 'function': {
        if (first === undefined) return numberOf(Number.NaN);
        const argument = write(first);
        const negative = part.name === 'ln' && nodeValue(first, point) < 0;
        return {
          kind: 'function',
          // Nodes of this kind are made from function names alone.
          name: part.name as FunctionName,
          argument: negative ? { kind: 'product', factors: [numberOf(-1), argument] } : argument,
        };
      }
    }
  };
  return write(node);
}

function positiveFirst(terms: readonly Expression[]): Expression[] {
  const negative = (term: Expression): boolean => {
    const first = term.kind === 'product' ? term.factors[0] : term;
    return first?.kind === 'number' && first.value < 0;
  };
  return [...terms.filter((term) => !negative(term)), ...terms.filter(negative)];
}
