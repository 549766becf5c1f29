import type { Fit } from '../../core/fit/fit.ts';
import { cellText } from '../../core/given/cellText.ts';
import { Problem, type ProblemCode } from '../../core/problem.ts';
import { flatten } from '../../core/readings/cellWalk.ts';
import { numberFromText } from '../../core/readings/numberFromText.ts';
import type { Cell } from '../../core/readings/readings.ts';
import { functionWords } from '../../core/words/functionWords.ts';
import type { Call } from '../call.ts';
import type { Answer } from '../sheetFunction.ts';

interface ReadOffNumbers {
  readonly value: number;
  readonly standardUncertainty: number;
  readonly low: number;
  readonly high: number;
}

const MOST_CELLS = 100_000;
const NOTHING: readonly Answer[] = ['', '', '', ''];

/** Problems of one value, which leave the other rows standing. */
const ownProblems: ReadonlySet<ProblemCode> = new Set<ProblemCode>(['domain', 'undefined', 'noConvergence']);

function numberAt(cell: Cell, position: number): number | undefined {
  const text = cellText(cell, 'at');
  if (text === '') return undefined;
  const value = typeof cell === 'boolean' ? Number.NaN : numberFromText(text);
  if (Number.isNaN(value)) {
    throw new Problem('argument', 'at', functionWords.notNumberAt('at', position, text), { position });
  }
  return value;
}

/** One row of value, standard uncertainty, low and high for every cell of `at`; a blank cell gives a blank row. */
export function readOffRows(
  call: Call,
  fit: Fit,
  readOff: (fit: Fit, at: number) => ReadOffNumbers,
): (readonly Answer[])[] {
  const cells = flatten(call.range('at'));
  if (cells.length > MOST_CELLS) {
    throw new Problem('argument', 'at', functionWords.tooManyCells(cells.length, MOST_CELLS));
  }
  const wanted = cells.map((cell, index) => numberAt(cell, index + 1));
  return wanted.map((at) => {
    if (at === undefined) return NOTHING;
    try {
      const { value, standardUncertainty, low, high } = readOff(fit, at);
      return [value, standardUncertainty, low, high];
    } catch (error) {
      if (wanted.length > 1 && error instanceof Problem && ownProblems.has(error.code)) {
        return [error, error, error, error];
      }
      throw error;
    }
  });
}
