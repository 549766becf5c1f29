import type { FitState, KnownEffect } from '../fit/fit.ts';
import type { Known } from '../given/given.ts';
import { Problem } from '../problem.ts';
import { fitWords } from '../words/fitWords.ts';

/** Steps tried, in parts of the standard uncertainty: the first for which all four fits exist. */
const PARTS = [1 / 32, 1 / 1024, 1 / 32768];
/** Least step in parts of the value: below it the differences would be rounding. */
const LEAST_PART = 2e-4;

/**
 * Repeats a fit with each uncertain known constant shifted, for derivatives that include how the line itself changes.
 * @param refit the fit with one constant's value replaced
 * @throws Problem `undefined` when the fit does not exist on both sides of a known constant
 */
export function knownEffectsOf(
  known: Known,
  refit: (name: string, value: number) => FitState,
): KnownEffect[] {
  const effects: KnownEffect[] = [];
  for (const [name, { value, standardUncertainty }] of known) {
    if (standardUncertainty > 0) effects.push(effectOf(name, value, standardUncertainty, refit));
  }
  return effects;
}

function effectOf(
  name: string,
  value: number,
  standardUncertainty: number,
  refit: (name: string, value: number) => FitState,
): KnownEffect {
  const least = LEAST_PART * Math.abs(value);
  const steps = [
    Math.max(standardUncertainty / 32, least),
    ...PARTS.map((part) => part * standardUncertainty),
  ];
  for (const step of steps) {
    try {
      const shifted = [
        refit(name, value - 2 * step),
        refit(name, value - step),
        refit(name, value + step),
        refit(name, value + 2 * step),
      ] as const;
      return { name, standardUncertainty, step, shifted };
    } catch (error) {
      if (!(error instanceof Problem)) throw error;
    }
  }
  throw new Problem('undefined', 'known', fitWords.knownShift(name));
}

/**
 * Total derivative of a quantity of the fit with respect to a known constant.
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, table 25.2 (five-point differentiation)
 */
export function derivativeByKnown(
  { step, shifted }: KnownEffect,
  quantity: (state: FitState) => number,
): number {
  const [below2, below1, above1, above2] = shifted;
  const inner = quantity(above1) - quantity(below1);
  const outer = quantity(above2) - quantity(below2);
  return (8 * inner - outer) / (12 * step);
}

/** Variance that the known constants' uncertainties bring to a quantity of the fit (JCGM 100:2008, 5.1.2). */
export function varianceFromKnown(
  effects: readonly KnownEffect[],
  quantity: (state: FitState) => number,
): number {
  return effects.reduce(
    (sum, effect) => sum + (effect.standardUncertainty * derivativeByKnown(effect, quantity)) ** 2,
    0,
  );
}
