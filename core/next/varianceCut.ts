import { lineMoments } from '../constants/lineMoments.ts';
import { factorisationSpace, factorise, inverseNormal } from '../direct/qr.ts';
import { lawInputs } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { scaleOf, spreadAt, spreadOf } from '../fit/spread.ts';
import { lineDerivatives } from '../judge/lineDerivatives.ts';
import { Problem } from '../problem.ts';
import { lineAt } from '../readoff/lineAt.ts';
import { quadraticForm } from '../readoff/quadraticForm.ts';
import { nextWords } from '../words/nextWords.ts';

/** What one more reading takes off the variance of a constant. */
export interface VarianceCut {
  /** By the predictor value of the new reading, in units of the scale; NaN outside the law's domain. */
  readonly at: (x: number) => number;
  /** s² where it is estimated (NaN without degrees of freedom), 1 where uncertainties are stated. */
  readonly scale: number;
}

/** Inverse normal matrix M⁻¹ of a fit, a row of its model and the weight of a new reading, and the constant's gradient. */
interface Model {
  readonly inverse: readonly Float64Array[];
  readonly gradient: readonly number[];
  readonly row: (x: number) => { readonly terms: readonly number[]; readonly weight: number };
  readonly scale: number;
}

/**
 * The part w (gᵀM⁻¹a)²/(1 + w aᵀM⁻¹a) of a constant's variance that a new reading with row a and weight w removes:
 * the difference of gᵀM⁻¹g and gᵀ(M + w a aᵀ)⁻¹g. Known constants keep what they contribute.
 * @throws Problem `argument` when u_y or u_x is a range
 * @see Björck (1996), Numerical Methods for Least Squares Problems, section 3.1.3 (rank-one modification)
 */
export function varianceCut(fit: Fit, constant: string): VarianceCut {
  for (const argument of ['u_y', 'u_x'] as const) {
    const spread = argument === 'u_y' ? fit.settings.spreadY : fit.settings.spreadX;
    if (spread.kind === 'each') throw new Problem('argument', argument, nextWords.needsRule(argument));
  }
  const { inverse, gradient, row, scale } =
    fit.direct === null ? ofLine(fit, constant) : ofCurve(fit, constant);
  const at = (x: number): number => {
    const { terms, weight } = row(x);
    const q = weight * quadraticForm(terms, inverse);
    const c = inverse.reduce(
      (sum, entries, j) =>
        sum + (gradient[j] ?? 0) * entries.reduce((inner, entry, k) => inner + entry * (terms[k] ?? 0), 0),
      0,
    );
    return (weight * c * c) / (1 + q);
  };
  return { at, scale };
}

/** Derivative of a constant of the table by each unknown constant: 1 for its own, a derived one by its source. */
export function byUnknown({ law, values }: Fit, constant: string): number[] {
  const derived = law.derived.find(({ name }) => name === constant);
  const source = derived?.from ?? constant;
  const factor = derived?.slope(values[law.constants.indexOf(source)] ?? Number.NaN) ?? 1;
  return law.unknown.map((name) => (name === source ? factor : 0));
}

function ofLine(fit: Fit, constant: string): Model {
  const { axes, form, law, lineFromReadings: line, values } = fit;
  const { total, mean, spread } = lineMoments(axes.horizontal, line.lineWeight);
  const derivatives = lineDerivatives(fit);
  const unknown = byUnknown(fit, constant);
  const sumOf = (column: Float64Array | undefined): number =>
    unknown.reduce((sum, factor, k) => sum + (factor === 0 ? 0 : factor * (column?.[k] ?? 0)), 0);
  const bySlope = sumOf(derivatives?.bySlope);
  const byIntercept = sumOf(derivatives?.byIntercept);
  const free = line.terms === 2;
  // About the mean the two terms do not correlate.
  const inverse = free
    ? [Float64Array.of(1 / spread, 0), Float64Array.of(0, 1 / total)]
    : [Float64Array.of(1 / (spread + total * mean * mean))];
  return {
    inverse,
    gradient: free ? [bySlope - mean * byIntercept, byIntercept] : [bySlope],
    scale: scaleOf(fit.settings.spreadY) === 'known' ? 1 : line.residualStandardDeviation ** 2,
    row(x) {
      const alone = form.responseFrom !== null && !form.responseOnBothAxes;
      const y = alone
        ? (form.responseFrom?.at([
            x,
            lineAt(line, form.horizontal.at([x, Number.NaN, ...values])),
            ...values,
          ]) ?? Number.NaN)
        : (law.curve?.at([x, Number.NaN, ...values]) ?? Number.NaN);
      const horizontal = form.horizontal.at([x, y, ...values]);
      return { terms: free ? [horizontal - mean, 1] : [horizontal], weight: weightOnLine(fit, x, y) };
    },
  };
}

/** Weight of a new reading on the vertical straight axis at x and its fitted response. */
function weightOnLine({ form, settings, values, line }: Fit, x: number, y: number): number {
  const { spreadX, spreadY } = settings;
  if (spreadY.kind === 'none') return 1;
  const inputs = lawInputs(x, y, values);
  const deviation = spreadAt(spreadY, y, 0);
  const vertical = form.vertical
    .gradient(inputs, 1, [0, 1])
    .partials.map((column) => column[0] ?? Number.NaN);
  const [byX = Number.NaN, byY = Number.NaN] = vertical;
  if (spreadX.kind === 'none') return 1 / (deviation * byY) ** 2;
  const horizontal = form.horizontal.gradient(inputs, 1, [0, 1]).partials.map((column) => column[0] ?? 0);
  const [alongX = 0, alongY = 0] = horizontal;
  // Var(Y − bX) of the reading.
  const ofX = spreadAt(spreadX, x, 0) * (byX - line.slope * alongX);
  const ofY = deviation * (byY - line.slope * alongY);
  return 1 / (ofX * ofX + ofY * ofY);
}

function ofCurve(fit: Fit, constant: string): Model {
  const { direct, law, readings, settings, taking, values } = fit;
  const { curve } = law;
  const jacobian = direct?.jacobian ?? [];
  const n = taking.length;
  const p = law.unknown.length;
  const y = Float64Array.from(taking, (index) => readings.y[index] ?? Number.NaN);
  const deviation = spreadOf(settings.spreadY, y, new Int32Array(n), 'u_y');
  const weighted = new Float64Array(n * p);
  jacobian.forEach((column, k) => {
    for (let i = 0; i < n; i++) weighted[k * n + i] = (column[i] ?? 0) / (deviation[i] ?? Number.NaN);
  });
  const places = law.unknown.map((name) => 2 + law.constants.indexOf(name));
  return {
    inverse: inverseNormal(factorise(factorisationSpace(n, p), weighted)),
    gradient: byUnknown(fit, constant),
    scale: scaleOf(settings.spreadY) === 'known' ? 1 : (direct?.residualStandardDeviation ?? Number.NaN) ** 2,
    row(x) {
      const found = curve?.gradient(lawInputs(x, Number.NaN, values), 1, places);
      const terms = found?.partials.map((column) => column[0] ?? Number.NaN) ?? [];
      return { terms, weight: 1 / spreadAt(settings.spreadY, found?.value[0] ?? Number.NaN, 0) ** 2 };
    },
  };
}
