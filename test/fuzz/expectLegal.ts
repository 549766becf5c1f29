import { functionWords } from '../../core/words/functionWords.ts';
import { HostError, hostFunction } from '../hostCalls.ts';
import type { HostileCall } from './hostileCalls.ts';

/** Processor time that any of these calls may take, in milliseconds: the sheets are small, so that a call that needs more
 * grows without bound. It is the process's own time, which a busy machine does not change. */
const MOST_MILLISECONDS = 1_000;

const LONGEST_TEXT = 32_767;
const CODES: readonly string[] = ['#VALUE!', '#N/A', '#DIV/0!', '#NUM!', '#NULL!'];

export interface Outcome {
  /** The answer or the error, as text that can be compared. */
  readonly text: string;
  readonly milliseconds: number;
}

/**
 * Calls a function and checks what a sheet relies on: legal cells or an error of the contract with a sentence,
 * arguments untouched, nothing left on the prototypes, and an end within reason.
 * @throws Error saying which of these does not hold
 */
export function expectLegal({ id, given }: HostileCall): Outcome {
  for (const argument of given) freeze(argument);
  const before = written(given);
  const prototypes = prototypeNames();
  const started = process.cpuUsage();
  const text = outcome(id, given);
  const { user, system } = process.cpuUsage(started);
  const milliseconds = (user + system) / 1000;
  if (written(given) !== before) throw new Error('an argument was changed');
  if (prototypeNames() !== prototypes) throw new Error('something was left on a prototype');
  if (milliseconds > MOST_MILLISECONDS)
    throw new Error(`took ${milliseconds.toFixed(0)} ms of processor time`);
  return { text, milliseconds };
}

function outcome(id: string, given: readonly unknown[]): string {
  let answer: unknown;
  try {
    answer = hostFunction(id)(...given, { functionName: id });
  } catch (thrown) {
    if (!(thrown instanceof HostError)) throw new Error(`threw what no host knows: ${String(thrown)}`);
    return errorText(id, thrown);
  }
  if (!Array.isArray(answer)) return cellText(id, answer);
  const rows: unknown[] = answer;
  if (rows.length === 0) throw new Error('an empty table');
  const widths = new Set(rows.map((row) => (Array.isArray(row) ? row.length : -1)));
  if (widths.size !== 1 || widths.has(-1) || widths.has(0)) throw new Error('rows of different lengths');
  return rows
    .map((row) => (Array.isArray(row) ? row.map((cell) => cellText(id, cell)).join('|') : ''))
    .join('\n');
}

function cellText(id: string, cell: unknown): string {
  if (typeof cell === 'number') {
    if (!Number.isFinite(cell)) throw new Error(`the cell ${cell}`);
    return String(cell);
  }
  if (typeof cell === 'boolean') return String(cell);
  if (typeof cell === 'string') {
    if (cell.length > LONGEST_TEXT) throw new Error(`a text of ${cell.length} characters`);
    if (/\b(NaN|undefined|\[object|Infinity)\b/.test(cell)) throw new Error(`the text ${cell}`);
    return cell;
  }
  if (cell instanceof HostError) return errorText(id, cell);
  throw new Error(`a cell that is no cell: ${String(cell)}`);
}

function errorText(id: string, { code, message }: HostError): string {
  if (!CODES.includes(code)) throw new Error(`the error code ${code}`);
  if (message === functionWords.unexpected(id)) throw new Error('a fault of its own');
  const carriesSentence = code === '#VALUE!' || code === '#N/A';
  if (carriesSentence && !/^.{10,}[.?]$/su.test(message))
    throw new Error(`the message ${JSON.stringify(message)}`);
  return `${code} ${message}`;
}

function freeze(value: unknown): void {
  if (!Array.isArray(value)) return;
  const parts: unknown[] = value;
  for (const part of parts) freeze(part);
  Object.freeze(value);
}

function written(given: readonly unknown[]): string {
  return JSON.stringify(given, (_, value: unknown) => (Object.is(value, -0) ? '-0' : value));
}

function prototypeNames(): string {
  const names = [Object.prototype, Array.prototype, Function.prototype, String.prototype, Number.prototype];
  return JSON.stringify(names.map((prototype) => Reflect.ownKeys(prototype).map(String)));
}
