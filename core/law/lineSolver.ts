import { bitOf, type Node } from './algebra.ts';
import type { ColumnFunction, LineTerms, StraightForm } from './law.ts';
import type { LineNodes } from './lines.ts';
import { nodeValue } from './nodes.ts';
import { followPlan, type Plan, solvePlans } from './solveLine.ts';
import type { FormTask } from './straightForm.ts';

/** Agreement asked of a solution with the line's terms; wrong branches are far off. */
const TOLERANCE = 1e-6;

/** Relative rounding of a constant. */
const ROUNDING = 64 * Number.EPSILON;

/** Makes the function that turns a slope and an intercept into constants, every real solution, positive first. */
export function lineSolver(
  line: LineNodes,
  task: FormTask,
  slopeOf: ColumnFunction,
  interceptOf: ColumnFunction,
): StraightForm['solve'] {
  const { g, symbols } = task;
  const count = symbols.length;
  const wanted = task.unknown.filter((index) => !task.trials.includes(index));
  const proportional = line.intercept === g.zero;
  const plans = new Map<LineTerms, readonly Plan[]>();
  const equations = {
    slope: line.slope,
    intercept: line.intercept,
    slopeSymbol: g.symbol(count),
    interceptSymbol: g.symbol(count + 1),
  };
  const plansFor = (use: LineTerms): readonly Plan[] => {
    const known = plans.get(use);
    if (known !== undefined) return known;
    const mask = (use === 'intercept' ? 0 : line.slope.mask) | (use === 'slope' ? 0 : line.intercept.mask);
    const indices = wanted.filter((index) => (mask & bitOf(index)) !== 0);
    const found = solvePlans(g, indices, equations, use);
    plans.set(use, found);
    return found;
  };

  /** Values of all symbols along one plan; x and y have none. */
  const values = new Float64Array(count + 2).fill(Number.NaN);
  return (slope, intercept, constants, asked) => {
    const use = proportional ? 'slope' : asked;
    const solutions: Float64Array[] = [];
    for (const plan of plansFor(use)) {
      for (let k = 2; k < count; k++) values[k] = constants[k - 2] ?? Number.NaN;
      values[count] = slope;
      values[count + 1] = intercept;
      followPlan(plan, values);
      if (!plan.every(({ index }) => Number.isFinite(values[index]))) continue;
      if (use !== 'intercept' && !agrees(slopeOf, line.slope, values, slope)) continue;
      if (use !== 'slope' && !agrees(interceptOf, line.intercept, values, intercept)) continue;
      const own = values.slice(2, count);
      if (!solutions.some((other) => other.every((value, k) => Object.is(value, own[k]))))
        solutions.push(own);
    }
    if (solutions.length < 2) return solutions;
    const positive = (values: Float64Array): number =>
      wanted.filter((index) => (values[index - 2] ?? 0) > 0).length;
    return solutions.sort((a, b) => positive(b) - positive(a));
  };
}

function agrees(strict: ColumnFunction, node: Node, values: Float64Array, wanted: number): boolean {
  const off = Math.abs(strict.at(values) - wanted);
  if (off <= TOLERANCE * Math.abs(wanted)) return true;
  // A branch on which the term does not exist.
  if (Number.isNaN(off)) return false;
  const terms = node.kind === 'sum' ? node.parts : [node];
  const scale = terms.reduce((total, term) => total + Math.abs(nodeValue(term, values)), 0);
  if (off <= TOLERANCE * (Math.abs(wanted) + scale)) return true;
  // Where a term is nearly zero, as ln p is for p near 1, the last digits of the constants are all that is off.
  const places = Array.from(values.keys()).slice(2, -2);
  const { partials } = strict.gradient([...values], 1, places);
  const moved = places.reduce(
    (sum, place, k) => sum + Math.abs((partials[k]?.[0] ?? 0) * (values[place] ?? 0)),
    0,
  );
  return off <= ROUNDING * moved;
}
