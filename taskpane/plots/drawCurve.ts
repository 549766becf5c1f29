import * as Plot from '@observablehq/plot';
import type { Fit } from '../../core/fit/fit.ts';
import { spreadAt } from '../../core/fit/spread.ts';
import { curveBand } from '../../core/readoff/curveBand.ts';
import type { Drawing, DrawingSize } from './drawStraight.ts';
import { frame } from './frame.ts';
import { asideDots, lineAndReadings, tautLine } from './marks.ts';
import { extent, extents, joined, padded, sheetPoints } from './points.ts';
import { type Point, thin } from './thin.ts';

/** Places along the curve at which it is worked out. */
const PLACES = 120;

/** Whether the readings span so much that a logarithmic axis is worth an offer: three decades, all above 0. */
export function spansDecades(fit: Fit): boolean {
  const range = extent(fit.readings.y);
  return range !== null && range[0] > 0 && range[1] / range[0] >= 1000;
}

/** Readings, curve and coverage band on the axes of the sheet. */
export function drawCurve(fit: Fit, size: DrawingSize, logarithmic: boolean): Drawing {
  const { used, aside, all } = sheetPoints(fit);
  const [across, up] = extents(all);
  const x = padded(across, 0.03);
  const rows = curveRows(fit, placesAlong(x, fit));
  const shown = logarithmic ? rows.filter((row) => row.fitted > 0) : rows;
  const span = joined(up, extent(shown.map((row) => row.fitted)));
  const y = logarithmic && span !== null ? logarithmicRange(span) : padded(span);
  const banded = shown.filter((row) => Number.isFinite(row.low + row.high) && (!logarithmic || row.low > 0));
  const { marks, ...options } = frame({ ...size, x, y, logarithmic });
  return Plot.plot({
    ...options,
    marks: [
      ...marks,
      Plot.areaY(banded, {
        x: 'x',
        y1: 'low',
        y2: 'high',
        fill: 'var(--signal)',
        fillOpacity: 0.18,
        clip: true,
      }),
      uncertaintyBars(fit, used, logarithmic, y[0]),
      asideDots(thin(aside, size.width)),
      ...lineAndReadings(tautLine(shown.map((row) => [row.x, row.fitted])), used, size.width),
    ],
  });
}

interface CurveRow {
  readonly x: number;
  readonly fitted: number;
  readonly low: number;
  readonly high: number;
}

function curveRows(fit: Fit, places: Float64Array): CurveRow[] {
  const { fitted, low, high } = curveBand(fit, places);
  const rows: CurveRow[] = [];
  places.forEach((x, i) => {
    const value = fitted[i] ?? Number.NaN;
    if (Number.isFinite(value)) {
      rows.push({ x, fitted: value, low: low[i] ?? Number.NaN, high: high[i] ?? Number.NaN });
    }
  });
  return rows;
}

/**
 * Even places along the axis, and closer ones near a low end that the readings reach by factors; none beyond a zero
 * that no reading is beyond.
 */
function placesAlong([start, end]: readonly [number, number], fit: Fit): Float64Array {
  const [least, most] = extent(fit.readings.x) ?? [start, end];
  const from = least >= 0 ? Math.max(0, start) : start;
  const to = most <= 0 ? Math.min(0, end) : end;
  const even = Array.from({ length: PLACES + 1 }, (_, i) => from + ((to - from) * i) / PLACES);
  const dense =
    least > 0 && to / least > 20
      ? Array.from({ length: PLACES / 2 + 1 }, (_, i) => least * (to / least) ** (i / (PLACES / 2)))
      : [];
  return Float64Array.from([...even, ...dense]).sort();
}

function logarithmicRange([least, most]: readonly [number, number]): [number, number] {
  const margin = (most / least) ** 0.04;
  return [least / margin, most * margin];
}

/** Bars of one standard uncertainty, where it is stated; none when they would hide the readings. */
function uncertaintyBars(
  fit: Fit,
  used: readonly Point[],
  logarithmic: boolean,
  floor: number,
): Plot.Markish[] {
  const { spreadY } = fit.settings;
  const stated = spreadY.kind === 'absolute' || spreadY.kind === 'relative' || spreadY.kind === 'each';
  if (!stated || used.length > 300) return [];
  const bars = used.map(({ x, y, position }) => {
    const u = spreadAt(spreadY, y, position);
    const low = y - u;
    // A logarithmic axis has no place for an end at zero or below: the bar then reaches down to the frame.
    return { x, low: logarithmic && low <= 0 ? floor : low, high: y + u };
  });
  return [
    Plot.ruleX(bars, {
      x: 'x',
      y1: 'low',
      y2: 'high',
      stroke: 'var(--reading)',
      strokeWidth: 1.5,
      clip: true,
    }),
  ];
}
