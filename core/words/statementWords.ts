import { listed, plural, shown } from './plain.ts';

/** A result as `STATEMENT` puts it into words; numbers are rounded already. */
export interface StatedResult {
  readonly name: string;
  readonly value: string;
  /** Standard uncertainty with its unit, or null when none can be stated. */
  readonly standardUncertainty: string | null;
  readonly interval: { readonly low: string; readonly high: string; readonly unit: string } | null;
  /** In percent. */
  readonly probability: number;
  readonly factor: number;
  readonly distribution: 'normal' | 't';
  readonly degreesOfFreedom: number;
  readonly readings: number;
  readonly law: string;
  readonly method: string;
  readonly setAside: number;
}

/** What a statement says. */
export const statementWords = {
  sentence: (result: StatedResult): string => {
    const { name, value, standardUncertainty } = result;
    const uncertainty =
      standardUncertainty === null
        ? ''
        : ` with standard uncertainty ${standardUncertainty}; ${coverageOf(result)}`;
    return `${name} = ${value}${uncertainty}; ${originOf(result)}.`;
  },
  noUncertainty: (result: StatedResult, reason: 'few' | 'exact' | 'beyond'): string => {
    const because = {
      few: `${plural(result.readings, 'reading')} leave no scatter to judge by`,
      exact: 'the readings show no scatter',
      beyond: 'it is beyond the range of numbers in these units',
    };
    return `${result.name} = ${result.value}, for which no uncertainty can be stated, because ${because[reason]}; ${originOf(result)}.`;
  },
  brackets: (name: string, value: string): string => `${name} = ${value}`,
  bracketsAlone: (name: string, value: string): string => `${name} = ${value} (no uncertainty can be stated)`,
  line: (plot: string, against: string): string => `by a straight line of ${plot} against ${against}`,
  direct: (response: string): string => `by least squares in the units of ${response}`,
  trial: (response: string, trials: readonly string[]): string =>
    `by least squares in the units of ${response}, ${listed(trials)} included`,
  equalWeights: (): string => 'with equal weights',
  equalScatter: (response: string): string => `weighted for the same scatter in ${response} everywhere`,
  proportionalScatter: (response: string): string => `weighted for scatter in proportion to ${response}`,
  stated: (response: string): string => `weighted by the stated uncertainties of ${response}`,
  statedBoth: (response: string, predictor: string): string =>
    `with the stated uncertainties of ${response} and ${predictor}`,
  held: (): string => 'with the intercept held at the value of the known constants',
  known: (items: readonly string[]): string => `with ${listed(items)} given`,
  knownItem: (name: string, value: number, standardUncertainty: number): string =>
    standardUncertainty > 0
      ? `${name} = ${shown(value)} ± ${shown(standardUncertainty)}`
      : `${name} = ${shown(value)}`,
  simulated: (): string => 'interval by simulation (JCGM 101:2008)',
};

function coverageOf({ interval, probability, factor, distribution, degreesOfFreedom }: StatedResult): string {
  const level = `${shown(Number(probability.toPrecision(6)))} %`;
  if (interval === null) return `there is no ${level} coverage interval with both ends`;
  const { low, high, unit } = interval;
  const source =
    distribution === 'normal'
      ? `normal distribution, coverage factor ${factor.toFixed(2)}`
      : `Student's t with ${plural(degreesOfFreedom, 'degree')} of freedom, coverage factor ${factor.toFixed(2)}`;
  return `the ${level} coverage interval is ${low} to ${high}${unit} (${source})`;
}

function originOf({ readings, law, method, setAside }: StatedResult): string {
  const aside = setAside === 0 ? '' : `; ${plural(setAside, 'reading')} set aside`;
  return `from ${plural(readings, 'reading')} with ${law}, ${method}${aside}`;
}
