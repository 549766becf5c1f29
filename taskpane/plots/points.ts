import type { Fit } from '../../core/fit/fit.ts';
import { oncePerFit } from './oncePerFit.ts';
import type { Point } from './thin.ts';

/** The readings on the straight axes of a fit. */
export const straightPoints = oncePerFit((fit: Fit): readonly Point[] => {
  const { horizontal, vertical } = fit.axes;
  return Array.from(fit.used, (index, row) => ({
    x: horizontal[row] ?? Number.NaN,
    y: vertical[row] ?? Number.NaN,
    position: fit.readings.position[index] ?? 0,
  }));
});

/** What the line leaves of each reading, over the same horizontal axis. */
export const residualPoints = oncePerFit((fit: Fit): readonly Point[] => {
  const { horizontal } = fit.axes;
  return Array.from(fit.used, (index, row) => ({
    x: horizontal[row] ?? Number.NaN,
    y: fit.line.residual[row] ?? Number.NaN,
    position: fit.readings.position[index] ?? 0,
  }));
});

interface SheetPoints {
  readonly used: readonly Point[];
  readonly aside: readonly Point[];
  readonly all: readonly Point[];
}

/** The readings as they are in the sheet, and those of them that the fit does not use. */
export const sheetPoints = oncePerFit((fit: Fit): SheetPoints => {
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
  return { used, aside, all: [...used, ...aside] };
});

/** The ranges of points along both axes; null without any. */
export function extents(points: readonly Point[]): readonly [Range | null, Range | null] {
  return [extentOf(points.length, (i) => points[i]?.x), extentOf(points.length, (i) => points[i]?.y)];
}

export type Range = readonly [number, number];

/** The least and the greatest of some numbers, those that are none left out; null without any. */
export function extent(values: ArrayLike<number>): Range | null {
  return extentOf(values.length, (i) => values[i]);
}

/** A range that holds several. */
export function joined(...ranges: readonly (Range | null)[]): Range | null {
  return extent(ranges.flatMap((range) => range ?? []));
}

function extentOf(count: number, at: (i: number) => number | undefined): Range | null {
  let least = Number.POSITIVE_INFINITY;
  let most = Number.NEGATIVE_INFINITY;
  for (let i = 0; i < count; i++) {
    const value = at(i) ?? Number.NaN;
    if (value < least) least = value;
    if (value > most) most = value;
  }
  return least <= most ? [least, most] : null;
}

/** A range with a margin on both sides, so that no mark touches the frame. */
export function padded(range: Range | null, share = 0.05): [number, number] {
  if (range === null) return [0, 1];
  const [least, most] = range;
  const margin = (most - least) * share || Math.abs(most) * share || 1;
  return [least - margin, most + margin];
}
