import { constantsFromLine, realSolutions } from '../constants/fromLine.ts';
import { givenConstants, lawInputs } from '../fit/columns.ts';
import { type DrawnLine, drawLine } from '../fit/drawLine.ts';
import { fitCompiled } from '../fit/fitLaw.ts';
import { chosenForm, fitTask, takingPart } from '../fit/fitTask.ts';
import { scaleOf } from '../fit/spread.ts';
import type { FitSettings } from '../given/given.ts';
import { compileLaw } from '../law/compileLaw.ts';
import type { Law } from '../law/law.ts';
import { Problem } from '../problem.ts';
import type { Readings } from '../readings/readings.ts';
import { bowPercent } from '../straightness/bow.ts';
import { aicc, logLikelihood, logLikelihoodFrom } from '../straightness/likelihood.ts';
import { fittedOnLine, lineIsLaw, misfit, onOwnAxis, rootMeanSquare } from '../straightness/misfit.ts';
import { sumOfLogarithms } from '../straightness/sumOfLogarithms.ts';
import { judgeWords } from '../words/judgeWords.ts';
import { directLogLikelihood } from './directLikelihood.ts';
import { type JudgedLine, judgedLine } from './judgedLine.ts';
import { outsideReason } from './outsideReason.ts';
import { SharedColumns } from './sharedColumns.ts';

/** One law judged on readings; NaN where a number does not exist. */
export interface JudgedLaw {
  /** As it was asked for. */
  readonly law: string;
  /** Why it cannot be judged; empty when it can. */
  readonly reason: string;
  /** What laws are ranked by, least first: AICc, or with errors in both axes the weighted sum of squares + 2k. */
  readonly criterion: number;
  readonly aicc: number;
  readonly rSquared: number;
  readonly bowPercent: number;
  readonly misfit: number;
}

/**
 * Judges a law on all of the readings by the likelihood of its fit. With `judge=line` that is the line on the straight axes
 * (where the chosen form has y on both axes, the first form of the same law that has not); a law with trial constants
 * is judged where these are settled, by its direct fit in the units of y. With `judge=direct` every law is. r squared and
 * bow are those of the line, on the first form that holds every reading.
 * @param given settings whose known constants all stand in this law
 * @throws what is no Problem of this law with these readings: `cell`
 */
export function judgeLaw(
  readings: Readings,
  text: string,
  given: FitSettings,
  columns = new SharedColumns(),
): JudgedLaw {
  let law: Law | null = null;
  const settings = judgedSettings(given);
  try {
    law = compileLaw(text, settings.known.keys());
    const form = chosenForm(law, settings.options.form);
    const direct = settings.options.judge === 'direct' || form.trials.length > 0;
    return direct
      ? byDirectFit(readings, text, law, settings)
      : byLine(readings, text, law, settings, columns);
  } catch (error) {
    if (!(error instanceof Problem) || error.code === 'cell') throw error;
    return ineligible(
      text,
      (law !== null ? reasonOf(error, readings, law, settings) : null) ?? error.message,
    );
  }
}

/** A reading outside the law as the reason, where that is what stopped the fit. */
function reasonOf(problem: Problem, readings: Readings, law: Law, settings: FitSettings): string | null {
  const stopped =
    problem.code === 'domain' || (problem.code === 'noConvergence' && !curveExists(readings, law, settings));
  return stopped ? outsideReason(readings, law, settings) : null;
}

/** Whether the curve has a value at every reading for constants of 1. */
function curveExists({ x }: Readings, law: Law, settings: FitSettings): boolean {
  const ones = givenConstants(law, settings.known).map((value) => (Number.isNaN(value) ? 1 : value));
  const values = law.curve?.evaluate(lawInputs(x, Number.NaN, ones), x.length);
  return values?.every(Number.isFinite) ?? true;
}

/** The settings under which laws are compared: every reading counts. */
function judgedSettings(settings: FitSettings): FitSettings {
  const { options } = settings;
  const direct = options.judge === 'direct';
  return {
    ...settings,
    options: {
      ...options,
      interval: 'line',
      fit: direct ? 'direct' : options.fit,
      // The curve takes every reading or fails; only the line that a direct fit starts from may do with fewer.
      outside: direct ? 'set aside' : 'stop',
    },
  };
}

