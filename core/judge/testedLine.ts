import type { Fit } from '../fit/fit.ts';
import { fitTask } from '../fit/fitTask.ts';
import { lineWeightOf } from '../fit/lineWeight.ts';
import { scaleOf } from '../fit/spread.ts';
import { fitLine } from '../line/fitLine.ts';
import type { Line } from '../line/line.ts';
import { Problem } from '../problem.ts';

/**
 * The line whose residuals are tested for shape. After a direct fit the readings on the straight axes are weighted as
 * the direct fit weighs them, 1/(σ ∂Y/∂y)²: a line with equal weights there would test another scatter.
 * @returns null when no line can be drawn
 */
export function testedLine(fit: Fit): Line | null {
  try {
    return fit.direct === null ? fit.line : weightedLine(fit);
  } catch (error) {
    if (error instanceof Problem) return null;
    throw error;
  }
}

function weightedLine(fit: Fit): Line {
  const { axes, form, law, readings, used, settings, line } = fit;
  const spreadY = settings.spreadY.kind === 'none' ? ({ kind: 'equal' } as const) : settings.spreadY;
  const task = fitTask(law, readings, used, { ...settings, spreadY });
  const lineWeight = lineWeightOf(task, axes);
  const held = line.terms === 1 ? ({ held: line.intercept, standardUncertainty: 0 } as const) : 'free';
  const intercept = form.proportional ? 'absent' : held;
  return fitLine(axes.horizontal, axes.vertical, lineWeight, scaleOf(settings.spreadY), intercept);
}
