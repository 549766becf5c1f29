import { type ConstantsFromLine, constantsFromLine } from '../constants/fromLine.ts';
import { directFit } from '../direct/directFit.ts';
import { settleTrials } from '../direct/settleTrials.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { lineWords } from '../words/lineWords.ts';
import { lawInputs, unknownOf, withUnknown } from './columns.ts';
import { type DrawnLine, drawLine } from './drawLine.ts';
import type { DirectResult } from './fit.ts';
import type { FitTask } from './fitTask.ts';
import { scaleOf, spreadOf } from './spread.ts';

/** A task settled: its constants, and the line that they came from or that goes with them. */
export interface Settled {
  /** All constants, aligned with `law.constants`. */
  readonly values: Float64Array;
  /** Present when the constants come from the direct fit. */
  readonly direct: DirectResult | null;
  /** Present when they come from the line. */
  readonly fromLine: ConstantsFromLine | null;
  /** The line; drawn when first asked for where the constants do not need it. */
  readonly drawn: () => DrawnLine;
}

/**
 * Settles the constants of a law: from the line, or from the direct fit for trial constants and `fit=direct`.
 * @param given values of the known constants, aligned with `law.constants`
 * @param near the settled constants of a nearby task, to stay on the same branch and minimum
 * @throws Problem `tooFew`, `domain`, `undefined`, `noConvergence`, `argument`
 */
export function settle(task: FitTask, given: Float64Array, near: Float64Array | null = null): Settled {
  const { law, form, settings } = task;
  const byTrial = form.trials.length > 0;
  if (!byTrial && settings.options.fit === 'line') {
    const strict = settings.options.outside === 'stop';
    const drawn = drawLine(task, given, strict);
    const fromLine = constantsFromLine(drawn, given, near);
    return { values: fromLine.values, direct: null, fromLine, drawn: () => drawn };
  }
  if (settings.spreadX.kind !== 'none') {
    throw new Problem('argument', 'u_x', fitWords.bothAxesNeedLine(byTrial ? 'trial' : 'direct'));
  }
  const problem = directProblem(task, given);
  const direct =
    near !== null
      ? directFit({ ...problem, start: unknownOf(law, near) })
      : byTrial
        ? settleTrials({ ...problem, form })
        : directFit({ ...problem, start: startFromLine(task, given) });
  const values = withUnknown(law, given, direct.theta);
  let drawn: DrawnLine | undefined;
  return {
    values,
    direct,
    fromLine: null,
    drawn: () => {
      drawn ??= drawLine(task, values, !byTrial && settings.options.outside === 'stop');
      return drawn;
    },
  };
}

function directProblem(task: FitTask, given: Float64Array) {
  const { law, x, y, position, settings } = task;
  requireSquares(y);
  const deviation = spreadOf(settings.spreadY, y, position, 'u_y');
  return {
    law,
    x,
    y,
    omega: deviation.map((sigma) => 1 / (sigma * sigma)),
    scale: scaleOf(settings.spreadY),
    constants: given,
  };
}

/** Beyond these, sums of squares in the units of y leave the range of numbers. */
const SQUARED = { least: 1e-140, most: 1e140 };

/** @throws Problem `undefined` when the squares of the responses, or of what is left of them, are no numbers */
function requireSquares(y: Float64Array): void {
  let most = 0;
  for (let i = 0; i < y.length; i++) most = Math.max(most, Math.abs(y[i] as number)); // i < n
  if (most === 0 || (most >= SQUARED.least && most <= SQUARED.most)) return;
  throw new Problem('undefined', 'y', lineWords.unitTooFar());
}

/**
 * Where a direct fit starts: the constants of the weighted or of the line with weights for equal scatter in y,
 * whichever has the smaller sum of squares in the units of y.
 * @throws Problem `domain` for a reading outside the form's domain, unless it may be set aside
 */
function startFromLine(task: FitTask, given: Float64Array): Float64Array {
  const { law, settings } = task;
  const strict = settings.options.outside === 'stop';
  const weighted: FitTask = {
    ...task,
    settings: {
      ...settings,
      spreadY: settings.spreadY.kind === 'none' ? { kind: 'equal' } : settings.spreadY,
    },
  };
  const starts = [weighted, { ...task, settings: { ...settings, spreadY: { kind: 'none' } } } as const];
  const { omega } = directProblem(task, given);
  let best: { readonly values: Float64Array; readonly sum: number } | null = null;
  let problem: unknown;
  for (const start of starts) {
    try {
      const { values } = constantsFromLine(drawLine(start, given, strict), given);
      const sum = sumOfSquares(task, values, omega);
      if (best === null || sum < best.sum) best = { values, sum };
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
      problem ??= error;
    }
  }
  if (best === null) throw problem;
  return unknownOf(law, best.values);
}

function sumOfSquares({ law, x, y }: FitTask, values: Float64Array, omega: Float64Array): number {
  const fitted = law.curve?.evaluate(lawInputs(x, y, values), x.length);
  if (fitted === undefined) return 0;
  let sum = 0;
  for (let i = 0; i < x.length; i++) sum += (omega[i] ?? 0) * ((y[i] ?? 0) - (fitted[i] ?? 0)) ** 2;
  return Number.isNaN(sum) ? Number.POSITIVE_INFINITY : sum;
}
