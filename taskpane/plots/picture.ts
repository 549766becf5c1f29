import type { Fit } from '../../core/fit/fit.ts';
import { drawCurve, spansDecades } from './drawCurve.ts';
import { type DrawingSize, drawStraight } from './drawStraight.ts';
import { printColours } from './printColours.ts';

/** A plot of a fit as the text of an SVG picture that stands alone, light, for a document. */
export function plotPicture(fit: Fit, kind: 'straight' | 'curve', size: DrawingSize): string {
  const drawing = kind === 'straight' ? drawStraight(fit, size) : drawCurve(fit, size, spansDecades(fit));
  const svg = drawing instanceof SVGSVGElement ? drawing : drawing.querySelector('svg');
  if (svg === null) return '';
  svg.style.fontFamily = 'system-ui, sans-serif';
  // As XML, which HTML's own way of writing is not: a hard space in a title would break the picture.
  const text = new XMLSerializer().serializeToString(svg);
  return text.replace(/var\((--[a-z-]+)\)/g, (whole, name: string) => printColours[name] ?? whole);
}
