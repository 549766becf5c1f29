/** A number format with six significant digits for numbers of this size; whole numbers as such. */
export function numberFormatFor(values: readonly number[]): string {
  const sizes = values.filter((value) => value !== 0).map(Math.abs);
  const [largest, smallest] = [Math.max(...sizes), Math.min(...sizes)];
  if (sizes.length === 0 || values.every((value) => Number.isInteger(value) && Math.abs(value) < 1e7))
    return '0';
  if (largest >= 1e7 || largest < 1e-4 || (values.length === 1 && smallest < 1e-4)) return '0.00000E+00';
  const decimals = Math.min(9, Math.max(0, 5 - Math.floor(Math.log10(largest))));
  return decimals === 0 ? '0' : `0.${'0'.repeat(decimals)}`;
}
