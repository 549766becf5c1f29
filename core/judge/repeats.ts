import { fTail } from '../distributions/tails.ts';
import { ascendingDistinct } from '../line/ascending.ts';
import type { Line } from '../line/line.ts';

/** A line against readings repeated at the same place. */
export interface RepeatsTest {
  /** Distinct horizontal values. */
  readonly groups: number;
  readonly f: number;
  readonly p: number;
  /** Standard deviation of repeats about their means (of weight 1), and its degrees of freedom. */
  readonly pureErrorDeviation: number;
  readonly pureErrorFreedom: number;
}

/**
 * Lack of fit against repeats: F of what the line leaves between group means to what repeats leave within them.
 * Null unless some horizontal value repeats exactly and there are more groups than line terms.
 * @param horizontal n values
 * @param vertical n values
 * @see Draper & Smith (1998), Applied Regression Analysis, 3rd ed., section 2.1
 */
export function repeatsTest(
  line: Line,
  horizontal: Float64Array,
  vertical: Float64Array,
): RepeatsTest | null {
  const { lineWeight, weightedSumOfSquares, terms } = line;
  const n = horizontal.length;
  const distinct = ascendingDistinct(horizontal.slice()).length;
  const pureErrorFreedom = n - distinct;
  const lackFreedom = distinct - terms;
  if (pureErrorFreedom < 1 || lackFreedom < 1) return null;
  const groups = new Map<number, number[]>();
  horizontal.forEach((x, i) => {
    const group = groups.get(x);
    if (group === undefined) groups.set(x, [i]);
    else group.push(i);
  });
  let pureError = 0;
  for (const group of groups.values()) {
    const first = vertical[group[0] ?? 0] ?? 0;
    let [total, sum] = [0, 0];
    for (const i of group) {
      total += lineWeight[i] ?? 0;
      sum += (lineWeight[i] ?? 0) * ((vertical[i] ?? 0) - first);
    }
    const mean = first + sum / total;
    for (const i of group) pureError += (lineWeight[i] ?? 0) * ((vertical[i] ?? 0) - mean) ** 2;
  }
  const lackOfFit = Math.max(0, weightedSumOfSquares - pureError);
  const f = lackOfFit / lackFreedom / (pureError / pureErrorFreedom);
  return {
    groups: distinct,
    f,
    p: fTail(f, lackFreedom, pureErrorFreedom),
    pureErrorDeviation: Math.sqrt(pureError / pureErrorFreedom),
    pureErrorFreedom,
  };
}
