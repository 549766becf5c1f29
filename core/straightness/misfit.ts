import { lawInputs, pick } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import type { Law, StraightForm } from '../law/law.ts';
import type { Line } from '../line/line.ts';

/**
 * √(Σ (y − ŷ)²/ν) in the units of y, ŷ the law at the fitted constants; NaN when ν = 0 or the law has no value at a
 * reading. After a direct fit over every reading that takes part, otherwise over those on the line.
 */
export function misfit(fit: Fit): number {
  const { readings, direct, used, taking } = fit;
  const y = pick(readings.y, direct === null ? used : taking);
  const fitted = direct?.fitted ?? fittedOnLine({ ...pieces(fit), x: pick(readings.x, used) });
  return rootMeanSquare(y, fitted, direct?.degreesOfFreedom ?? fit.line.degreesOfFreedom);
}

/** √(Σ (y − ŷ)²/ν). */
export function rootMeanSquare(y: Float64Array, fitted: Float64Array, degreesOfFreedom: number): number {
  if (!(degreesOfFreedom > 0)) return Number.NaN;
  let sum = 0;
  for (let i = 0; i < y.length; i++) {
    const residual = (y[i] as number) - (fitted[i] as number); // i < n
    sum += residual * residual;
  }
  return Math.sqrt(sum / degreesOfFreedom);
}

/** What the fitted response of a line follows from. */
export interface LineOfLaw {
  readonly law: Law;
  readonly form: StraightForm;
  readonly line: Line;
  /** All constants, aligned with `law.constants`. */
  readonly values: Float64Array;
  /** Predictor of the readings on the line. */
  readonly x: Float64Array;
}

/** The law at the constants from a line at every reading on it; NaN where it has no value. */
export function fittedOnLine({ law, form, line, values, x }: LineOfLaw): Float64Array {
  const { curve } = law;
  const { responseFrom } = form;
  if (
    responseFrom !== null &&
    !form.responseOnBothAxes &&
    (curve === null || lineIsLaw({ law, form, line }))
  ) {
    // The line carried back to y is the law: with y on its own axis without another step.
    if (onOwnAxis({ law, form })) return line.fitted;
    return responseFrom.evaluate(lawInputs(x, line.fitted, values), x.length);
  }
  if (curve === null) return x.map(() => Number.NaN);
  return curve.evaluate(lawInputs(x, Number.NaN, values), x.length);
}

/** True when both terms of the line and nothing else settle the constants, so that the line is the law itself. */
export function lineIsLaw({ law, form, line }: Pick<LineOfLaw, 'law' | 'form' | 'line'>): boolean {
  const terms = line.terms === 2 && form.inSlope.length > 0 && form.inIntercept.length > 0;
  return terms && law.unknown.length === 2 && law.known.length === 0 && form.trials.length === 0;
}

/** True when the vertical axis is the response itself and the horizontal one free of it. */
export function onOwnAxis({ law, form }: Pick<LineOfLaw, 'law' | 'form'>): boolean {
  const { expression } = form.vertical;
  return !form.responseOnBothAxes && expression.kind === 'symbol' && expression.name === law.response;
}

function pieces({ law, form, line, values }: Fit): Omit<LineOfLaw, 'x'> {
  return { law, form, line, values };
}
