import type { Fit } from '../../core/fit/fit.ts';
import { drawCurve } from './drawCurve.ts';
import { type DrawingSize, drawStraight } from './drawStraight.ts';
import { printColours } from './printColours.ts';

/** A plot of a fit as the text of an SVG picture that stands alone, light, for a document. */
export function plotPicture(fit: Fit, kind: 'straight' | 'curve', size: DrawingSize): string {
  const drawing = kind === 'straight' ? drawStraight(fit, size) : drawCurve(fit, size, false);
  const svg = drawing instanceof SVGSVGElement ? drawing : drawing.querySelector('svg');
  if (svg === null) return '';
  svg.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  svg.style.fontFamily = 'system-ui, sans-serif';
  return svg.outerHTML.replace(/var\((--[a-z-]+)\)/g, (whole, name: string) => printColours[name] ?? whole);
}
