import { FIRST_CONSTANT, lawInputs } from '../fit/columns.ts';
import type { DrawnLine } from '../fit/drawLine.ts';
import type { FitTask } from '../fit/fitTask.ts';
import type { LineTerms, StraightForm } from '../law/law.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { combinedConstant } from './combinedConstant.ts';
import { lineMoments } from './lineMoments.ts';
import { type TermsInUse, termsInUse } from './usedTerms.ts';

/** Constants solved from a line. */
export interface ConstantsFromLine {
  readonly terms: TermsInUse;
  /** All constants, aligned with `law.constants`. */
  readonly values: Float64Array;
  /** ∂θ/∂slope and ∂θ/∂intercept of the unknown constants, aligned with `law.unknown`. */
  readonly bySlope: Float64Array;
  readonly byIntercept: Float64Array;
}

/**
 * Turns the slope and the intercept of a line into the law's constants.
 * @param constants known values filled in, aligned with `law.constants`
 * @param near choose the solution nearest to these constants; otherwise the one with the least Σ (y − ŷ)²
 * @throws Problem `undefined` when no real constants give this line
 */
export function constantsFromLine(
  drawn: DrawnLine,
  constants: Float64Array,
  near: Float64Array | null = null,
): ConstantsFromLine {
  const { form, settings } = drawn.task;
  const terms = termsInUse(form, settings.options.intercept === 'held');
  if (terms === 'combined') return combined(drawn, constants, near);
  const values = valuesFromLine(drawn, constants, terms, near);
  const [slope, intercept] = termDerivatives(drawn.task, values, 1);
  const { law } = drawn.task;
  const names = namesOf(drawn.task);
  const bySlope = new Float64Array(law.unknown.length);
  const byIntercept = new Float64Array(law.unknown.length);
  constantDerivatives(terms, slope, intercept, 0).forEach(([ofSlope, ofIntercept], which) => {
    const k = law.unknown.indexOf(names[which] ?? '');
    if (k < 0) return;
    bySlope[k] = ofSlope;
    byIntercept[k] = ofIntercept;
  });
  return { terms, values, bySlope, byIntercept };
}

/**
 * The constants alone, without their derivatives.
 * @throws Problem `undefined` when no real constants give this line
 */
export function valuesFromLine(
  drawn: DrawnLine,
  constants: Float64Array,
  terms: LineTerms,
  near: Float64Array | null = null,
): Float64Array {
  const { task, line } = drawn;
  const solutions = realSolutions(task.form, line.slope, line.intercept, constants, terms);
  const values = solutions.length === 1 ? solutions[0] : choose(solutions, drawn, near);
  if (values === undefined) {
    throw new Problem(
      'undefined',
      'law',
      fitWords.noRealConstants(task.law.unknown, line.slope, line.intercept),
    );
  }
  return values;
}

/** Solutions whose constants are all numbers. */
export function realSolutions(
  form: StraightForm,
  slope: number,
  intercept: number,
  constants: ArrayLike<number>,
  terms: LineTerms,
): Float64Array[] {
  const solutions = form.solve(slope, intercept, constants, terms);
  return solutions.every(allFinite) ? solutions : solutions.filter(allFinite);
}

function allFinite(values: Float64Array): boolean {
  for (let k = 0; k < values.length; k++) if (!Number.isFinite(values[k])) return false;
  return true;
}

/** The solution nearest to `near`. */
export function nearest(
  solutions: readonly Float64Array[],
  near: ArrayLike<number>,
): Float64Array | undefined {
  if (solutions.length < 2) return solutions[0];
  const distance = (values: Float64Array): number =>
    values.reduce((sum, value, k) => {
      const size = Math.abs(near[k] ?? 0) || 1;
      return sum + ((value - (near[k] ?? 0)) / size) ** 2;
    }, 0);
  let best: Float64Array | undefined;
  for (const values of solutions) {
    if (best === undefined || distance(values) < distance(best)) best = values;
  }
  return best;
}

