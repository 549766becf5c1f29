import { type Block, formatBlock, parseBlock } from '../host/address.ts';
import type { CellChange } from '../host/workbook.ts';
import type { Choice, Place, SpreadEntry } from './choice.ts';

/** Two places that end in the same row, one row longer. */
export interface Growth {
  readonly x: Place;
  readonly y: Place;
  /** The cells right below the present ones. */
  readonly belowX: Place;
  readonly belowY: Place;
}

/** Where the readings are when they stand in two single columns of a sheet that end in the same row: such readings may go on. */
export function readingColumns({ x, y }: Choice): { readonly x: Block; readonly y: Block } | undefined {
  const [first, second] = [parseBlock(x.address), parseBlock(y.address)];
  if (first === undefined || second === undefined || x.sheet !== y.sheet) return undefined;
  const single = first.left === first.right && second.left === second.right;
  const level = first.bottom === second.bottom && first.bottom > first.top;
  return single && level ? { x: first, y: second } : undefined;
}

/** The row right below both columns of readings, when a change touched it; undefined for any other arrangement. */
export function growthAfter(choice: Choice, change: CellChange): Growth | undefined {
  const columns = readingColumns(choice);
  const changed = parseBlock(change.address);
  if (columns === undefined || changed === undefined || change.kind !== 'cells') return undefined;
  if (change.sheet !== choice.x.sheet) return undefined;
  const { x, y } = columns;
  const below = x.bottom + 1;
  const touches = (column: number) =>
    changed.top <= below && below <= changed.bottom && changed.left <= column && column <= changed.right;
  if (!touches(x.left) && !touches(y.left)) return undefined;
  const grown = (place: Place, top: number, column: number): Place => ({
    sheet: place.sheet,
    address: formatBlock({ top, left: column, bottom: below, right: column }),
  });
  return {
    x: grown(choice.x, x.top, x.left),
    y: grown(choice.y, y.top, y.left),
    belowX: grown(choice.x, below, x.left),
    belowY: grown(choice.y, below, y.left),
  };
}

/** A choice with its readings in other cells; uncertainties that stand beside them, cell for cell, go along. */
export function withPlaces(choice: Choice, places: Pick<Choice, 'x' | 'y'>): Choice {
  const spread = (entry: SpreadEntry): SpreadEntry =>
    entry.kind === 'range' && isBeside(entry.place, choice.y)
      ? { kind: 'range', place: besides(entry.place, places.y) }
      : entry;
  return {
    ...choice,
    x: places.x,
    y: places.y,
    spreadY: spread(choice.spreadY),
    spreadX: spread(choice.spreadX),
  };
}

/** Whether a column has the same rows as another. */
function isBeside(place: Place, other: Place): boolean {
  return besides(place, other).address === place.address;
}

/** The cells of a column in the rows of another: a column chosen before the readings grew or moved. */
export function besides(place: Place, rows: Place): Place {
  const block = parseBlock(place.address);
  const other = parseBlock(rows.address);
  if (block === undefined || other === undefined) return place;
  if (block.left !== block.right || other.left !== other.right) return place;
  return { sheet: place.sheet, address: formatBlock({ ...block, top: other.top, bottom: other.bottom }) };
}
