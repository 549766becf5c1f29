import { Problem } from '../problem.ts';
import { type CellRange, countCells, flatten } from '../readings/cellWalk.ts';
import { numberFromText } from '../readings/numberFromText.ts';
import { argumentWords } from '../words/argumentWords.ts';
import { cellText, type Given, isRange, single } from './cellText.ts';
import type { Spread } from './given.ts';

export type SpreadArgument = 'u_y' | 'u_x';

function refuse(argument: SpreadArgument, message: string, position?: number): never {
  throw new Problem('argument', argument, message, position === undefined ? {} : { position });
}

/**
 * The standard uncertainty of the readings in one direction.
 * @param argument which direction; `equal` and `proportional` exist for u_y only
 * @param given nothing, a number above 0, text (`0.05`, `2%`, `equal`, `proportional`) or a range
 * @param count number of pairs of input cells; a range must have as many, and is read row by row
 * @param blanks `maybeZero` when a blank cell may arrive as 0: then a 0 in the range says nothing, as a blank does
 * @throws Problem `argument` when it is none of these, or not above 0; `cell` when a cell holds an error
 */
export function parseSpread(
  argument: SpreadArgument,
  given: Given,
  count: number,
  blanks: 'distinct' | 'maybeZero' = 'distinct',
): Spread {
  const whole = single(given);
  if (isRange(whole)) {
    return { kind: 'each', values: eachValue(argument, whole, count, blanks) };
  }
  const text = cellText(whole, argument);
  if (text === '') return { kind: 'none' };
  const word = text.toLowerCase();
  if (argument === 'u_y' && (word === 'equal' || word === 'proportional')) return { kind: word };
  if (text.includes(',')) refuse(argument, argumentWords.decimalComma(argument, text));
  const percent = text.endsWith('%');
  const value = numberFromText(percent ? text.slice(0, -1) : text);
  if (Number.isNaN(value)) refuse(argument, argumentWords.spreadText(argument, text));
  if (!(value > 0)) refuse(argument, argumentWords.spreadPositive(argument, value));
  return percent ? { kind: 'relative', fraction: value / 100 } : { kind: 'absolute', value };
}

function eachValue(
  argument: SpreadArgument,
  range: CellRange,
  count: number,
  blanks: 'distinct' | 'maybeZero',
): Float64Array {
  const cells = countCells(range);
  if (cells !== count) refuse(argument, argumentWords.spreadCount(argument, cells, count));
  const values = new Float64Array(count).fill(Number.NaN);
  const zeroIsBlank = blanks === 'maybeZero' && !range.some((row) => row.includes(null));
  flatten(range).forEach((cell, index) => {
    if (typeof cell === 'number' && cell > 0 && Number.isFinite(cell)) {
      values[index] = cell;
      return;
    }
    if (cell === null || cell === '' || (cell === 0 && zeroIsBlank)) return;
    if (typeof cell === 'object' && cell.error === '#N/A') return;
    refuse(argument, argumentWords.spreadCell(argument, index + 1, cellText(cell, argument)), index + 1);
  });
  return values;
}

/**
 * Refuses an uncertainty in x that has no stated uncertainty in y beside it.
 * @throws Problem `argument`
 */
export function requireKnownUncertainty(spreadY: Spread, spreadX: Spread): void {
  if (spreadX.kind === 'none') return;
  if (spreadY.kind === 'none' || spreadY.kind === 'equal' || spreadY.kind === 'proportional') {
    refuse('u_x', argumentWords.spreadNeedsKnown());
  }
}
