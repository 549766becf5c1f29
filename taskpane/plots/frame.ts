import type { PlotOptions } from '@observablehq/plot';
import { tickText } from './tickText.ts';

/** Width of one character of a tick, in pixels. */
const CHARACTER = 6.4;

/** What every full-size plot has in common: quiet axes, grid lines as hair lines, titles with units. */
export function frame(options: {
  readonly width: number;
  readonly height: number;
  readonly x: readonly [number, number];
  readonly y: readonly [number, number];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly logarithmic?: boolean;
}): PlotOptions {
  const { width, height, x, y, xTitle, yTitle, logarithmic = false } = options;
  const longest = Math.max(...[...y, (y[0] + y[1]) / 3].map((value) => tickText(round(value)).length));
  return {
    width,
    height,
    marginTop: yTitle === '' ? 10 : 24,
    marginRight: 14,
    marginBottom: xTitle === '' ? 22 : 40,
    marginLeft: Math.min(70, Math.max(34, 14 + longest * CHARACTER)),
    style: { background: 'transparent', fontFamily: 'inherit', fontSize: '11px', color: 'var(--ink-soft)' },
    x: {
      domain: [...x],
      ticks: Math.max(3, Math.floor(width / 85)),
      tickFormat: tickText,
      label: xTitle === '' ? null : xTitle,
      labelAnchor: 'right',
      labelArrow: 'none',
      labelOffset: 34,
      tickSize: 4,
    },
    y: {
      domain: [...y],
      ticks: Math.max(3, Math.floor(height / 46)),
      tickFormat: tickText,
      label: yTitle === '' ? null : yTitle,
      labelAnchor: 'top',
      labelArrow: 'none',
      tickSize: 4,
      ...(logarithmic ? { type: 'log' as const } : {}),
    },
  };
}

function round(value: number): number {
  return Number(value.toPrecision(3));
}
