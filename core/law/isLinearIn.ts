import type { ColumnFunction } from './law.ts';

/**
 * True when the derivatives by the symbols at `places` do not depend on those symbols.
 * @param points at which the function has a value; their entries at `places` are moved
 */
export function isLinearIn(
  curve: ColumnFunction,
  points: readonly Float64Array[],
  places: readonly number[],
): boolean {
  let compared = 0;
  for (const point of points) {
    const moved = Float64Array.from(point);
    for (const [k, place] of places.entries()) moved[place] = (point[place] ?? 0) * (1.37 + 0.21 * k) + 0.11;
    const before = curve.gradient(Array.from(point), 1, places).partials;
    const after = curve.gradient(Array.from(moved), 1, places).partials;
    for (const [k] of places.entries()) {
      const [p, q] = [before[k]?.[0] ?? Number.NaN, after[k]?.[0] ?? Number.NaN];
      if (!Number.isFinite(p) || !Number.isFinite(q)) continue;
      compared++;
      if (Math.abs(p - q) > 1e-9 * (Math.abs(p) + Math.abs(q))) return false;
    }
  }
  return compared > 0;
}
