import { fitLine } from '../line/fitLine.ts';
import { fitLineBothAxes } from '../line/fitLineBothAxes.ts';
import type { Intercept, Line } from '../line/line.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';
import { FIRST_CONSTANT, indices, lawInputs, pick } from './columns.ts';
import type { StraightAxes } from './fit.ts';
import type { FitTask } from './fitTask.ts';
import { axisUncertainties, lineWeightOf } from './lineWeight.ts';
import { scaleOf } from './spread.ts';
import { straightAxes } from './straightAxes.ts';

/** A line on the straight axes of a task's form. */
export interface DrawnLine {
  /** The task with only those of its readings that the line uses. */
  readonly task: FitTask;
  /** Indices into the given task's readings of those on the line, and of those outside the form's domain. */
  readonly used: Int32Array;
  readonly outside: Int32Array;
  readonly axes: StraightAxes;
  readonly line: Line;
}

/**
 * Fits the line on a form's straight axes.
 * @param constants values of all constants that the axes need, aligned with `law.constants`
 * @param strict stop at a reading outside the form's domain, rather than leave it out
 * @param knownUncertain let a held intercept carry the known constants' uncertainty
 * @throws Problem `domain` naming the first reading outside the form's domain; `tooFew`; `undefined`
 */
export function drawLine(
  task: FitTask,
  constants: Float64Array,
  strict: boolean,
  knownUncertain = false,
): DrawnLine {
  const { form, settings } = task;
  const intercept = interceptOf(task, constants, knownUncertain);
  const { inside, used, outside, horizontal, vertical } = insideDomain(task, constants, strict);
  const n = inside.x.length;
  const need = intercept === 'free' ? 2 : 1;
  if (n < need) throw new Problem('tooFew', 'x', fitWords.noReadings(n, need));
  const axes = straightAxes(form, lawInputs(inside.x, inside.y, constants), n, horizontal, vertical);
  if (settings.spreadX.kind === 'none') {
    const lineWeight = lineWeightOf(inside, axes);
    const line = fitLine(horizontal, vertical, lineWeight, scaleOf(settings.spreadY), intercept);
    return { task: inside, used, outside, axes, line };
  }
  const u = axisUncertainties(inside, axes);
  const line = fitLineBothAxes(horizontal, vertical, u.horizontal, u.vertical, u.covariance, intercept);
  return { task: inside, used, outside, axes, line };
}

/** How the intercept enters: absent from the form, free, or held where the known constants put it. */
function interceptOf(
  { law, form, settings }: FitTask,
  constants: Float64Array,
  knownUncertain: boolean,
): Intercept | 'absent' {
  if (form.proportional) return 'absent';
  if (settings.options.intercept === 'free') return 'free';
  if (form.inIntercept.length > 0) {
    throw new Problem('argument', 'options', fitWords.heldNeedsKnown(form.intercept, form.inIntercept));
  }
  const uncertain = law.known.filter((name) => (settings.known.get(name)?.standardUncertainty ?? 0) > 0);
  const places = uncertain.map((name) => FIRST_CONSTANT + law.constants.indexOf(name));
  const { value, partials } = form.interceptOf.gradient(lawInputs(0, 0, constants), 1, places);
  let variance = 0;
  if (knownUncertain) {
    uncertain.forEach((name, k) => {
      variance += ((partials[k]?.[0] ?? 0) * (settings.known.get(name)?.standardUncertainty ?? 0)) ** 2;
    });
  }
  return { held: value[0] ?? Number.NaN, standardUncertainty: Math.sqrt(variance) };
}

interface InsideDomain {
  readonly inside: FitTask;
  readonly used: Int32Array;
  readonly outside: Int32Array;
  readonly horizontal: Float64Array;
  readonly vertical: Float64Array;
}

function insideDomain(task: FitTask, constants: Float64Array, strict: boolean): InsideDomain {
  const { form, x, y, position } = task;
  const n = x.length;
  const inputs = lawInputs(x, y, constants);
  const horizontal = form.horizontal.evaluate(inputs, n);
  const vertical = form.vertical.evaluate(inputs, n);
  let outsideCount = 0;
  for (let i = 0; i < n; i++) {
    const sum = (horizontal[i] as number) + (vertical[i] as number); // i < n
    if (sum - sum !== 0) outsideCount++;
  }
  const all = indices(n);
  if (outsideCount === 0)
    return { inside: task, used: all, outside: new Int32Array(0), horizontal, vertical };
  const isInside = (i: number): boolean => Number.isFinite((horizontal[i] ?? 0) + (vertical[i] ?? 0));
  const used = all.filter(isInside);
  const outside = all.filter((i) => !isInside(i));
  const first = outside[0] ?? 0;
  if (strict) {
    const at = position[first] ?? 0;
    const axis = outsideAxis(task, vertical, first);
    throw new Problem('domain', 'y', fitWords.outsideDomain(at, x[first] ?? 0, y[first] ?? 0, axis), {
      position: at,
    });
  }
  const inside = {
    ...task,
    x: pick(x, used),
    y: pick(y, used),
    position: used.map((i) => position[i] ?? 0),
  };
  return { inside, used, outside, horizontal: pick(horizontal, used), vertical: pick(vertical, used) };
}

/** The text of the axis that does not exist at a reading. */
export function outsideAxis({ form }: FitTask, vertical: Float64Array, index: number): string {
  return Number.isFinite(vertical[index]) ? form.against : form.plot;
}
