import * as Plot from '@observablehq/plot';
import { columnExtremes, crowded, type Extremes, outermost, type Point } from './thin.ts';

/** Hair lines behind a plot, at the ticks of its axes. */
export function hairLines(x: readonly number[], y: readonly number[]): Plot.Markish[] {
  const line = { stroke: 'var(--rule)', strokeOpacity: 1, strokeWidth: 1 };
  return [Plot.gridX([...x], line), Plot.gridY([...y], line)];
}

/** The fitted line or curve. */
export function tautLine(points: readonly (readonly [number, number])[]): Plot.Markish {
  return Plot.line(points as [number, number][], { stroke: 'var(--signal)', strokeWidth: 2, clip: true });
}

/**
 * Readings as filled dots, smaller when there are many. Too many to draw each: what each pixel column spans, with the
 * outermost of them as dots.
 */
function readingDots(points: readonly Point[], width: number, radius = 3.5): Plot.Markish[] {
  const full = crowded(points, width);
  const columns = full ? columnExtremes(points, width) : [];
  const many = points.length > 300;
  const dots = Plot.dot(full ? outermost(columns) : points, {
    x: 'x',
    y: 'y',
    r: full ? Math.min(1, radius) : many ? Math.min(2, radius) : radius,
    fill: 'var(--reading)',
    ...(full ? {} : { stroke: 'var(--paper-raised)', strokeWidth: many ? 0.3 : 1 }),
  });
  if (!full) return [dots];
  const spans = Plot.ruleX(columns, {
    x: ({ left, right }: Extremes) => (left.x + right.x) / 2,
    y1: ({ low }: Extremes) => low.y,
    y2: ({ high }: Extremes) => high.y,
    stroke: 'var(--reading)',
    strokeOpacity: 0.3,
  });
  return [spans, dots];
}

/** Readings that take no part: hollow. */
export function asideDots(points: readonly Point[]): Plot.Markish {
  return Plot.dot(points, {
    x: 'x',
    y: 'y',
    r: 3.5,
    fill: 'none',
    stroke: 'var(--reading-aside)',
    strokeWidth: 1.5,
  });
}

/** Lines below the readings on them, or above so many that they would be hidden. */
export function lineAndReadings(
  line: Plot.Markish,
  points: readonly Point[],
  width: number,
  radius?: number,
): Plot.Markish[] {
  const dots = readingDots(points, width, radius);
  return crowded(points, width) ? [...dots, line] : [line, ...dots];
}
