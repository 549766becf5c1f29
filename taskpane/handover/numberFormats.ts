/** Most decimals of a number as it was given, for it to be shown as it is. */
const AS_GIVEN = 6;

/**
 * A number format for numbers that are shown alike: as many decimals as they have, and at most as many as give the
 * largest of them six significant digits.
 */
export function numberFormatFor(values: readonly number[]): string {
  const sizes = values.filter((value) => value !== 0).map(Math.abs);
  if (sizes.length === 0) return '0';
  const largest = Math.max(...sizes);
  if (largest >= 1e7 || largest < 1e-4) return '0.00000E+00';
  const significant = Math.min(9, Math.max(0, 5 - Math.floor(Math.log10(largest))));
  const given = Math.max(...sizes.map(decimalsOf));
  const decimals = given <= AS_GIVEN ? Math.min(given, significant) : significant;
  return decimals === 0 ? '0' : `0.${'0'.repeat(decimals)}`;
}

/** Decimals of a number as it is printed; more than any limit for one printed with an exponent. */
function decimalsOf(value: number): number {
  const text = String(value);
  if (text.includes('e')) return Number.POSITIVE_INFINITY;
  return text.split('.')[1]?.length ?? 0;
}
