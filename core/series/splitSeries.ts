import { Problem } from '../problem.ts';
import type { CellRange } from '../readings/cellWalk.ts';
import { readCells } from '../readings/readCells.ts';
import type { Cell, Readings, SetAside } from '../readings/readings.ts';
import { seriesWords } from '../words/seriesWords.ts';

/** A key as it is shown: trimmed text, a number or a truth value. */
export type SeriesKey = string | number | boolean;

/** The readings of one key; positions are those among all the input cells. */
export interface KeyedSeries {
  readonly key: SeriesKey;
  readonly readings: Readings;
}

/**
 * Splits readings into series by key, in order of first appearance. A number and a text that looks like it are different
 * keys; a pair with a blank key (or #N/A) belongs to no series.
 * @param keys one per pair of cells
 * @param x range of predictor cells; blank cells are null
 * @param y range of response cells
 * @throws Problem `cell` when a key, or a cell of x or y, holds an error; `argument` when sizes differ or all keys are blank
 */
export function splitSeries(keys: readonly Cell[], x: CellRange, y: CellRange): KeyedSeries[] {
  const all = readCells(x, y, { blanks: 'distinct' });
  const names: SeriesKey[] = [];
  const numberOf = new Map<SeriesKey, number>();
  const belongsTo = new Int32Array(all.count).fill(-1);
  keys.forEach((cell, index) => {
    const key = keyOf(cell, index + 1);
    if (key === null) return;
    let number = numberOf.get(key);
    if (number === undefined) {
      number = names.length;
      numberOf.set(key, number);
      names.push(key);
    }
    belongsTo[index] = number;
  });
  if (names.length === 0) throw new Problem('argument', 'key', seriesWords.noKeys());
  return columnsOf(all, names, belongsTo);
}

/** Sorts complete readings into one stretch of memory per series. */
function columnsOf(all: Readings, names: readonly SeriesKey[], belongsTo: Int32Array): KeyedSeries[] {
  const n = all.x.length;
  const seriesAt = (i: number): number => belongsTo[(all.position[i] as number) - 1] ?? -1; // i < n
  const ends = new Int32Array(names.length + 1);
  for (let i = 0; i < n; i++) {
    const series = seriesAt(i);
    if (series >= 0) ends[series + 1] = (ends[series + 1] as number) + 1;
  }
  for (let k = 0; k < names.length; k++) ends[k + 1] = (ends[k + 1] as number) + (ends[k] as number);
  const next = ends.slice();
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
  const asides = new Map<number, SetAside[]>();
  for (const one of all.setAside) {
    const series = belongsTo[one.position - 1] ?? -1;
    const list = asides.get(series);
    if (list === undefined) asides.set(series, [one]);
    else list.push(one);
  }
  return names.map((key, k) => {
    const [from, to] = [ends[k] ?? 0, ends[k + 1] ?? 0];
    return {
      key,
      readings: {
        x: x.subarray(from, to),
        y: y.subarray(from, to),
        position: position.subarray(from, to),
        count: all.count,
        setAside: asides.get(k) ?? NONE,
        waiting: 0,
        trailingZeros: 0,
      },
    };
  });
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
