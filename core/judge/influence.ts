import { lineMoments } from '../constants/lineMoments.ts';
import { unknownOf } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { lineDerivatives } from './lineDerivatives.ts';
import { constantsWithout, directDeletion, lineWithout } from './withoutReading.ts';

/** A reading without which a constant would be another. */
export interface DrivingReading {
  /** Index into `fit.readings`. */
  readonly index: number;
  readonly constant: string;
  readonly value: number;
  readonly without: number;
  /** |without − value| in standard uncertainties of the constant. */
  readonly shift: number;
}

/** Change in standard uncertainties from which a reading drives a constant. */
const DRIVES = 1;
/** First-order change from which the exact one is worked out. */
const LOOKS_LIKE = 0.7;

/**
 * Readings that by themselves move a constant by more than its standard uncertainty, with the constant they move the
 * most, ascending by index. A size-adjusted change above 1 calls for attention in sets of small to moderate size.
 * @see Belsley, Kuh & Welsch (1980), Regression Diagnostics, section 2.1 (DFBETAS and its cut-offs)
 */
export function drivingReadings(fit: Fit): DrivingReading[] {
  const { law, covarianceFromReadings, values } = fit;
  const unknown = unknownOf(law, values);
  const uncertainty = covarianceFromReadings.map((row, k) => Math.sqrt(row[k] ?? Number.NaN));
  if (!uncertainty.some((u) => u > 0)) return [];
  const rows = fit.direct === null ? fit.used : fit.taking;
  const firstOrder = firstOrderChange(fit);
  const notable = uncertainty.map((u) => LOOKS_LIKE * u);
  const change = new Float64Array(unknown.length);
  const without = constantsWithout(fit);
  const found: DrivingReading[] = [];
  rows.forEach((index, row) => {
    firstOrder(row, change);
    let looks = false;
    for (let k = 0; k < change.length; k++) if (Math.abs(change[k] ?? 0) > (notable[k] ?? 0)) looks = true;
    if (!looks) return;
    const constants = without(row);
    if (constants === null) return;
    let most: DrivingReading | null = null;
    unknownOf(law, constants).forEach((value, k) => {
      const shift = Math.abs(value - (unknown[k] ?? Number.NaN)) / (uncertainty[k] ?? Number.NaN);
      // Beyond the range of numbers there is nothing to measure by.
      if (shift > DRIVES && shift < Number.POSITIVE_INFINITY && shift > (most?.shift ?? 0)) {
        most = {
          index,
          constant: law.unknown[k] ?? '',
          value: unknown[k] ?? Number.NaN,
          without: value,
          shift,
        };
      }
    });
    if (most !== null) found.push(most);
  });
  return found;
}

/** Writes the change of the unknown constants when a reading is left out, to first order. */
function firstOrderChange(fit: Fit): (row: number, out: Float64Array) => void {
  if (fit.direct !== null) {
    const { change } = directDeletion(fit);
    return (row, out) => out.set(change(row));
  }
  const { line, axes } = fit;
  const moments = lineMoments(axes.horizontal, line.lineWeight);
  const derivatives = lineDerivatives(fit);
  if (derivatives === null) return (_, out) => out.fill(Number.NaN);
  const { bySlope, byIntercept } = derivatives;
  return (row, out) => {
    const { slope, intercept } = lineWithout({ line, axes }, moments, row);
    for (let k = 0; k < out.length; k++) {
      out[k] =
        (bySlope[k] ?? 0) * (slope - line.slope) + (byIntercept[k] ?? 0) * (intercept - line.intercept);
    }
  };
}
