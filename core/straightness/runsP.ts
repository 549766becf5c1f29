import { logGamma } from '../distributions/logGamma.ts';
import { isAscending } from '../line/ascending.ts';

/**
 * Probability of as few or fewer runs of residual signs, in order of the horizontal axis, given how many are above and
 * below the line. Residuals of exactly 0 are left out; with all on one side there is nothing to test (NaN).
 * @param horizontal n values
 * @param residual n values
 * @see Wald & Wolfowitz (1940), Ann. Math. Statist. 11, 147
 */
export function runsP(horizontal: Float64Array, residual: Float64Array): number {
  const order = new Uint32Array(horizontal.length).map((_, i) => i);
  const sorted = isAscending(horizontal)
    ? order
    : order.sort((i, j) => (horizontal[i] ?? 0) - (horizontal[j] ?? 0) || i - j);
  let above = 0;
  let below = 0;
  let runs = 0;
  let previous = 0;
  for (const i of sorted) {
    const sign = Math.sign(residual[i] ?? 0);
    if (sign === 0) continue;
    if (sign > 0) above++;
    else below++;
    if (sign !== previous) runs++;
    previous = sign;
  }
  return probabilityOfRuns(above, below, runs);
}

/** Probability of `runs` or fewer runs among `above` and `below` signs in random order. */
export function probabilityOfRuns(above: number, below: number, runs: number): number {
  if (above === 0 || below === 0) return Number.NaN;
  const all = logChoose(above + below, above);
  // Numbers of runs grow likelier up to their mean: below it, what no longer shows in the sum ends it.
  const mean = 1 + (2 * above * below) / (above + below);
  let probability = 0;
  for (let count = runs; count >= 2; count--) {
    const half = Math.floor(count / 2);
    const ways =
      count % 2 === 0
        ? 2 * term(above - 1, half - 1, below - 1, half - 1, all)
        : term(above - 1, half, below - 1, half - 1, all) + term(above - 1, half - 1, below - 1, half, all);
    probability += ways;
    if (count < mean && ways < 1e-18 * probability) break;
  }
  return Math.min(1, probability);
}

function term(n: number, k: number, m: number, j: number, all: number): number {
  if (k > n || j > m) return 0;
  return Math.exp(logChoose(n, k) + logChoose(m, j) - all);
}

function logChoose(n: number, k: number): number {
  if (k === 0 || k === n) return 0;
  return logGamma(n + 1) - logGamma(k + 1) - logGamma(n - k + 1);
}
