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
  const unitWeight = lineWeight === null ? 1 : powerOfTwo(greatest(lineWeight));
  const place = placeOf(horizontal, vertical, lineWeight, 1 / unitWeight);
  const origin =
    held === null
      ? { horizontal: place.meanX, vertical: place.meanY }
      : { horizontal: 0, vertical: held };
  const unitX = powerOfTwo(distance(place.leastX, place.mostX, origin.horizontal));
  const unitY = powerOfTwo(distance(place.leastY, place.mostY, origin.vertical));
  // Reciprocals of powers of two are exact.
  const [perX, perY, perWeight] = [1 / unitX, 1 / unitY, 1 / unitWeight];
  const [x0, y0] = [origin.horizontal, origin.vertical];
  let total = 0;
  let sumX = 0;
  let sumY = 0;
  let squaresX = 0;
  let squaresY = 0;
  let products = 0;
  for (let i = 0; i < n; i++) {
    // i < n throughout.
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) * perWeight;
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
  if (held === null) {
    // What rounding left of the sums about the means.
    squaresX -= (sumX * sumX) / total;
    squaresY -= (sumY * sumY) / total;
    products -= (sumX * sumY) / total;
    origin.horizontal += (sumX / total) * unitX;
    origin.vertical += (sumY / total) * unitY;
  } else {
    squaresY = squaresAboutZero(vertical, lineWeight, perY, perWeight);
  }
  const first = products / squaresX;
  const [x1, y1] = [origin.horizontal, origin.vertical];
  let leftProducts = 0;
  let leftSquares = 0;
  for (let i = 0; i < n; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) * perWeight;
    const dx = ((horizontal[i] as number) - x1) * perX;
    const residual = ((vertical[i] as number) - y1) * perY - first * dx;
    leftProducts += w * dx * residual;
    leftSquares += w * residual * residual;
  }
  // One step of refinement for the last digits of the slope, and what it takes off the squares.
  const correction = leftProducts / squaresX;
  return {
    origin,
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

interface Place {
  readonly meanX: number;
  readonly meanY: number;
  readonly leastX: number;
  readonly mostX: number;
  readonly leastY: number;
  readonly mostY: number;
}

/** Weighted means, and where the readings begin and end. */
function placeOf(
  horizontal: Float64Array,
  vertical: Float64Array,
  lineWeight: Float64Array | null,
  perWeight: number,
): Place {
  const x0 = horizontal[0] ?? 0;
  const y0 = vertical[0] ?? 0;
  let [leastX, mostX, leastY, mostY] = [x0, x0, y0, y0];
  let total = 0;
  let sumX = 0;
  let sumY = 0;
  for (let i = 0; i < horizontal.length; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) * perWeight;
    const x = horizontal[i] as number;
    const y = vertical[i] as number;
    total += w;
    sumX += w * (x - x0);
    sumY += w * (y - y0);
    if (x < leastX) leastX = x;
    else if (x > mostX) mostX = x;
    if (y < leastY) leastY = y;
    else if (y > mostY) mostY = y;
  }
  return { meanX: x0 + sumX / total, meanY: y0 + sumY / total, leastX, mostX, leastY, mostY };
}

function squaresAboutZero(
  column: Float64Array,
  lineWeight: Float64Array | null,
  perUnit: number,
  perWeight: number,
): number {
  let squares = 0;
  for (let i = 0; i < column.length; i++) {
    const w = lineWeight === null ? 1 : (lineWeight[i] as number) * perWeight;
    const value = (column[i] as number) * perUnit;
    squares += w * value * value;
  }
  return squares;
}

function greatest(column: Float64Array): number {
  let most = 0;
  for (let i = 0; i < column.length; i++) if ((column[i] as number) > most) most = column[i] as number;
  return most;
}

/** The greatest distance of a range from a value. */
function distance(least: number, most: number, from: number): number {
  return Math.max(Math.abs(least - from), Math.abs(most - from));
}

/** The power of two at or below a size; 1 for 0. */
function powerOfTwo(size: number): number {
  return size > 0 ? 2 ** Math.max(-1022, Math.floor(Math.log2(size))) : 1;
}
