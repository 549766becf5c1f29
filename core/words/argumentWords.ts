import { listed, shown } from './plain.ts';

/** Text as a message quotes it: cut to 60 characters. */
function quoted(text: string): string {
  return `'${text.length > 60 ? `${text.slice(0, 59)}…` : text}'`;
}

/** What is said about known constants, uncertainties and options that cannot be read. */
export const argumentWords = {
  knownEntry: (entry: string): string =>
    `known must hold entries like R=1000 separated by ';', but one of them is ${quoted(entry)}.`,
  knownSymbol: (symbol: string): string =>
    `known must name each constant by its symbol, but ${quoted(symbol)} is not a symbol.`,
  knownTwice: (symbol: string): string =>
    `known must give each constant once, but ${symbol} stands there twice.`,
  knownNumber: (symbol: string, text: string, what: 'value' | 'standard uncertainty'): string =>
    `known must give the ${what} of ${symbol} as a number, but it is ${text === '' ? 'missing' : quoted(text)}.`,
  knownNegative: (symbol: string, value: number): string =>
    `known must give a standard uncertainty of 0 or more for ${symbol}, but it is ${shown(value)}.`,
  knownColumns: (row: number, columns: number): string =>
    `known must have rows of name, value and, if there is one, standard uncertainty, but row ${row} has ${columns} ${columns === 1 ? 'cell' : 'cells'} filled.`,
  decimalComma: (argument: string, text: string): string =>
    `${argument} must use a decimal point and separate entries with ';', but it holds the comma in ${quoted(text)}.`,
  spreadText: (argument: 'u_y' | 'u_x', text: string): string =>
    argument === 'u_y'
      ? `u_y must be a number above 0, a text like 2%, equal or proportional, or a range with one cell per reading, but it is ${quoted(text)}.`
      : `u_x must be a number above 0, a text like 2%, or a range with one cell per reading, but it is ${quoted(text)}.`,
  spreadPositive: (argument: string, value: number): string =>
    `${argument} must be above 0, but it is ${shown(value)}.`,
  spreadCount: (argument: string, cells: number, count: number): string =>
    `${argument} must have one cell per reading, but it has ${cells} ${cells === 1 ? 'cell' : 'cells'} and the readings have ${count}.`,
  spreadCell: (argument: string, position: number, shownValue: string): string =>
    `${argument} must hold numbers above 0, but its cell ${position} holds ${quoted(shownValue)}.`,
  spreadNeedsKnown: (): string =>
    'u_x must stand beside a known u_y (a number, a text like 2%, or a range), but u_y states no uncertainty.',
  optionEntry: (entry: string): string =>
    `options must hold entries like coverage=0.99 separated by ';', but one of them is ${quoted(entry)}.`,
  optionKey: (key: string, allowed: readonly string[]): string =>
    `options must be among ${listed(allowed)}, but one of them is ${quoted(key)}.`,
  optionTwice: (key: string): string => `options must set each option once, but ${key} is set twice.`,
  optionValue: (key: string, value: string, allowed: readonly string[]): string =>
    `options: ${key} must be ${listed(allowed, 'or')}, but it is ${quoted(value)}.`,
  cellError: (argument: string, error: string): string => `${argument} holds the error ${error}.`,
};
