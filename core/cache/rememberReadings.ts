import { type CellRange, countCells, everyPair } from '../readings/cellWalk.ts';
import { type ReadCellsOptions, readCells } from '../readings/readCells.ts';
import type { Cell, Readings } from '../readings/readings.ts';
import { type Cache, sharedCache } from './cache.ts';
import { contentKey } from './contentKey.ts';

/** Readings with the key that stands for their content. */
export interface KeyedReadings {
  readonly readings: Readings;
  readonly key: string;
}

/** Readings read before, with the cells that gave none, by which the same cells are recognised. */
interface Recent extends KeyedReadings {
  readonly blanks: ReadCellsOptions['blanks'];
  readonly oddX: readonly Cell[];
  readonly oddY: readonly Cell[];
}

const RECENT = 'recent readings';
const MOST_RECENT = 6;
const MOST_ODD = 20_000;

/**
 * Reads cells as `readCells` does, once per distinct content: cells that were read lately are recognised by comparing
 * them with the columns, which stops at the first difference.
 * @throws what `readCells` throws
 */
export function rememberReadings(
  x: CellRange,
  y: CellRange,
  options: ReadCellsOptions = {},
  cache: Cache = sharedCache,
): KeyedReadings {
  const recents = cache.remember(RECENT, (): Recent[] => []);
  const blanks = options.blanks ?? 'distinct';
  if (options.blankPairs === undefined) {
    const at = recents.findIndex((recent) => recent.blanks === blanks && recognise(recent, x, y));
    const found = recents[at];
    if (found !== undefined) {
      recents.splice(at, 1);
      recents.unshift(found);
      return found;
    }
  }
  const readings = readCells(x, y, options);
  const { count, waiting, trailingZeros, setAside } = readings;
  const others = setAside.map((one) => one.message).join('\n');
  const key = contentKey(
    cache,
    'readings',
    [readings.x, readings.y, readings.position],
    `${count},${waiting},${trailingZeros}\n${others}`,
  );
  const odd = count - readings.x.length;
  if (options.blankPairs === undefined && odd <= MOST_ODD) {
    recents.unshift({ readings, key, blanks, ...oddCells(readings, x, y) });
    if (recents.length > MOST_RECENT) recents.length = MOST_RECENT;
  }
  return { readings, key };
}

function oddCells(readings: Readings, x: CellRange, y: CellRange): { oddX: Cell[]; oddY: Cell[] } {
  const oddX: Cell[] = [];
  const oddY: Cell[] = [];
  if (readings.x.length < readings.count) {
    let complete = 0;
    everyPair(x, y, readings.count, (index, cellX, cellY) => {
      if (readings.position[complete] === index + 1) complete++;
      else {
        oddX.push(cellX);
        oddY.push(cellY);
      }
      return true;
    });
  }
  return { oddX, oddY };
}

function recognise(recent: Recent, x: CellRange, y: CellRange): boolean {
  const { readings, oddX, oddY } = recent;
  if (countCells(x) !== readings.count || countCells(y) !== readings.count) return false;
  const { position } = readings;
  let complete = 0;
  let odd = 0;
  return everyPair(x, y, readings.count, (index, cellX, cellY) => {
    if (position[complete] === index + 1) {
      const same = Object.is(cellX, readings.x[complete]) && Object.is(cellY, readings.y[complete]);
      complete++;
      return same;
    }
    const same = sameCell(cellX, oddX[odd] ?? null) && sameCell(cellY, oddY[odd] ?? null);
    odd++;
    return same;
  });
}

function sameCell(a: Cell, b: Cell): boolean {
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return Object.is(a, b);
  return a.error === b.error;
}
