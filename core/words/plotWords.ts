import { plural, shown } from './plain.ts';

export interface StraightName {
  readonly plot: string;
  readonly against: string;
  readonly readings: number;
  readonly slope: number;
  readonly intercept: number;
  readonly bowPercent: number;
}

export interface ResidualName {
  readonly plot: string;
  readonly readings: number;
  readonly standardDeviation: number;
  /** Position of the reading farthest from the line. */
  readonly farthest: number;
}

/** What the plots say to those who do not see them, and of a reading that is picked. */
export const plotWords = {
  straight: ({ plot, against, readings, slope, intercept, bowPercent }: StraightName): string =>
    `${plot} against ${against}: ${plural(readings, 'reading')} and the line with slope ${shown(slope)} and intercept ${shown(intercept)}${
      Number.isFinite(bowPercent) ? `, bow ${shown(Number(bowPercent.toPrecision(3)))} %` : ''
    }.`,
  residual: ({ plot, readings, standardDeviation, farthest }: ResidualName): string =>
    `What the line leaves of ${plot} at ${plural(readings, 'reading')}${
      Number.isFinite(standardDeviation)
        ? `, residual standard deviation ${shown(Number(standardDeviation.toPrecision(3)))}`
        : ''
    }; reading ${farthest} lies farthest from the line.`,
  residualAxis: (plot: string): string => `residual of ${plot}`,
  curve: (readings: number, equation: string, probability: number, band: 'curve' | 'reading'): string =>
    `${plural(readings, 'reading')} and the curve ${equation} with its ${shown(100 * probability)} % band for ${
      band === 'curve' ? 'the curve' : 'a new reading'
    }.`,
  keys: 'Arrow keys step through the readings.',
  picked: (position: number, x: number, y: number): string => `Reading ${position}: ${shown(x)}, ${shown(y)}`,
  logarithmic: 'logarithmic vertical axis',
};
