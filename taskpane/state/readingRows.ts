import type { Fit } from '../../core/fit/fit.ts';
import { residualTable } from '../../core/judge/residuals.ts';

/** One reading as the list shows it; numbers that do not exist are empty texts. */
export interface ReadingRow {
  readonly position: number;
  readonly x: number | '';
  readonly y: number | '';
  readonly residual: number | '';
  readonly standardised: number | '';
  readonly leverage: number | '';
  readonly finding: string;
  readonly leftOut: boolean;
}

/** Longer lists start with the most telling readings. */
export const MOST_ROWS = 200;

/**
 * The readings of a fit and those left out for a look, in the order of the cells.
 * @param most number of rows; of more readings, those with a finding and the largest standardised residuals are kept
 */
export function readingRows(fit: Fit, leftOut: readonly number[], most = MOST_ROWS): readonly ReadingRow[] {
  const table = residualTable(fit);
  const { position, x, y } = fit.readings;
  const rows: ReadingRow[] = leftOut.map((at) => ({ ...nothing, position: at, leftOut: true }));
  for (let i = 0; i < position.length; i++) {
    const at = position[i] ?? 0;
    const row = table[at - 1];
    if (row === undefined) continue;
    rows.push({
      position: at,
      x: x[i] ?? '',
      y: y[i] ?? '',
      residual: row.residual,
      standardised: row.standardised,
      leverage: row.leverage,
      finding: row.finding,
      leftOut: false,
    });
  }
  const kept = rows.length <= most ? rows : rows.sort((a, b) => telling(b) - telling(a)).slice(0, most);
  return kept.sort((a, b) => a.position - b.position);
}

const nothing = { x: '', y: '', residual: '', standardised: '', leverage: '', finding: '' } as const;

function telling({ leftOut, finding, standardised }: ReadingRow): number {
  const size = standardised === '' ? 0 : Math.abs(standardised);
  return size + (finding === '' ? 0 : 1e6) + (leftOut ? 1e9 : 0);
}
