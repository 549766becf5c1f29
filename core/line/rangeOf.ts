/** Lowest and highest of a column; infinite for an empty one. */
export function rangeOf(column: ArrayLike<number>): readonly [low: number, high: number] {
  let [low, high] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (let i = 0; i < column.length; i++) {
    low = Math.min(low, column[i] ?? low);
    high = Math.max(high, column[i] ?? high);
  }
  return [low, high];
}
