import * as Plot from '@observablehq/plot';
import type { Point } from './thin.ts';

/** Hair lines behind a plot, at the ticks of its axes. */
export function hairLines(x: readonly number[], y: readonly number[]): Plot.Markish[] {
  const line = { stroke: 'var(--rule)', strokeOpacity: 1, strokeWidth: 1 };
  return [Plot.gridX([...x], line), Plot.gridY([...y], line)];
}

/** The fitted line or curve. */
export function tautLine(points: readonly (readonly [number, number])[]): Plot.Markish {
  return Plot.line(points as [number, number][], { stroke: 'var(--signal)', strokeWidth: 2, clip: true });
}

/** Readings as filled dots, smaller when there are many. */
export function readingDots(points: readonly Point[], r = points.length > 300 ? 2 : 3.5): Plot.Markish {
  return Plot.dot(points, {
    x: 'x',
    y: 'y',
    r,
    fill: 'var(--reading)',
    stroke: 'var(--paper-raised)',
    strokeWidth: points.length > 300 ? 0.3 : 1,
  });
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
