import { plural, shown } from './plain.ts';

/** What a fit says when it has to stop. */
export const fitWords = {
  formRange: (given: number, count: number, law: string): string =>
    `options: form must be a whole number from 1 to ${count} for ${law}, but it is ${shown(given)}.`,
  outsideDomain: (position: number, x: number, y: number, axis: string): string =>
    `Reading ${position} (x = ${shown(x)}, y = ${shown(y)}) lies outside the law's domain: ${axis} does not exist there.`,
  zeroSpread: (position: number, argument: string): string =>
    `${argument}: reading ${position} is 0, so an uncertainty in proportion to it is 0 as well; give an absolute uncertainty.`,
  infiniteWeight: (position: number): string =>
    `Reading ${position} cannot be weighted: its place on the straight axis does not depend on y there.`,
  noUncertainty: (position: number, argument: string): string =>
    `Reading ${position} has no uncertainty in ${argument} yet, so it is set aside.`,
  heldNeedsKnown: (intercept: string, unknown: readonly string[]): string =>
    `options: intercept=held needs an intercept that follows from known constants, but ${intercept} holds the unknown ${unknown.join(', ')}; give ${unknown.length > 1 ? 'their values' : 'its value'} in known.`,
  noRealConstants: (names: readonly string[], slope: number, intercept: number): string =>
    `No real value of ${names.join(', ')} gives a line with slope ${shown(slope)} and intercept ${shown(intercept)}: these readings do not follow this law.`,
  bothAxesNeedLine: (why: 'direct' | 'trial'): string =>
    why === 'direct'
      ? 'u_x must be left out with fit=direct: errors on both axes are taken into account by the line only.'
      : 'u_x must be left out for a law with a trial constant: give that constant in known, or leave u_x out.',
  curveNeeded: (response: string, what: string): string =>
    `law must be solvable for ${response} for ${what}, but it is not; write it as ${response} = ….`,
  lineLost: (inside: number): string =>
    `Only ${plural(inside, 'reading')} can be drawn on the straight axes of this law, so there is no line to describe; its constants come from the direct fit.`,
  outsideLine: (position: number, axis: string): string =>
    `Reading ${position} is not on the line, where ${axis} does not exist, but takes part in the direct fit.`,
  outsideAside: (position: number, x: number, y: number, axis: string): string =>
    `Reading ${position} is set aside: at x = ${shown(x)}, y = ${shown(y)} ${axis} does not exist.`,
  knownShift: (name: string): string =>
    `The standard uncertainty of ${name} cannot be carried into the constants: the law cannot be fitted for values of ${name} on both sides of the given one.`,
  monteCarloNeedsLine: (): string =>
    'options: interval=montecarlo must go with fit=line and a law without trial constants; here the constants come from the direct fit.',
  newReadingNeedsRule: (): string =>
    'options: band=reading must go with u_y as a number, a text like 2%, equal, proportional or nothing, but u_y is a range, which says nothing of a new reading.',
  noResponse: (predictor: string, at: number, law: string): string =>
    `There is no value of ${law} at ${predictor} = ${shown(at)}: it lies outside the law's domain.`,
  noPredictor: (response: string, at: number, law: string): string =>
    `The fitted ${law} does not reach ${response} = ${shown(at)}.`,
  unboundedPredictor: (response: string, at: number): string =>
    `The interval of x at ${response} = ${shown(at)} is unbounded: at this coverage the slope cannot be told from zero, or the interval runs to the end of the law's domain.`,
  noReadings: (have: number, need: number): string =>
    `There ${have === 1 ? 'is' : 'are'} ${plural(have, 'reading')} so far; this law needs at least ${need}.`,
  unknownConstant: (name: string, names: readonly string[]): string =>
    `name must be a constant of the law (${names.join(', ')}), but it is '${name}'.`,
};
