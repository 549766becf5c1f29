import { rounded as byRounding, roundingFor, withPower } from '../../core/statement/rounding.ts';
import { powerOfTen } from '../../core/words/plain.ts';

/** Numbers from these bounds on are written with a power of ten. */
const LARGE = 1e7;
const SMALL = 1e-4;
/** An uncertainty below this share of its value is rounding in the sheet's own digits. */
const NEGLIGIBLE = 1e-12;

function signed(text: string): string {
  return text.replace('-', '−');
}

function exponentOf(value: number): number {
  return value === 0 ? 0 : Number(value.toExponential().split('e')[1]);
}

/** A number with so many significant digits, trailing zeros left out; empty when there is none. */
export function figures(value: number | '', digits = 4): string {
  if (value === '' || !Number.isFinite(value)) return '';
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size >= LARGE || size < SMALL) {
    const exponent = exponentOf(Number(value.toPrecision(digits)));
    const mantissa = Number((value / 10 ** exponent).toPrecision(digits));
    return `${signed(String(mantissa))} × ${powerOfTen(exponent)}`;
  }
  return signed(String(Number(value.toPrecision(digits))));
}

/** A number with so many decimals; empty when there is none. */
export function decimals(value: number | '', count: number): string {
  if (value === '' || !Number.isFinite(value)) return '';
  const text = value.toFixed(count);
  return signed(Number(text) === 0 ? text.replace('-', '') : text);
}

/** How many decimals show a column's typical size to so many digits; beyond 8 a power of ten reads better. */
export function decimalsFor(size: number, digits: number): number | undefined {
  if (!(size > 0) || !Number.isFinite(size)) return undefined;
  const count = Math.max(0, digits - 1 - exponentOf(size));
  return count > 8 || size >= LARGE ? undefined : count;
}

/** A value beside its standard uncertainty, both to the uncertainty's second digit. */
export interface Rounded {
  readonly value: string;
  /** Empty when there is none. */
  readonly uncertainty: string;
  readonly low: string;
  readonly high: string;
  /** A common power of ten, ` × 10⁻⁵`, or empty. */
  readonly power: string;
}

/**
 * Rounds a result for reading, as statements do: the uncertainty to two significant digits, everything else to the same
 * decimal place.
 * @see JCGM 100:2008, 7.2.6
 */
export function rounded(value: number, uncertainty: number, low: number, high: number): Rounded {
  if (uncertainty > 0 && uncertainty < NEGLIGIBLE * Math.abs(value)) {
    return { value: figures(value, 12), uncertainty: figures(uncertainty, 2), low: '', high: '', power: '' };
  }
  const rounding = roundingFor(value, uncertainty);
  const shown = (number: number): string => (Number.isFinite(number) ? byRounding(number, rounding) : '');
  return {
    value: shown(value),
    uncertainty: uncertainty === 0 ? '0' : shown(uncertainty),
    low: shown(low),
    high: shown(high),
    power: withPower('', rounding),
  };
}

/** A probability as a percentage without needless digits: 0.95 is `95`. */
export function percent(probability: number): string {
  return String(Number((probability * 100).toPrecision(6)));
}
