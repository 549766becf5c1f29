import type { Fit } from '../../core/fit/fit.ts';
import { straightness } from '../../core/straightness/straightness.ts';
import type { ResidualName, StraightName } from '../../core/words/plotWords.ts';

/** What the name of a straight plot is made of. */
export function straightName(fit: Fit): StraightName {
  const { bowPercent } = straightness(fit);
  const { slope, intercept } = fit.line;
  const { plot, against } = fit.form;
  return { plot, against, readings: fit.used.length, slope, intercept, bowPercent };
}

/** What the name of a residual plot is made of. */
export function residualName(fit: Fit): ResidualName {
  const { residual, residualStandardDeviation } = fit.line;
  let farthest = 0;
  residual.forEach((value, row) => {
    if (Math.abs(value) > Math.abs(residual[farthest] ?? 0)) farthest = row;
  });
  return {
    plot: fit.form.plot,
    readings: residual.length,
    standardDeviation: residualStandardDeviation,
    farthest: fit.readings.position[fit.used[farthest] ?? 0] ?? 0,
  };
}
