import type { Fit } from '../fit/fit.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { nextWords } from '../words/nextWords.ts';
import { varianceCut } from './varianceCut.ts';

/** Where one more reading tells most, and what it does to the standard uncertainty; NaN where there is none. */
export interface NextReading {
  readonly x: number;
  readonly now: number;
  readonly after: number;
}

const GRID = 256;
/** Golden-section steps: 0.618^60 of a cell of the grid. */
const REFINEMENTS = 60;

/**
 * Where in low…high one more reading cuts the standard uncertainty of a constant the most, the scatter as it is and the
 * reading weighted by the rule of u_y at the fitted y; of equal places the lowest.
 * @param constant name of a constant that the fit settles or derives
 * @param low lowest predictor value at which a reading can be taken
 * @param high highest, not below `low`
 * @throws Problem `argument` for another name, low above high, or an uncertainty given as a range; `undefined` when the
 * law has no value in low…high
 * @see Fedorov (1972), Theory of Optimal Experiments, section 2.5 (sequential designs)
 */
export function nextReading(fit: Fit, constant: string, low: number, high: number): NextReading {
  if (!(low <= high)) throw new Problem('argument', 'low', nextWords.order(low, high));
  const now = estimateOf(fit, constant);
  const cut = varianceCut(fit, constant);
  const x = best(cut.at, low, high);
  if (x === null) {
    throw new Problem('undefined', 'low', nextWords.nowhere(low, high, fit.law.name || fit.law.equation));
  }
  const after = Math.sqrt(Math.max(0, now * now - cut.scale * cut.at(x)));
  return { x, now, after };
}

/** The standard uncertainty of a constant. @throws Problem `argument` when there is none of that name */
export function estimateOf({ constants }: Fit, constant: string): number {
  const found = constants.find(({ name }) => name === constant);
  if (found !== undefined) return found.standardUncertainty;
  const names = constants.map(({ name }) => name);
  throw new Problem('argument', 'name', fitWords.unknownConstant(constant, names));
}

/** Highest place of a function in low…high: a grid, evenly and in equal ratios, then golden sections. */
function best(f: (x: number) => number, low: number, high: number): number | null {
  const grid = places(low, high);
  const values = grid.map((x) => {
    const value = f(x);
    return Number.isFinite(value) ? value : Number.NEGATIVE_INFINITY;
  });
  let top = 0;
  values.forEach((value, i) => {
    // Rounding does not decide between places that are equally good.
    if (
      value > (values[top] ?? 0) + 1e-12 * Math.abs(values[top] ?? 0) ||
      values[top] === Number.NEGATIVE_INFINITY
    ) {
      top = i;
    }
  });
  if (!((values[top] ?? 0) > 0)) return null;
  const at = grid[top] ?? low;
  const refined = refine(f, grid[top - 1] ?? at, grid[top + 1] ?? at);
  return f(refined) > (values[top] ?? 0) * (1 + 1e-12) ? refined : at;
}

function places(low: number, high: number): number[] {
  if (low === high) return [low];
  const found = [low, high];
  for (let i = 1; i < GRID; i++) {
    found.push(low + (i / GRID) * (high - low));
    if (low > 0 || high < 0) found.push(low * (high / low) ** (i / GRID));
  }
  return [...new Set(found.filter((x) => x >= low && x <= high))].sort((p, q) => p - q);
}

/** @see Press et al. (2007), Numerical Recipes, 3rd ed., section 10.2 (golden section) */
function refine(f: (x: number) => number, from: number, to: number): number {
  const ratio = (Math.sqrt(5) - 1) / 2;
  let [low, high] = [from, to];
  let p = high - ratio * (high - low);
  let q = low + ratio * (high - low);
  let atP = f(p);
  let atQ = f(q);
  for (let step = 0; step < REFINEMENTS; step++) {
    if (atP > atQ) {
      high = q;
      q = p;
      atQ = atP;
      p = high - ratio * (high - low);
      atP = f(p);
    } else {
      low = p;
      p = q;
      atP = atQ;
      q = low + ratio * (high - low);
      atQ = f(q);
    }
  }
  return (low + high) / 2;
}
