import { cellText, type Given, single } from '../core/given/cellText.ts';
import { Problem } from '../core/problem.ts';
import type { CellRange, RawRange } from '../core/readings/cellWalk.ts';
import { numberFromText } from '../core/readings/numberFromText.ts';
import type { Cell } from '../core/readings/readings.ts';
import { functionWords } from '../core/words/functionWords.ts';
import { isNothing, isRows, toCell, toRange } from './fromHost.ts';
import type { Parameter } from './sheetFunction.ts';

/** Arguments for which a 0 means nothing, so that it must be a blank cell as some hosts hand it over. */
const neverZero: ReadonlySet<string> = new Set(['known', 'options', 'laws', 'part', 'unit']);

function isBlank(cell: unknown): boolean {
  return cell === 0 || isNothing(cell);
}

/** One call of a sheet function: its arguments by name, as core wants them. */
export class Call {
  readonly #values = new Map<string, unknown>();
  readonly #ranges = new Map<string, CellRange>();
  /** 1 for every pair of x and y with a blank cell, when the host was asked. */
  blankPairs: Uint8Array | undefined;

  /**
   * @param parameters of the function called
   * @param given what the host passed: the arguments, omitted ones null, then its invocation object
   */
  constructor(parameters: readonly Parameter[], given: readonly unknown[]) {
    parameters.forEach(({ name }, index) => {
      const value = given[index];
      if (isInvocation(value)) return;
      this.#values.set(name, neverZero.has(name) ? withoutBlankRows(value) : value);
    });
  }

  /** Whether an argument was left out or is blank. */
  omitted(name: string): boolean {
    return isNothing(this.#values.get(name));
  }

  /** An argument that must be there, as rows of whatever the host calls a cell. */
  raw(name: string): RawRange {
    const value = this.#values.get(name);
    if (value === undefined || value === null) {
      throw new Problem('argument', name, functionWords.missing(name, 'a range of cells'));
    }
    return isRows(value) ? value : this.range(name);
  }

  /** An argument that must be there, as a range of cells. */
  range(name: string): CellRange {
    const value = this.#values.get(name);
    if (value === undefined || value === null) {
      throw new Problem('argument', name, functionWords.missing(name, 'a range of cells'));
    }
    const known = this.#ranges.get(name);
    if (known !== undefined) return known;
    const range = toRange(value);
    this.#ranges.set(name, range);
    return range;
  }

  /** An argument as core's parsers take it: nothing, a cell or a range. */
  given(name: string): Given {
    const value = this.#values.get(name);
    if (value === undefined || value === null) return null;
    return Array.isArray(value) ? single(this.range(name)) : toCell(value);
  }

  /** An argument as trimmed text; the empty string when it was left out. */
  text(name: string): string {
    return cellText(this.#cell(name, 'one cell'), name);
  }

  /** An argument as text that must be there. */
  requiredText(name: string, what: string): string {
    const text = cellText(this.#cell(name, what), name);
    if (text === '') throw new Problem('argument', name, functionWords.missing(name, what));
    return text;
  }

  /** An argument as a number that must be there. */
  number(name: string): number {
    const cell = this.#cell(name, 'a number');
    const text = cellText(cell, name);
    const value = typeof cell === 'boolean' ? Number.NaN : numberFromText(text);
    if (Number.isNaN(value)) throw new Problem('argument', name, functionWords.notNumber(name, text));
    return value;
  }

  #cell(name: string, what: string): Cell {
    const given = this.given(name);
    if (Array.isArray(given)) throw new Problem('argument', name, functionWords.oneCell(name, what));
    // What is no array is a cell or nothing.
    return (given ?? null) as Cell;
  }
}

/** A value without its rows of blank cells, some of which may have arrived as 0. */
function withoutBlankRows(value: unknown): unknown {
  if (!Array.isArray(value)) return isBlank(value) ? null : value;
  const rows: unknown[] = value;
  const kept = rows.filter((row) => !(Array.isArray(row) ? row.every(isBlank) : isBlank(row)));
  return kept.length === 0 ? null : kept;
}

/** Whether a value is the host's invocation object, which follows the arguments: no cell, no error, no data type. */
function isInvocation(value: unknown): boolean {
  return (
    typeof value === 'object' &&
    value !== null &&
    !Array.isArray(value) &&
    !('code' in value) &&
    !('basicValue' in value)
  );
}
