import type { FitSettings } from '../../core/given/given.ts';
import { Problem } from '../../core/problem.ts';
import { type CellRange, flatten } from '../../core/readings/cellWalk.ts';
import type { Cell } from '../../core/readings/readings.ts';
import { functionWords } from '../../core/words/functionWords.ts';
import type { Call } from '../call.ts';
import { lawOf, readingsOf, settingsOf } from '../fitting.ts';

/** Several series in one call: a key per pair of cells. */
export interface Series {
  readonly keys: readonly Cell[];
  readonly x: CellRange;
  /** y with null for every pair that was found to be blank. */
  readonly y: CellRange;
  readonly law: string;
  readonly settings: FitSettings;
}

/** The series of a call with `key`, `x`, `y` and `law`. */
export function seriesOf(call: Call): Series {
  const { readings } = readingsOf(call);
  const { count, trailingZeros } = readings;
  const keys = flatten(call.range('key'));
  if (keys.length !== count)
    throw new Problem('argument', 'key', functionWords.keysDiffer(keys.length, count));
  const y = call.range('y');
  const doubtful = trailingZeros > 0 || call.blankPairs !== undefined;
  return {
    keys,
    x: call.range('x'),
    y: doubtful ? completeOnly(y, readings.position) : y,
    law: lawOf(call),
    settings: settingsOf(call, count),
  };
}

/** y where zeros that stand for blanks are null: those whose pair is no complete reading. */
function completeOnly(y: CellRange, position: Int32Array): CellRange {
  const complete = new Set(position);
  return [flatten(y).map((cell, index) => (cell === 0 && !complete.has(index + 1) ? null : cell))];
}
