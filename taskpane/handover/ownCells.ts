import { formatBlock } from '../host/address.ts';
import type { Corner } from './liveBlock.ts';
import { fixedPlace } from './sheetCall.ts';

/** The fixed references of a block's own cells, by their place in the block. */
export function cellsBelow(
  corner: Corner,
): (row: number, column: number, rows?: number, columns?: number) => string {
  return (row, column, rows = 1, columns = 1) => {
    const top = corner.row + row;
    const left = corner.column + column;
    const address = formatBlock({ top, left, bottom: top + rows - 1, right: left + columns - 1 });
    return fixedPlace({ sheet: corner.sheet, address }, corner.sheet);
  };
}
