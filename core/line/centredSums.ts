/**
 * Sums of readings about their weighted means, or about a point at horizontal 0, in units (powers of two) that keep
 * every square within the range of numbers.
 */
export interface CentredSums {
  /** The point that sums are taken about: the means, or 0 and the held intercept. */
  readonly origin: { readonly horizontal: number; readonly vertical: number };
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
  const unitWeight = lineWeight === null ? 1 : powerOfTwo(greatest(lineWeight, 0));
  const origin =
    held === null ? means(horizontal, vertical, lineWeight, unitWeight) : { horizontal: 0, vertical: held };
  const unitX = powerOfTwo(greatest(horizontal, origin.horizontal));
  const unitY = powerOfTwo(greatest(vertical, origin.vertical));
  let total = 0;
  let sumX = 0;
  let sumY = 0;
  let squaresX = 0;
  let squaresY = 0;
  let products = 0;
  let rawSquaresY = 0;
  for (let i = 0; i < n; i++) {
    // i < n throughout.
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) / unitWeight;
    const dx = ((horizontal[i] as number) - origin.horizontal) / unitX;
    const dy = ((vertical[i] as number) - origin.vertical) / unitY;
    const wx = w * dx;
    total += w;
    sumX += wx;
    sumY += w * dy;
    squaresX += wx * dx;
    squaresY += w * dy * dy;
    products += wx * dy;
    if (held !== null) {
      const y = (vertical[i] as number) / unitY;
      rawSquaresY += w * y * y;
    }
  }
  if (held === null) {
    // What rounding left of the sums about the means.
    squaresX -= (sumX * sumX) / total;
    squaresY -= (sumY * sumY) / total;
    products -= (sumX * sumY) / total;
    origin.horizontal += (sumX / total) * unitX;
    origin.vertical += (sumY / total) * unitY;
  }
  const first = products / squaresX;
  const refined = residualSums(horizontal, vertical, lineWeight, origin, [unitX, unitY, unitWeight], first);
  const slope = first + refined.products / squaresX;
  const corrected = residualSums(horizontal, vertical, lineWeight, origin, [unitX, unitY, unitWeight], slope);
  return {
    origin,
    unitX,
    unitY,
    unitWeight,
    total,
    mean: held === null ? 0 : sumX / total,
    horizontalSquares: squaresX,
    verticalSquares: held === null ? squaresY : rawSquaresY,
    residualSquares: corrected.squares,
    slope,
  };
}

/** Σw dx r and Σw r² of the residuals of a slope about the origin. */
function residualSums(
  horizontal: Float64Array,
  vertical: Float64Array,
  lineWeight: Float64Array | null,
  origin: { readonly horizontal: number; readonly vertical: number },
  [unitX, unitY, unitWeight]: readonly [number, number, number],
  slope: number,
): { readonly products: number; readonly squares: number } {
  let products = 0;
  let squares = 0;
  for (let i = 0; i < horizontal.length; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) / unitWeight;
    const dx = ((horizontal[i] as number) - origin.horizontal) / unitX;
    const residual = ((vertical[i] as number) - origin.vertical) / unitY - slope * dx;
    products += w * dx * residual;
    squares += w * residual * residual;
  }
  return { products, squares };
}

function means(
  horizontal: Float64Array,
  vertical: Float64Array,
  lineWeight: Float64Array | null,
  unitWeight: number,
): { horizontal: number; vertical: number } {
  const x0 = horizontal[0] ?? 0;
  const y0 = vertical[0] ?? 0;
  let total = 0;
  let sumX = 0;
  let sumY = 0;
  for (let i = 0; i < horizontal.length; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) / unitWeight;
    total += w;
    sumX += w * ((horizontal[i] as number) - x0);
    sumY += w * ((vertical[i] as number) - y0);
  }
  return { horizontal: x0 + sumX / total, vertical: y0 + sumY / total };
}

/** The greatest distance of a column from a value. */
function greatest(column: Float64Array, from: number): number {
  let most = 0;
  for (let i = 0; i < column.length; i++) {
    const distance = Math.abs((column[i] as number) - from);
    if (distance > most) most = distance;
  }
  return most;
}

/** The power of two at or below a size; 1 for 0. */
function powerOfTwo(size: number): number {
  return size > 0 ? 2 ** Math.max(-1022, Math.floor(Math.log2(size))) : 1;
}
