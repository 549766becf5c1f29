import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import { frame } from './frame.ts';
import { grid, readingDots, tautLine } from './marks.ts';
import { extent, padded, straightPoints } from './points.ts';
import { thin } from './thin.ts';

/** A drawing with the scales that turn readings into pixels. */
export type Drawing = (SVGSVGElement | HTMLElement) & Plot.Plot;

export interface DrawingSize {
  readonly width: number;
  readonly height: number;
  readonly xTitle: string;
  readonly yTitle: string;
}

/** The two ends of a fitted line over its readings. */
export function lineEnds(fit: Fit, [from, to]: readonly [number, number]): readonly [number, number][] {
  const { slope, intercept } = fit.line;
  return [from, to].map((x) => [x, intercept + slope * x]);
}

/** Readings and the taut line on the straight axes. */
export function drawStraight(fit: Fit, size: DrawingSize): Drawing {
  const points = straightPoints(fit);
  const x = padded(extent(points.map((point) => point.x)));
  const ends = lineEnds(fit, x);
  const y = padded(extent([...points.map((point) => point.y), ...ends.map(([, value]) => value)]));
  return Plot.plot({
    ...frame({ ...size, x, y }),
    marks: [...grid(), tautLine(ends), readingDots(thin(points, size.width))],
  });
}
