/** A line by least squares without any rounding: every number is a ratio of whole numbers. */
export interface ExactLine {
  readonly slope: Ratio;
  readonly intercept: Ratio;
  /** Squares of the standard uncertainties, scale estimated from the scatter with n − 2 degrees of freedom. */
  readonly varianceSlope: Ratio;
  readonly varianceIntercept: Ratio;
}

export interface Ratio {
  readonly over: bigint;
  readonly under: bigint;
}

/**
 * The textbook sums in whole numbers: a reading is a whole number of some power of two, so nothing is rounded.
 * @see any textbook of statistics: slope = (nΣxy − ΣxΣy)/(nΣx² − (Σx)²)
 */
export function exactLine(x: readonly number[], y: readonly number[]): ExactLine {
  const n = BigInt(x.length);
  const [wholeX, unitX] = wholeNumbers(x);
  const [wholeY, unitY] = wholeNumbers(y);
  const sum = (values: readonly bigint[]): bigint => values.reduce((total, value) => total + value, 0n);
  const products = (a: readonly bigint[], b: readonly bigint[]): bigint =>
    sum(a.map((value, i) => value * (b[i] ?? 0n)));
  const sx = sum(wholeX);
  const sy = sum(wholeY);
  const squares = products(wholeX, wholeX);
  const sxx = n * squares - sx * sx;
  const sxy = n * products(wholeX, wholeY) - sx * sy;
  const syy = n * products(wholeY, wholeY) - sy * sy;
  // Residual sum of squares is (syy − sxy²/sxx)/n.
  const residual = { over: syy * sxx - sxy * sxy, under: n * sxx * (n - 2n) };
  return {
    slope: scaled({ over: sxy, under: sxx }, unitY - unitX),
    intercept: scaled({ over: sy * sxx - sxy * sx, under: n * sxx }, unitY),
    varianceSlope: scaled({ over: residual.over * n, under: residual.under * sxx }, 2 * (unitY - unitX)),
    varianceIntercept: scaled({ over: residual.over * squares, under: residual.under * sxx }, 2 * unitY),
  };
}

/** Values as whole multiples of one power of two, and its exponent. */
function wholeNumbers(values: readonly number[]): readonly [readonly bigint[], number] {
  const unit = Math.min(...values.filter((value) => value !== 0).map(lowestBit));
  return [values.map((value) => whole(value, unit)), unit];
}

/** Exponent of a power of two of which a value is a whole multiple. */
function lowestBit(value: number): number {
  return Math.max(-1074, Math.floor(Math.log2(Math.abs(value))) - 54);
}

function whole(value: number, unit: number): bigint {
  // Two steps, for 2^1074 is no number.
  const half = Math.trunc(-unit / 2);
  let [multiple, left] = [value, -unit];
  let factor = 1n;
  while (!Number.isSafeInteger(multiple) && left > 0) {
    const step = Math.min(left, Math.max(1, Math.min(half, 50)));
    multiple *= 2 ** step;
    left -= step;
    if (Math.abs(multiple) > Number.MAX_SAFE_INTEGER) break;
  }
  if (!Number.isInteger(multiple)) throw new Error(`${value} is no whole multiple of 2^${unit}`);
  if (left > 0) factor = 2n ** BigInt(left);
  return left >= 0 ? BigInt(multiple) * factor : BigInt(multiple) / 2n ** BigInt(-left);
}

function scaled({ over, under }: Ratio, exponent: number): Ratio {
  return exponent >= 0
    ? { over: over * 2n ** BigInt(exponent), under }
    : { over, under: under * 2n ** BigInt(-exponent) };
}

/** A ratio as a decimal text with 25 significant digits. */
export function decimalText({ over, under }: Ratio): string {
  const negative = over < 0n !== under < 0n;
  const top = over < 0n ? -over : over;
  const bottom = under < 0n ? -under : under;
  if (top === 0n) return '0';
  const magnitude = top.toString().length - bottom.toString().length;
  const shift = 26 - magnitude;
  const digits = shift >= 0 ? (top * 10n ** BigInt(shift)) / bottom : top / (bottom * 10n ** BigInt(-shift));
  return `${negative ? '-' : ''}${digits}e${-shift}`;
}

/** The square root of a ratio as a decimal text with about 25 significant digits. */
export function rootText({ over, under }: Ratio): string {
  const top = over < 0n ? -over : over;
  const bottom = under < 0n ? -under : under;
  let shift = 52 - (top.toString().length - bottom.toString().length);
  if (shift % 2 !== 0) shift++;
  const square = shift >= 0 ? (top * 10n ** BigInt(shift)) / bottom : top / (bottom * 10n ** BigInt(-shift));
  return `${wholeRoot(square)}e${-shift / 2}`;
}

/** The whole part of a square root, by Newton's iteration from above. */
function wholeRoot(value: bigint): bigint {
  if (value < 2n) return value;
  let root = 2n ** BigInt(Math.ceil(value.toString(2).length / 2));
  for (;;) {
    const next = (root + value / root) / 2n;
    if (next >= root) return root;
    root = next;
  }
}
