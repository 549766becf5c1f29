/** Steps between ticks as multiples of a power of ten, each with the ratio below which it is the nearest. */
const STEPS = [
  { multiple: 1, below: Math.sqrt(2) },
  { multiple: 2, below: Math.sqrt(10) },
  { multiple: 5, below: Math.sqrt(50) },
] as const;

/**
 * Round numbers along an axis, ascending.
 * @param range ends of the axis, the lower one first
 * @param count about how many: half as many to one and a half times as many
 */
export function evenTicks([from, to]: readonly [number, number], count: number): number[] {
  const span = to - from;
  if (!(span > 0) || !Number.isFinite(span)) return [from];
  const power = Math.floor(Math.log10(span / count));
  const ratio = span / count / 10 ** power;
  const multiple = STEPS.find(({ below }) => ratio < below)?.multiple ?? 10;
  // Below 1 a step is divided by, for 10 to a negative power is not exact and its inverse is.
  const at = (i: number): number => (power < 0 ? (i * multiple) / 10 ** -power : i * multiple * 10 ** power);
  const step = at(1);
  const first = Math.ceil(from / step - 1e-9);
  const last = Math.floor(to / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) => at(first + i) || 0);
}

/** Powers of ten along a logarithmic axis, every so many decades that about `count` are left. */
export function powerTicks([from, to]: readonly [number, number], count: number): number[] {
  const first = Math.ceil(Math.log10(from) - 1e-9);
  const last = Math.floor(Math.log10(to) + 1e-9);
  const every = Math.max(1, Math.ceil((last - first + 1) / count));
  const start = Math.ceil(first / every) * every;
  const powers: number[] = [];
  for (let exponent = start; exponent <= last; exponent += every) powers.push(Number(`1e${exponent}`));
  return powers;
}
