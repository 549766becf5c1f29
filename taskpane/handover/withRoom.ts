import { formatBlock, LAST_ROW } from '../host/address.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice, Place } from '../state/choice.ts';
import { readingColumns, withPlaces } from '../state/growth.ts';

/** Readings still to be typed that the formulas of a hand-over take in by themselves. */
const ROOM = 50;

/**
 * A choice whose two columns of readings go on over the blank cells below them, so that formulas take in what is still
 * to be typed there; what else stands further down keeps a blank row in between. Any other arrangement stays as it is.
 */
export async function withRoom(workbook: Workbook, choice: Choice): Promise<Choice> {
  const columns = readingColumns(choice);
  if (columns === undefined) return choice;
  const { x, y } = columns;
  const rows = Math.min(ROOM + 1, LAST_ROW - x.bottom);
  if (rows < 1) return choice;
  const place = (top: number, bottom: number, column: number): Place => ({
    sheet: choice.x.sheet,
    address: formatBlock({ top, left: column, bottom, right: column }),
  });
  const below = await Promise.all(
    [x.left, y.left].map((column) => workbook.readCells(place(x.bottom + 1, x.bottom + rows, column))),
  );
  const filled = Array.from({ length: rows }, (_, row) =>
    below.some((cells) => (cells[row]?.[0] ?? null) !== null),
  ).indexOf(true);
  const room = filled < 0 ? Math.min(ROOM, rows) : filled - 1;
  if (room < 1) return choice;
  return withPlaces(choice, {
    x: place(x.top, x.bottom + room, x.left),
    y: place(y.top, y.bottom + room, y.left),
  });
}
