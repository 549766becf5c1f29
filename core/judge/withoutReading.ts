import { nearest, realSolutions } from '../constants/fromLine.ts';
import { type LineMoments, lineMoments } from '../constants/lineMoments.ts';
import { termsInUse } from '../constants/usedTerms.ts';
import { unknownOf, withUnknown } from '../fit/columns.ts';
import type { Fit } from '../fit/fit.ts';
import { spreadOf } from '../fit/spread.ts';
import { lineDerivatives } from './lineDerivatives.ts';

/** A line given by its two terms. */
export interface LineThrough {
  readonly slope: number;
  readonly intercept: number;
}

/**
 * The line refitted without one of its readings, the other weights as they are: exact for errors in y, by the leverage.
 * @param row index among the readings on the line
 * @see Belsley, Kuh & Welsch (1980), Regression Diagnostics, equation 2.1 (deletion of a row)
 */
export function lineWithout(
  { line, axes }: Pick<Fit, 'line' | 'axes'>,
  moments: LineMoments,
  row: number,
): LineThrough {
  const { slope, intercept, lineWeight, residual, leverage, terms } = line;
  const w = lineWeight[row] ?? Number.NaN;
  const pull = (w * (residual[row] ?? Number.NaN)) / (1 - (leverage[row] ?? Number.NaN));
  const horizontal = axes.horizontal[row] ?? Number.NaN;
  const { total, mean, spread } = moments;
  if (terms === 1) {
    return { slope: slope - (pull * horizontal) / (spread + total * mean * mean), intercept };
  }
  const bySlope = (horizontal - mean) / spread;
  return { slope: slope - pull * bySlope, intercept: intercept - pull * (1 / total - mean * bySlope) };
}

/** The weights' sums that `lineWithout` needs, once for all readings of a line. */
export function momentsOf({ line, axes }: Pick<Fit, 'line' | 'axes'>): LineMoments {
  return lineMoments(axes.horizontal, line.lineWeight);
}

/**
 * All constants of a fit as they would be without one of its readings, aligned with `law.constants`; null where they
 * do not exist. From the line: the refitted line turned back into constants. From the direct fit: the first Gauss–Newton
 * step of a refit, (JᵀωJ)⁻¹ jᵢ ω rᵢ/(1 − hᵢ).
 * @returns a function of the index of the reading among `fit.used` (line) or `fit.taking` (direct fit)
 * @see Cook & Weisberg (1982), Residuals and Influence in Regression, section 5.3 (one-step approximation)
 */
export function constantsWithout(fit: Fit): (row: number) => Float64Array | null {
  return fit.direct === null ? fromLineWithout(fit) : fromDirectWithout(fit);
}

function fromLineWithout(fit: Fit): (row: number) => Float64Array | null {
  const { form, law, line, settings, values } = fit;
  const terms = termsInUse(form, settings.options.intercept === 'held');
  const moments = momentsOf(fit);
  if (terms === 'combined') {
    const derivatives = lineDerivatives(fit);
    return (row) => {
      const { slope, intercept } = lineWithout(fit, moments, row);
      const theta = unknownOf(law, values).map(
        (value, k) =>
          value +
          (derivatives?.bySlope[k] ?? 0) * (slope - line.slope) +
          (derivatives?.byIntercept[k] ?? 0) * (intercept - line.intercept),
      );
      return theta.every(Number.isFinite) ? withUnknown(law, values, theta) : null;
    };
  }
  return (row) => {
    const { slope, intercept } = lineWithout(fit, moments, row);
    if (!Number.isFinite(slope + intercept)) return null;
    return nearest(realSolutions(form, slope, intercept, values, terms), values) ?? null;
  };
}

function fromDirectWithout(fit: Fit): (row: number) => Float64Array | null {
  const { law, values } = fit;
  const deletion = directDeletion(fit);
  return (row) => {
    const change = deletion.change(row);
    const theta = unknownOf(law, values).map((value, k) => value + (change[k] ?? Number.NaN));
    return theta.every(Number.isFinite) ? withUnknown(law, values, theta) : null;
  };
}

/** Deletion of readings from a direct fit, to first order. */
export interface DirectDeletion {
  /** hᵢ = ω jᵢᵀ (JᵀωJ)⁻¹ jᵢ of every reading that takes part. */
  readonly leverage: Float64Array;
  /** Observed minus fitted response of every reading that takes part. */
  readonly residual: Float64Array;
  /** Change of the unknown constants when a reading is left out, aligned with `law.unknown`. */
  readonly change: (row: number) => Float64Array;
}

/** Leverages and first-order deletions of a direct fit; NaN without degrees of freedom. */
export function directDeletion({ readings, taking, direct, settings }: Fit): DirectDeletion {
  const n = taking.length;
  const leverage = new Float64Array(n).fill(Number.NaN);
  const residual = new Float64Array(n).fill(Number.NaN);
  const nothing = new Float64Array(direct?.theta.length ?? 0).fill(Number.NaN);
  if (direct === null) return { leverage, residual, change: () => nothing };
  const { covariance, jacobian, fitted, residualStandardDeviation } = direct;
  const y = Float64Array.from(taking, (index) => readings.y[index] ?? Number.NaN);
  const position = taking.map((index) => readings.position[index] ?? 0);
  const deviation = spreadOf(settings.spreadY, y, position, 'u_y');
  const { kind } = settings.spreadY;
  const estimated = kind === 'none' || kind === 'equal' || kind === 'proportional';
  const scale = estimated ? residualStandardDeviation ** 2 : 1;
  const step = (row: number): Float64Array =>
    Float64Array.from(covariance, (entries) =>
      entries.reduce((sum, entry, k) => sum + entry * (jacobian[k]?.[row] ?? Number.NaN), 0),
    );
  for (let i = 0; i < n; i++) {
    const variance = (deviation[i] ?? Number.NaN) ** 2 * scale;
    let sum = 0;
    step(i).forEach((entry, k) => {
      sum += entry * (jacobian[k]?.[i] ?? Number.NaN);
    });
    // The scale stands in the covariance as well: it cancels.
    leverage[i] = sum / variance;
    residual[i] = (y[i] ?? Number.NaN) - (fitted[i] ?? Number.NaN);
  }
  return {
    leverage,
    residual,
    change: (row) => {
      const variance = (deviation[row] ?? Number.NaN) ** 2 * scale;
      const pull = (residual[row] ?? Number.NaN) / variance / (1 - (leverage[row] ?? Number.NaN));
      return step(row).map((entry) => -entry * pull);
    },
  };
}
