import type { Algebra, Node } from './algebra.ts';
import { isolate } from './isolate.ts';
import type { ColumnFunction } from './law.ts';
import { randomNumbers } from './samplePoints.ts';
import { strictFunction } from './strictFunction.ts';

/** A curve, and the response at [predictor, –, ...constants] even where the curve has no closed form. */
export interface ImplicitCurve {
  readonly curve: ColumnFunction | null;
  readonly responseAt: (values: Float64Array) => number;
}

interface Implicit {
  readonly g: Algebra;
  /** left − right, opened and as written. */
  readonly equation: Node;
  readonly strict: ColumnFunction;
  readonly symbols: readonly string[];
}

/** The response of a law whose left side is not the response alone: solved for, or found by bisection. */
export function curveOf({ g, equation, strict, symbols }: Implicit): ImplicitCurve {
  const random = randomNumbers(90_001);
  const points = Array.from({ length: 40 }, () => Float64Array.from(symbols, () => 0.35 * 8 ** random()));
  let curve: ColumnFunction | null = null;
  let most = 3;
  for (const node of isolate(g, equation, 1)) {
    const branch = strictFunction(node, { g, symbols, plain: [], wide: [] });
    const hits = points.filter((point) => liesOn(strict, branch.at(point), point)).length;
    if (hits > most) [curve, most] = [branch, hits];
  }
  const solved = curve;
  if (solved !== null) return { curve: solved, responseAt: (values) => solved.at(values) };
  return { curve: null, responseAt: (values) => bisected(strict, values) };
}

/** True when the equation holds at that response: a small change of it changes the sign of left − right. */
function liesOn(strict: ColumnFunction, response: number, point: Float64Array): boolean {
  if (!Number.isFinite(response) || response === 0) return false;
  const at = (factor: number): number => {
    const moved = Float64Array.from(point);
    moved[1] = response * factor;
    return strict.at(moved);
  };
  const step = 1e-6;
  return at(1 - step) * at(1 + step) < 0;
}

/** The least positive response where left − right changes its sign; NaN when there is none between 10⁻⁶ and 10⁶. */
function bisected(strict: ColumnFunction, values: Float64Array): number {
  const point = Float64Array.from(values);
  const at = (response: number): number => {
    point[1] = response;
    return strict.at(point);
  };
  let low = Number.NaN;
  let before = Number.NaN;
  for (let decade = -6; decade <= 6; decade += 0.125) {
    const here = 10 ** decade;
    const value = at(here);
    if (value === 0) return here;
    if (before * value < 0) {
      let high = here;
      for (let i = 0; i < 200; i++) {
        const middle = (low + high) / 2;
        if (middle <= low || middle >= high) break;
        if (at(middle) * before > 0) low = middle;
        else high = middle;
      }
      // A pole changes the sign as well, but the value there is not small.
      return Math.abs(at(low)) <= Math.abs(before) && Math.abs(at(high)) <= Math.abs(value)
        ? high
        : Number.NaN;
    }
    low = here;
    before = value;
  }
  return Number.NaN;
}
