import { type Algebra, bitOf, type Node } from './algebra.ts';
import { isolate } from './isolate.ts';
import { nodeValue, substitute } from './nodes.ts';

/** Unknown constants in the order in which they follow, each from the line's terms and those before it. */
export type Plan = readonly { readonly index: number; readonly node: Node }[];

/** slope(θ) = slope and intercept(θ) = intercept. */
export interface LineEquations {
  readonly slope: Node;
  readonly intercept: Node;
  /** Symbols that stand for the numbers slope and intercept. */
  readonly slopeSymbol: Node;
  readonly interceptSymbol: Node;
}

/** Most plans kept: the branches of even roots and logarithms, in either order of solving. */
const MOST_PLANS = 12;

/**
 * Solves the equations of a line for its constants in closed form, every branch: an equation with one constant is
 * peeled; otherwise a constant is taken out of one equation and put into the other, or dropped by their quotient.
 * @param indices of the one or two constants to solve for
 * @param equations those to use, each an expression that is zero
 * @returns plans to try with numbers; empty when none was found
 */
export function solvePlans(
  g: Algebra,
  indices: readonly number[],
  line: LineEquations,
  use: 'both' | 'slope' | 'intercept',
): Plan[] {
  const slope = g.subtract(line.slope, line.slopeSymbol);
  const intercept = g.subtract(line.intercept, line.interceptSymbol);
  const [first, second] = indices;
  if (first === undefined) return [[]];
  if (second === undefined) {
    const equations = use === 'both' ? [slope, intercept] : [use === 'slope' ? slope : intercept];
    for (const equation of equations) {
      const plans = isolate(g, equation, first).map((node) => [{ index: first, node }]);
      if (plans.length > 0) return plans;
    }
    return [];
  }
  const quotient = g.subtract(
    g.divide(line.slope, line.intercept),
    g.divide(line.slopeSymbol, line.interceptSymbol),
  );
  const product = g.subtract(
    g.product(line.slope, line.intercept),
    g.product(line.slopeSymbol, line.interceptSymbol),
  );
  const pairs = [
    [slope, intercept],
    [intercept, slope],
    [quotient, slope],
    [quotient, intercept],
    [product, slope],
    [product, intercept],
  ] as const;
  const orders = [
    [first, second],
    [second, first],
  ] as const;
  // An equation with one unknown first.
  for (const [alone, other] of pairs) {
    for (const [a, b] of orders) {
      if ((alone.mask & bitOf(b)) !== 0 || (other.mask & bitOf(b)) === 0) continue;
      const plans = isolate(g, alone, a).flatMap((one) =>
        isolate(g, other, b).map((two) => [
          { index: a, node: one },
          { index: b, node: two },
        ]),
      );
      if (plans.length > 0) return plans.slice(0, MOST_PLANS);
    }
  }
  // Otherwise one is put into the other equation.
  for (const [from, into] of pairs) {
    for (const [a, b] of orders) {
      if ((from.mask & bitOf(b)) === 0) continue;
      const plans = isolate(g, from, b).flatMap((two) =>
        isolate(g, substitute(g, into, b, two), a).map((one) => [
          { index: a, node: one },
          { index: b, node: two },
        ]),
      );
      if (plans.length > 0) return plans.slice(0, MOST_PLANS);
    }
  }
  return [];
}

/** Values of the constants that a plan gives; writes them into `values`, aligned with the symbols. */
export function followPlan(plan: Plan, values: Float64Array): void {
  for (const { index, node } of plan) values[index] = nodeValue(node, values);
}
