import type { Fit } from '../../core/fit/fit.ts';
import { type ResidualRow, residualTable } from '../../core/judge/residuals.ts';

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
  const away: ReadingRow[] = leftOut.map((at) => ({ ...nothing, position: at, leftOut: true }));
  const kept: ReadingRow[] = [];
  const least = leastTelling(table, most - away.length);
  for (let i = 0; i < position.length; i++) {
    const at = position[i] ?? 0;
    const row = table[at - 1];
    if (row === undefined || kept.length >= most || telling(row) < least) continue;
    kept.push({
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
  return [...away, ...kept].sort((a, b) => a.position - b.position);
}

/** One reading on its own; undefined when there is no such reading on the line. */
export function readingRow(fit: Fit, position: number): ReadingRow | undefined {
  const { used, readings, line } = fit;
  const at = used.findIndex((index) => readings.position[index] === position);
  const index = used[at];
  if (index === undefined) return undefined;
  return {
    ...nothing,
    position,
    x: readings.x[index] ?? '',
    y: readings.y[index] ?? '',
    residual: line.residual[at] ?? '',
    leverage: line.leverage[at] ?? '',
    leftOut: false,
  };
}

const nothing = { x: '', y: '', residual: '', standardised: '', leverage: '', finding: '' } as const;

/** How telling the last of so many rows is. */
function leastTelling(table: readonly ResidualRow[], most: number): number {
  if (table.length <= most) return 0;
  return Float64Array.from(table, telling).sort()[table.length - most] ?? 0;
}

/** Readings with a finding come first, then the largest standardised residuals. */
function telling({ finding, standardised }: ResidualRow): number {
  const size = standardised === '' ? 0 : Math.abs(standardised);
  return size + (finding === '' || standardised === '' ? 0 : 1e6);
}
