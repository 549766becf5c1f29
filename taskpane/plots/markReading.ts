import type { Drawing } from './drawStraight.ts';
import type { Point } from './thin.ts';

const SVG = 'http://www.w3.org/2000/svg';
const CLASS = 'picked-reading';
/** How far from a reading the pointer may be, in pixels. */
const REACH = 24;

/** The SVG of a drawing, which is the drawing itself unless the library wrapped it. */
function svgOf(drawing: Drawing): SVGSVGElement | null {
  return drawing instanceof SVGSVGElement ? drawing : drawing.querySelector('svg');
}

/** Turns a value on an axis into pixels. */
function pixels(drawing: Drawing, axis: 'x' | 'y'): (value: number) => number {
  const scale = drawing.scale(axis);
  // The library types what a scale gives as unknown; both of ours give pixels.
  return (value) => Number(scale?.apply(value));
}

/** Rings a reading, or takes the ring away. */
export function markReading(drawing: Drawing, point: Point | undefined): void {
  const svg = svgOf(drawing);
  if (svg === null) return;
  svg.querySelector(`.${CLASS}`)?.remove();
  if (point === undefined) return;
  const [x, y] = [pixels(drawing, 'x')(point.x), pixels(drawing, 'y')(point.y)];
  if (!Number.isFinite(x + y)) return;
  const ring = document.createElementNS(SVG, 'circle');
  ring.setAttribute('class', CLASS);
  ring.setAttribute('cx', String(x));
  ring.setAttribute('cy', String(y));
  ring.setAttribute('r', '8');
  svg.append(ring);
}

/** The reading nearest to the pointer within reach; null when there is none. */
export function nearestReading(
  drawing: Drawing,
  points: readonly Point[],
  event: { readonly clientX: number; readonly clientY: number },
): number | null {
  const svg = svgOf(drawing);
  if (svg === null) return null;
  const box = svg.getBoundingClientRect();
  const scale = box.width / Number(svg.getAttribute('width') ?? box.width);
  const [left, top] = [(event.clientX - box.left) / scale, (event.clientY - box.top) / scale];
  const [across, down] = [pixels(drawing, 'x'), pixels(drawing, 'y')];
  // Readings out of reach sideways need no closer look: of 100,000 a few thousand are left.
  const [from, to] = [left - REACH, left + REACH].map((edge) => Number(drawing.scale('x')?.invert?.(edge)));
  if (from === undefined || to === undefined) return null;
  let best: number | null = null;
  let least = REACH * REACH;
  for (const { x, y, position } of points) {
    if (x < from || x > to) continue;
    const distance = (across(x) - left) ** 2 + (down(y) - top) ** 2;
    if (distance < least) [best, least] = [position, distance];
  }
  return best;
}
