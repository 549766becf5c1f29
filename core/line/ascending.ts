/** Distinct values of a column, ascending, in the place of the column itself. */
export function ascendingDistinct(column: Float64Array): Float64Array {
  if (!isAscending(column)) column.sort();
  let count = Math.min(1, column.length);
  for (let i = 1; i < column.length; i++) {
    const value = column[i] as number; // i < n
    if (value !== column[count - 1]) column[count++] = value;
  }
  return column.subarray(0, count);
}

/** Whether no value of a column is below the one before it. */
export function isAscending(column: Float64Array): boolean {
  for (let i = 1; i < column.length; i++) {
    if ((column[i] as number) < (column[i - 1] as number)) return false; // i < n
  }
  return true;
}
