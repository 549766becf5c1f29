import { Problem } from '../problem.ts';
import { readingWords } from '../words/readingWords.ts';
import { asCell } from './asCell.ts';
import { countCells, everyPair, isColumn, type RawRange } from './cellWalk.ts';
import { numberFromText } from './numberFromText.ts';
import type { Cell, Readings, SetAside } from './readings.ts';

export interface ReadCellsOptions {
  /**
   * `distinct` (default): a blank cell arrives as null. `maybeZero`: it may arrive as 0, so that pairs with y = 0 after
   * the last non-zero y are taken as not there yet, unless a null among the cells shows that the host tells them apart.
   */
  readonly blanks?: 'distinct' | 'maybeZero';
  /** What the host says of the cells: 1 for every pair with a blank cell, in order. Then nothing is ambiguous. */
  readonly blankPairs?: Uint8Array;
  /** Turns whatever the host calls a cell into one of ours; called for cells that are not numbers only. */
  readonly toCell?: (value: unknown) => Cell;
}

enum Kind {
  Number = 0,
  Waiting = 1,
  Other = 2,
}

function kindOf(cell: Cell, position: number, argument: 'x' | 'y'): Kind {
  if (typeof cell === 'number') {
    if (Number.isFinite(cell)) return Kind.Number;
    throw cellProblem(position, argument, '#NUM!');
  }
  if (cell === null || cell === '') return Kind.Waiting;
  if (typeof cell !== 'object') return Kind.Other;
  if (cell.error === '#N/A') return Kind.Waiting;
  throw cellProblem(position, argument, cell.error);
}

function cellProblem(position: number, argument: string, error: string): Problem {
  return new Problem('cell', argument, readingWords.cellError(position, argument, error), {
    position,
    cellError: error,
  });
}

function setAsideFor(position: number, argument: 'x' | 'y', cell: Cell): SetAside {
  if (typeof cell === 'boolean') {
    return { position, reason: 'boolean', message: readingWords.boolean(position, argument, cell) };
  }
  const text = String(cell);
  const start = text.trimStart();
  if (
    (start.startsWith('<') || start.startsWith('≤')) &&
    !Number.isNaN(numberFromText(start.replace(/^<=|^[<≤]/, '')))
  ) {
    return {
      position,
      reason: 'belowDetection',
      message: readingWords.belowDetection(position, argument, text),
    };
  }
  const words = Number.isNaN(numberFromText(text)) ? readingWords.text : readingWords.numberAsText;
  return { position, reason: 'text', message: words(position, argument, text) };
}

/**
 * Reads pairs of cells into columns of readings, each number copied once.
 * @param x range of predictor cells, any shape
 * @param y range of response cells, with as many cells as x; both are read row by row
 * @returns complete readings as columns; the other pairs counted (blank, empty text or #N/A in either cell) or set
 *   aside with a sentence that names their 1-based position (other text, booleans)
 * @throws Problem `argument` when the numbers of cells differ or there are none; `cell` when a cell holds an error
 *   other than #N/A
 * @example readCells([[1], [2]], [[2.1], ['']]).x // Float64Array [1], with one pair waiting
 */
export function readCells(x: RawRange, y: RawRange, options: ReadCellsOptions = {}): Readings {
  // Most columns are numbers down to where the next reading will be typed.
  const predictors = new Float64Array(x.length);
  const responses = new Float64Array(x.length);
  const numbers = x.length === y.length ? readNumbers(x, y, predictors, responses) : 0;
  const columns = isColumn(x, numbers) && isColumn(y, numbers);
  const count = columns ? x.length : countCells(x);
  const countY = columns ? y.length : countCells(y);
  if (count !== countY) throw new Problem('argument', 'y', readingWords.sizesDiffer(count, countY));
  if (count === 0) throw new Problem('argument', 'x', readingWords.noCells('x'));
  const predictor = columns ? predictors : new Float64Array(count);
  const response = columns ? responses : new Float64Array(count);
  const position = new Int32Array(count);
  const setAside: SetAside[] = [];
  const { blankPairs, toCell = asCell } = options;
  let complete = 0;
  let waiting = 0;
  let lastNonZero = 0;
  let blankSeen = false;

  const visit = (index: number, rawX: unknown, rawY: unknown): boolean => {
    if (isFiniteNumber(rawX) && isFiniteNumber(rawY) && blankPairs?.[index] !== 1) {
      // Adding 0 turns −0, which no cell shows, into 0.
      predictor[complete] = rawX + 0;
      response[complete] = rawY + 0;
      position[complete] = index + 1;
      complete++;
      if (rawY !== 0) lastNonZero = complete;
      return true;
    }
    const cellX = toCell(rawX);
    const cellY = toCell(rawY);
    const kindX = kindOf(cellX, index + 1, 'x');
    const kindY = kindOf(cellY, index + 1, 'y');
    if (cellX === null || cellY === null) blankSeen = true;
    if (kindX === Kind.Waiting || kindY === Kind.Waiting || blankPairs?.[index] === 1) waiting++;
    else if (kindY === Kind.Other) setAside.push(setAsideFor(index + 1, 'y', cellY));
    else setAside.push(setAsideFor(index + 1, 'x', cellX));
    return true;
  };

  if (columns) {
    complete = blankPairs === undefined ? numbers : 0;
    for (let index = 0; index < complete; index++) position[index] = index + 1;
    lastNonZero = complete;
    while (lastNonZero > 0 && response[lastNonZero - 1] === 0) lastNonZero--;
    for (let index = complete; index < count; index++) visit(index, x[index]?.[0], y[index]?.[0]);
  } else everyPair(x, y, count, visit);

  const ambiguous = options.blanks === 'maybeZero' && blankPairs === undefined && !blankSeen;
  const trailingZeros = ambiguous ? complete - lastNonZero : 0;
  complete -= trailingZeros;
  const all = complete === count;
  return {
    x: all ? predictor : predictor.slice(0, complete),
    y: all ? response : response.slice(0, complete),
    position: all ? position : position.slice(0, complete),
    count,
    setAside,
    waiting: waiting + trailingZeros,
    trailingZeros,
  };
}

/** Reads two columns of cells as long as both hold one number. @returns how many pairs were read */
function readNumbers(x: RawRange, y: RawRange, predictor: Float64Array, response: Float64Array): number {
  const count = predictor.length;
  for (let index = 0; index < count; index++) {
    const rowX = x[index];
    const rowY = y[index];
    if (rowX?.length !== 1 || rowY?.length !== 1) return index;
    const rawX = rowX[0];
    const rawY = rowY[0];
    if (!isFiniteNumber(rawX) || !isFiniteNumber(rawY)) return index;
    predictor[index] = rawX + 0;
    response[index] = rawY + 0;
  }
  return count;
}

function isFiniteNumber(value: unknown): value is number {
  return typeof value === 'number' && value - value === 0;
}
