import {
  constantDerivatives,
  namesOf,
  realSolutions,
  termDerivatives,
  valuesFromLine,
} from '../constants/fromLine.ts';
import { carriedCovariance } from '../constants/propagate.ts';
import { termsInUse } from '../constants/usedTerms.ts';
import { givenConstants, lawInputs } from '../fit/columns.ts';
import type { StraightAxes } from '../fit/fit.ts';
import { chosenForm, type FitTask } from '../fit/fitTask.ts';
import { lineWeightOf } from '../fit/lineWeight.ts';
import { scaleOf } from '../fit/spread.ts';
import { straightAxes } from '../fit/straightAxes.ts';
import type { FitSettings } from '../given/given.ts';
import type { Law, LineTerms, StraightForm } from '../law/law.ts';
import { fitLine } from '../line/fitLine.ts';
import type { Line } from '../line/line.ts';
import { Problem } from '../problem.ts';
import { bowPercent } from '../straightness/bow.ts';
import type { SeriesColumns } from './splitSeries.ts';

/** One series settled by its line. */
export interface SettledSeries {
  readonly line: Line;
  readonly values: Float64Array;
  /** Variance of each unknown constant, aligned with `law.unknown`. */
  readonly variance: readonly number[];
  readonly bowPercent: number;
}

/** A stretch of the columns. */
interface Stretch {
  readonly from: number;
  readonly to: number;
}

/**
 * Lines for many series at once: axes, weights and derivatives are evaluated down whole columns, the rest series by series
 * with the functions that a single fit uses, so that the digits are the same.
 * @returns for every series its line and constants, or the Problem that a single fit has, or null where a single fit must
 * say what is wrong (too few readings, one outside the law's domain); null for all when the settings ask for more
 * than a line with exact known constants
 */
export function seriesLines(
  law: Law,
  settings: FitSettings,
  columns: SeriesColumns,
  series: readonly Stretch[],
): readonly (SettledSeries | Problem | null)[] | null {
  const form = chosenForm(law, settings.options.form);
  const terms = termsInUse(form, false);
  if (terms === 'combined' || !isPlain(form, settings)) return null;
  const given = givenConstants(law, settings.known);
  const task: FitTask = { law, form, settings, ...columns };
  const n = columns.x.length;
  const inputs = lawInputs(columns.x, columns.y, given);
  const horizontal = form.horizontal.evaluate(inputs, n);
  const vertical = form.vertical.evaluate(inputs, n);
  const axes = straightAxes(form, inputs, n, horizontal, vertical);
  const weight = weightOrNull(task, axes);
  if (weight === undefined) return null;
  const scale = scaleOf(settings.spreadY);
  const intercept = form.proportional ? 'absent' : 'free';
  const fewest = form.proportional ? 1 : 2;
  const used = new Int32Array(0);
  const longest = series.reduce((most, { from, to }) => Math.max(most, to - from), 0);
  const residual = new Float64Array(longest);

  const valuesOf = (line: Line, from: number, to: number): Float64Array => {
    const [only, ...more] = realSolutions(form, line.slope, line.intercept, given, terms);
    if (only !== undefined && more.length === 0) return only;
    // Several solutions are told apart by the readings.
    const { x, y, position } = columns;
    const own = { law, form, settings, x: x.subarray(from, to), y: y.subarray(from, to), position };
    return valuesFromLine({ task: own, used, outside: used, axes, line }, given, terms);
  };

  const lineOf = ({ from, to }: Stretch): SettledLine | Problem | null => {
    if (to - from < fewest) return null;
    const h = horizontal.subarray(from, to);
    const v = vertical.subarray(from, to);
    if (!isComplete(h) || !isComplete(v)) return null;
    try {
      const line = fitLine(h, v, weight?.subarray(from, to) ?? null, scale, intercept);
      return {
        line,
        values: valuesOf(line, from, to),
        bowPercent: bowPercent(line, h, weight !== null, line.residualInto(residual)),
      };
    } catch (error) {
      if (error instanceof Problem) return error;
      throw error;
    }
  };
  return withVariances(task, terms, series.map(lineOf));
}

type SettledLine = Omit<SettledSeries, 'variance'>;

/** Adds the variances, with the derivatives of all series' constants in one evaluation. */
function withVariances(
  task: FitTask,
  terms: LineTerms,
  lines: readonly (SettledLine | Problem | null)[],
): (SettledSeries | Problem | null)[] {
  const { law } = task;
  const constants = law.constants.map(() => new Float64Array(lines.length).fill(Number.NaN));
  constants.forEach((column, place) => {
    lines.forEach((one, row) => {
      if (one !== null && !(one instanceof Problem)) column[row] = one.values[place] ?? Number.NaN;
    });
  });
  const [slope, intercept] = termDerivatives(task, constants, lines.length);
  const names = namesOf(task);
  const which = law.unknown.map((name) => names.indexOf(name));
  return lines.map((one, row) => {
    if (one === null || one instanceof Problem) return one;
    const derivatives = constantDerivatives(terms, slope, intercept, row);
    const variance = which.map((k) => {
      const own = derivatives[k] ?? NONE;
      return carriedCovariance(one.line, own, own);
    });
    const { line, values, bowPercent } = one;
    return { line, values, bowPercent, variance };
  });
}

const NONE = [0, 0] as const;

/** Whether a fit is no more than a line with a free intercept, errors in y only and exact known constants. */
function isPlain({ trials }: StraightForm, { options, spreadX, spreadY, known }: FitSettings): boolean {
  return (
    trials.length === 0 &&
    options.fit === 'line' &&
    options.intercept === 'free' &&
    spreadX.kind === 'none' &&
    spreadY.kind !== 'each' &&
    [...known.values()].every(({ standardUncertainty }) => standardUncertainty === 0)
  );
}

function isComplete(column: Float64Array): boolean {
  for (let i = 0; i < column.length; i++) {
    const value = column[i] as number; // i < length
    if (value - value !== 0) return false;
  }
  return true;
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
