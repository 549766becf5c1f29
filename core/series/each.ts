import type { Fit } from '../fit/fit.ts';
import { fitCompiled } from '../fit/fitLaw.ts';
import type { FitSettings } from '../given/given.ts';
import { compileLaw } from '../law/compileLaw.ts';
import { Problem } from '../problem.ts';
import type { SetAside } from '../readings/readings.ts';
import { bowPercent } from '../straightness/bow.ts';
import { seriesWords } from '../words/seriesWords.ts';
import { type SettledSeries, seriesLines } from './seriesLines.ts';
import { type KeyedSeries, readingsOf, type SeriesKey, type SplitSeries } from './splitSeries.ts';

/** One constant of one series; what does not exist is NaN. */
export interface SeriesValue {
  readonly value: number;
  readonly standardUncertainty: number;
}

/** One series: its constants, aligned with the names, or the reason why there are none. */
export interface SeriesRow {
  readonly key: SeriesKey;
  /** Readings that the constants come from; those at hand where there are none. */
  readonly readings: number;
  readonly values: readonly SeriesValue[];
  readonly rSquared: number;
  readonly bowPercent: number;
  readonly note: string;
}

export interface EachSeries {
  /** Names of the law's unknown constants. */
  readonly constants: readonly string[];
  /** One row per key, in order of first appearance. */
  readonly rows: readonly SeriesRow[];
}

/**
 * Fits a law to many series, each by itself as `fitLaw` would; a series that cannot be fitted keeps its row.
 * @param law catalogue name or equation
 * @throws Problem `argument` for what is wrong with all series alike
 * @example eachSeries(splitSeries(keys, readings), 'straight line', settings).rows.map((row) => row.key) // ['a', 'b']
 */
export function eachSeries(split: SplitSeries, law: string, settings: FitSettings): EachSeries {
  const compiled = compileLaw(law, settings.known.keys());
  const places = compiled.unknown.map((name) => compiled.constants.indexOf(name));
  const lines = seriesLines(compiled, settings, split.columns, split.series);
  const rows = split.series.map((one, index) => {
    const settled = lines?.[index] ?? null;
    if (settled instanceof Problem) return rowOfProblem(one, settled);
    if (settled !== null) return rowOfLine(one, settled, places);
    try {
      return rowOfFit(one.key, fitCompiled(readingsOf(split, one), compiled, settings));
    } catch (error) {
      return rowOfProblem(one, error);
    }
  });
  return { constants: compiled.unknown, rows };
}

/** The row of a series that was fitted together with the others. */
function rowOfLine(
  { key, from, to, setAside }: KeyedSeries,
  { line, values, variance, bowPercent: bowOfLine }: SettledSeries,
  places: readonly number[],
): SeriesRow {
  const hasFreedom = line.degreesOfFreedom > 0;
  return {
    key,
    readings: to - from,
    values: places.map((place, k) => ({
      value: values[place] ?? Number.NaN,
      standardUncertainty: hasFreedom ? Math.sqrt(variance[k] ?? Number.NaN) : Number.NaN,
    })),
    rSquared: line.rSquared,
    bowPercent: bowOfLine,
    note: asideNote(setAside),
  };
}

/** The row of a series that was fitted by itself. */
function rowOfFit(key: SeriesKey, fit: Fit): SeriesRow {
  return {
    key,
    readings: (fit.direct === null ? fit.used : fit.taking).length,
    values: valuesOf(fit),
    ...lineFigures(fit),
    note: asideNote(fit.setAside),
  };
}

/** The row of a series that cannot be fitted. @throws what is wrong with all series alike */
function rowOfProblem({ key, from, to, setAside }: KeyedSeries, error: unknown): SeriesRow {
  if (!(error instanceof Problem) || error.code === 'argument' || error.code === 'cell') throw error;
  const note = [error.message, asideNote(setAside)].filter((text) => text !== '').join(' ');
  return {
    key,
    readings: to - from,
    values: [],
    rSquared: Number.NaN,
    bowPercent: Number.NaN,
    note: from === to && setAside.length === 0 ? seriesWords.noReadings() : note,
  };
}

/** The unknown constants with the standard uncertainty that `fit.constants` gives them, without the intervals. */
function valuesOf({ law, values, covariance, direct, lineFromReadings }: Fit): SeriesValue[] {
  const hasFreedom = (direct ?? lineFromReadings).degreesOfFreedom > 0;
  return law.unknown.map((name, k) => ({
    value: values[law.constants.indexOf(name)] ?? Number.NaN,
    standardUncertainty: hasFreedom ? Math.sqrt(covariance[k]?.[k] ?? Number.NaN) : Number.NaN,
  }));
}

function lineFigures(fit: Fit): { readonly rSquared: number; readonly bowPercent: number } {
  try {
    const { line, axes } = fit;
    return { rSquared: line.rSquared, bowPercent: bowPercent(line, axes.horizontal) };
  } catch (error) {
    // A direct fit may stand without a line.
    if (fit.direct === null || !(error instanceof Problem)) throw error;
    return { rSquared: Number.NaN, bowPercent: Number.NaN };
  }
}

function asideNote(setAside: readonly SetAside[]): string {
  const [first] = setAside;
  return first === undefined ? '' : seriesWords.setAside(setAside.length, first.message);
}
