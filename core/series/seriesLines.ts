import { type ConstantsFromLine, constantsFromLine } from '../constants/fromLine.ts';
import { carriedCovariance } from '../constants/propagate.ts';
import { termsInUse } from '../constants/usedTerms.ts';
import { givenConstants, lawInputs } from '../fit/columns.ts';
import type { DrawnLine } from '../fit/drawLine.ts';
import type { StraightAxes } from '../fit/fit.ts';
import { chosenForm, type FitTask } from '../fit/fitTask.ts';
import { lineWeightOf } from '../fit/lineWeight.ts';
import { scaleOf } from '../fit/spread.ts';
import { straightAxes } from '../fit/straightAxes.ts';
import type { FitSettings } from '../given/given.ts';
import type { Law } from '../law/law.ts';
import { fitLine } from '../line/fitLine.ts';
import type { Line } from '../line/line.ts';
import { Problem } from '../problem.ts';
import type { SeriesColumns } from './splitSeries.ts';

/** One series settled by its line. */
export interface SettledSeries {
  readonly line: Line;
  readonly horizontal: Float64Array;
  readonly values: Float64Array;
  /** Variance of each unknown constant, aligned with `law.unknown`. */
  readonly variance: readonly number[];
  /** Whether the readings have weights of their own. */
  readonly weighted: boolean;
}

/**
 * Lines for many series at once: axes and weights are evaluated down all the readings together, the rest series by
 * series with the functions that a single fit uses, so that the digits are the same.
 * @returns a function from a stretch of the columns to its line and constants, null where there are too few readings or one
 * lies outside the law's domain; or null when the settings ask for more than a line with exact known constants
 * @throws (the function) Problem `undefined` as a single fit does
 */
export function seriesLines(
  law: Law,
  settings: FitSettings,
  columns: SeriesColumns,
): ((from: number, to: number) => SettledSeries | null) | null {
  const form = chosenForm(law, settings.options.form);
  const { options, spreadX, spreadY, known } = settings;
  const plain =
    form.trials.length === 0 &&
    termsInUse(form, false) !== 'combined' &&
    options.fit === 'line' &&
    options.intercept === 'free' &&
    spreadX.kind === 'none' &&
    spreadY.kind !== 'each' &&
    [...known.values()].every(({ standardUncertainty }) => standardUncertainty === 0);
  if (!plain) return null;
  const given = givenConstants(law, known);
  const task: FitTask = { law, form, settings, ...columns };
  const n = columns.x.length;
  const inputs = lawInputs(columns.x, columns.y, given);
  const horizontal = form.horizontal.evaluate(inputs, n);
  const vertical = form.vertical.evaluate(inputs, n);
  const axes = straightAxes(form, inputs, n, horizontal, vertical);
  const weight = weightOrNull(task, axes);
  if (weight === undefined) return null;
  const scale = scaleOf(spreadY);
  const intercept = form.proportional ? 'absent' : 'free';
  const none = new Int32Array(0);

  const fewest = form.proportional ? 1 : 2;

  return (from, to) => {
    if (to - from < fewest) return null;
    const h = horizontal.subarray(from, to);
    const v = vertical.subarray(from, to);
    for (let i = 0; i < h.length; i++) {
      const sum = (h[i] as number) + (v[i] as number); // i < length
      if (sum - sum !== 0) return null;
    }
    const line = fitLine(h, v, weight?.subarray(from, to) ?? null, scale, intercept);
    const own: FitTask = {
      law,
      form,
      settings,
      x: columns.x.subarray(from, to),
      y: columns.y.subarray(from, to),
      position: columns.position,
    };
    const drawn: DrawnLine = { task: own, used: none, outside: none, axes, line };
    const fromLine: ConstantsFromLine = constantsFromLine(drawn, given);
    const { bySlope, byIntercept } = fromLine;
    const variance = law.unknown.map((_, k) => {
      const derivatives = [bySlope[k] ?? 0, byIntercept[k] ?? 0] as const;
      return carriedCovariance(line, derivatives, derivatives);
    });
    return { line, horizontal: h, values: fromLine.values, variance, weighted: weight !== null };
  };
}

/** Weights of all readings; undefined when one of them has none, so that its series must say so. */
function weightOrNull(task: FitTask, axes: StraightAxes): Float64Array | null | undefined {
  try {
    return lineWeightOf(task, axes);
  } catch (error) {
    if (error instanceof Problem) return undefined;
    throw error;
  }
}
