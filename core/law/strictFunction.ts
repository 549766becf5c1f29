import type { Algebra, Node } from './algebra.ts';
import { columnFunction } from './columnFunction.ts';
import { isolate } from './isolate.ts';
import type { ColumnFunction } from './law.ts';
import { present } from './present.ts';

/** The symbols of a law and points on its curve. */
export interface Ground {
  readonly g: Algebra;
  /** `[predictor, response, ...constants]` */
  readonly symbols: readonly string[];
  readonly plain: readonly Float64Array[];
  readonly wide: readonly Float64Array[];
}

/** A node as a function over columns, on its strict domain. */
export function strictFunction(node: Node, ground: Ground): ColumnFunction {
  const { g, symbols, plain, wide } = ground;
  return columnFunction(present(node, { g, names: symbols, plain, wide }).expression, symbols);
}

/**
 * Solves F = 0 for a symbol and takes the branch on which the curve's points lie.
 * @param points [predictor, response, ...constants] at which F is zero
 * @returns null when there is no such branch
 */
export function solvedFor(
  equation: Node,
  index: number,
  ground: Ground,
  points: readonly Float64Array[] = ground.plain,
): ColumnFunction | null {
  const near = { ...ground, plain: points, wide: [] };
  let best: ColumnFunction | null = null;
  let most = 2;
  for (const node of isolate(ground.g, equation, index)) {
    const solution = strictFunction(node, near);
    const hits = points.filter((point) => {
      const value = solution.at(point);
      const wanted = point[index] ?? Number.NaN;
      return Math.abs(value - wanted) <= 1e-6 * Math.abs(wanted);
    }).length;
    if (hits > most) [best, most] = [solution, hits];
  }
  return best;
}
