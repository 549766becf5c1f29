import type { KnownEffect } from '../fit/fit.ts';
import type { Law } from '../law/law.ts';
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
  const { varianceSlope, varianceIntercept, covariance } = line;
  const free = line.terms === 2;
  return task.law.unknown.map((_, j) =>
    Float64Array.from(task.law.unknown, (_unknown, k) => {
      const sj = fromLine?.bySlope[j] ?? 0;
      const sk = fromLine?.bySlope[k] ?? 0;
      if (!free) return sj * sk * varianceSlope;
      const ij = fromLine?.byIntercept[j] ?? 0;
      const ik = fromLine?.byIntercept[k] ?? 0;
      return sj * sk * varianceSlope + (sj * ik + ij * sk) * covariance + ij * ik * varianceIntercept;
    }),
  );
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
