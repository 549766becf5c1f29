/** A reading to be drawn. */
export interface Point {
  readonly x: number;
  readonly y: number;
  /** 1-based position among the input cells. */
  readonly position: number;
}

/**
 * Thins points for a drawing so many columns wide: of each column the leftmost, the rightmost, the lowest and the
 * highest stay, so that no extreme is lost and at most four are drawn in a column. Linear in the number of points.
 * @param keep position that stays in any case, such as the selected one
 */
export function thin(
  points: readonly Point[],
  columns: number,
  keep: number | null = null,
): readonly Point[] {
  if (!crowded(points, columns)) return points;
  const drawn = outermost(columnExtremes(points, columns));
  const kept = keep === null ? undefined : points.find((point) => point.position === keep);
  return kept === undefined || drawn.includes(kept) ? drawn : [...drawn, kept];
}

/** The outermost points of columns, each once. */
export function outermost(columns: readonly Extremes[]): readonly Point[] {
  return [...new Set(columns.flatMap(({ left, right, low, high }) => [left, right, low, high]))];
}

/** Whether points are too many to draw each of them. */
export function crowded(points: readonly Point[], columns: number): boolean {
  return points.length > 4 * columns;
}

/** The outermost points of one column of a drawing. */
export interface Extremes {
  left: Point;
  right: Point;
  low: Point;
  high: Point;
}

/** The outermost points of every column that holds any, from left to right. */
export function columnExtremes(points: readonly Point[], columns: number): readonly Extremes[] {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (const { x } of points) {
    if (x < least) least = x;
    if (x > most) most = x;
  }
  const width = (most - least) / columns || 1;
  const extremes: (Extremes | undefined)[] = Array.from({ length: columns });
  for (const point of points) {
    const column = Math.min(columns - 1, Math.floor((point.x - least) / width) || 0);
    const found = extremes[column];
    if (found === undefined) extremes[column] = { left: point, right: point, low: point, high: point };
    else widen(found, point);
  }
  return extremes.filter((found) => found !== undefined);
}

function widen(found: Extremes, point: Point): void {
  if (point.x < found.left.x) found.left = point;
  if (point.x > found.right.x) found.right = point;
  if (point.y < found.low.y) found.low = point;
  if (point.y > found.high.y) found.high = point;
}