/** The solution nearest to `near`, or the first of those with the least sum of squares in y. */
function choose(
  solutions: readonly Float64Array[],
  { task }: DrawnLine,
  near: Float64Array | null,
): Float64Array | undefined {
  if (near !== null) return nearest(solutions, near);
  const { law, x, y } = task;
  if (law.curve === null) return solutions[0];
  const { curve } = law;
  const scores = solutions.map((values) => {
    const fitted = curve.evaluate(lawInputs(x, y, values), x.length);
    let sum = 0;
    for (let i = 0; i < x.length; i++) sum += ((y[i] ?? 0) - (fitted[i] ?? 0)) ** 2;
    return Number.isNaN(sum) ? Number.POSITIVE_INFINITY : sum;
  });
  const size = y.reduce((sum, value) => sum + value * value, 0);
  const least = Math.min(...scores);
  return solutions.find((_, k) => (scores[k] ?? 0) <= least * (1 + 1e-9) + 1e-24 * size);
}

/** The unknown constants that the line settles, at most two. */
export function namesOf({ law, form }: Pick<FitTask, 'law' | 'form'>): string[] {
  return law.unknown.filter((name) => form.inSlope.includes(name) || form.inIntercept.includes(name));
}

type Derivatives = readonly Float64Array[];

/**
 * Derivatives of the line's slope and intercept by the constants of `namesOf`, one column each.
 * @param constants a column or one value per constant, aligned with `law.constants`
 * @param count rows
 */
export function termDerivatives(
  task: Pick<FitTask, 'law' | 'form'>,
  constants: ArrayLike<Float64Array | number>,
  count: number,
): readonly [slope: Derivatives, intercept: Derivatives] {
  const { law, form } = task;
  const places = namesOf(task).map((name) => FIRST_CONSTANT + law.constants.indexOf(name));
  const inputs = [0, 0, ...Array.from(constants)];
  return [
    form.slopeOf.gradient(inputs, count, places).partials,
    form.interceptOf.gradient(inputs, count, places).partials,
  ];
}

/** ∂θ/∂slope and ∂θ/∂intercept of the constants of `namesOf`, from one row of the line terms' derivatives by them. */
export function constantDerivatives(
  terms: LineTerms,
  slope: Derivatives,
  intercept: Derivatives,
  row: number,
): readonly (readonly [bySlope: number, byIntercept: number])[] {
  if (terms === 'slope') return [[1 / (slope[0]?.[row] ?? Number.NaN), 0]];
  if (terms === 'intercept') return [[0, 1 / (intercept[0]?.[row] ?? Number.NaN)]];
  const s0 = slope[0]?.[row] ?? 0;
  const s1 = slope[1]?.[row] ?? 0;
  const i0 = intercept[0]?.[row] ?? 0;
  const i1 = intercept[1]?.[row] ?? 0;
  const determinant = s0 * i1 - s1 * i0;
  return [
    [i1 / determinant, -s1 / determinant],
    [-i0 / determinant, s0 / determinant],
  ];
}

function combined(drawn: DrawnLine, constants: Float64Array, near: Float64Array | null): ConstantsFromLine {
  const { task, line, axes } = drawn;
  const { law, form } = task;
  const name = form.inSlope[0] ?? '';
  const index = law.constants.indexOf(name);
  const starts =
    near === null
      ? [
          ...realSolutions(form, line.slope, line.intercept, constants, 'slope'),
          ...realSolutions(form, line.slope, line.intercept, constants, 'intercept'),
        ]
      : [Float64Array.from(constants, (value, k) => (k === index ? (near[k] ?? value) : value))];
  const moments = lineMoments(axes.horizontal, line.lineWeight);
  const found = combinedConstant(form, line, moments, FIRST_CONSTANT + index, starts);
  if (found === null) {
    throw new Problem('undefined', 'law', fitWords.noRealConstants([name], line.slope, line.intercept));
  }
  const values = Float64Array.from(constants);
  values[index] = found.value;
  return {
    terms: 'combined',
    values,
    bySlope: Float64Array.of(found.bySlope),
    byIntercept: Float64Array.of(found.byIntercept),
  };
}
