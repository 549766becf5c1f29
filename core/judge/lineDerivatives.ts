import { type ConstantsFromLine, constantsFromLine } from '../constants/fromLine.ts';
import type { Fit } from '../fit/fit.ts';
import { fitTask } from '../fit/fitTask.ts';

/**
 * How the constants of a fit follow from the slope and the intercept of its line.
 * @returns null when the constants come from the direct fit
 */
export function lineDerivatives(fit: Fit): ConstantsFromLine | null {
  if (fit.direct !== null) return null;
  const { law, readings, used, settings, axes, lineFromReadings, values } = fit;
  const task = fitTask(law, readings, used, settings);
  const drawn = { task, used, outside: new Int32Array(0), axes, line: lineFromReadings };
  return constantsFromLine(drawn, values, values);
}
