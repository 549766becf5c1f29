import { asCell } from '../readings/asCell.ts';
import { countCells, everyPair, type RawRange } from '../readings/cellWalk.ts';
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
 * them with the columns, which stops at the first difference; older ones are found by their content.
 * @throws what `readCells` throws
 */
export function rememberReadings(
  x: RawRange,
  y: RawRange,
  options: ReadCellsOptions = {},
  cache: Cache = sharedCache,
): KeyedReadings {
  const { blanks = 'distinct', toCell = asCell } = options;
  const recents = cache.remember(RECENT, (): Recent[] => []);
  const recognisable = options.blankPairs === undefined;
  if (recognisable) {
    const difference: Difference = { index: 0 };
    const at = recents.findIndex(
      (recent) => recent.blanks === blanks && recognise(recent, x, y, toCell, difference),
    );
    const found = recents[at];
    if (found !== undefined) {
      recents.splice(at, 1);
      recents.unshift(found);
      return found;
    }
  }
  const readings = readCells(x, y, options);
  const key = readingsKey(readings, cache);
  if (recognisable && readings.count - readings.x.length <= MOST_ODD) {
    recents.unshift({ readings, key, blanks, ...oddCells(readings, x, y, toCell) });
    if (recents.length > MOST_RECENT) recents.length = MOST_RECENT;
  }
  return { readings, key };
}

function readingsKey(readings: Readings, cache: Cache): string {
  const { x, y, position, count, waiting, trailingZeros, setAside } = readings;
  // Positions that count up from 1 go without saying.
  const gaps = x.length > 0 && position[x.length - 1] !== x.length;
  const others = setAside.map((one) => one.message).join('\n');
  return contentKey(
    cache,
    'readings',
    gaps ? [x, y, position] : [x, y],
    `${count},${waiting},${trailingZeros}\n${others}`,
  );
}

function oddCells(
  readings: Readings,
  x: RawRange,
  y: RawRange,
  toCell: (value: unknown) => Cell,
): { oddX: Cell[]; oddY: Cell[] } {
  const oddX: Cell[] = [];
  const oddY: Cell[] = [];
  if (readings.x.length < readings.count) {
    let complete = 0;
    everyPair(x, y, readings.count, (index, cellX, cellY) => {
      if (readings.position[complete] === index + 1) complete++;
      else {
        oddX.push(toCell(cellX));
        oddY.push(toCell(cellY));
      }
      return true;
    });
  }
  return { oddX, oddY };
}

/** Where cells last differed from readings read before: a reading typed anew differs there from all of them. */
interface Difference {
  index: number;
}

function recognise(
  recent: Recent,
  x: RawRange,
  y: RawRange,
  toCell: (value: unknown) => Cell,
  difference: Difference,
): boolean {
  const { readings, oddX, oddY } = recent;
  const { count, position, x: predictor, y: response } = readings;
  let complete = 0;
  let odd = 0;
  const same = (index: number, cellX: unknown, cellY: unknown): boolean => {
    if (position[complete] === index + 1) {
      const equal = cellX === predictor[complete] && cellY === response[complete];
      complete++;
      return equal;
    }
    const equal = sameCell(toCell(cellX), oddX[odd] ?? null) && sameCell(toCell(cellY), oddY[odd] ?? null);
    odd++;
    return equal;
  };
  // Single columns, as a rule, need no counting.
  if (x.length === count && y.length === count) {
    // Readings without a gap above them stand in the rows of their own numbers.
    const leading = position[predictor.length - 1] === predictor.length ? predictor.length : 0;
    const { index: likely } = difference;
    if (likely < leading && (x[likely]?.[0] !== predictor[likely] || y[likely]?.[0] !== response[likely]))
      return false;
    complete = sameNumbers(x, y, predictor, response, leading);
    for (let index = complete; index < count; index++) {
      const rowX = x[index];
      const rowY = y[index];
      const differs = index < leading || rowX?.length !== 1 || rowY?.length !== 1;
      if (differs || !same(index, rowX[0], rowY[0])) {
        difference.index = index;
        return false;
      }
    }
    return true;
  }
  if (countCells(x) !== count || countCells(y) !== count) return false;
  return everyPair(x, y, count, same);
}

/** How many leading rows of two columns of cells hold the numbers of a predictor and a response, at most `leading`. */
function sameNumbers(
  x: RawRange,
  y: RawRange,
  predictor: Float64Array,
  response: Float64Array,
  leading: number,
): number {
  for (let index = 0; index < leading; index++) {
    const rowX = x[index] ?? NO_ROW;
    const rowY = y[index] ?? NO_ROW;
    const cellX = rowX[0];
    const cellY = rowY[0];
    // Knowing them to be numbers spares the engine a comparison of anything with anything.
    if (typeof cellX !== 'number' || typeof cellY !== 'number') return index;
    if (cellX !== predictor[index] || cellY !== response[index]) return index;
    if (rowX.length !== 1 || rowY.length !== 1) return index;
  }
  return leading;
}

const NO_ROW: readonly unknown[] = [];

function sameCell(a: Cell, b: Cell): boolean {
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return a === b;
  return a.error === b.error;
}
