import { varianceFromKnown } from '../constants/knownEffects.ts';
import { lawInputs, pick } from '../fit/columns.ts';
import type { Fit, FitState } from '../fit/fit.ts';
import { ascendingDistinct } from '../line/ascending.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { crossingNear, leavingAt } from './crossing.ts';
import { lineAt, lineVarianceAt } from './lineAt.ts';
import { newReadingVariance, newReadingVarianceOnLine } from './newReading.ts';
import { quadraticForm } from './quadraticForm.ts';
import type { ReadOff } from './readOff.ts';

/**
 * Reads the predictor off a fit: where the line, or after a direct fit the curve, reaches a response. The interval holds
 * every x at which that response lies within k standard uncertainties of the fit, which on a line is Fieller's.
 * Where the fit reaches the response more than once, the first place within the readings counts, else the nearest.
 * @param at value of the response; exact with `band=curve`, a new reading with `band=reading`
 * @throws Problem `undefined` when the fit does not reach it or the interval is unbounded
 * @see Fieller (1954), Some problems in interval estimation, J. R. Stat. Soc. B 16, 175
 */
export function predictorAt(fit: Fit, at: number): ReadOff {
  const { predictor, response } = fit.law;
  const misses = fit.direct === null ? missesLine(fit, at) : missesCurve(fit, at);
  const missed = (x: number): number => misses.by(x, misses.state);
  const value = crossingNear(missed, placesToLook(fit));
  if (value === null) {
    throw new Problem('undefined', 'at', fitWords.noPredictor(response, at, fit.law.name || predictor));
  }
  const { factor, degreesOfFreedom } = fit.coverage;
  const nothing = { value, standardUncertainty: Number.NaN, low: Number.NaN, high: Number.NaN };
  if (!(degreesOfFreedom > 0)) return nothing;
  const deviation = (x: number): number =>
    Math.sqrt(misses.variance(x) + varianceFromKnown(fit.knownEffects, (state) => misses.by(x, state)));
  const standardUncertainty = deviation(value) / Math.abs(misses.slope(value));
  if (standardUncertainty === 0) return { value, standardUncertainty, low: value, high: value };
  const outsideBy = (x: number): number => Math.abs(missed(x)) - factor * deviation(x);
  const step = factor * standardUncertainty;
  const ends = Number.isFinite(step)
    ? [leavingAt(outsideBy, value, -step / 2), leavingAt(outsideBy, value, step / 2)]
    : [];
  const [low, high] = ends;
  if (low === null || low === undefined || high === null || high === undefined) {
    throw new Problem('undefined', 'at', fitWords.unboundedPredictor(response, at));
  }
  return { value, standardUncertainty, low, high };
}

/** By how much a fit misses a response at x, its variance there from the readings, and its derivative by x. */
interface Misses {
  readonly state: FitState;
  readonly by: (x: number, state: FitState) => number;
  readonly variance: (x: number) => number;
  readonly slope: (x: number) => number;
}

/** On the straight axes: Y(x, y) − a − b·X(x, y). */
function missesLine(fit: Fit, at: number): Misses {
  const { form, lineFromReadings: line, values } = fit;
  const horizontalAt = (x: number): number => form.horizontal.at([x, at, ...values]);
  return {
    state: { values, slope: line.slope, intercept: line.intercept },
    by(x, state) {
      const inputs = [x, at, ...state.values];
      return form.vertical.at(inputs) - lineAt(state, form.horizontal.at(inputs));
    },
    variance(x) {
      const byResponse = (): number =>
        form.vertical.gradient(lawInputs(x, at, values), 1, [1]).partials[0]?.[0] ?? Number.NaN;
      return lineVarianceAt(line, horizontalAt(x)) + newReadingVarianceOnLine(fit, at, byResponse);
    },
    slope(x) {
      const inputs = lawInputs(x, at, values);
      const vertical = form.vertical.gradient(inputs, 1, [0]).partials[0]?.[0] ?? 0;
      const horizontal = form.horizontal.gradient(inputs, 1, [0]).partials[0]?.[0] ?? 0;
      return vertical - line.slope * horizontal;
    },
  };
}

/** In the units of y: y − ŷ(x). */
function missesCurve(fit: Fit, at: number): Misses {
  const { law, values, covarianceFromReadings } = fit;
  const { curve } = law;
  if (curve === null) {
    throw new Problem('argument', 'law', fitWords.curveNeeded(law.response, 'reading off'));
  }
  const places = law.unknown.map((name) => 2 + law.constants.indexOf(name));
  const gradientAt = (x: number, wrt: readonly number[]): number[] =>
    curve.gradient(lawInputs(x, at, values), 1, wrt).partials.map((partial) => partial[0] ?? Number.NaN);
  return {
    state: { values, slope: Number.NaN, intercept: Number.NaN },
    by: (x, state) => at - curve.at([x, at, ...state.values]),
    variance: (x) =>
      quadraticForm(gradientAt(x, places), covarianceFromReadings) + newReadingVariance(fit, x, at),
    slope: (x) => gradientAt(x, [0])[0] ?? Number.NaN,
  };
}

const MOST_PLACES = 65;

/** Places found before, for a fit is read off at many responses. */
const placesOf = new WeakMap<Fit, readonly number[]>();

/** Distinct predictor values of the readings, ascending, thinned evenly, with points between them. */
function placesToLook(fit: Fit): readonly number[] {
  const known = placesOf.get(fit);
  if (known !== undefined) return known;
  const distinct = ascendingDistinct(pick(fit.readings.x, fit.taking).slice());
  const stride = Math.max(1, Math.ceil(distinct.length / MOST_PLACES));
  const some: number[] = [];
  for (let i = 0; i < distinct.length; i += stride) some.push(distinct[i] ?? 0);
  const last = distinct[distinct.length - 1];
  if (last !== undefined && last !== some[some.length - 1]) some.push(last);
  const places = some.flatMap((x, i) => {
    const next = some[i + 1];
    return next === undefined ? [x] : [x, x + (next - x) / 2];
  });
  placesOf.set(fit, places);
  return places;
}
