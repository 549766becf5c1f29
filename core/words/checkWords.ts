import { probability } from './judgeWords.ts';
import { listed, plural, shown } from './plain.ts';

/** A number with two significant digits. */
function two(value: number): string {
  return shown(Number(value.toPrecision(2)));
}

/** r squared to its first digit that is not 9, and one more: 0.9914, 0.99993. */
function nines(rSquared: number): string {
  const digits = Math.min(15, Math.max(2, Math.ceil(-Math.log10(Math.max(1e-14, 1 - rSquared))) + 1));
  return rSquared.toFixed(digits);
}

/** A law as a sentence names it: by its catalogue name, or as the one in question. */
export function lawText(name: string): string {
  if (name === '') return 'this law';
  return name === 'straight line' ? 'a straight line' : `the ${name} law`;
}

/** What a careful engineer would say about a fit; each a sentence. */
export const checkWords = {
  curvature: (bow: number, p: number, law: string, rSquared: number): string =>
    `Curvature is left: the middle of the readings lies ${bow > 0 ? 'below' : 'above'} the line and its ends ${bow > 0 ? 'above' : 'below'}, a bow of ${two(bow)} % of the line's rise (${probability(p)})${rSquared > 0.95 ? `; r squared = ${nines(rSquared)} does not show it` : ''}, so ${lawText(law)} is not the whole story.`,
  curvatureSmall: (bow: number, p: number): string =>
    `A slight curvature is left: a bow of ${two(bow)} % of the line's rise, small but more than the scatter explains (${probability(p)}).`,
  runs: (p: number, against: string): string =>
    `The residuals keep the same sign in long stretches along ${against} (${probability(p)} for so few changes of sign): something besides scatter is left.`,
  scatter: (direction: number, p: number, plot: string, advice: string): string =>
    `The scatter is not the same everywhere: it ${direction > 0 ? 'grows' : 'shrinks'} with ${plot} (${probability(p)}), so the fit weighs readings wrongly; ${advice}.`,
  adviseEqual: (response: string): string =>
    `if ${response} scatters by the same amount everywhere, give u_y as equal`,
  adviseProportional: (response: string): string =>
    `if ${response} scatters in proportion to its size, give u_y as proportional`,
  adviseState: (): string => 'state u_y, as a number, a text like 2% or a range',
  lackOfFit: (groups: number, f: number, p: number, law: string): string =>
    `Lack of fit: the means of repeated readings (${groups} places) miss the line by more than the repeats scatter (F = ${two(f)}, ${probability(p)}), so ${lawText(law)} does not describe them.`,
  identicalRepeats: (): string =>
    'Repeated readings are identical, so they tell nothing of the scatter: were they copied, or rounded coarsely?',
  chiSquaredHigh: (chiSquared: number, freedom: number, p: number): string =>
    `The readings scatter more than the stated uncertainties allow (chi-squared ${two(chiSquared)} with ${plural(freedom, 'degree')} of freedom, ${probability(p)}): the law is wrong or the uncertainties are too small.`,
  chiSquaredLow: (chiSquared: number, freedom: number): string =>
    `The readings scatter much less than the stated uncertainties (chi-squared ${two(chiSquared)} with ${plural(freedom, 'degree')} of freedom): the uncertainties may be too large, or hold a part that all readings share.`,
  drives: (position: number, constant: string, value: number, without: number, shift: number): string =>
    `Reading ${position} drives ${constant}: without it ${constant} would be ${shown(without)} instead of ${shown(value)}, ${shift < 9.95 ? shift.toFixed(1) : two(shift)} standard uncertainties away.`,
  moreDrive: (count: number): string =>
    `${plural(count, 'more reading')} ${count === 1 ? 'moves' : 'move'} a constant by more than its standard uncertainty; RESIDUALS shows which.`,
  outlying: (position: number, deviations: number, stated: boolean, p: number): string =>
    `Reading ${position} is outlying: ${two(Math.abs(deviations))} ${stated ? 'stated uncertainties' : 'standard deviations'} from the line (${probability(p)}); check it at its source, nothing has been left out.`,
  moreOutlying: (count: number): string =>
    `${plural(count, 'more reading')} ${count === 1 ? 'is' : 'are'} outlying; RESIDUALS shows which.`,
  exact: (): string =>
    'The readings lie on the law to the last digit: readings that were measured scatter, so the uncertainties here mean nothing.',
  disagree: (
    constant: string,
    line: number,
    direct: number,
    ratio: number,
    response: string,
    stated: boolean,
  ): string =>
    `Line and direct fit disagree on ${constant}: ${shown(line)} from the line, ${shown(direct)} from least squares in the units of ${response}, ${two(ratio)} times the standard uncertainty of the difference; ${stated ? 'the law or the stated u_y does not go with these readings' : 'how the readings are weighted decides the result, so state u_y'}.`,
  directFails: (message: string): string =>
    `The direct fit, tried for comparison, gives no result: ${message}`,
  leftover: (
    term: string,
    fitted: number,
    expected: number,
    known: readonly string[],
    ratio: number,
  ): string =>
    `The fitted ${term} is ${shown(fitted)}, but ${known.length === 0 ? 'the law' : `the given ${listed(known)}`} ${known.length > 1 ? 'say' : 'says'} ${shown(expected)}: they are ${two(ratio)} standard uncertainties apart.`,
  leftoverAgrees: (term: string, known: readonly string[], ratio: number): string =>
    `The fitted ${term} agrees with ${known.length === 0 ? 'the law' : `the given ${listed(known)}`}: ${two(ratio)} standard uncertainties apart.`,
  extrapolated: (
    names: readonly string[],
    against: string,
    low: number,
    high: number,
    times: number,
  ): string =>
    `${listed(names)} ${names.length > 1 ? 'are' : 'is'} read where ${against} = 0, but the readings run from ${shown(low)} to ${shown(high)}: ${names.length > 1 ? 'they are' : 'it is'} extrapolated by ${two(times)} times their range.`,
  noFreedom: (readings: number): string =>
    `${plural(readings, 'reading')} settle the constants with none to spare: no uncertainty can be stated and nothing tests the law.`,
  fewReadings: (freedom: number, percent: number): string =>
    `Few readings: with ${plural(freedom, 'degree')} of freedom the standard uncertainties are themselves known to about ${percent} % only (JCGM 100:2008, E.4.3).`,
  twoPlaces: (against: string): string =>
    `All readings stand at two values of ${against}: every law with two constants passes through them, so nothing tests this one.`,
  moreSetAside: (count: number): string =>
    `${plural(count, 'more reading')} ${count === 1 ? 'is' : 'are'} set aside for such reasons.`,
  detectionBias: (response: string): string =>
    `With the lowest readings left out because they are below detection, the fall of ${response} looks slower than it is.`,
  logBias: (plot: string, response: string, percent: number): string =>
    `The line is drawn on ${plot}, so the curve follows the median of ${response}; where a mean is wanted, such as a total, it is higher by ${percent > 60 ? 'more than 60' : `about ${two(percent)}`} %.`,
  simulated: (
    constant: string,
    first: readonly [number, number],
    simulated: readonly [number, number],
  ): string =>
    `For ${constant} the first-order interval (${shown(first[0])} to ${shown(first[1])}) and the simulated one (${shown(simulated[0])} to ${shown(simulated[1])}) differ by more than the rounding of its uncertainty (JCGM 101:2008, clause 8): quote the simulated one.`,
  bothAxes: (response: string): string =>
    `${response} stands on both axes of this form, which flatters r squared: judge by the misfit, not by r squared.`,
  betterLaw: (best: string, law: string, difference: number): string =>
    `The readings support ${lawText(best)} ${difference > 10 ? 'far better' : 'better'} than ${lawText(law)}: AICc is lower by ${two(difference)}; COMPARE ranks the laws.`,
};
