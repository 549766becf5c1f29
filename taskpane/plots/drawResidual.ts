import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import type { Drawing, DrawingSize } from './drawStraight.ts';
import { frame } from './frame.ts';
import { lineAndReadings } from './marks.ts';
import { oncePerFit } from './oncePerFit.ts';
import { extent, extents, joined, padded, residualPoints } from './points.ts';
import { type Point, thin } from './thin.ts';

/** What a residual plot shows: residuals, the ends of two standard deviations, and both axes' ranges. */
export const residualView = oncePerFit((fit: Fit) => {
  const points = residualPoints(fit);
  const [across, up] = extents(points);
  const x = padded(across);
  const guide = twoDeviations(fit, x);
  const guides = guide.flatMap(({ y }) => [-y, y]);
  const y = padded(joined(up, extent([0, ...guides])));
  return { points, guide, x, y };
});

/** What the line leaves, over the same horizontal axis: the zero line, and two residual standard deviations. */
export function drawResidual(fit: Fit, size: DrawingSize): Drawing {
  const { points, guide, x, y } = residualView(fit);
  const { marks, ...options } = frame({ ...size, x, y });
  const dashed = { x: 'x', stroke: 'var(--edge)', strokeDasharray: '3 4', clip: true } as const;
  return Plot.plot({
    ...options,
    marks: [
      ...marks,
      ...lineAndReadings(
        [
          Plot.line(guide, { ...dashed, y: 'y' }),
          Plot.line(guide, { ...dashed, y: (point: Point) => -point.y }),
          Plot.ruleY([0], { stroke: 'var(--signal)', strokeWidth: 2 }),
        ],
        points,
        size.width,
      ),
    ],
  });
}

/**
 * Two residual standard deviations along the horizontal axis: level for readings of one weight, else 2 s/√w from reading
 * to reading. None without degrees of freedom, nor where each reading states an uncertainty of its own, for then
 * nothing holds between two of them.
 */
function twoDeviations(fit: Fit, [from, to]: readonly [number, number]): readonly Point[] {
  const { residualStandardDeviation, lineWeight } = fit.line;
  if (!Number.isFinite(residualStandardDeviation)) return [];
  const at = (row: number): number => (2 * residualStandardDeviation) / Math.sqrt(lineWeight[row] ?? 1);
  if (lineWeight.every((weight) => weight === lineWeight[0])) {
    return [from, to].map((x) => ({ x, y: at(0), position: 0 }));
  }
  if (fit.settings.spreadY.kind === 'each' || fit.settings.spreadX.kind === 'each') return [];
  const along = Array.from(fit.axes.horizontal, (x, row) => ({ x, y: at(row), position: row + 1 }));
  return [...thin(along, 200)].sort((a, b) => a.x - b.x);
}
