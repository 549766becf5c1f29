import { pick } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { rangeOf } from '../line/rangeOf.ts';

/** The range of the readings of a fit that a value lies outside of, where nothing supports the law; null within it. */
export function beyondReadings(
  { readings, taking }: Fit,
  of: 'x' | 'y',
  value: number,
): { readonly low: number; readonly high: number } | null {
  const [low, high] = rangeOf(pick(readings[of], taking));
  return value < low || value > high ? { low, high } : null;
}
