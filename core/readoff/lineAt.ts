import type { Line } from '../line/line.ts';

/** Value of a line at a horizontal value. */
export function lineAt(
  line: { readonly slope: number; readonly intercept: number },
  horizontal: number,
): number {
  return line.intercept + line.slope * horizontal;
}

/** Variance of the line's value at a horizontal value, from the readings; NaN without degrees of freedom. */
export function lineVarianceAt(line: Line, horizontal: number): number {
  if (line.terms === 1) return horizontal * horizontal * line.varianceSlope;
  return line.varianceIntercept + horizontal * (2 * line.covariance + horizontal * line.varianceSlope);
}
