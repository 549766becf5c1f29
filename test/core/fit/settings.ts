import type { FitSettings } from '../../../core/given/given.ts';
import { parseKnown } from '../../../core/given/parseKnown.ts';
import { parseOptions } from '../../../core/given/parseOptions.ts';
import { parseSpread } from '../../../core/given/parseSpread.ts';
import { readCells } from '../../../core/readings/readCells.ts';
import type { Cell, Readings } from '../../../core/readings/readings.ts';

type GivenColumn = readonly (number | null)[];

export interface GivenTexts {
  readonly known?: string;
  readonly uY?: string | number | GivenColumn;
  readonly uX?: string | number | GivenColumn;
  readonly options?: string;
}

/** Settings from texts as a sheet function takes them. */
export function settingsFrom(
  { known = '', uY = '', uX = '', options = '' }: GivenTexts = {},
  count = 0,
): FitSettings {
  const given = (value: string | number | GivenColumn): Cell | Cell[][] =>
    typeof value === 'string' || typeof value === 'number' ? value : value.map((entry) => [entry]);
  return {
    known: parseKnown(known),
    spreadY: parseSpread('u_y', given(uY), count, 'distinct'),
    spreadX: parseSpread('u_x', given(uX), count, 'distinct'),
    options: parseOptions(options),
  };
}

/** Readings from two columns of cells. */
export function readingsFrom(x: readonly Cell[], y: readonly Cell[]): Readings {
  const column = (cells: readonly Cell[]): Cell[][] => cells.map((cell) => [cell]);
  return readCells(column(x), column(y), { blanks: 'distinct' });
}
