/** A function of one variable, NaN where it does not exist. */
type Curve = (x: number) => number;

/**
 * A point between two of different sign where a continuous function crosses zero, to the last digit.
 * @returns null when the sign changes at a pole or a gap
 */
export function bisect(f: Curve, from: number, to: number): number | null {
  let [a, b] = [from, to];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(Math.sign(fa) * Math.sign(fb) < 0)) return null;
  const atEnds = Math.min(Math.abs(fa), Math.abs(fb));
  for (let count = 0; count < 1200; count++) {
    // Secant in the middle half, bisection otherwise: safe and quick.
    const secant = a - (fa * (b - a)) / (fb - fa);
    const middle = a + (b - a) / 2;
    const near =
      Number.isFinite(secant) && Math.abs(secant - middle) < Math.abs(b - a) / 4 && count % 3 !== 2;
    const x = near ? secant : middle;
    if (x === a || x === b) break;
    const fx = f(x);
    if (Number.isNaN(fx)) return null;
    if (fx === 0) return x;
    if (Math.sign(fx) === Math.sign(fa)) [a, fa] = [x, fx];
    else [b, fb] = [x, fx];
  }
  const [x, left] = Math.abs(fa) <= Math.abs(fb) ? [a, Math.abs(fa)] : [b, Math.abs(fb)];
  return left <= atEnds ? x : null;
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
      const found = bisect(f, previous.x, x);
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
    if (value >= 0) return bisect(f, x, next);
    x = next;
    if (!narrowing) length *= 1.5;
  }
  return null;
}
