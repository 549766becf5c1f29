import { shown } from './plain.ts';

/** What is said about planning further readings. */
export const nextWords = {
  order: (low: number, high: number): string =>
    `low must not be above high, but low is ${shown(low)} and high is ${shown(high)}.`,
  needsRule: (argument: 'u_y' | 'u_x'): string =>
    `${argument} must be a number or a text like 2%${argument === 'u_y' ? ', equal, proportional or nothing' : ''} to plan a reading, but it is a range, which says nothing of a new reading.`,
  nowhere: (low: number, high: number, law: string): string =>
    `There is no place from ${shown(low)} to ${shown(high)} where a reading would tell more: ${law} has no value there that depends on its constants.`,
  target: (target: number): string => `The target uncertainty must be above 0, but it is ${shown(target)}.`,
  noScatter: (name: string): string =>
    `How many readings ${name} needs cannot be said yet: there is no scatter to judge by.`,
  knownLimit: (name: string, target: number, limit: number): string =>
    `No number of readings brings the standard uncertainty of ${name} to ${shown(target)}: the known constants alone contribute ${shown(limit)}.`,
};
