/**
 * Sums of readings about their weighted means, or about a point at horizontal 0, in units (powers of two) that keep
 * every square within the range of numbers.
 */
export interface CentredSums {
  /** The point that sums are taken about: the means as numbers hold them, or 0 and the held intercept. */
  readonly origin: { readonly horizontal: number; readonly vertical: number };
  /** What the means are beyond the origin: far from zero it is more than the last digit of the residuals. */
  readonly beyond: { readonly horizontal: number; readonly vertical: number };
  readonly unitX: number;
  readonly unitY: number;
  readonly unitWeight: number;
  /** Σw in units of unitWeight. */
  readonly total: number;
  /** Weighted mean of the horizontal distance from the origin, in units of unitX: 0 about the means. */
  readonly mean: number;
  /** Σw dx², Σw dy² and Σw r², in units of the above. */
  readonly horizontalSquares: number;
  readonly verticalSquares: number;
  readonly residualSquares: number;
  /** Slope in units of unitY / unitX. */
  readonly slope: number;
}

/**
 * @param lineWeight weights above 0, or null for equal ones
 * @param held vertical value at horizontal 0 that the line must pass through, or null for a free line
 */
export function centredSums(
  horizontal: Float64Array,
  vertical: Float64Array,
  lineWeight: Float64Array | null,
  held: number | null,
): CentredSums {
  const n = horizontal.length;
  const weight = lineWeight ?? ones(n);
  const unitWeight = lineWeight === null ? 1 : powerOfTwo(greatest(lineWeight));
  const columns = { horizontal, vertical, weight, perWeight: 1 / unitWeight };
  const origin = held === null ? means(columns) : { horizontal: 0, vertical: held };
  const unitX = powerOfTwo(farthest(horizontal, origin.horizontal));
  const unitY = powerOfTwo(farthest(vertical, origin.vertical));
  const frame = { origin, perX: 1 / unitX, perY: 1 / unitY };
  const sums = summed(n, 6, (into, from, to) => addMoments(columns, frame, into, from, to));
  const [total, sumX, sumY] = [sums[0] ?? 0, sums[1] ?? 0, sums[2] ?? 0];
  let [squaresX, squaresY, products] = [sums[3] ?? 0, sums[4] ?? 0, sums[5] ?? 0];
  if (held === null) {
    // What rounding left of the sums about the means.
    squaresX -= (sumX * sumX) / total;
    squaresY -= (sumY * sumY) / total;
    products -= (sumX * sumY) / total;
  } else {
    const zero = { horizontal: 0, vertical: 0 };
    const about = { ...frame, origin: zero };
    squaresY = summed(n, 6, (into, from, to) => addMoments(columns, about, into, from, to))[4] ?? 0;
  }
  const first = products / squaresX;
  const [beyondX, beyondY] = held === null ? [sumX / total, sumY / total] : [0, 0];
  const level = beyondY - first * beyondX;
  const left = summed(n, 2, (into, from, to) =>
    addResiduals(columns, frame, { slope: first, level }, into, from, to),
  );
  const [leftProducts, leftSquares] = [left[0] ?? 0, left[1] ?? 0];
  // One step of refinement for the last digits of the slope, and what it takes off the squares.
  const correction = leftProducts / squaresX;
  return {
    origin,
    beyond: { horizontal: beyondX * unitX, vertical: beyondY * unitY },
    unitX,
    unitY,
    unitWeight,
    total,
    mean: held === null ? 0 : sumX / total,
    horizontalSquares: squaresX,
    verticalSquares: squaresY,
    residualSquares: Math.max(0, leftSquares - correction * leftProducts),
    slope: first + correction,
  };
}

interface Columns {
  readonly horizontal: Float64Array;
  readonly vertical: Float64Array;
  readonly weight: Float64Array;
  /** Reciprocals of units are exact: units are powers of two. */
  readonly perWeight: number;
}

interface Frame {
  readonly origin: { readonly horizontal: number; readonly vertical: number };
  readonly perX: number;
  readonly perY: number;
}

/** Rows summed at a time: a short loop that runs often is what an engine turns into fast code first. */
const CHUNK = 2048;

/** Sums under way; whoever asks for sums reads them before the next are asked for. */
const scratch = new Float64Array(6);

function summed(
  n: number,
  count: number,
  add: (into: Float64Array, from: number, to: number) => void,
): Float64Array {
  const sums = scratch.fill(0, 0, count);
  for (let from = 0; from < n; from += CHUNK) add(sums, from, Math.min(n, from + CHUNK));
  return sums;
}

