import { plural } from './plain.ts';

/** Text from a cell as a message quotes it: cut to 40 characters. */
function quoted(text: string): string {
  return `'${text.length > 40 ? `${text.slice(0, 39)}…` : text}'`;
}

/** What is said about cells that are not readings. */
export const readingWords = {
  sizesDiffer: (x: number, y: number): string =>
    `x and y must have the same number of cells, but x has ${x} and y has ${y}.`,
  noCells: (argument: string): string =>
    `${argument} must be a range with at least one cell, but it is empty.`,
  cellError: (position: number, argument: string, error: string): string =>
    `Reading ${position} holds the error ${error} in ${argument}.`,
  text: (position: number, argument: string, text: string): string =>
    text.trim() === ''
      ? `Reading ${position} is set aside: its ${argument} cell holds only spaces.`
      : `Reading ${position} is set aside: its ${argument} is the text ${quoted(text)}.`,
  numberAsText: (position: number, argument: string, text: string): string =>
    `Reading ${position} is set aside: its ${argument} is ${quoted(text)} stored as text; make it a number to use it.`,
  boolean: (position: number, argument: string, value: boolean): string =>
    `Reading ${position} is set aside: its ${argument} is ${value ? 'TRUE' : 'FALSE'}.`,
  belowDetection: (position: number, argument: string, text: string): string =>
    `Reading ${position} is set aside: its ${argument} is ${quoted(text)}, below a detection limit; leaving out only the lowest values biases the result.`,
  trailingZeros: (count: number): string =>
    `The last ${plural(count, 'pair')} with y = 0 ${count === 1 ? 'was' : 'were'} taken as blank, because here a blank cell can arrive as 0; if a zero is a reading, put a later reading below it.`,
};
