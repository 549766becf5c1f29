import { lawInputs, pick } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { constantsWithout, directDeletion } from '../judge/withoutReading.ts';
import { leaveOneOut } from './studentised.ts';

/**
 * √(mean (yᵢ − ŷ₍₋ᵢ₎)²) in the units of y: how far each reading lies from the law settled without it. NaN when one of
 * the refits does not exist.
 * - Response on the vertical axis alone: the line is refitted without the reading (exact, by the leverage; the other
 *   weights stay) and Ŷ₍₋ᵢ₎ carried back to y.
 * - Response on both axes: the refitted line is turned back into constants, and the curve read off at xᵢ.
 * - Direct fit: residual/(1 − h), with the leverage h of the curve's tangent plane at the fitted constants (first order).
 * - Errors in both axes: as the first, with the weights of the fitted slope (first order).
 * @see Cook & Weisberg (1982), Residuals and Influence in Regression, section 2.2
 */
export function leaveOneOutMisfit(fit: Fit): number {
  const residual = predictionResiduals(fit);
  let sum = 0;
  for (let i = 0; i < residual.length; i++) sum += (residual[i] ?? Number.NaN) ** 2;
  return Math.sqrt(sum / residual.length);
}

/** yᵢ − ŷ₍₋ᵢ₎ of every reading on the line, or of every one that takes part in the direct fit. */
export function predictionResiduals(fit: Fit): Float64Array {
  const { form, law, axes, line, values, readings } = fit;
  if (fit.direct !== null) {
    const { residual, leverage } = directDeletion(fit);
    return residual.map((entry, i) => entry / (1 - (leverage[i] ?? Number.NaN)));
  }
  const x = pick(readings.x, fit.used);
  const y = pick(readings.y, fit.used);
  if (form.responseFrom !== null && !form.responseOnBothAxes) {
    const vertical = leaveOneOut(line, axes.vertical);
    const predicted = form.responseFrom.evaluate(lawInputs(x, vertical, values), x.length);
    return y.map((observed, i) => observed - (predicted[i] ?? Number.NaN));
  }
  const { curve } = law;
  if (curve === null) return y.map(() => Number.NaN);
  const without = constantsWithout(fit);
  return y.map((observed, i) => {
    const constants = without(i);
    return constants === null
      ? Number.NaN
      : observed - curve.at([x[i] ?? Number.NaN, Number.NaN, ...constants]);
  });
}
