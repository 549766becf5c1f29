import type { Fit } from '../fit/fit.ts';
import { cooksDistance, standardisedResiduals } from '../straightness/studentised.ts';
import { judgeWords } from '../words/judgeWords.ts';
import { drivingReadings } from './influence.ts';
import { outlierP } from './outliers.ts';

/** One pair of input cells: its residual on the straight axes and what stands out about it; '' where there is none. */
export interface ResidualRow {
  /** 1-based position among the input cells. */
  readonly reading: number | '';
  readonly residual: number | '';
  readonly standardised: number | '';
  readonly leverage: number | '';
  /** Cook's distance. */
  readonly influence: number | '';
  readonly finding: string;
}

const NOTHING: ResidualRow = {
  reading: '',
  residual: '',
  standardised: '',
  leverage: '',
  influence: '',
  finding: '',
};

/** Probability below which a reading counts as outlying. */
const OUTLYING = 0.05;
/** Scatter that is rounding, relative to the readings on the vertical axis. */
const ROUNDING = 1e-13;

/**
 * A row for every pair of input cells, in place: residual, internally studentised residual, leverage, Cook's distance and
 * a finding where the reading stands out. Findings: outlying (Bonferroni at 5 %), high leverage (above ½, or three times
 * the average), drives the result (moves a constant by more than its standard uncertainty). Nothing is removed.
 * @see Huber (1981), Robust Statistics, section 7.2 (leverages above 0.5); three times the average: common practice
 */
export function residualTable(fit: Fit): ResidualRow[] {
  const { readings, used, line } = fit;
  const rows: ResidualRow[] = Array.from({ length: readings.count }, () => NOTHING);
  for (const { position, message } of fit.setAside) {
    rows[position - 1] = { ...NOTHING, reading: position, finding: message };
  }
  const standardised = standardisedResiduals(line);
  const influence = cooksDistance(line, standardised);
  const findings = readingFindings(fit, standardised);
  used.forEach((index, row) => {
    const reading = readings.position[index] ?? 0;
    rows[reading - 1] = {
      reading,
      residual: orNothing(line.residual[row]),
      standardised: orNothing(standardised[row]),
      leverage: orNothing(line.leverage[row]),
      influence: orNothing(influence[row]),
      finding: findings.get(index) ?? '',
    };
  });
  return rows;
}

/** What stands out about readings on the line, by their index into `fit.readings`. */
function readingFindings(fit: Fit, standardised: Float64Array): ReadonlyMap<number, string> {
  const { line, used, axes } = fit;
  const found = new Map<number, string[]>();
  const add = (index: number, sentence: string): void => {
    found.set(index, [...(found.get(index) ?? []), sentence]);
  };
  const n = used.length;
  const stated = line.scale === 'known';
  const outlying = scatters(fit) ? outlierP(line, standardised) : new Float64Array(n).fill(1);
  const high = Math.min(0.5, (3 * line.terms) / n);
  const driving = scatters(fit) && line.degreesOfFreedom > 0 ? drivingReadings(fit) : [];
  used.forEach((index, row) => {
    if ((outlying[row] ?? 1) < OUTLYING) {
      const deviations = (standardised[row] ?? Number.NaN) * (stated ? line.residualStandardDeviation : 1);
      add(index, judgeWords.outlying(deviations, stated, outlying[row] ?? Number.NaN));
    }
    const leverage = line.leverage[row] ?? 0;
    if (n > line.terms && leverage > high) {
      add(index, judgeWords.highLeverage(leverage, fit.form.against, axes.horizontal[row] ?? Number.NaN));
    }
  });
  for (const { index, constant, value, without, shift } of driving) {
    add(index, judgeWords.drives(constant, value, without, shift));
  }
  return new Map([...found].map(([index, sentences]) => [index, sentences.join(' ')]));
}

/** Whether the residuals are more than rounding. */
export function scatters({ line, axes }: Pick<Fit, 'line' | 'axes'>): boolean {
  let size = 0;
  let rest = 0;
  for (let i = 0; i < line.residual.length; i++) {
    size = Math.max(size, Math.abs(axes.vertical[i] ?? 0));
    rest = Math.max(rest, Math.abs(line.residual[i] ?? 0));
  }
  return rest > ROUNDING * size;
}

function orNothing(value: number | undefined): number | '' {
  return value !== undefined && Number.isFinite(value) ? value : '';
}
