import type { Markish, PlotOptions } from '@observablehq/plot';
import { hairLines } from './marks.ts';
import { evenTicks, powerTicks } from './ticks.ts';
import { powerTexts, tickTexts } from './tickText.ts';

/** Widths of one character of a tick and of a title, in pixels at 11 pixels of type: those of wide sans serifs. */
const CHARACTER = 6.6;
const TITLE_CHARACTER = 6;

export interface FrameOptions {
  readonly width: number;
  readonly height: number;
  readonly x: readonly [number, number];
  readonly y: readonly [number, number];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly logarithmic?: boolean;
  /** Room on the left when plots below one another share it; else as much as the ticks need. */
  readonly marginLeft?: number | undefined;
}

/** What every full-size plot has in common: quiet axes with round ticks, titles with units, hair lines behind it all. */
export function frame(options: FrameOptions): PlotOptions & { readonly marks: Markish[] } {
  const { width, height, x, y, xTitle, yTitle, logarithmic = false } = options;
  const down = axisTicks(y, height, logarithmic);
  const marginLeft = options.marginLeft ?? roomFor(down.texts);
  const along = acrossTicks(x, width - marginLeft);
  const marginRight = Math.max(14, Math.ceil(((along.texts.at(-1) ?? '').length * CHARACTER) / 2));
  return {
    width,
    height,
    marginTop: yTitle === '' ? 10 : 24,
    marginRight,
    marginBottom: xTitle === '' ? 22 : 40,
    marginLeft,
    style: { background: 'transparent', fontFamily: 'inherit', fontSize: '11px', color: 'var(--ink-soft)' },
    x: {
      domain: [...x],
      ticks: along.ticks,
      tickFormat: (_: number, i: number) => along.texts[i] ?? '',
      label: xTitle === '' ? null : shortened(xTitle, width),
      labelAnchor: 'right',
      labelArrow: 'none',
      labelOffset: 34,
      tickSize: 4,
    },
    y: {
      domain: [...y],
      ticks: down.ticks,
      // The library calls a logarithmic axis's format without the index.
      tickFormat: (tick: number, i: number) => down.texts[logarithmic ? down.ticks.indexOf(tick) : i] ?? '',
      label: yTitle === '' ? null : shortened(yTitle, width),
      labelAnchor: 'top',
      labelArrow: 'none',
      tickSize: 4,
      ...(logarithmic ? { type: 'log' as const } : {}),
    },
    marks: [hairLines(along.ticks, down.ticks)],
  };
}

/** Room that the numbers of a vertical axis need on its left, ticks included. */
export function leftRoom(y: readonly [number, number], height: number): number {
  return roomFor(axisTicks(y, height, false).texts);
}

interface Ticks {
  readonly ticks: number[];
  readonly texts: readonly string[];
}

function axisTicks(range: readonly [number, number], height: number, logarithmic: boolean): Ticks {
  const count = Math.max(3, Math.floor(height / 46));
  if (logarithmic) {
    const ticks = powerTicks(range, count);
    return { ticks, texts: powerTexts(ticks) };
  }
  const ticks = evenTicks(range, count);
  return { ticks, texts: tickTexts(ticks) };
}

/** As many ticks along an axis as its numbers leave room for. */
function acrossTicks(range: readonly [number, number], width: number): Ticks {
  for (let count = Math.max(3, Math.floor(width / 70)); ; count--) {
    const ticks = evenTicks(range, count);
    const texts = tickTexts(ticks);
    const longest = Math.max(0, ...texts.map((text) => text.length));
    if (count <= 1 || ticks.length * (longest * CHARACTER + 14) <= width) return { ticks, texts };
  }
}

function roomFor(texts: readonly string[]): number {
  const longest = Math.max(0, ...texts.map((text) => text.length));
  return Math.min(120, Math.max(34, Math.ceil(14 + longest * CHARACTER)));
}

/** A title that fits into so many pixels. */
function shortened(title: string, width: number): string {
  const most = Math.floor((width - 20) / TITLE_CHARACTER);
  return title.length <= most ? title : `${title.slice(0, most - 1).trimEnd()}…`;
}
