import { useLayoutEffect, useMemo, useRef, useState } from 'preact/hooks';
import { plotWords } from '../../core/words/plotWords.ts';
import type { Drawing } from './drawStraight.ts';
import { markReading, nearestReading } from './markReading.ts';
import type { Point } from './thin.ts';

const NARROWEST = 260;

export interface FigureProps {
  /** Draws at a width; a new function draws anew. */
  readonly draw: (width: number) => Drawing;
  /** The finding, as a sentence. */
  readonly name: string;
  readonly points: readonly Point[];
  readonly selected: number | null;
  readonly onSelect: (position: number | null) => void;
}

/** A plot as wide as its place, whose readings are picked with the pointer or with the arrow keys. */
export function Figure({ draw, name, points, selected, onSelect }: FigureProps) {
  const place = useRef<HTMLDivElement>(null);
  const [drawing, setDrawing] = useState<Drawing | null>(null);
  const [width, setWidth] = useState(0);

  useLayoutEffect(() => {
    const element = place.current;
    if (element === null) return;
    const measure = (): void => setWidth(Math.max(NARROWEST, Math.floor(element.clientWidth)));
    measure();
    const observer = new ResizeObserver(measure);
    observer.observe(element);
    return () => observer.disconnect();
  }, []);

  useLayoutEffect(() => {
    if (width === 0 || place.current === null) return;
    const drawn = draw(width);
    drawn.setAttribute('aria-hidden', 'true');
    place.current.replaceChildren(drawn);
    setDrawing(drawn);
  }, [draw, width]);

  const chosen = points.find((point) => point.position === selected);
  useLayoutEffect(() => {
    if (drawing !== null) markReading(drawing, chosen);
  }, [chosen, drawing]);

  // Sorted when a key is first pressed: most plots are only looked at.
  const inOrder = useMemo(() => {
    let order: Point[] | undefined;
    return (): readonly Point[] => {
      order ??= [...points].sort((a, b) => a.x - b.x || a.position - b.position);
      return order;
    };
  }, [points]);
  const pick = (event: MouseEvent): void => {
    if (drawing !== null) onSelect(nearestReading(drawing, points, event));
  };
  const step = (event: KeyboardEvent): void => {
    const next = steppedTo(event.key, inOrder(), selected);
    if (next === undefined) return;
    event.preventDefault();
    onSelect(next);
  };
  const shown = chosen === undefined ? '' : plotWords.picked(chosen.position, chosen.x, chosen.y);
  return (
    <div class="figure-plot">
      <div
        class="figure-drawing"
        ref={place}
        role="img"
        aria-label={`${name} ${plotWords.keys}`}
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the arrow keys step through the readings in it
        tabIndex={0}
        onClick={pick}
        onKeyDown={step}
      />
      <p class="figure-picked" aria-live="polite">
        {shown}
      </p>
    </div>
  );
}

/** The reading that a key leads to, in order; undefined for a key that leads nowhere. */
function steppedTo(key: string, order: readonly Point[], selected: number | null): number | null | undefined {
  if (key === 'Escape') return null;
  const at = order.findIndex((point) => point.position === selected);
  const target = {
    ArrowRight: at + 1,
    ArrowUp: at + 1,
    ArrowLeft: at < 0 ? order.length - 1 : at - 1,
    ArrowDown: at < 0 ? order.length - 1 : at - 1,
    Home: 0,
    End: order.length - 1,
  }[key];
  if (target === undefined) return undefined;
  return order[Math.min(order.length - 1, Math.max(0, target))]?.position;
}
