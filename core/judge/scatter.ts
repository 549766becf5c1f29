import { chiSquaredTail } from '../distributions/tails.ts';
import type { Line } from '../line/line.ts';

/** Whether the scatter about a line changes along it. */
export interface ScatterTest {
  /** n R² of the squared residuals regressed on the fitted values: chi-squared with one degree of freedom. */
  readonly statistic: number;
  readonly p: number;
  /** +1 when the scatter grows with the fitted value, −1 when it falls. */
  readonly direction: number;
}

/**
 * The studentised score test for unequal scatter, of weighted residuals against the fitted vertical values. Absent
 * (NaN) below five readings, or when residuals or fitted values do not vary.
 * @see Koenker (1981), A note on studentizing a test for heteroscedasticity, J. Econometrics 17, 107
 */
export function scatterTest(line: Line): ScatterTest {
  const { residual, fitted, lineWeight } = line;
  const n = residual.length;
  const absent = { statistic: Number.NaN, p: Number.NaN, direction: Number.NaN };
  if (n < 5) return absent;
  const squares = residual.map((r, i) => r * r * (lineWeight[i] ?? 0));
  const most = squares.reduce((top, value) => Math.max(top, value), 0);
  if (!(most > 0)) return absent;
  const u = squares.map((value) => value / most);
  const meanU = mean(u);
  const meanF = mean(fitted);
  let [uu, ff, uf] = [0, 0, 0];
  for (let i = 0; i < n; i++) {
    const du = (u[i] as number) - meanU; // i < n
    const df = (fitted[i] as number) - meanF;
    uu += du * du;
    ff += df * df;
    uf += du * df;
  }
  if (!(uu > 0 && ff > 0)) return absent;
  const statistic = (n * uf * uf) / uu / ff;
  return { statistic, p: chiSquaredTail(statistic, 1), direction: Math.sign(uf) };
}

function mean(column: Float64Array): number {
  return column.reduce((sum, value) => sum + value, 0) / column.length;
}
