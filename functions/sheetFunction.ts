import type { Problem } from '../core/problem.ts';
import type { Call } from './call.ts';

export interface Parameter {
  readonly name: string;
  /** One line of the host's tooltip. */
  readonly description: string;
  readonly optional: boolean;
  /** `matrix` takes a range or one cell; `scalar` one cell. */
  readonly dimensionality: 'scalar' | 'matrix';
}

/** What a cell of an answer may be before it becomes a legal cell: an absent number shows as nothing, a Problem as an error. */
export type Answer = number | string | boolean | null | Problem;

interface Declaration {
  /** Name below the namespace. */
  readonly id: string;
  readonly description: string;
  readonly parameters: readonly Parameter[];
}

export interface ScalarFunction extends Declaration {
  readonly result: 'scalar';
  readonly compute: (call: Call) => Answer;
}

export interface TableFunction extends Declaration {
  readonly result: 'matrix';
  readonly compute: (call: Call) => readonly (readonly Answer[])[];
}

/** One sheet function: its metadata, its registration and its line in the README all come from this. */
export type SheetFunction = ScalarFunction | TableFunction;
