import { Problem } from '../problem.ts';
import { asCell } from '../readings/asCell.ts';
import { countCells, type RawRange } from '../readings/cellWalk.ts';
import type { Cell, Readings, SetAside } from '../readings/readings.ts';
import { seriesWords } from '../words/seriesWords.ts';

/** A key as it is shown: trimmed text, a number or a truth value. */
export type SeriesKey = string | number | boolean;

/** Complete readings of all series, one series after the other; positions are those among all the input cells. */
export interface SeriesColumns {
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly position: Int32Array;
}

/** One series: a stretch of the columns, and what its cells excluded. */
export interface KeyedSeries {
  readonly key: SeriesKey;
  readonly from: number;
  readonly to: number;
  readonly setAside: readonly SetAside[];
}

export interface SplitSeries {
  readonly columns: SeriesColumns;
  /** Number of pairs of input cells. */
  readonly count: number;
  /** In order of first appearance. */
  readonly series: readonly KeyedSeries[];
}

/**
 * Splits readings into series by key, in order of first appearance. A number and a text that looks like it are different
 * keys; a pair with a blank key (or #N/A) belongs to no series.
 * @param keys range with a cell for every pair of cells that was read, row by row
 * @param readings all that was read, of whatever series
 * @param toCell turns whatever the host calls a cell into one of ours; called for cells that are not text only
 * @throws Problem `cell` when a key holds an error; `argument` when the sizes differ or all keys are blank
 */
export function splitSeries(
  keys: RawRange,
  readings: Readings,
  toCell: (value: unknown) => Cell = asCell,
): SplitSeries {
  const { count } = readings;
  const given = countCells(keys);
  if (given !== count) throw new Problem('argument', 'key', seriesWords.keysDiffer(given, count));
  const names: SeriesKey[] = [];
  const numberOf = new Map<SeriesKey, number>();
  const belongsTo = new Int32Array(count).fill(-1);
  let index = 0;
  let cellBefore: unknown;
  for (const row of keys) {
    for (const cell of row) {
      // As a rule a series stands in rows of its own.
      if (index > 0 && cell === cellBefore) {
        belongsTo[index] = belongsTo[index - 1] as number; // index < count
        index++;
        continue;
      }
      cellBefore = cell;
      const key = keyOf(typeof cell === 'string' ? cell : toCell(cell), index + 1);
      if (key !== null) {
        let number = numberOf.get(key);
        if (number === undefined) {
          number = names.length;
          numberOf.set(key, number);
          names.push(key);
        }
        belongsTo[index] = number;
      }
      index++;
    }
  }
  if (names.length === 0) throw new Problem('argument', 'key', seriesWords.noKeys());
  return columnsOf(readings, names, belongsTo);
}

/** Complete readings as one stretch of memory per series, copied only where they stand mixed. */
function columnsOf(all: Readings, names: readonly SeriesKey[], belongsTo: Int32Array): SplitSeries {
  const n = all.x.length;
  const seriesAt = (i: number): number => belongsTo[(all.position[i] as number) - 1] ?? -1; // i < n
  const ends = new Int32Array(names.length + 1);
  let sorted = true;
  let before = 0;
  for (let i = 0; i < n; i++) {
    const series = seriesAt(i);
    if (series < before) sorted = false;
    before = series;
    if (series >= 0) ends[series + 1] = (ends[series + 1] as number) + 1;
  }
  for (let k = 0; k < names.length; k++) ends[k + 1] = (ends[k + 1] as number) + (ends[k] as number);
  const asides = new Map<number, SetAside[]>();
  for (const one of all.setAside) {
    const series = belongsTo[one.position - 1] ?? -1;
    const list = asides.get(series);
    if (list === undefined) asides.set(series, [one]);
    else list.push(one);
  }
  return {
    columns: sorted ? all : gathered(all, ends.slice(), seriesAt),
    count: all.count,
    series: names.map((key, k) => ({
      key,
      from: ends[k] ?? 0,
      to: ends[k + 1] ?? 0,
      setAside: asides.get(k) ?? NONE,
    })),
  };
}

/** Columns with the readings of one series after those of another. @param next where each series goes on */
function gathered(all: SeriesColumns, next: Int32Array, seriesAt: (i: number) => number): SeriesColumns {
  const n = all.x.length;
  const x = new Float64Array(n);
  const y = new Float64Array(n);
  const position = new Int32Array(n);
  for (let i = 0; i < n; i++) {
    const series = seriesAt(i);
    if (series < 0) continue;
    const place = next[series] as number; // series < names.length
    next[series] = place + 1;
    x[place] = all.x[i] as number; // i < n
    y[place] = all.y[i] as number;
    position[place] = all.position[i] as number;
  }
  return { x, y, position };
}

/** The readings of one series, to fit by itself. */
export function readingsOf({ columns, count }: SplitSeries, { from, to, setAside }: KeyedSeries): Readings {
  return {
    x: columns.x.subarray(from, to),
    y: columns.y.subarray(from, to),
    position: columns.position.subarray(from, to),
    count,
    setAside,
    waiting: 0,
    trailingZeros: 0,
  };
}

const NONE: readonly SetAside[] = [];

/** A key to tell series apart; null for a cell that names none. */
function keyOf(cell: Cell, position: number): SeriesKey | null {
  if (cell === null) return null;
  if (typeof cell === 'object') {
    if (cell.error === '#N/A') return null;
    throw new Problem('cell', 'key', seriesWords.keyError(position, cell.error), {
      position,
      cellError: cell.error,
    });
  }
  if (typeof cell !== 'string') return cell;
  const text = cell.trim();
  return text === '' ? null : text;
}
