import { listed } from './plain.ts';

/** Text as a message quotes it: cut to 40 characters. */
function quoted(text: string): string {
  return `'${text.length > 40 ? `${text.slice(0, 39)}…` : text}'`;
}

/** What is said about a law that cannot be read, straightened or settled. */
export const lawWords = {
  empty: (): string => 'law must be a catalogue name or an equation such as y = a + b*x, but it is empty.',
  tooLong: (length: number, most: number): string =>
    `law must have at most ${most} characters, but it has ${length}.`,
  tooDeep: (position: number): string =>
    `law must not be nested more than 100 deep, but it is at ${position}.`,
  tooManySymbols: (count: number, most: number): string =>
    `law must have at most ${most} constants, but it has ${count}.`,
  character: (character: string, position: number): string =>
    character === ','
      ? `law must use a decimal point and functions of one argument, but there is a comma at ${position}.`
      : `law must be written with names, numbers and + - * / ^ ( ), but there is ${quoted(character)} at ${position}.`,
  badNumber: (text: string, position: number): string =>
    `law must hold numbers that can be computed with, but ${quoted(text)} at ${position} cannot.`,
  unknownFunction: (name: string, position: number, near: readonly string[]): string =>
    `law: unknown function ${quoted(name)} at ${position}: ${near.length > 0 ? `did you mean ${listed(near, 'or')}?` : `write ${name}*( … ) for a product.`}`,
  functionAlone: (name: string, position: number): string =>
    `law: the function ${quoted(name)} at ${position} must be followed by its argument in parentheses.`,
  functionOperand: (name: string, position: number): string =>
    `law: it is not clear where the argument of ${name} ends at ${position}: put it in parentheses.`,
  operand: (found: string, position: number): string =>
    found === ''
      ? `law ends at ${position} where a name, a number or a parenthesis must follow.`
      : `law must have a name, a number or a parenthesis at ${position}, but there is ${quoted(found)}.`,
  operator: (found: string, position: number): string =>
    `law must have an operator between terms, but ${quoted(found)} at ${position} follows without one.`,
  ambiguous: (position: number): string =>
    `law must say what is multiplied: write * or parentheses at ${position}.`,
  unclosed: (position: number, mark: string): string =>
    `law must close the ${quoted(mark)} that stands at ${position}.`,
  unopened: (mark: string, position: number): string =>
    `law must open what it closes, but ${quoted(mark)} at ${position} closes nothing.`,
  noEquals: (): string => "law must be an equation with one '=', but it has none.",
  twoEquals: (position: number): string =>
    `law must be an equation with one '=', but there is another at ${position}.`,
  colon: (position: number): string =>
    `law may have ':' only after a declaration such as v(x): …, but there is one at ${position}.`,
  declaration: (text: string): string =>
    `law must declare two different names, the response and the predictor, as y(x) does, but it starts with ${quoted(text)}.`,
  noPredictor: (response: string): string =>
    `law must name its predictor: write ${response}(…) = … on the left, or use x or t on the right.`,
  noResponse: (): string =>
    'law must name its response and predictor: start it with y(x): … in your own symbols, or use x and y.',
  predictorMissing: (predictor: string): string =>
    `law must depend on its predictor ${predictor}, but ${predictor} does not appear in it.`,
  responseMissing: (response: string): string =>
    `law must depend on its response ${response}, but ${response} does not appear in it.`,
  noUnknowns: (known: readonly string[]): string =>
    known.length === 0
      ? 'law must have a constant that the readings can settle, but it has none.'
      : `law must leave a constant for the readings to settle, but ${known.join(', ')} ${known.length > 1 ? 'are all' : 'is'} known.`,
  unknownLaw: (name: string, near: readonly string[]): string =>
    `law must be a catalogue name or an equation with '=', but it is ${quoted(name)}${near.length > 0 ? `; did you mean ${listed(near, 'or')}?` : '.'}`,
  knownNotThere: (name: string, constants: readonly string[]): string =>
    `known must name constants of the law (${constants.join(', ')}), but ${quoted(name)} is not in it.`,
  knownVariable: (name: string, constants: readonly string[]): string =>
    `known must name constants of the law (${constants.join(', ')}), but ${quoted(name)} is a column of readings.`,
  settledProduct: (combination: string, give: readonly string[]): string =>
    `law: only ${combination} is settled by these readings: give ${listed(give, 'or')} in known.`,
  settledPart: (names: readonly string[], surplus: number): string =>
    `law: the readings settle only combinations of ${listed(names)}: give ${surplus === 1 ? 'one' : surplus} of them in known.`,
  noEffect: (name: string): string =>
    `law: the readings say nothing about ${name}: give it in known or leave it out.`,
  nowhere: (): string =>
    'law must have real values for some readings and constants, but none could be found.',
  notStraight: (unknown: readonly string[], most: number): string =>
    unknown.length > most
      ? `law cannot be drawn as a straight line: it has ${unknown.length} unknown constants (${unknown.join(', ')}), and a line with two trial constants settles at most ${most}; give some of them in known.`
      : `law cannot be drawn as a straight line, not even with trial values for two of ${unknown.join(', ')}; give some of them in known.`,
  noteBothAxes: (response: string): string => `${response} stands on both axes`,
  noteBranch: (): string => 'holds on one branch only',
  noteTrial: (names: readonly string[]): string =>
    `needs ${names.length === 1 ? 'a trial value' : 'trial values'} of ${listed(names)}`,
  noteLinear: (): string => 'linear in all constants: solved directly',
  noteSide: (text: string): string => `on the other side, ${text}`,
  noteSides: (): string => 'all readings on one side',
  noteKnownTerm: (term: 'slope' | 'intercept'): string => `the ${term} is known: a check`,
};