/** Adds Σw, Σw dx, Σw dy, Σw dx², Σw dy² and Σw dx dy of some rows. */
function addMoments(
  { horizontal, vertical, weight, perWeight }: Columns,
  { origin, perX, perY }: Frame,
  into: Float64Array,
  from: number,
  to: number,
): void {
  const { horizontal: x0, vertical: y0 } = origin;
  let [total, sumX, sumY, squaresX, squaresY, products] = [0, 0, 0, 0, 0, 0];
  for (let i = from; i < to; i++) {
    // from ≤ i < to ≤ n
    const w = (weight[i] as number) * perWeight;
    const dx = ((horizontal[i] as number) - x0) * perX;
    const dy = ((vertical[i] as number) - y0) * perY;
    const wx = w * dx;
    total += w;
    sumX += wx;
    sumY += w * dy;
    squaresX += wx * dx;
    squaresY += w * dy * dy;
    products += wx * dy;
  }
  into[0] = (into[0] ?? 0) + total;
  into[1] = (into[1] ?? 0) + sumX;
  into[2] = (into[2] ?? 0) + sumY;
  into[3] = (into[3] ?? 0) + squaresX;
  into[4] = (into[4] ?? 0) + squaresY;
  into[5] = (into[5] ?? 0) + products;
}

/** Adds Σw dx r and Σw r² of the residuals of a line that passes the origin at a level. */
function addResiduals(
  { horizontal, vertical, weight, perWeight }: Columns,
  { origin, perX, perY }: Frame,
  { slope, level }: { readonly slope: number; readonly level: number },
  into: Float64Array,
  from: number,
  to: number,
): void {
  const { horizontal: x0, vertical: y0 } = origin;
  let [products, squares] = [0, 0];
  for (let i = from; i < to; i++) {
    const w = (weight[i] as number) * perWeight;
    const dx = ((horizontal[i] as number) - x0) * perX;
    const residual = ((vertical[i] as number) - y0) * perY - slope * dx - level;
    products += w * dx * residual;
    squares += w * residual * residual;
  }
  into[0] = (into[0] ?? 0) + products;
  into[1] = (into[1] ?? 0) + squares;
}

/** Weighted means of both columns. */
function means(columns: Columns): { horizontal: number; vertical: number } {
  const { horizontal, vertical } = columns;
  const first = { horizontal: horizontal[0] ?? 0, vertical: vertical[0] ?? 0 };
  const frame = { origin: first, perX: 1, perY: 1 };
  const sums = summed(horizontal.length, 3, (into, from, to) =>
    addFirstMoments(columns, frame, into, from, to),
  );
  const total = sums[0] ?? 1;
  return {
    horizontal: first.horizontal + (sums[1] ?? 0) / total,
    vertical: first.vertical + (sums[2] ?? 0) / total,
  };
}

function addFirstMoments(
  { horizontal, vertical, weight, perWeight }: Columns,
  { origin }: Frame,
  into: Float64Array,
  from: number,
  to: number,
): void {
  const { horizontal: x0, vertical: y0 } = origin;
  let [total, sumX, sumY] = [0, 0, 0];
  for (let i = from; i < to; i++) {
    const w = (weight[i] as number) * perWeight;
    total += w;
    sumX += w * ((horizontal[i] as number) - x0);
    sumY += w * ((vertical[i] as number) - y0);
  }
  into[0] = (into[0] ?? 0) + total;
  into[1] = (into[1] ?? 0) + sumX;
  into[2] = (into[2] ?? 0) + sumY;
}

/** Weights of 1, at least n of them; all columns share them. */
function ones(n: number): Float64Array {
  if (n > sharedOnes.length) sharedOnes = new Float64Array(n).fill(1);
  return sharedOnes;
}

let sharedOnes = new Float64Array(4096).fill(1);

/** The greatest of a column of values above 0. */
function greatest(column: Float64Array): number {
  return farthest(column, 0);
}

/** The greatest distance of a column from a value. */
function farthest(column: Float64Array, origin: number): number {
  let most = 0;
  for (let from = 0; from < column.length; from += CHUNK) {
    most = Math.max(most, farthestOf(column, origin, from, Math.min(column.length, from + CHUNK)));
  }
  return most;
}

function farthestOf(column: Float64Array, origin: number, from: number, to: number): number {
  let most = 0;
  for (let i = from; i < to; i++) {
    const distance = Math.abs((column[i] as number) - origin);
    if (distance > most) most = distance;
  }
  return most;
}

/** The power of two at or below a size; 1 for 0. */
function powerOfTwo(size: number): number {
  return size > 0 ? 2 ** Math.max(-1022, Math.floor(Math.log2(size))) : 1;
}
