import type { Line } from '../line/line.ts';

/** Leverage from which a reading is on the line by itself. */
const ALONE = 1 - 1e-12;

/**
 * Internally studentised residuals r √w / (s √(1 − h)); NaN where the line passes through a reading by force.
 * @see Cook & Weisberg (1982), Residuals and Influence in Regression, equation 2.1.1
 */
export function standardisedResiduals(line: Line): Float64Array {
  const { residual, lineWeight, leverage, residualStandardDeviation } = line;
  return residual.map((r, i) => {
    const h = leverage[i] ?? 0;
    return h >= ALONE
      ? Number.NaN
      : (r * Math.sqrt(lineWeight[i] ?? 0)) / (residualStandardDeviation * Math.sqrt(1 - h));
  });
}

/**
 * Cook's distance of each reading.
 * @param standardised the line's, where they are at hand
 * @see Cook (1977), Detection of influential observation in linear regression, Technometrics 19, 15
 */
export function cooksDistance(line: Line, standardised = standardisedResiduals(line)): Float64Array {
  const { leverage, terms } = line;
  return standardised.map((value, i) => {
    const h = leverage[i] ?? 0;
    return (value * value * h) / ((1 - h) * terms);
  });
}

/**
 * The vertical value that the line without each reading has at that reading, Y − r/(1 − h).
 * @param vertical n values
 */
export function leaveOneOut(line: Line, vertical: Float64Array): Float64Array {
  const { residual, leverage } = line;
  return residual.map((r, i) => {
    const h = leverage[i] ?? 0;
    return h >= ALONE ? Number.NaN : (vertical[i] ?? Number.NaN) - r / (1 - h);
  });
}
