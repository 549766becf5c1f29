import { listed, plural, shown } from './plain.ts';

/** What the direct fit and the search for trial constants say. */
export const directWords = {
  tooFew: (have: number, need: number, equation: string): string =>
    `There ${have === 1 ? 'is' : 'are'} ${plural(have, 'reading')}, but ${equation} needs at least ${need}.`,
  curveNeeded: (response: string, equation: string): string =>
    `law must be solvable for ${response} to be fitted in the units of ${response}, but ${equation} is not; write it as ${response} = ….`,
  noStart: (names: readonly string[], start: ArrayLike<number>): string =>
    `The direct fit cannot begin: the law does not exist at every reading for ${listed(names.map((name, k) => `${name} = ${shown(start[k] ?? Number.NaN)}`))}.`,
  runAway: (names: readonly string[], values: readonly number[]): string =>
    `The readings do not settle ${listed(names)}: the fit goes on getting better as ${names.length > 1 ? 'they run' : 'it runs'} away${reachedOf(names, values)}. Give ${names.length > 1 ? 'one of them' : 'it'} in known, take more readings, or choose a law with fewer constants.`,
  dependent: (names: readonly string[]): string =>
    names.length === 1
      ? `The readings do not settle ${listed(names)}: the fitted values do not depend on it here.`
      : `The readings do not settle ${listed(names)} separately: changing them together leaves the fitted values as they are. Give one of them in known, or take readings over a wider range.`,
  notSettled: (names: readonly string[], iterations: number): string =>
    `The direct fit did not settle: after ${plural(iterations, 'step')} ${listed(names)} still changed, so no values are given.`,
  noTrialFits: (names: readonly string[], equation: string): string =>
    `The readings do not settle ${listed(names)}: no value tried gives a curve of ${equation} that exists at every reading.`,
  atEdge: (names: readonly string[]): string =>
    `The least sum of squares lies at the edge of the law's domain (${listed(names)}): standard uncertainties are indicative only.`,
  searchCut: (tried: number): string =>
    `The search for the trial constants was cut after ${tried} values; a better fit elsewhere cannot be excluded.`,
  searchThinned: (used: number, count: number): string =>
    `Trial constants were searched with ${used} of the ${count} readings and then settled with all of them.`,
} as const;

/** How far constants ran, as far as there is a number for it. */
function reachedOf(names: readonly string[], values: readonly number[]): string {
  const reached = names
    .map((name, k) => [name, values[k] ?? Number.NaN] as const)
    .filter(([, value]) => Number.isFinite(value))
    .map(([name, value]) => `${name} reached ${shown(value)}`);
  return reached.length === 0 ? '' : ` (${listed(reached)})`;
}
