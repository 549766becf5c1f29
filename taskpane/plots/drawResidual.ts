import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import type { Drawing, DrawingSize } from './drawStraight.ts';
import { frame } from './frame.ts';
import { grid, readingDots } from './marks.ts';
import { extent, padded, residualPoints } from './points.ts';
import { thin } from './thin.ts';

/** What the line leaves, over the same horizontal axis: the zero line, and two residual standard deviations. */
export function drawResidual(fit: Fit, size: DrawingSize): Drawing {
  const points = residualPoints(fit);
  const x = padded(extent(points.map((point) => point.x)));
  // Two standard deviations hold for readings of one weight.
  const { residualStandardDeviation, lineWeight } = fit.line;
  const weighted = lineWeight.some((weight) => weight !== lineWeight[0]);
  const unit = residualStandardDeviation / Math.sqrt(lineWeight[0] ?? 1);
  const guides = weighted || !Number.isFinite(unit) ? [] : [-2 * unit, 2 * unit];
  const y = padded(extent([0, ...guides, ...points.map((point) => point.y)]));
  return Plot.plot({
    ...frame({ ...size, x, y }),
    marks: [
      ...grid(),
      Plot.ruleY(guides, { stroke: 'var(--edge)', strokeDasharray: '3 4' }),
      Plot.ruleY([0], { stroke: 'var(--signal)', strokeWidth: 2 }),
      readingDots(thin(points, size.width)),
    ],
  });
}
