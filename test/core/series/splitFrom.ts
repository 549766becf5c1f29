import { readCells } from '../../../core/readings/readCells.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import { type SplitSeries, splitSeries } from '../../../core/series/splitSeries.ts';

/** Series from columns of cells as they stand in a sheet. */
export function splitFrom(keys: readonly Cell[], x: readonly Cell[], y: readonly Cell[]): SplitSeries {
  const column = (cells: readonly Cell[]): Cell[][] => cells.map((cell) => [cell]);
  return splitSeries(column(keys), readCells(column(x), column(y)));
}
