import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import { type Drawing, lineEnds } from './drawStraight.ts';
import { lineAndReadings, tautLine } from './marks.ts';
import { extent, extents, joined, padded, straightPoints } from './points.ts';

/** A law's readings and line as a small picture: shape alone, no numbers. */
export function drawLaw(fit: Fit, width: number, height: number): Drawing {
  const points = straightPoints(fit);
  const [across, up] = extents(points);
  const x = padded(across, 0.06);
  const ends = lineEnds(fit, x);
  const y = padded(joined(up, extent(ends.map(([, value]) => value))), 0.08);
  return Plot.plot({
    width,
    height,
    margin: 3,
    style: { background: 'transparent', color: 'var(--ink-soft)' },
    x: { domain: x, axis: null },
    y: { domain: y, axis: null },
    marks: [
      Plot.frame({ stroke: 'var(--rule)', anchor: 'left' }),
      Plot.frame({ stroke: 'var(--rule)', anchor: 'bottom' }),
      ...lineAndReadings(tautLine(ends), points, width, points.length > 60 ? 1.4 : 2.4),
    ],
  });
}
