import type { ConstantSource } from '../constants/estimates.ts';
import { varianceFromKnown } from '../constants/knownEffects.ts';
import { FIRST_CONSTANT } from './columns.ts';
import type { Fit, FitState, LeftoverTerm } from './fit.ts';

/**
 * The fitted line term in which no unknown constant stands, against the value that the known constants give it; null
 * when the line has no such term, or the constants do not come from a line with a free intercept.
 */
export function leftoverTerm(
  { task, settled }: ConstantSource,
  { knownEffects }: Pick<Fit, 'knownEffects'>,
): LeftoverTerm | null {
  const { form, settings } = task;
  const terms = settled.fromLine?.terms;
  if (form.proportional || settings.options.intercept === 'held') return null;
  if (terms !== 'slope' && terms !== 'intercept') return null;
  const term = terms === 'slope' ? 'intercept' : 'slope';
  const { line } = settled.drawn();
  const function_ = term === 'slope' ? form.slopeOf : form.interceptOf;
  const expectedAt = (values: Float64Array): number => {
    const inputs = new Float64Array(FIRST_CONSTANT + values.length);
    inputs.set(values, FIRST_CONSTANT);
    return function_.at(inputs);
  };
  const difference = (state: FitState): number => state[term] - expectedAt(state.values);
  const variance = term === 'slope' ? line.varianceSlope : line.varianceIntercept;
  return {
    term,
    fitted: line[term],
    expected: expectedAt(settled.values),
    standardUncertainty: Math.sqrt(variance + varianceFromKnown(knownEffects, difference)),
  };
}
