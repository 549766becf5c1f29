import { type KeyedReadings, rememberReadings } from '../../core/cache/rememberReadings.ts';
import type { Cell } from '../../core/readings/readings.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice, Place, SpreadEntry } from './choice.ts';

type Cells = readonly (readonly Cell[])[];

/** The cells that a choice stands on, as they are in the sheet now. */
export interface SheetCells {
  readonly x: Cells;
  readonly y: Cells;
  /** Null unless the uncertainty stands in cells. */
  readonly spreadY: Cells | null;
  readonly spreadX: Cells | null;
  /** The places they were read from. */
  readonly of: string;
}

function placesOf({ x, y, spreadY, spreadX }: Choice): string {
  return JSON.stringify([x, y, spreadY, spreadX]);
}

/** Whether cells were read from the places that a choice names. */
export function cellsAreOf(cells: SheetCells | null, choice: Choice): boolean {
  return cells?.of === placesOf(choice);
}

export async function readSheetCells(workbook: Workbook, choice: Choice): Promise<SheetCells> {
  const read = (place: Place): Promise<Cells> => workbook.readCells(place);
  const spread = (entry: SpreadEntry): Promise<Cells | null> =>
    entry.kind === 'range' ? read(entry.place) : Promise.resolve(null);
  const [x, y, spreadY, spreadX] = await Promise.all([
    read(choice.x),
    read(choice.y),
    spread(choice.spreadY),
    spread(choice.spreadX),
  ]);
  return { x, y, spreadY, spreadX, of: placesOf(choice) };
}

function same(one: Cells | null, other: Cells | null): boolean {
  if (one === null || other === null) return one === other;
  return (
    one.length === other.length &&
    one.every((row, r) => {
      const beside = other[r];
      return row.length === beside?.length && row.every((cell, c) => sameCell(cell, beside[c]));
    })
  );
}

function sameCell(one: Cell, other: Cell | undefined): boolean {
  if (typeof one !== 'object' || one === null) return one === other;
  return typeof other === 'object' && other !== null && one.error === other.error;
}

export function sameCells(one: SheetCells | null, other: SheetCells): boolean {
  return (
    one !== null &&
    one.of === other.of &&
    same(one.x, other.x) &&
    same(one.y, other.y) &&
    same(one.spreadY, other.spreadY) &&
    same(one.spreadX, other.spreadX)
  );
}

/**
 * The readings in the cells, without those that the user leaves out for a look: their y counts as not there.
 * @throws Problem what `readCells` throws
 */
export function readingsIn(cells: SheetCells, leftOut: readonly number[]): KeyedReadings {
  if (leftOut.length === 0) return rememberReadings(cells.x, cells.y);
  const out = new Set(leftOut);
  let position = 0;
  const y = cells.y.map((row) =>
    row.map((cell) => {
      position++;
      return out.has(position) ? null : cell;
    }),
  );
  return rememberReadings(cells.x, y);
}
