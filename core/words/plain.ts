/** A number as a message shows it: up to six significant digits, no trailing zeros. */
export function shown(value: number): string {
  return Number.isFinite(value) ? String(Number(value.toPrecision(6))).replace('-', '−') : String(value);
}

/** A count with its noun: `1 reading`, `3 readings`. */
export function plural(count: number, noun: string): string {
  return `${count} ${noun}${count === 1 ? '' : 's'}`;
}

/** Items as a phrase: `a`, `a and b`, `a, b and c`. */
export function listed(items: readonly string[], conjunction: 'and' | 'or' = 'and'): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} ${conjunction} ${items[items.length - 1]}`;
}

const SUPERSCRIPTS = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** A power of ten with a raised exponent: `10⁻³`. */
export function powerOfTen(exponent: number): string {
  const digits = [...String(Math.abs(exponent))].map((digit) => SUPERSCRIPTS[Number(digit)] ?? '');
  return `10${exponent < 0 ? '⁻' : ''}${digits.join('')}`;
}