function ineligible(law: string, reason: string): JudgedLaw {
  const nothing = Number.NaN;
  return {
    law,
    reason,
    criterion: nothing,
    aicc: nothing,
    rSquared: nothing,
    bowPercent: nothing,
    misfit: nothing,
  };
}

function byLine(
  readings: Readings,
  text: string,
  law: Law,
  settings: FitSettings,
  columns: SharedColumns,
): JudgedLaw {
  const form = chosenForm(law, settings.options.form);
  const terms = form.proportional || settings.options.intercept === 'held' ? 1 : 2;
  const k = terms + scaleTerms(settings);
  const taking = columns.taking(readings, settings);
  const n = taking.length;
  if (n - k - 1 <= 0) return ineligible(text, judgeWords.needsReadings(k + 2, n));
  if (form.responseOnBothAxes || settings.options.fit === 'direct') {
    const fit = fitCompiled(readings, law, settings);
    const drawn = judgedLine(fit);
    if (drawn === null) return ineligible(text, judgeWords.bothAxes(law.response));
    return judged(text, drawn, logLikelihood(drawn.line, drawn.axes.verticalByY), k, misfit(fit));
  }
  const given = givenConstants(law, settings.known);
  const task = fitTask(law, readings, taking, settings);
  const drawn = columns.draw(task) ?? drawLine(task, given, true);
  const { line } = drawn;
  const values = constantsOf(drawn, given);
  const weights = settings.spreadY.kind === 'none' ? 0 : 0.5 * sumOfLogarithms(line.lineWeight);
  const likelihood =
    settings.spreadX.kind === 'none'
      ? logLikelihoodFrom(line, weights + columns.jacobian(drawn))
      : Number.NaN;
  const ofLine = { law, form, line, values, x: task.x };
  // With equal weights on y's own axis the misfit is the scatter about the line.
  const distance =
    settings.spreadY.kind === 'none' && onOwnAxis(ofLine) && lineIsLaw(ofLine)
      ? line.residualStandardDeviation
      : rootMeanSquare(task.y, fittedOnLine(ofLine), line.degreesOfFreedom);
  return judged(text, drawn, likelihood, k, distance, settings.spreadY.kind !== 'none');
}

/**
 * The constants from a line; their derivatives are not needed.
 * @throws Problem `undefined` when no real constants give this line
 */
function constantsOf(drawn: DrawnLine, given: Float64Array): Float64Array {
  const { task, line } = drawn;
  const { law, form } = task;
  if (lineIsLaw({ law, form, line })) {
    const [only, ...more] = realSolutions(form, line.slope, line.intercept, given, 'both');
    if (only !== undefined && more.length === 0) return only;
  }
  return constantsFromLine(drawn, given).values;
}

/** A law with the line that it is judged by. */
function judged(
  text: string,
  { line, axes }: JudgedLine,
  likelihood: number,
  k: number,
  distance: number,
  weighted = true,
): JudgedLaw {
  const n = axes.horizontal.length;
  const criterion = aicc(likelihood, k, n);
  if (criterion === Number.POSITIVE_INFINITY) return ineligible(text, judgeWords.noLikelihood());
  return {
    law: text,
    reason: '',
    criterion: Number.isNaN(likelihood) ? line.weightedSumOfSquares + 2 * k : criterion,
    aicc: criterion,
    rSquared: line.rSquared,
    bowPercent: bowPercent(line, axes.horizontal, weighted),
    misfit: distance,
  };
}

function byDirectFit(readings: Readings, text: string, law: Law, settings: FitSettings): JudgedLaw {
  const k = law.unknown.length + scaleTerms(settings);
  const n = takingPart(readings, settings).taking.length;
  if (n - k - 1 <= 0) return ineligible(text, judgeWords.needsReadings(k + 2, n));
  const fit = fitCompiled(readings, law, settings);
  const criterion = aicc(directLogLikelihood(fit), k, n);
  if (!(criterion < Number.POSITIVE_INFINITY)) return ineligible(text, judgeWords.noLikelihood());
  const drawn = judgedLine(fit);
  return {
    law: text,
    reason: '',
    criterion,
    aicc: criterion,
    rSquared: drawn?.line.rSquared ?? Number.NaN,
    bowPercent: drawn === null ? Number.NaN : bowPercent(drawn.line, drawn.axes.horizontal),
    misfit: misfit(fit),
  };
}

function scaleTerms({ spreadY }: FitSettings): 0 | 1 {
  return scaleOf(spreadY) === 'estimated' ? 1 : 0;
}
