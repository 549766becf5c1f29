import type { Book, ChartState } from './book.ts';
import { chartPicture, pictureUrl } from './chartPicture.ts';

/** Keeps a picture over the cells for every chart, redrawn a moment after something changes. */
export function attachCharts(book: Book, delay = 60): void {
  const waiting = new Map<ChartState, ReturnType<typeof setTimeout>>();
  book.onDraw((chart, shown) => {
    const pending = waiting.get(chart);
    if (pending !== undefined) clearTimeout(pending);
    waiting.delete(chart);
    if (!shown) {
      book.grid.hidePicture(chart.sheet, chart.id);
      return;
    }
    waiting.set(
      chart,
      setTimeout(() => {
        waiting.delete(chart);
        book.grid.showPicture(chart.sheet, chart.id, {
          source: pictureUrl(chartPicture(book, chart)),
          name: chart.title || chart.name,
          left: chart.left / 0.75,
          top: chart.top / 0.75,
          width: chart.width / 0.75,
          height: chart.height / 0.75,
        });
      }, delay),
    );
  });
}
