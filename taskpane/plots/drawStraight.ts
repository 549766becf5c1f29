import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import { frame } from './frame.ts';
import { lineAndReadings, tautLine } from './marks.ts';
import { oncePerFit } from './oncePerFit.ts';
import { extent, extents, joined, padded, straightPoints } from './points.ts';

/** A drawing with the scales that turn readings into pixels. */
export type Drawing = (SVGSVGElement | HTMLElement) & Plot.Plot;

export interface DrawingSize {
  readonly width: number;
  readonly height: number;
  readonly xTitle: string;
  readonly yTitle: string;
  /** Room on the left when plots below one another share it. */
  readonly marginLeft?: number | undefined;
}

/** The two ends of a fitted line over its readings. */
export function lineEnds(fit: Fit, [from, to]: readonly [number, number]): readonly [number, number][] {
  const { slope, intercept } = fit.line;
  return [from, to].map((x) => [x, intercept + slope * x]);
}

/** What a straight plot shows: its readings, the ends of its line, and both axes' ranges. */
export const straightView = oncePerFit((fit: Fit) => {
  const points = straightPoints(fit);
  const [across, up] = extents(points);
  const x = padded(across);
  const ends = lineEnds(fit, x);
  const y = padded(joined(up, extent(ends.map(([, value]) => value))));
  return { points, ends, x, y };
});

/** Readings and the taut line on the straight axes. */
export function drawStraight(fit: Fit, size: DrawingSize): Drawing {
  const { points, ends, x, y } = straightView(fit);
  const { marks, ...options } = frame({ ...size, x, y });
  return Plot.plot({
    ...options,
    marks: [...marks, ...lineAndReadings(tautLine(ends), points, size.width)],
  });
}
