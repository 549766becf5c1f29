import { type DrawnLine, drawLine } from '../fit/drawLine.ts';
import type { Fit } from '../fit/fit.ts';
import { fitTask } from '../fit/fitTask.ts';
import { Problem } from '../problem.ts';

/** A line with the axes it is drawn on. */
export type JudgedLine = Pick<DrawnLine, 'line' | 'axes'>;

/**
 * The line that a fit is judged by, with y on one axis only and every reading on it: on the chosen form, else on the
 * first of the others that has one.
 */
export function judgedLine(fit: Fit): JudgedLine | null {
  const { form, law, taking, values } = fit;
  if (!form.responseOnBothAxes && everyReadingOnLine(fit)) return { line: fit.line, axes: fit.axes };
  for (const other of law.forms) {
    if (other.responseOnBothAxes || other.number === form.number) continue;
    const options = { ...fit.settings.options, form: other.number };
    try {
      return drawLine(fitTask(law, fit.readings, taking, { ...fit.settings, options }), values, true);
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
    }
  }
  return null;
}

function everyReadingOnLine(fit: Fit): boolean {
  if (fit.direct === null) return true;
  try {
    return fit.used.length === fit.taking.length;
  } catch (error) {
    // A direct fit that stands without a line.
    if (error instanceof Problem) return false;
    throw error;
  }
}
