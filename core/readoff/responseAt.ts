import { varianceFromKnown } from '../constants/knownEffects.ts';
import { lawInputs } from '../fit/columns.ts';
import type { Fit, FitState } from '../fit/fit.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { lineAt, lineVarianceAt } from './lineAt.ts';
import { newReadingVariance, newReadingVarianceOnLine } from './newReading.ts';
import { quadraticForm } from './quadraticForm.ts';
import type { ReadOff } from './readOff.ts';

/**
 * Reads the response off a fit: value, standard uncertainty and coverage interval.
 * On a line, Ŷ = a + bX with interval Ŷ ± k·u carried back to y; after a direct fit, ŷ ± k·u from the constants'
 * covariance. With `band=reading` the scatter of a new reading is included.
 * @param at value of the predictor
 * @throws Problem `undefined` when the law has no value there; `argument` for a new reading with u_y as a range
 */
export function responseAt(fit: Fit, at: number): ReadOff {
  const found = readsOffLine(fit) ? fromLine(fit, at) : fromCurve(fit, at);
  if (!Number.isFinite(found.value)) {
    const { predictor, response } = fit.law;
    throw new Problem('undefined', 'at', fitWords.noResponse(predictor, at, response));
  }
  return found;
}

/** True when the response is read off the straight line itself: it stands on the vertical axis alone. */
export function readsOffLine(fit: Fit): boolean {
  return fit.direct === null && fit.form.responseFrom !== null && !fit.form.responseOnBothAxes;
}

/** Half-width factor k, and whether there is any uncertainty to state. */
function widening(fit: Fit): number {
  const { factor, degreesOfFreedom } = fit.coverage;
  return degreesOfFreedom > 0 ? factor : Number.NaN;
}

function fromLine(fit: Fit, at: number): ReadOff {
  // A held intercept's own uncertainty comes with the known constants.
  const { form, lineFromReadings: line, values, knownEffects } = fit;
  const responseOf = (state: FitState): number => {
    const horizontal = form.horizontal.at([at, Number.NaN, ...state.values]);
    return form.responseFrom?.at([at, lineAt(state, horizontal), ...state.values]) ?? Number.NaN;
  };
  const horizontal = form.horizontal.at([at, Number.NaN, ...values]);
  const vertical = lineAt(line, horizontal);
  const back = form.responseFrom?.gradient(lawInputs(at, vertical, values), 1, [1]);
  const value = back?.value[0] ?? Number.NaN;
  const byVertical = Math.abs(back?.partials[0]?.[0] ?? Number.NaN);
  const k = widening(fit);
  const variance =
    lineVarianceAt(line, horizontal) +
    varianceFromKnown(knownEffects, responseOf) / byVertical ** 2 +
    newReadingVarianceOnLine(fit, value, () => 1 / byVertical);
  const deviation = Number.isNaN(k) ? Number.NaN : Math.sqrt(variance);
  const ends = [-k, k].map(
    (factor) => form.responseFrom?.at([at, vertical + factor * deviation, ...values]) ?? Number.NaN,
  );
  const low = Math.min(...ends);
  const high = Math.max(...ends);
  // Beyond a pole of the way back an end has no meaning.
  const bracketed = low <= value && value <= high;
  return {
    value,
    standardUncertainty: byVertical * deviation,
    low: bracketed ? low : Number.NaN,
    high: bracketed ? high : Number.NaN,
  };
}

function fromCurve(fit: Fit, at: number): ReadOff {
  const { law, values, knownEffects, covarianceFromReadings } = fit;
  if (law.curve === null) {
    throw new Problem('argument', 'law', fitWords.curveNeeded(law.response, 'reading off'));
  }
  const { curve } = law;
  const places = law.unknown.map((name) => 2 + law.constants.indexOf(name));
  const { value: column, partials } = curve.gradient(lawInputs(at, Number.NaN, values), 1, places);
  const value = column[0] ?? Number.NaN;
  const gradient = partials.map((partial) => partial[0] ?? Number.NaN);
  const variance =
    quadraticForm(gradient, covarianceFromReadings) +
    varianceFromKnown(knownEffects, (state) => curve.at([at, Number.NaN, ...state.values])) +
    newReadingVariance(fit, at, value);
  const k = widening(fit);
  const deviation = Number.isNaN(k) ? Number.NaN : Math.sqrt(variance);
  return {
    value,
    standardUncertainty: deviation,
    low: value - k * deviation,
    high: value + k * deviation,
  };
}
