import type { Inputs, Law, StraightForm } from '../law/law.ts';
import type { WeightedReadings } from './lawModel.ts';
import { curveOf } from './lawModel.ts';
import { lineUseOf } from './lineTermsOf.ts';
import { type LineTermsValue, weightedLine } from './weightedLine.ts';

/** Values for all constants of a law, with the strict law's Σ ω (y − ŷ)² there. */
export interface Candidate {
  /** Aligned with `law.constants`. */
  readonly constants: Float64Array;
  readonly sumOfSquares: number;
}

/**
 * Makes the function that solves a form's line at given values of its trial constants, weighted so that it is
 * least squares in the units of y, and returns the best constants that the line leads to: weights from the observed
 * readings first, then from the line before.
 * @returns a function of all constants (known and trial ones filled in) and of the number of passes, each of which is
 * a candidate; null when no curve through them exists at every reading
 * @see Seber & Wild (1989), Nonlinear Regression, section 2.8 (weights of transformed responses)
 */
export function lineStarts(
  law: Law,
  form: StraightForm,
  readings: WeightedReadings,
): (constants: Float64Array, passes: number) => Candidate | null {
  const { x, y, omega } = readings;
  const n = x.length;
  const curve = curveOf(law);
  const { free, solveFrom } = lineUseOf(form);
  const crossed = form.horizontal.uses.includes(1);
  const predicted = new Float64Array(n);
  const workVertical = new Float64Array(n);
  const weight = new Float64Array(n);
  const curveValues = new Float64Array(n);

  const score = (constants: Float64Array): number => {
    const fitted = curve.evaluate([x, y, ...constants], n, curveValues);
    let sum = 0;
    for (let i = 0; i < n; i++) sum += (omega[i] ?? 0) * ((y[i] ?? 0) - (fitted[i] ?? 0)) ** 2;
    return Number.isNaN(sum) ? Number.POSITIVE_INFINITY : sum;
  };

  const better = (
    line: LineTermsValue,
    constants: Float64Array,
    best: Candidate | null,
  ): Candidate | null => {
    const solutions =
      free === 'neither'
        ? [Float64Array.from(constants)]
        : solveFrom.flatMap((use) => form.solve(line.slope, line.intercept, constants, use));
    for (const solution of solutions) {
      const sumOfSquares = score(solution);
      if (Number.isFinite(sumOfSquares) && !(best !== null && best.sumOfSquares <= sumOfSquares)) {
        best = { constants: solution, sumOfSquares };
      }
    }
    return best;
  };

  return (constants, passes) => {
    const inputs: Inputs = [x, y, ...constants];
    const held = {
      slope: form.slopeOf.at([Number.NaN, Number.NaN, ...constants]),
      intercept: form.proportional ? 0 : form.interceptOf.at([Number.NaN, Number.NaN, ...constants]),
    };
    if (free === 'neither') return better(held, constants, null);
    const vertical = form.vertical.gradient(inputs, n, [1]);
    const verticalByY = vertical.partials[0];
    const horizontal = crossed
      ? form.horizontal.gradient(inputs, n, [1])
      : { value: form.horizontal.evaluate(inputs, n), partials: [] };
    const horizontalByY = horizontal.partials[0];

    let line: LineTermsValue | null = null;
    let best: Candidate | null = null;
    for (let pass = 0; pass < passes; pass++) {
      let response = vertical.value;
      if (line !== null && form.responseFrom !== null && !crossed) {
        // The line before says where the curve runs: its slope there weighs the reading and carries its residual over.
        for (let i = 0; i < n; i++) predicted[i] = line.intercept + line.slope * (horizontal.value[i] ?? 0);
        const back = form.responseFrom.gradient([x, predicted, ...constants], n, [1]);
        for (let i = 0; i < n; i++) {
          const steepness = back.partials[0]?.[i] ?? 0;
          weight[i] = (omega[i] ?? 0) * steepness ** 2;
          workVertical[i] = (predicted[i] ?? 0) + ((y[i] ?? 0) - (back.value[i] ?? 0)) / steepness;
        }
        response = workVertical;
      } else {
        if (line !== null && !crossed) break;
        const slope: number = line?.slope ?? 0;
        for (let i = 0; i < n; i++) {
          const steepness = (verticalByY?.[i] ?? 0) - slope * (horizontalByY?.[i] ?? 0);
          weight[i] = steepness === 0 ? (omega[i] ?? 0) : (omega[i] ?? 0) / steepness ** 2;
        }
      }
      const next = weightedLine(horizontal.value, response, weight, free, held);
      if (next === null) break;
      const unchanged =
        line !== null && close(next.slope, line.slope) && close(next.intercept, line.intercept);
      line = next;
      if (unchanged) break;
      best = better(line, constants, best);
    }
    return best;
  };
}

/** Equal to about six digits: further passes would not move a start. */
function close(p: number, q: number): boolean {
  return Math.abs(p - q) <= 1e-6 * Math.abs(q);
}
