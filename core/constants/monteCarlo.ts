import { FIRST_CONSTANT } from '../fit/columns.ts';
import type { Fit, KnownEffect } from '../fit/fit.ts';
import type { Law } from '../law/law.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { combinedConstant } from './combinedConstant.ts';
import { nearest, realSolutions } from './fromLine.ts';
import { derivativeByKnown } from './knownEffects.ts';
import { lineMoments } from './lineMoments.ts';
import { type Random, seededRandom } from './random.ts';
import { termsInUse } from './usedTerms.ts';

/** Trials of a propagation of distributions, and of one that iterates in every trial. */
export const MONTE_CARLO_TRIALS = 10_000;
const ITERATED_TRIALS = 4_000;
const SEED = 20_261_201;

/** What the propagation of distributions gives for a constant; NaN where too many trials have no constant. */
export interface Sampled {
  readonly standardUncertainty: number;
  /** The probabilistically symmetric coverage interval. */
  readonly low: number;
  readonly high: number;
}

/**
 * Propagates the distributions of the line's terms (normal for a known scale, else the joint t) and of the known
 * constants (normal) to the unknown and derived constants, with a fixed seed.
 * @param fit a fit whose constants come from the line, with degrees of freedom
 * @throws Problem `argument` for constants from a direct fit
 * @see JCGM 101:2008, clauses 5–7
 */
export function monteCarlo(
  fit: Pick<
    Fit,
    | 'law'
    | 'form'
    | 'settings'
    | 'values'
    | 'direct'
    | 'axes'
    | 'lineFromReadings'
    | 'knownEffects'
    | 'coverage'
  >,
): ReadonlyMap<string, Sampled> {
  if (fit.direct !== null) throw new Problem('argument', 'options', fitWords.monteCarloNeedsLine());
  const { law, form, values, lineFromReadings: line, knownEffects, coverage } = fit;
  const terms = termsInUse(form, fit.settings.options.intercept === 'held');
  const trials = terms === 'combined' ? ITERATED_TRIALS : MONTE_CARLO_TRIALS;
  const random = seededRandom(SEED);
  const drawLine = lineSampler(line, random);
  const shifts = knownEffects.map((effect) => shiftOf(law, effect));
  const moments = terms === 'combined' ? lineMoments(fit.axes.horizontal, line.lineWeight) : null;
  const place = FIRST_CONSTANT + law.constants.indexOf(form.inSlope[0] ?? '');
  const solve = (
    slope: number,
    intercept: number,
    constants: Float64Array,
  ): ArrayLike<number> | undefined => {
    if (moments === null || terms !== 'combined') {
      if (terms === 'combined') return undefined;
      return nearest(realSolutions(form, slope, intercept, constants, terms), values);
    }
    const found = combinedConstant(form, { slope, intercept }, moments, place, [constants]);
    if (found === null) return undefined;
    const solved = Float64Array.from(constants);
    solved[place - FIRST_CONSTANT] = found.value;
    return solved;
  };
  const columns = new Map<string, Float64Array>();
  for (const name of law.unknown) columns.set(name, new Float64Array(trials));
  for (const { name } of law.derived) columns.set(name, new Float64Array(trials));
  const constants = Float64Array.from(values);
  for (let trial = 0; trial < trials; trial++) {
    let { slope, intercept } = drawLine();
    for (const shift of shifts) {
      const moved = shift.standardUncertainty * random.normal();
      slope += shift.bySlope * moved;
      intercept += shift.byIntercept * moved;
      constants[shift.place] = (values[shift.place] ?? 0) + moved;
    }
    const solved = solve(slope, intercept, constants);
    for (const name of law.unknown) {
      const column = columns.get(name);
      if (column !== undefined) column[trial] = solved?.[law.constants.indexOf(name)] ?? Number.NaN;
    }
    for (const derived of law.derived) {
      const column = columns.get(derived.name);
      const parent = solved?.[law.constants.indexOf(derived.from)] ?? Number.NaN;
      if (column !== undefined) column[trial] = derived.value(parent);
    }
  }
  return new Map([...columns].map(([name, column]) => [name, summary(column, coverage.probability)]));
}

function lineSampler(line: Fit['lineFromReadings'], random: Random) {
  const uSlope = Math.sqrt(line.varianceSlope);
  const free = line.terms === 2;
  // Cholesky factor of the covariance of slope and intercept.
  const along = free && uSlope > 0 ? line.covariance / uSlope : 0;
  const across = free ? Math.sqrt(Math.max(0, line.varianceIntercept - along * along)) : 0;
  const { degreesOfFreedom } = line;
  return (): { slope: number; intercept: number } => {
    const widened =
      line.scale === 'known' ? 1 : Math.sqrt(degreesOfFreedom / random.chiSquared(degreesOfFreedom));
    const first = widened * random.normal();
    const second = widened * random.normal();
    return {
      slope: line.slope + uSlope * first,
      intercept: line.intercept + along * first + across * second,
    };
  };
}

function shiftOf(law: Law, effect: KnownEffect) {
  return {
    place: law.constants.indexOf(effect.name),
    standardUncertainty: effect.standardUncertainty,
    bySlope: derivativeByKnown(effect, (state) => state.slope),
    byIntercept: derivativeByKnown(effect, (state) => state.intercept),
  };
}

function summary(column: Float64Array, probability: number): Sampled {
  const sorted = column.slice().sort();
  const count = sorted.length;
  // Numbers sort before NaN: a trial without a constant would lie beyond an end.
  const lost = column.reduce((sum, value) => sum + (Number.isNaN(value) ? 1 : 0), 0);
  if (lost > 0) return { standardUncertainty: Number.NaN, low: Number.NaN, high: Number.NaN };
  const mean = column.reduce((sum, value) => sum + value / count, 0);
  const variance = column.reduce((sum, value) => sum + (value - mean) ** 2 / (count - 1), 0);
  const inside = Math.round(probability * count);
  const first = Math.floor((count - inside) / 2);
  return {
    standardUncertainty: Math.sqrt(variance),
    low: sorted[first] ?? Number.NaN,
    high: sorted[first + inside - 1] ?? Number.NaN,
  };
}
