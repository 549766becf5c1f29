import { listed } from './plain.ts';

/** Text as a message quotes it: cut to 60 characters. */
function quoted(text: string): string {
  return `'${text.length > 60 ? `${text.slice(0, 59)}…` : text}'`;
}

/** What the sheet functions say about their own arguments. */
export const functionWords = {
  missing: (argument: string, what: string): string => `${argument} must be ${what}, but it is missing.`,
  oneCell: (argument: string, what: string): string =>
    `${argument} must be ${what}, but it is a range of several cells.`,
  notNumber: (argument: string, text: string): string =>
    `${argument} must be a number, but it is ${text === '' ? 'missing' : quoted(text)}.`,
  notNumberAt: (argument: string, position: number, text: string): string =>
    `${argument} must hold numbers, but its cell ${position} holds ${quoted(text)}.`,
  cellError: (argument: string, error: string): string => `${argument} holds the error ${error}.`,
  part: (text: string, allowed: readonly string[]): string =>
    `part must be ${listed(allowed, 'or')}, but it is ${quoted(text)}.`,
  constant: (name: string, names: readonly string[]): string =>
    `name must be a constant that the readings settle (${listed(names, 'or')}), but it is ${quoted(name)}.`,
  noConstant: (name: string): string =>
    `${name} does not exist for these readings: the constants that they give lie outside the range in which it is defined.`,
  noLaws: (): string => "laws must name at least one law, in cells or separated by ';', but there is none.",
  tooManyLaws: (count: number, most: number): string =>
    `laws must name at most ${most} laws, but there are ${count}.`,
  tooManyCells: (count: number, most: number): string =>
    `at must have at most ${most} cells, but it has ${count}.`,
  dataType: (): string => '(a data type)',
  unexpected: (id: string): string =>
    `TAUT.${id} could not finish these cells because of a fault of its own; the other formulas are not affected.`,
};
