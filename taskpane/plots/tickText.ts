import { powerOfTen } from '../../core/words/plain.ts';

/** The number at a tick: a proper minus sign, and powers of ten for the very large and the very small. */
export function tickText(value: number): string {
  if (value === 0) return '0';
  const size = Math.abs(value);
  if (size < 1e5 && size >= 1e-3) return String(Number(value.toPrecision(6))).replace('-', '−');
  const [mantissa = '', exponent = '0'] = value.toExponential(3).split('e');
  const lead = String(Number(mantissa)).replace('-', '−');
  const power = powerOfTen(Number(exponent));
  if (lead === '1') return power;
  return lead === '−1' ? `−${power}` : `${lead}·${power}`;
}
