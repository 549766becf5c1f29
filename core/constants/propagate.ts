import type { KnownEffect } from '../fit/fit.ts';
import type { Law } from '../law/law.ts';
import type { Line } from '../line/line.ts';
import type { ConstantSource } from './estimates.ts';
import { derivativeByKnown } from './knownEffects.ts';

/**
 * Covariance of the unknown constants from the readings alone: the line's covariance carried through the constants'
 * derivatives, or that of the direct fit. NaN without degrees of freedom.
 * @see JCGM 100:2008, 5.2.2 (correlated input quantities)
 */
export function covarianceFromReadings({ task, settled }: ConstantSource): Float64Array[] {
  const { direct, fromLine } = settled;
  if (direct !== null) return direct.covariance.map((row) => Float64Array.from(row));
  const { line } = settled.drawn();
  return task.law.unknown.map((_, j) =>
    Float64Array.from(task.law.unknown, (_unknown, k) =>
      carriedCovariance(
        line,
        [fromLine?.bySlope[j] ?? 0, fromLine?.byIntercept[j] ?? 0],
        [fromLine?.bySlope[k] ?? 0, fromLine?.byIntercept[k] ?? 0],
      ),
    ),
  );
}

/** Covariance of two quantities of a line, given their derivatives by slope and intercept. */
export function carriedCovariance(
  { terms, varianceSlope, varianceIntercept, covariance }: Line,
  [sj, ij]: readonly [number, number],
  [sk, ik]: readonly [number, number],
): number {
  if (terms === 1) return sj * sk * varianceSlope;
  return sj * sk * varianceSlope + (sj * ik + ij * sk) * covariance + ij * ik * varianceIntercept;
}

/** Covariance of the unknown constants with what the known constants' uncertainties add. */
export function addKnown(
  law: Law,
  fromReadings: readonly Float64Array[],
  effects: readonly KnownEffect[],
): readonly Float64Array[] {
  if (effects.length === 0) return fromReadings;
  const places = law.unknown.map((name) => law.constants.indexOf(name));
  const steps = effects.map((effect) =>
    places.map(
      (place) =>
        effect.standardUncertainty * derivativeByKnown(effect, ({ values }) => values[place] ?? Number.NaN),
    ),
  );
  return fromReadings.map((row, j) =>
    row.map((entry, k) => steps.reduce((sum, step) => sum + (step[j] ?? 0) * (step[k] ?? 0), entry)),
  );
}
