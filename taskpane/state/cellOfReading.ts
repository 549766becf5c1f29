import { formatBlock, parseBlock } from '../host/address.ts';
import type { Place } from './choice.ts';

/**
 * The cell at a position of a place read row by row.
 * @param position 1-based
 */
export function cellAt(place: Place, position: number): Place | undefined {
  const block = parseBlock(place.address);
  if (block === undefined) return undefined;
  const columns = block.right - block.left + 1;
  const row = block.top + Math.floor((position - 1) / columns);
  const column = block.left + ((position - 1) % columns);
  if (position < 1 || row > block.bottom) return undefined;
  return {
    sheet: place.sheet,
    address: formatBlock({ top: row, left: column, bottom: row, right: column }),
  };
}

/** The two cells of a reading as one place where they lie side by side, else the cell of y. */
export function cellsOfReading(x: Place, y: Place, position: number): Place | undefined {
  const cellX = cellAt(x, position);
  const cellY = cellAt(y, position);
  const blockX = cellX && parseBlock(cellX.address);
  const blockY = cellY && parseBlock(cellY.address);
  if (!blockX || !blockY || x.sheet !== y.sheet) return cellY;
  if (blockX.top !== blockY.top || Math.abs(blockX.left - blockY.left) !== 1) return cellY;
  return {
    sheet: y.sheet,
    address: formatBlock({
      ...blockY,
      left: Math.min(blockX.left, blockY.left),
      right: Math.max(blockX.right, blockY.right),
    }),
  };
}
