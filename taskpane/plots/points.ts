import type { Fit } from '../../core/fit/fit.ts';
import type { Point } from './thin.ts';

/** The readings on the straight axes of a fit. */
export function straightPoints(fit: Fit): Point[] {
  const { horizontal, vertical } = fit.axes;
  return Array.from(fit.used, (index, row) => ({
    x: horizontal[row] ?? Number.NaN,
    y: vertical[row] ?? Number.NaN,
    position: fit.readings.position[index] ?? 0,
  }));
}

/** What the line leaves of each reading, over the same horizontal axis. */
export function residualPoints(fit: Fit): Point[] {
  const { horizontal } = fit.axes;
  return Array.from(fit.used, (index, row) => ({
    x: horizontal[row] ?? Number.NaN,
    y: fit.line.residual[row] ?? Number.NaN,
    position: fit.readings.position[index] ?? 0,
  }));
}

/** The readings as they are in the sheet, and those of them that the fit does not use. */
export function sheetPoints(fit: Fit): { readonly used: Point[]; readonly aside: Point[] } {
  const taken = new Set(fit.direct === null ? fit.used : fit.taking);
  const used: Point[] = [];
  const aside: Point[] = [];
  fit.readings.x.forEach((x, index) => {
    const point = {
      x,
      y: fit.readings.y[index] ?? Number.NaN,
      position: fit.readings.position[index] ?? 0,
    };
    (taken.has(index) ? used : aside).push(point);
  });
  return { used, aside };
}

/** The least and the greatest of some numbers, those that are none left out; null without any. */
export function extent(values: Iterable<number>): readonly [number, number] | null {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (const value of values) {
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return least <= most ? [least, most] : null;
}

/** A range with a margin on both sides, so that no mark touches the frame. */
export function padded(range: readonly [number, number] | null, share = 0.05): [number, number] {
  if (range === null) return [0, 1];
  const [least, most] = range;
  const margin = (most - least) * share || Math.abs(most) * share || 1;
  return [least - margin, most + margin];
}
