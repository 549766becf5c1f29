import { nearest, realSolutions } from '../constants/fromLine.ts';
import { termsInUse } from '../constants/usedTerms.ts';
import type { Fit } from '../fit/fit.ts';
import { fitCompiled } from '../fit/fitLaw.ts';
import { chosenForm } from '../fit/fitTask.ts';
import { scaleOf } from '../fit/spread.ts';
import type { FitSettings } from '../given/given.ts';
import { compileLaw } from '../law/compileLaw.ts';
import { Problem } from '../problem.ts';
import { seriesWords } from '../words/seriesWords.ts';
import { sharedSlope } from './slopes.ts';
import { readingsOf, type SeriesKey, type SplitSeries } from './splitSeries.ts';

/** A row of the table; numbers that do not exist are NaN. */
export interface ShareRow {
  readonly term: string;
  readonly value: number;
  readonly standardUncertainty: number;
  readonly note: string;
}

/** Level at which the note of the test says that slopes differ. */
const LEVEL = 0.05;

/**
 * Do several series share a slope? The shared slope, the test that slopes are equal, then for each key the slope of its
 * own line and the intercept that it has with the shared slope, each with the constants that follow.
 * @param law catalogue name or equation, straight without trial constants
 * @throws Problem `argument` for a law with trial constants, u_x or fit=direct; `tooFew` when no series can be drawn
 * @see Snedecor & Cochran (1989), Statistical Methods, 8th ed., chapter 18 (analysis of covariance)
 */
export function shareSlope(split: SplitSeries, law: string, settings: FitSettings): ShareRow[] {
  const compiled = compileLaw(law, settings.known.keys());
  const { trials, plot, against } = chosenForm(compiled, settings.options.form);
  if (trials.length > 0) throw new Problem('argument', 'law', seriesWords.trialNotShared(trials));
  if (settings.options.fit === 'direct') {
    throw new Problem('argument', 'options', seriesWords.directNotShared());
  }
  if (settings.spreadX.kind !== 'none') {
    throw new Problem('argument', 'u_x', seriesWords.bothAxesNotShared());
  }
  const drawn: { readonly key: SeriesKey; readonly fit: Fit }[] = [];
  const problems = new Map<SeriesKey, Problem>();
  const { series } = split;
  for (const one of series) {
    const { key } = one;
    try {
      drawn.push({ key, fit: fitCompiled(readingsOf(split, one), compiled, settings) });
    } catch (error) {
      if (!(error instanceof Problem) || error.code === 'argument' || error.code === 'cell') throw error;
      problems.set(key, error);
    }
  }
  const [first] = problems.values();
  if (drawn.length === 0) {
    throw new Problem(first?.code ?? 'tooFew', 'x', seriesWords.noSeries(first?.message ?? ''));
  }
  const lines = drawn.map(({ fit }) => ({ horizontal: fit.axes.horizontal, line: fit.lineFromReadings }));
  const scale = scaleOf(settings.spreadY);
  const shared = sharedSlope(lines, scale);
  const between = drawn.length - 1;
  const statistic =
    scale === 'known'
      ? seriesWords.statisticKnown(between)
      : seriesWords.statistic(between, shared.degreesOfFreedom - between);
  const rows: ShareRow[] = [
    {
      term: 'shared slope',
      value: shared.slope,
      standardUncertainty: shared.standardUncertainty,
      note: seriesWords.sharedSlope(plot, against, drawn.length),
    },
    { term: 'F', value: shared.f, standardUncertainty: Number.NaN, note: between > 0 ? statistic : '' },
    { term: 'p', value: shared.p, standardUncertainty: Number.NaN, note: seriesWords.test(shared.p, LEVEL) },
  ];
  for (const { key } of series) {
    const place = drawn.findIndex((one) => one.key === key);
    const fit = drawn[place]?.fit;
    if (fit === undefined) {
      const note = problems.get(key)?.message ?? '';
      rows.push(blank(`slope: ${key}`, note), blank(`intercept: ${key}`, note));
      continue;
    }
    const { line } = fit;
    const intercept = shared.intercepts[place];
    rows.push(
      {
        term: `slope: ${key}`,
        value: line.slope,
        standardUncertainty: Math.sqrt(line.varianceSlope),
        note: seriesWords.ownSlope(fit.used.length, constantsText(fit, fit.values)),
      },
      {
        term: `intercept: ${key}`,
        value: intercept?.value ?? Number.NaN,
        standardUncertainty: intercept?.standardUncertainty ?? Number.NaN,
        note: seriesWords.sharedIntercept(
          constantsText(fit, constantsOf(fit, shared.slope, intercept?.value ?? Number.NaN)),
        ),
      },
    );
  }
  return rows;
}

function blank(term: string, note: string): ShareRow {
  return { term, value: Number.NaN, standardUncertainty: Number.NaN, note };
}

/** The constants that a series has with the shared slope. */
function constantsOf({ form, values, settings }: Fit, slope: number, intercept: number): Float64Array | null {
  const terms = termsInUse(form, settings.options.intercept === 'held');
  if (terms === 'combined') return null;
  return nearest(realSolutions(form, slope, intercept, values, terms), values) ?? null;
}

function constantsText({ law }: Fit, values: Float64Array | null): string {
  if (values === null) return '';
  return law.unknown
    .map((name) => seriesWords.constant(name, values[law.constants.indexOf(name)] ?? Number.NaN))
    .join(', ');
}
