import { powerOfTen } from '../words/plain.ts';

/** How numbers of one result are written: places after the point, and a power of ten taken out (0 for none). */
export interface Rounding {
  readonly decimals: number;
  readonly exponent: number;
}

/** Sizes between which numbers are written without a power of ten. */
const LEAST_PLAIN = -4;
const MOST_PLAIN = 6;

/**
 * Rounds an uncertainty to two significant digits and the value with it to the same decimal place.
 * @param value finite
 * @param standardUncertainty 0 or above; 0 and NaN give six significant digits of the value
 * @see JCGM 100:2008, 7.2.6
 */
export function roundingFor(value: number, standardUncertainty: number): Rounding {
  const certain = !(standardUncertainty > 0 && Number.isFinite(standardUncertainty));
  const last = certain ? exponentOf(value, 6) - 5 : exponentOf(standardUncertainty, 2) - 1;
  const size = Math.max(exponentOf(value, 6), last);
  const exponent = size < LEAST_PLAIN || size > MOST_PLAIN || last > 0 ? size : 0;
  return { decimals: Math.min(100, Math.max(0, exponent - last)), exponent };
}

/** A number written by a rounding, its power of ten left to `withPower`. */
export function rounded(value: number, { decimals, exponent }: Rounding): string {
  const scaled =
    exponent === 0 ? value : Number(`${value}e${-exponent}`.replace(/e(.*)e(.*)/, joinExponents));
  const text = scaled.toFixed(decimals);
  // Rounding may leave a zero that is not negative.
  return (Number(text) === 0 ? text.replace('-', '') : text).replace('-', '−');
}

/** `0.0412(13)`: the uncertainty's two digits refer to the last digits of the value. */
export function bracketForm(value: number, standardUncertainty: number): string {
  const rounding = roundingFor(value, standardUncertainty);
  const { decimals } = rounding;
  const digits = rounded(standardUncertainty, rounding);
  // Digits of the uncertainty in units of the last place, or with its own point when it reaches beyond 1.
  const inBrackets = Number(digits) >= 1 && decimals > 0 ? digits : digits.replace(/^0\.0*/, '');
  return withPower(`${rounded(value, rounding)}(${inBrackets})`, rounding);
}

/** A text with the power of ten of its rounding, if there is one: `1.2 × 10⁻⁹`. */
export function withPower(text: string, { exponent }: Rounding): string {
  return exponent === 0 ? text : `${text} × ${powerOfTen(exponent)}`;
}

/** The decimal exponent of a number once it is rounded to some significant digits; 0 for 0. */
function exponentOf(value: number, digits: number): number {
  if (value === 0 || !Number.isFinite(value)) return 0;
  return Number(value.toExponential(digits - 1).split('e')[1]);
}

/** `1.5e-7` and a further power: exponents add up, so that no digit is lost to a multiplication. */
function joinExponents(_whole: string, first: string, second: string): string {
  return `e${Number(first) + Number(second)}`;
}
