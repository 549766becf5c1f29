import { plural, shown } from './plain.ts';

/** What is said about several series in one call. */
export const seriesWords = {
  keyError: (position: number, error: string): string => `Cell ${position} of key holds the error ${error}.`,
  keysDiffer: (keys: number, count: number): string =>
    `key must have as many cells as x, but it has ${keys} and x has ${count}.`,
  noKeys: (): string => 'key must name at least one series, but all of its cells are blank.',
  setAside: (count: number, first: string): string =>
    count === 1 ? first : `${plural(count, 'reading')} set aside; the first: ${first}`,
  noReadings: (): string => 'There are no readings yet.',
  trialNotShared: (trials: readonly string[]): string =>
    `law must be straight without trial constants to share a slope, but ${trials.join(' and ')} would differ from series to series; give ${trials.length > 1 ? 'their values' : 'its value'} in known.`,
  directNotShared: (): string =>
    'options: fit=direct must be left out, because slopes are shared on the straight axes.',
  bothAxesNotShared: (): string =>
    'u_x must be left out: slopes are compared on the straight axes with errors in y only.',
  noSeries: (first: string): string => `No series can be drawn as a line: ${first}`,
  sharedSlope: (plot: string, against: string, series: number): string =>
    `of ${plot} against ${against}, one slope for ${series === 1 ? 'the one series' : `all ${series} series`}`,
  test: (p: number, level: number): string =>
    !(p >= 0)
      ? 'no test: two series with scatter of their own are needed'
      : p < level
        ? `the slopes differ: so much difference would come by chance with p = ${shown(Number(p.toPrecision(2)))}`
        : `nothing speaks against one slope (p = ${shown(Number(p.toPrecision(2)))})`,
  statistic: (numerator: number, denominator: number): string =>
    `that all slopes are equal, with ${numerator} and ${denominator} degrees of freedom`,
  statisticKnown: (numerator: number): string =>
    `that all slopes are equal, from the stated uncertainties (chi-squared over its ${plural(numerator, 'degree')} of freedom)`,
  ownSlope: (readings: number, constants: string): string =>
    `its own line, ${plural(readings, 'reading')}${constants === '' ? '' : `: ${constants}`}`,
  sharedIntercept: (constants: string): string =>
    `with the shared slope${constants === '' ? '' : `: ${constants}`}`,
  constant: (name: string, value: number): string => `${name} = ${shown(value)}`,
};
