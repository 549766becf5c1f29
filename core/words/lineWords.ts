import { plural } from './plain.ts';

/** What is said when no line can be fitted. */
export const lineWords = {
  tooFew: (have: number, need: number): string =>
    `There ${have === 1 ? 'is' : 'are'} ${plural(have, 'reading')} so far; a line needs at least ${need}.`,
  noSpread: (): string =>
    'x must hold at least two different values on the straight axis, but all of them are the same.',
  unitTooFar: (): string =>
    'The readings are so small or so large in this unit that their uncertainty is beyond the range of numbers; use another unit.',
  notSettled: (steps: number): string =>
    `The line with errors on both axes did not settle in ${plural(steps, 'step')}: the slope is not determined by these readings.`,
};
