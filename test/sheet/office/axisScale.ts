import type { AxisState } from './book.ts';

export interface AxisScale {
  place(value: number): number;
  readonly ticks: readonly { readonly value: number; readonly text: string }[];
}

/** Lays an axis out from `start` to `end` (pixels) over the values, with round ticks. */
export function axisScale(values: readonly number[], axis: AxisState, start: number, end: number): AxisScale {
  const usable = axis.logarithmic ? values.filter((value) => value > 0) : values;
  let [low, high] =
    usable.length > 0 ? extremes(usable) : [axis.logarithmic ? 1 : 0, axis.logarithmic ? 10 : 1];
  if (low === high) [low, high] = axis.logarithmic ? [low / 2, high * 2] : [low - 1, high + 1];
  if (axis.logarithmic) return logarithmicScale(axis, low, high, start, end);
  const step = roundStep((high - low) / 5);
  low = axis.minimum ?? Math.floor(low / step) * step;
  high = axis.maximum ?? Math.ceil(high / step) * step;
  const decimals = Math.max(0, -Math.floor(Math.log10(step) + 1e-9));
  const count = Math.floor((high - low) / step + 1e-6);
  const first = Math.ceil(low / step - 1e-6) * step;
  const ticks = Array.from({ length: count + 1 }, (_, index) => first + index * step)
    .filter((value) => value <= high + step * 1e-6)
    .map((value) => ({ value, text: tickText(value, decimals) }));
  return { place: (value) => start + ((value - low) / (high - low)) * (end - start), ticks };
}

function logarithmicScale(axis: AxisState, low: number, high: number, start: number, end: number): AxisScale {
  const from = Math.log10(axis.minimum ?? 10 ** Math.floor(Math.log10(low)));
  const to = Math.log10(axis.maximum ?? 10 ** Math.ceil(Math.log10(high)));
  const powers = Array.from(
    { length: Math.floor(to) - Math.ceil(from) + 1 },
    (_, index) => Math.ceil(from) + index,
  );
  return {
    place: (value) =>
      value > 0 ? start + ((Math.log10(value) - from) / (to - from)) * (end - start) : Number.NaN,
    ticks: powers.map((power) => ({ value: 10 ** power, text: tickText(10 ** power, Math.max(0, -power)) })),
  };
}

function extremes(values: readonly number[]): [number, number] {
  let [low, high] = [Infinity, -Infinity];
  for (const value of values) [low, high] = [Math.min(low, value), Math.max(high, value)];
  return [low, high];
}

function roundStep(rough: number): number {
  const power = 10 ** Math.floor(Math.log10(rough));
  const factor = rough / power;
  return (factor <= 1 ? 1 : factor <= 2 ? 2 : factor <= 5 ? 5 : 10) * power;
}

function tickText(value: number, decimals: number): string {
  const size = Math.abs(value);
  if (size !== 0 && (size >= 1e6 || size < 1e-4)) return value.toExponential(1).replace('e+', 'e');
  return value.toFixed(Math.min(8, decimals)).replace('-', '−');
}
