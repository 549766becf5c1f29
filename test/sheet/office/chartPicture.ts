import { type AxisScale, axisScale } from './axisScale.ts';
import type { AxisState, Book, ChartState, SeriesState } from './book.ts';

interface Drawn {
  readonly series: SeriesState;
  readonly points: readonly (readonly [number, number] | null)[];
  readonly color: string;
  readonly markers: boolean;
  readonly line: boolean;
}

/** The stand-in's own series colours, told apart in grey too. */
const COLORS = ['#23527c', '#b4552d', '#4b7a3a', '#7a4b8c', '#8a7327', '#3a7f84'];
const TEXT = 'font-family="Segoe UI, Helvetica, Arial, sans-serif"';

/** Draws a chart's series as a picture (SVG), with numbers read from the cells as they are now. */
export function chartPicture(book: Book, chart: ChartState): string {
  const width = Math.max(120, chart.width / 0.75);
  const height = Math.max(90, chart.height / 0.75);
  const drawn = chart.series.map((series, index) => drawnSeries(book, chart, series, index));
  const points = drawn.flatMap((one) => one.points).filter((point) => point !== null);
  const titled = chart.titleVisible && chart.title !== '';
  const legend = chart.legendVisible && drawn.length > 1;
  const frame = {
    left: 56 + (chart.y.titleVisible ? 18 : 0),
    right: width - 18,
    top: titled ? 36 : 16,
    bottom: height - 32 - (chart.x.titleVisible ? 18 : 0) - (legend ? 20 : 0),
  };
  const x = axisScale(
    points.map(([value]) => value),
    chart.x,
    frame.left,
    frame.right,
  );
  const y = axisScale(
    points.map(([, value]) => value),
    chart.y,
    frame.bottom,
    frame.top,
  );
  const parts = [
    `<rect x="0.5" y="0.5" width="${width - 1}" height="${height - 1}" fill="#fff" stroke="#c9cdd2"/>`,
    titled ? label(width / 2, 22, chart.title, 14, 'middle', '#22262b') : '',
    ...gridAndTicks(x, y, frame, chart.x, chart.y),
    ...drawn.map((one) => drawSeries(one, x, y, frame)),
    chart.x.titleVisible
      ? label((frame.left + frame.right) / 2, frame.bottom + 34, chart.x.title, 12, 'middle')
      : '',
    chart.y.titleVisible
      ? `<g transform="translate(16 ${(frame.top + frame.bottom) / 2}) rotate(-90)">${label(0, 0, chart.y.title, 12, 'middle')}</g>`
      : '',
    legend ? drawLegend(drawn, frame.left, height - 12) : '',
  ];
  const size = `width="${width}" height="${height}" viewBox="0 0 ${width} ${height}"`;
  return `<svg xmlns="http://www.w3.org/2000/svg" ${size}>${parts.join('')}</svg>`;
}

interface Frame {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
}

function drawnSeries(book: Book, chart: ChartState, series: SeriesState, index: number): Drawn {
  const type = series.chartType ?? chart.chartType;
  const linedByType = /Lines|Smooth|^Line/.test(type);
  const markedByType = !/NoMarkers|^Line$/.test(type);
  return {
    series,
    points: pointsOf(book, series),
    color: series.lineColor ?? series.markerColor ?? COLORS[index % COLORS.length] ?? '#000',
    markers: series.markerStyle === 'None' ? false : series.markerStyle === 'Automatic' ? markedByType : true,
    line: series.lineVisible ?? linedByType,
  };
}

function pointsOf(book: Book, series: SeriesState): (readonly [number, number] | null)[] {
  if (!series.ySource) return [];
  const ys = numbers(book, series.ySource);
  const xs = series.xSource ? numbers(book, series.xSource) : ys.map((_, index) => index + 1);
  return ys.map((value, index) => {
    const across = xs[index];
    return value === null || across === null || across === undefined ? null : [across, value];
  });
}

function numbers(book: Book, source: { sheet: string; rect: Frame }): (number | null)[] {
  const values: (number | null)[] = [];
  const { sheet, rect } = source;
  for (let row = rect.top; row <= rect.bottom; row++) {
    for (let column = rect.left; column <= rect.right; column++) {
      const { value } = book.grid.read(sheet, row, column);
      values.push(typeof value === 'number' ? value : null);
    }
  }
  return values;
}

