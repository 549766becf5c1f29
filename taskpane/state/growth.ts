import { formatBlock, parseBlock } from '../host/address.ts';
import type { CellChange } from '../host/workbook.ts';
import type { Choice, Place } from './choice.ts';

/** Two places that end in the same row, one row longer. */
export interface Growth {
  readonly x: Place;
  readonly y: Place;
  /** The cells right below the present ones. */
  readonly belowX: Place;
  readonly belowY: Place;
}

/** The row right below both columns of readings, when a change touched it; undefined for any other arrangement. */
export function growthAfter(choice: Choice, change: CellChange): Growth | undefined {
  const x = parseBlock(choice.x.address);
  const y = parseBlock(choice.y.address);
  const changed = parseBlock(change.address);
  if (x === undefined || y === undefined || changed === undefined || change.kind !== 'cells')
    return undefined;
  const columns = x.left === x.right && y.left === y.right && x.bottom === y.bottom && x.bottom > x.top;
  if (!columns || choice.x.sheet !== choice.y.sheet || change.sheet !== choice.x.sheet) return undefined;
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
