import type { Spread } from '../given/given.ts';
import type { Scale } from '../line/line.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';

/** Whether a spread states uncertainties, or leaves the scale to be estimated from the scatter. */
export function scaleOf(spread: Spread): Scale {
  return spread.kind === 'absolute' || spread.kind === 'relative' || spread.kind === 'each'
    ? 'known'
    : 'estimated';
}

/**
 * Standard deviation of each reading by a spread, up to a common factor when the scale is estimated:
 * 1 (`none`, `equal`), |y| (`proportional`) or the stated uncertainty.
 * @param values the readings in the direction of the spread, n
 * @param position 1-based position of each among the input cells, n
 * @throws Problem `domain` when a reading of y = 0 makes a proportional uncertainty vanish
 */
export function spreadOf(
  spread: Spread,
  values: Float64Array,
  position: ArrayLike<number>,
  argument: 'u_y' | 'u_x',
): Float64Array {
  const deviations = new Float64Array(values.length);
  for (let i = 0; i < values.length; i++) {
    const deviation = spreadAt(spread, values[i] ?? Number.NaN, position[i] ?? 0);
    // A reading may be exact in x; in y its weight would be infinite.
    if (deviation === 0 && argument === 'u_y') {
      const at = position[i] ?? 0;
      throw new Problem('domain', argument, fitWords.zeroSpread(at, argument), { position: at });
    }
    deviations[i] = deviation;
  }
  return deviations;
}

/** Standard deviation of one reading of the given value; NaN where the spread has none for it. */
export function spreadAt(spread: Spread, value: number, position: number): number {
  switch (spread.kind) {
    case 'none':
    case 'equal':
      return 1;
    case 'proportional':
      return Math.abs(value);
    case 'absolute':
      return spread.value;
    case 'relative':
      return spread.fraction * Math.abs(value);
    case 'each':
      return spread.values[position - 1] ?? Number.NaN;
  }
}
