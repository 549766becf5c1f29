import type { ConstantEstimate, Fit } from '../fit/fit.ts';
import type { FitTask } from '../fit/fitTask.ts';
import type { Settled } from '../fit/settle.ts';
import type { DerivedConstant } from '../law/law.ts';
import { carriedInterval, type Interval } from './carriedInterval.ts';
import { monteCarlo } from './monteCarlo.ts';
import { carriedCovariance } from './propagate.ts';

/** What constants are estimated from. */
export interface ConstantSource {
  readonly task: FitTask;
  readonly settled: Settled;
}

const NO_INTERVAL: Interval = { low: Number.NaN, high: Number.NaN };

/**
 * The unknown constants with standard uncertainty and coverage interval, then the derived ones. A constant that
 * depends on one line term alone, with exact known constants, has that term's interval carried through; others have
 * value ± k·u. Without degrees of freedom every uncertainty is absent (NaN).
 */
export function constantEstimates(source: ConstantSource, fit: Fit): ConstantEstimate[] {
  const { task, settled } = source;
  const { law, settings } = task;
  const { factor } = fit.coverage;
  const hasFreedom = fit.coverage.degreesOfFreedom > 0;
  const sampled = settings.options.interval === 'montecarlo' && hasFreedom ? monteCarlo(fit) : null;
  const estimates: ConstantEstimate[] = [];
  const carried = new Map<string, Interval>();
  law.unknown.forEach((name, k) => {
    const value = settled.values[law.constants.indexOf(name)] ?? Number.NaN;
    const standardUncertainty = hasFreedom ? deviationOf(source, fit, k) : Number.NaN;
    const single =
      fit.knownEffects.length === 0 && hasFreedom ? carriedInterval(source, fit.coverage, name) : null;
    if (single !== null) carried.set(name, single);
    const plain = { low: value - factor * standardUncertainty, high: value + factor * standardUncertainty };
    const interval = single ?? plain;
    estimates.push({
      name,
      value,
      standardUncertainty,
      ...interval,
      ...sampledInterval(sampled, name),
      derived: false,
    });
  });
  for (const derived of law.derived) {
    const parent = estimates.find(({ name }) => name === derived.from);
    if (parent === undefined) continue;
    estimates.push({
      ...derivedEstimate(derived, parent, carried.get(derived.from), factor),
      ...sampledInterval(sampled, derived.name),
    });
  }
  return estimates;
}

/** The smallest number that carries all its digits. */
const SMALLEST = 2 ** -1022;

/** Standard uncertainty of an unknown constant, also where its square is beyond the range of numbers. */
function deviationOf({ settled }: ConstantSource, fit: Fit, k: number): number {
  const variance = fit.covariance[k]?.[k] ?? Number.NaN;
  const { fromLine } = settled;
  const inRange = variance >= SMALLEST && variance < Number.POSITIVE_INFINITY;
  if (inRange || fromLine === null || fit.knownEffects.length > 0) return Math.sqrt(variance);
  const derivatives = [fromLine.bySlope[k] ?? 0, fromLine.byIntercept[k] ?? 0] as const;
  const size = Math.max(...derivatives.map(Math.abs));
  if (!(size > 0 && size < Number.POSITIVE_INFINITY)) return Math.sqrt(variance);
  const relative = [derivatives[0] / size, derivatives[1] / size] as const;
  return size * Math.sqrt(carriedCovariance(settled.drawn().line, relative, relative));
}

function derivedEstimate(
  derived: DerivedConstant,
  parent: ConstantEstimate,
  carried: Interval | undefined,
  factor: number,
): ConstantEstimate {
  const value = derived.value(parent.value);
  const standardUncertainty = Math.abs(derived.slope(parent.value)) * parent.standardUncertainty;
  const plain = { low: value - factor * standardUncertainty, high: value + factor * standardUncertainty };
  const interval = carried === undefined ? plain : imageOf(derived, carried, value);
  return { name: derived.name, value, standardUncertainty, ...interval, derived: true };
}

/** A constant's interval carried into a quantity derived from it; absent when the quantity does not exist at an end. */
function imageOf(derived: DerivedConstant, { low, high }: Interval, value: number): Interval {
  const ends = [derived.value(low), derived.value(high)];
  const image = { low: Math.min(...ends), high: Math.max(...ends) };
  return image.low <= value && value <= image.high ? image : NO_INTERVAL;
}

/** The sampled interval takes the place of the first-order one; the standard uncertainty stays. */
function sampledInterval(sampled: ReadonlyMap<string, Interval> | null, name: string): Partial<Interval> {
  const found = sampled?.get(name);
  return found === undefined ? {} : { low: found.low, high: found.high };
}
