import { powerOfTen } from '../../core/words/plain.ts';

/** Digits beyond which a power of ten would make a number longer, not shorter. */
const MOST_DIGITS = 4;

/** The number at a tick that stands alone: a proper minus sign, powers of ten for the very large and the very small. */
export function tickText(value: number): string {
  const size = Math.abs(value);
  if (value === 0) return '0';
  if (size < 1e5 && size >= 1e-3) return signed(String(Number(value.toPrecision(6))));
  return withPower(value, 3);
}

/**
 * The numbers at evenly spaced ticks of one axis, with exactly the digits that tell neighbours apart.
 * @param ticks ascending, a round step apart
 */
export function tickTexts(ticks: readonly number[]): string[] {
  const [first, second] = ticks;
  if (first === undefined || second === undefined) return ticks.map(tickText);
  const largest = Math.max(...ticks.map(Math.abs));
  const stepPower = powerAt(second - first);
  const digits = powerAt(largest) - stepPower + 1;
  const tiny = largest < 1e-3;
  if (tiny || (largest >= 1e5 && digits <= MOST_DIGITS)) {
    return ticks.map((tick) =>
      tick === 0 ? '0' : withPower(tick, Math.max(0, powerAt(Math.abs(tick)) - stepPower)),
    );
  }
  const decimals = Math.max(0, -stepPower);
  return ticks.map((tick) => (tick === 0 ? '0' : signed(tick.toFixed(decimals))));
}

/** The numbers at ticks that are powers of ten, all written in one way: as powers if any must be. */
export function powerTexts(ticks: readonly number[]): string[] {
  if (ticks.every((tick) => tick < 1e5 && tick >= 1e-3)) return ticks.map(tickText);
  return ticks.map((tick) => (tick === 1 || tick === 10 ? String(tick) : powerOfTen(powerAt(tick))));
}

/** Exponent of the leading digit; steps such as 0.1 + 0.2 − 0.2 count as what they are meant to be. */
function powerAt(size: number): number {
  return Math.floor(Math.log10(size) + 1e-9);
}

function withPower(value: number, decimals: number): string {
  const [mantissa = '', exponent = '0'] = value.toExponential(Math.min(20, decimals)).split('e');
  const lead = signed(String(Number(mantissa)));
  const power = powerOfTen(Number(exponent));
  if (lead === '1') return power;
  return lead === '−1' ? `−${power}` : `${lead}·${power}`;
}

function signed(text: string): string {
  return text.replace('-', '−');
}
