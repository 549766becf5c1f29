import type { Fit } from '../../core/fit/fit.ts';
import { drawCurve } from './drawCurve.ts';
import { type DrawingSize, drawStraight } from './drawStraight.ts';

/** The palette's light colours, for a picture that is printed on white; a test compares them with the palette. */
export const printColours: Readonly<Record<string, string>> = {
  '--paper-raised': '#ffffff',
  '--ink-soft': '#4a626a',
  '--rule': '#d9d8d0',
  '--edge': '#7b8b8e',
  '--reading': '#2b6f7c',
  '--reading-aside': '#7b8b8e',
  '--signal': '#c26d1f',
};

/** A plot of a fit as the text of an SVG picture that stands alone, light, for a document. */
export function plotPicture(fit: Fit, kind: 'straight' | 'curve', size: DrawingSize): string {
  const drawing = kind === 'straight' ? drawStraight(fit, size) : drawCurve(fit, size, false);
  const svg = drawing instanceof SVGSVGElement ? drawing : drawing.querySelector('svg');
  if (svg === null) return '';
  svg.setAttribute('xmlns', 'http://www.w3.org/2000/svg');
  svg.style.fontFamily = 'system-ui, sans-serif';
  return svg.outerHTML.replace(/var\((--[a-z-]+)\)/g, (whole, name: string) => printColours[name] ?? whole);
}
