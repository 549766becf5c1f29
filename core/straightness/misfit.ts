import { FIRST_CONSTANT, lawInputs, pick, RESPONSE } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';

/**
 * √(Σ (y − ŷ)²/ν) in the units of y, ŷ the law at the fitted constants; NaN when ν = 0 or the law has no value at a
 * reading. After a direct fit over every reading that takes part, otherwise over those on the line.
 */
export function misfit(fit: Fit): number {
  const { readings, direct, line } = fit;
  const taking = direct === null ? fit.used : fit.taking;
  const degreesOfFreedom = direct?.degreesOfFreedom ?? line.degreesOfFreedom;
  if (!(degreesOfFreedom > 0)) return Number.NaN;
  const y = pick(readings.y, taking);
  const fitted = direct?.fitted ?? fittedResponse(fit);
  let sum = 0;
  for (let i = 0; i < y.length; i++) {
    const residual = (y[i] as number) - (fitted[i] as number); // i < n
    sum += residual * residual;
  }
  return Math.sqrt(sum / degreesOfFreedom);
}

/** The law at the fitted constants at every reading on the line; NaN where it has no value. */
export function fittedResponse(fit: Fit): Float64Array {
  const { law, form, line, values } = fit;
  // Where y itself stands against a column of x, with both terms settled by the line, the line is the law.
  if (onOwnAxis(fit) && line.terms === 2 && law.known.length === 0) return line.fitted;
  const x = pick(fit.readings.x, fit.used);
  if (law.curve !== null) return law.curve.evaluate(lawInputs(x, Number.NaN, values), x.length);
  if (form.responseFrom === null || form.responseOnBothAxes) return x.map(() => Number.NaN);
  return form.responseFrom.evaluate(lawInputs(x, line.fitted, values), x.length);
}

/** True when the vertical axis is the response itself. */
export function onOwnAxis({ law, form, direct }: Fit): boolean {
  const { expression, uses } = form.vertical;
  return (
    direct === null &&
    !form.responseOnBothAxes &&
    expression.kind === 'symbol' &&
    expression.name === law.response &&
    uses.every((index) => index === RESPONSE || index >= FIRST_CONSTANT)
  );
}
