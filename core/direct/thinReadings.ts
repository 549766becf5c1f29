import type { WeightedReadings } from './lawModel.ts';

/**
 * At most `most` of the readings, evenly by rank of x, both ends included: enough to find the region of a minimum.
 * The same readings always give the same choice.
 */
export function thinReadings(readings: WeightedReadings, most: number): WeightedReadings {
  const { x, y, omega } = readings;
  const n = x.length;
  if (n <= most) return readings;
  const order = Array.from(x.keys()).sort((i, j) => (x[i] ?? 0) - (x[j] ?? 0) || i - j);
  const chosen = Array.from({ length: most }, (_, i) => order[Math.round((i * (n - 1)) / (most - 1))] ?? 0);
  const pick = (column: Float64Array): Float64Array =>
    Float64Array.from(chosen, (i) => column[i] ?? Number.NaN);
  return { x: pick(x), y: pick(y), omega: pick(omega) };
}
