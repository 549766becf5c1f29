/** A reading to be drawn. */
export interface Point {
  readonly x: number;
  readonly y: number;
  /** 1-based position among the input cells. */
  readonly position: number;
}

/**
 * Thins points for a drawing so many columns wide: of each column the first, the last, the lowest and the highest stay,
 * and the outermost of all, so that no extreme is lost and about four at most are drawn in a column. Linear in the number of points.
 * @param keep position that stays in any case, such as the selected one
 */
export function thin(
  points: readonly Point[],
  columns: number,
  keep: number | null = null,
): readonly Point[] {
  if (points.length <= 4 * columns) return points;
  let [leftmost] = points;
  let rightmost = leftmost;
  for (const point of points) {
    if (leftmost === undefined || point.x < leftmost.x) leftmost = point;
    if (rightmost === undefined || point.x > rightmost.x) rightmost = point;
  }
  if (leftmost === undefined || rightmost === undefined) return points;
  const least = leftmost.x;
  const width = (rightmost.x - least) / columns || 1;
  const first = new Map<number, Point>();
  const last = new Map<number, Point>();
  const lowest = new Map<number, Point>();
  const highest = new Map<number, Point>();
  let kept: Point | undefined;
  for (const point of points) {
    const column = Math.min(columns - 1, Math.floor((point.x - least) / width));
    if (!first.has(column)) first.set(column, point);
    last.set(column, point);
    if (point.y < (lowest.get(column)?.y ?? Number.POSITIVE_INFINITY)) lowest.set(column, point);
    if (point.y > (highest.get(column)?.y ?? Number.NEGATIVE_INFINITY)) highest.set(column, point);
    if (point.position === keep) kept = point;
  }
  const drawn = new Set<Point>([leftmost, rightmost, ...(kept === undefined ? [] : [kept])]);
  for (const column of [first, last, lowest, highest]) for (const point of column.values()) drawn.add(point);
  return [...drawn];
}
