/** A function of one variable, NaN where it does not exist. */
type Curve = (x: number) => number;

/**
 * A point between two of different sign where a continuous function crosses zero, to the last digit.
 * @returns null when the sign changes at a pole or a gap
 * @see Brent (1973), Algorithms for Minimization without Derivatives, chapter 4
 */
export function crossingBetween(f: Curve, from: number, to: number): number | null {
  // The crossing lies between b, the best point so far, and c; a is the point before b.
  let [a, b] = [from, to];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(Math.sign(fa) * Math.sign(fb) < 0)) return null;
  const atEnds = Math.min(Math.abs(fa), Math.abs(fb));
  let [c, fc] = [a, fa];
  let step = b - a;
  let stepBefore = step;
  for (let count = 0; count < 1200; count++) {
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const half = (c - b) / 2;
    const digit = Number.EPSILON * Math.abs(b);
    if (fb === 0 || Math.abs(half) <= digit) break;
    let next = Number.NaN;
    if (Math.abs(stepBefore) >= digit && Math.abs(fa) > Math.abs(fb))
      next = interpolated(a, b, c, fa, fb, fc);
    // An interpolated step must stay inside and be shrinking; otherwise half the way is taken.
    const shrinks = 2 * Math.abs(next) < Math.min(3 * Math.abs(half) - digit, Math.abs(stepBefore));
    const inside = Math.sign(next) === Math.sign(half);
    [stepBefore, step] = shrinks && inside ? [step, next] : [half, half];
    [a, fa] = [b, fb];
    b += Math.abs(step) > digit ? step : Math.sign(half) * digit;
    // Where a digit is less than numbers can tell apart.
    if (b === a) break;
    fb = f(b);
    if (Number.isNaN(fb)) return null;
    if (Math.sign(fb) === Math.sign(fc)) {
      [c, fc] = [a, fa];
      step = b - a;
      stepBefore = step;
    }
  }
  const [x, left] = Math.abs(fb) <= Math.abs(fc) ? [b, Math.abs(fb)] : [c, Math.abs(fc)];
  return left <= atEnds ? x : null;
}

/** The step from b to where the secant, or the inverse parabola through three points, crosses zero. */
function interpolated(a: number, b: number, c: number, fa: number, fb: number, fc: number): number {
  const s = fb / fa;
  if (a === c) return (s * (c - b)) / (s - 1);
  const q = fa / fc;
  const r = fb / fc;
  const p = s * ((c - b) * q * (q - r) - (b - a) * (r - 1));
  return -p / ((q - 1) * (r - 1) * (s - 1));
}

/**
 * Points at which to look for a crossing, outwards from a range of readings: between them, then further and further
 * away, by growing steps and, on the side of zero, by growing factors.
 */
export function outward(from: number, to: number, side: 'below' | 'above'): number[] {
  const span = to - from || Math.abs(from) || 1;
  const edge = side === 'below' ? from : to;
  const sign = side === 'below' ? -1 : 1;
  const points = Array.from({ length: 60 }, (_, i) => edge + (sign * span * 1.5 ** i) / 32);
  // A range on one side of zero may go on towards zero for ever.
  const towardsZero = edge !== 0 && Math.sign(edge) !== sign;
  if (towardsZero) {
    const inner = Array.from({ length: 120 }, (_, i) => edge / 1.3 ** (i + 1));
    points.push(...inner);
  }
  return points.sort((p, q) => sign * (p - q));
}

/**
 * The crossing of zero nearest to a range, looked for inside it and then outwards on both sides.
 * @param inside sorted points in the range at which to look first
 */
export function crossingNear(f: Curve, inside: readonly number[]): number | null {
  const [first = 0] = inside;
  const last = inside[inside.length - 1] ?? first;
  const within = crossingAlong(f, inside, true);
  if (within !== null) return within;
  const above = crossingAlong(f, [last, ...outward(first, last, 'above')]);
  const below = crossingAlong(f, [first, ...outward(first, last, 'below')]);
  if (above === null || below === null) return above ?? below;
  return above - last <= first - below ? above : below;
}

/**
 * The first crossing of zero along a walk. A walk ends at a pole and where the function ceases to exist: what lies
 * beyond is another branch than that of the readings.
 * @param beyondGaps go on after a point where the function does not exist
 */
export function crossingAlong(f: Curve, walk: readonly number[], beyondGaps = false): number | null {
  let previous: { readonly x: number; readonly value: number } | null = null;
  for (const x of walk) {
    const value = f(x);
    if (value === 0) return x;
    if (Number.isNaN(value)) {
      if (previous !== null && !beyondGaps) return null;
      previous = null;
      continue;
    }
    if (previous !== null && Math.sign(previous.value) !== Math.sign(value)) {
      const found = crossingBetween(f, previous.x, x);
      if (found !== null) return found;
      if (!beyondGaps) return null;
    }
    previous = { x, value };
  }
  return null;
}

/**
 * The first point, going from `start` in one direction, at which a function that is negative there becomes zero.
 * @param step length of the first step, with its direction as sign
 * @returns null when it stays negative to the end of the function's domain, or for ever
 */
export function leavingAt(f: Curve, start: number, step: number): number | null {
  let x = start;
  let length = step;
  let narrowing = false;
  for (let count = 0; count < 600; count++) {
    const next = x + length;
    if (!Number.isFinite(next)) return null;
    const value = f(next);
    if (Number.isNaN(value)) {
      narrowing = true;
      length /= 2;
      if (x + length === x) return null;
      continue;
    }
    if (value >= 0) return crossingBetween(f, x, next);
    x = next;
    if (!narrowing) length *= 1.5;
  }
  return null;
}
