import type { Fit } from '../fit/fit.ts';
import { spreadAt } from '../fit/spread.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';

/**
 * Standard deviation of a new reading in y at a fitted response, by the rule of u_y: stated, or scaled by the scatter.
 * @param response the fitted y
 * @param residualStandardDeviation s of the fit (of the line, or in the units of y)
 * @throws Problem `argument` when u_y is a range, which says nothing of a new reading
 */
function newReadingDeviation(fit: Fit, response: number, residualStandardDeviation: number): number {
  const { spreadY } = fit.settings;
  if (spreadY.kind === 'each') {
    throw new Problem('argument', 'options', fitWords.newReadingNeedsRule());
  }
  const deviation = spreadAt(spreadY, response, 0);
  const estimated = spreadY.kind === 'none' || spreadY.kind === 'equal' || spreadY.kind === 'proportional';
  return estimated ? deviation * residualStandardDeviation : deviation;
}

/**
 * Variance of a new reading on the vertical straight axis; 0 with `band=curve`.
 * @param verticalByResponse the derivative of that axis by y, asked for only where it matters
 */
export function newReadingVarianceOnLine(
  fit: Fit,
  response: number,
  verticalByResponse: () => number,
): number {
  if (fit.settings.options.band === 'curve') return 0;
  const deviation = newReadingDeviation(fit, response, fit.line.residualStandardDeviation);
  // Without u_y the scatter is the same everywhere on the straight axis itself.
  return (fit.settings.spreadY.kind === 'none' ? deviation : deviation * verticalByResponse()) ** 2;
}

/** Variance of a new reading in the units of y; 0 with `band=curve`. */
export function newReadingVariance(fit: Fit, at: number, response: number): number {
  if (fit.settings.options.band === 'curve') return 0;
  if (fit.direct !== null) {
    return newReadingDeviation(fit, response, fit.direct.residualStandardDeviation) ** 2;
  }
  const inputs = [at, response, ...fit.values];
  const slope = fit.form.vertical.gradient(inputs, 1, [1]).partials[0]?.[0] ?? Number.NaN;
  return newReadingVarianceOnLine(fit, response, () => slope) / (slope * slope);
}
