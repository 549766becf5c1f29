import { useLayoutEffect, useRef } from 'preact/hooks';
import type { Fit } from '../../core/fit/fit.ts';
import { drawLaw } from './drawLaw.ts';

const WIDTH = 150;
const HEIGHT = 88;

/** A law's readings and line on its straight axes, small. */
export function LawPlot({ fit, caption }: { readonly fit: Fit; readonly caption: string }) {
  const place = useRef<HTMLSpanElement>(null);
  useLayoutEffect(() => {
    const drawn = drawLaw(fit, WIDTH, HEIGHT);
    drawn.setAttribute('aria-hidden', 'true');
    place.current?.replaceChildren(drawn);
  }, [fit]);
  return <span class="law-drawing" ref={place} role="img" aria-label={caption} />;
}