function gridAndTicks(x: AxisScale, y: AxisScale, frame: Frame, across: AxisState, up: AxisState): string[] {
  const line = (x1: number, y1: number, x2: number, y2: number, color: string) =>
    `<line x1="${x1.toFixed(1)}" y1="${y1.toFixed(1)}" x2="${x2.toFixed(1)}" y2="${y2.toFixed(1)}" stroke="${color}"/>`;
  const parts: string[] = [];
  for (const tick of y.ticks) {
    const at = y.place(tick.value);
    if (up.gridlines) parts.push(line(frame.left, at, frame.right, at, '#e3e6e9'));
    if (up.visible) parts.push(label(frame.left - 6, at + 4, tick.text, 11, 'end'));
  }
  for (const tick of x.ticks) {
    const at = x.place(tick.value);
    if (across.gridlines) parts.push(line(at, frame.top, at, frame.bottom, '#e3e6e9'));
    if (across.visible) parts.push(label(at, frame.bottom + 16, tick.text, 11, 'middle'));
  }
  parts.push(line(frame.left, frame.bottom, frame.right, frame.bottom, '#6b7279'));
  parts.push(line(frame.left, frame.top, frame.left, frame.bottom, '#6b7279'));
  return parts;
}

function drawSeries(drawn: Drawn, x: AxisScale, y: AxisScale, frame: Frame): string {
  const placed = drawn.points.map((point) => {
    if (!point) return null;
    const at = [x.place(point[0]), y.place(point[1])] as const;
    return at.every(Number.isFinite) ? at : null;
  });
  const { color, series } = drawn;
  let path = '';
  let pen = 'M';
  for (const at of placed) {
    if (!at) {
      pen = 'M';
      continue;
    }
    path += `${pen}${at[0].toFixed(1)} ${at[1].toFixed(1)}`;
    pen = 'L';
  }
  const dash = /Dash/.test(series.lineStyle)
    ? ' stroke-dasharray="6 4"'
    : /Dot/.test(series.lineStyle)
      ? ' stroke-dasharray="2 3"'
      : '';
  const weight = series.lineWeight / 0.75;
  const line =
    drawn.line && path
      ? `<path d="${path}" fill="none" stroke="${color}" stroke-width="${weight}"${dash}/>`
      : '';
  const fill = series.markerColor ?? color;
  const radius = series.markerSize / 0.75 / 2;
  const inFrame = ([left, top]: readonly [number, number]) =>
    left >= frame.left - 1 && left <= frame.right + 1 && top >= frame.top - 1 && top <= frame.bottom + 1;
  const markers = drawn.markers
    ? placed
        .map((at) =>
          at && inFrame(at)
            ? `<circle cx="${at[0].toFixed(1)}" cy="${at[1].toFixed(1)}" r="${radius}" fill="${fill}"/>`
            : '',
        )
        .join('')
    : '';
  return line + markers;
}

function drawLegend(drawn: readonly Drawn[], left: number, bottom: number): string {
  let at = left;
  const parts: string[] = [];
  for (const { series, color, markers, line } of drawn) {
    const mark = line
      ? `<line x1="${at}" y1="${bottom - 4}" x2="${at + 18}" y2="${bottom - 4}" stroke="${color}" stroke-width="2"/>`
      : '';
    const dot = markers
      ? `<circle cx="${at + 9}" cy="${bottom - 4}" r="3" fill="${series.markerColor ?? color}"/>`
      : '';
    parts.push(mark, dot, label(at + 24, bottom, series.name, 11, 'start'));
    at += 40 + series.name.length * 6.2;
  }
  return parts.join('');
}

function label(
  x: number,
  y: number,
  text: string,
  size: number,
  anchor: 'start' | 'middle' | 'end',
  color = '#4a5057',
): string {
  const at = `x="${x.toFixed(1)}" y="${y.toFixed(1)}"`;
  return `<text ${at} font-size="${size}" text-anchor="${anchor}" fill="${color}" ${TEXT}>${escapeText(text)}</text>`;
}

function escapeText(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}

/** The picture as the data URL of an image. */
export function pictureUrl(svg: string): string {
  const bytes = new TextEncoder().encode(svg);
  let binary = '';
  for (const byte of bytes) binary += String.fromCharCode(byte);
  return `data:image/svg+xml;base64,${btoa(binary)}`;
}
