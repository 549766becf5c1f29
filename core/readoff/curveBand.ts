import type { Fit } from '../fit/fit.ts';
import { Problem } from '../problem.ts';
import { responseAt } from './responseAt.ts';

/** A fitted curve with its coverage band, to draw; NaN where the curve or an end of the band does not exist. */
export interface CurveBand {
  readonly fitted: Float64Array;
  readonly low: Float64Array;
  readonly high: Float64Array;
}

/** The response and its coverage interval at every one of `xs`. */
export function curveBand(fit: Fit, xs: Float64Array): CurveBand {
  const fitted = new Float64Array(xs.length).fill(Number.NaN);
  const low = fitted.slice();
  const high = fitted.slice();
  xs.forEach((x, i) => {
    try {
      const read = responseAt(fit, x);
      fitted[i] = read.value;
      low[i] = read.low;
      high[i] = read.high;
    } catch (error) {
      // A gap in the drawing: the curve has no value here.
      if (!(error instanceof Problem && error.code === 'undefined')) throw error;
    }
  });
  return { fitted, low, high };
}
