import { Problem } from '../problem.ts';
import { numberFromText } from '../readings/numberFromText.ts';
import { argumentWords } from '../words/argumentWords.ts';
import { cellText, type Given, isRange, single } from './cellText.ts';
import type { Options } from './given.ts';

/** The options when nothing is said. */
export const defaultOptions: Options = {
  coverage: 0.95,
  intercept: 'free',
  form: 1,
  fit: 'line',
  band: 'curve',
  outside: 'stop',
  interval: 'line',
  judge: 'line',
  style: 'sentence',
};

type Written = { -readonly [K in keyof Options]: Options[K] };
type Setter = (options: Written, value: string) => void;

function refuse(message: string): never {
  throw new Problem('argument', 'options', message);
}

/** A setter for an option whose values are words. */
function oneOf<V extends string>(
  key: string,
  allowed: readonly V[],
  set: (options: Written, value: V) => void,
): Setter {
  return (options, text) => {
    const word = text.toLowerCase().replace(/\s+/g, ' ');
    const value = allowed.find((candidate) => candidate === word);
    if (value === undefined) refuse(argumentWords.optionValue(key, text, allowed));
    set(options, value);
  };
}

const setters: ReadonlyMap<keyof Options, Setter> = new Map<keyof Options, Setter>([
  [
    'coverage',
    (options, text) => {
      const value = numberFromText(text);
      if (!(value > 0 && value < 1)) {
        refuse(argumentWords.optionValue('coverage', text, ['a probability above 0 and below 1']));
      }
      options.coverage = value;
    },
  ],
  [
    'intercept',
    oneOf('intercept', ['free', 'held'], (options, value) => {
      options.intercept = value;
    }),
  ],
  [
    'form',
    (options, text) => {
      const value = numberFromText(text);
      if (!Number.isSafeInteger(value) || value < 1) {
        refuse(argumentWords.optionValue('form', text, ['a whole number from 1']));
      }
      options.form = value;
    },
  ],
  [
    'fit',
    oneOf('fit', ['line', 'direct'], (options, value) => {
      options.fit = value;
    }),
  ],
  [
    'band',
    oneOf('band', ['curve', 'reading'], (options, value) => {
      options.band = value;
    }),
  ],
  [
    'outside',
    oneOf('outside', ['stop', 'set aside'], (options, value) => {
      options.outside = value;
    }),
  ],
  [
    'interval',
    oneOf('interval', ['line', 'montecarlo'], (options, value) => {
      options.interval = value;
    }),
  ],
  [
    'judge',
    oneOf('judge', ['line', 'direct'], (options, value) => {
      options.judge = value;
    }),
  ],
  [
    'style',
    oneOf('style', ['sentence', 'brackets'], (options, value) => {
      options.style = value;
    }),
  ],
]);

/** Names of the options, in the order in which messages list them. */
export const optionNames: readonly (keyof Options)[] = [...setters.keys()];

/**
 * Options from text `coverage=0.99; intercept=held` or from rows *option, value*; case does not matter.
 * @throws Problem `argument` for an unknown option or value, listing the allowed ones; `cell` when a cell holds an error
 * @example parseOptions('Coverage=0.99').coverage // 0.99
 */
export function parseOptions(given: Given): Options {
  const options: Written = { ...defaultOptions };
  const done = new Set<string>();
  const set = (keyText: string, value: string): void => {
    const key = keyText.toLowerCase();
    // An unknown key finds nothing.
    const setter = setters.get(key as keyof Options);
    if (setter === undefined) refuse(argumentWords.optionKey(keyText, optionNames));
    if (done.has(key)) refuse(argumentWords.optionTwice(key));
    done.add(key);
    setter(options, value);
  };
  const setEntry = (entry: string): void => {
    const equals = entry.indexOf('=');
    if (equals < 1) refuse(argumentWords.optionEntry(entry));
    set(entry.slice(0, equals).trim(), entry.slice(equals + 1).trim());
  };
  const whole = single(given);
  if (isRange(whole)) {
    for (const row of whole) {
      const cells = row.map((cell) => cellText(cell, 'options'));
      const [key = '', value = ''] = cells;
      if (cells.every((text) => text === '')) continue;
      if (cells.length === 1) setEntry(key);
      else if (cells.slice(2).some((text) => text !== '')) refuse(argumentWords.optionEntry(cells.join(' ')));
      else set(key, value);
    }
    return options;
  }
  for (const entry of cellText(whole, 'options').split(/[;\n]/))
    if (entry.trim() !== '') setEntry(entry.trim());
  return options;
}
