import type { SelectedArea, Workbook } from '../host/workbook.ts';
import { type Arrangement, arrange } from './arrange.ts';

/** Header cells are looked for in this many rows above the selection. */
const HEADER_ROWS = 40;

/**
 * The readings among the cells that are selected in the sheet.
 * @throws HostTrouble, or Problem saying what to select instead
 */
export async function takeSelection(workbook: Workbook): Promise<Arrangement> {
  return arrangeAreas(workbook, await workbook.selection());
}

/** The readings among some areas. */
export async function arrangeAreas(workbook: Workbook, areas: readonly SelectedArea[]): Promise<Arrangement> {
  return arrange(
    await Promise.all(
      areas.map(async (area) => ({
        area,
        cells: await workbook.readCells(area),
        above: await workbook.cellsAbove(area, HEADER_ROWS),
      })),
    ),
  );
}
