import type { Coverage } from '../fit/fit.ts';
import type { ConstantSource } from './estimates.ts';
import { nearest, realSolutions } from './fromLine.ts';
import { singleTermOf } from './usedTerms.ts';

export interface Interval {
  readonly low: number;
  readonly high: number;
}

/**
 * The interval of the one line term that settles a constant, carried through to the constant; null when the constant
 * takes both terms or comes from the direct fit. Both ends are absent (NaN) when the term's interval reaches a value
 * for which the constant does not exist.
 */
export function carriedInterval(
  { task, settled }: ConstantSource,
  coverage: Coverage,
  name: string,
): Interval | null {
  const { fromLine, values } = settled;
  if (fromLine === null || fromLine.terms === 'combined') return null;
  const { terms } = fromLine;
  const { law, form } = task;
  const term = singleTermOf(form, terms, name);
  if (term === null) return null;
  const { line } = settled.drawn();
  const place = law.constants.indexOf(name);
  const width = coverage.factor * Math.sqrt(term === 'slope' ? line.varianceSlope : line.varianceIntercept);
  const image = (shift: number): number => {
    const slope = line.slope + (term === 'slope' ? shift : 0);
    const intercept = line.intercept + (term === 'intercept' ? shift : 0);
    const solutions = realSolutions(form, slope, intercept, values, terms);
    return nearest(solutions, values)?.[place] ?? Number.NaN;
  };
  const ends = [image(-width), image(width)];
  const low = Math.min(...ends);
  const high = Math.max(...ends);
  const value = values[place] ?? Number.NaN;
  return low <= value && value <= high ? { low, high } : { low: Number.NaN, high: Number.NaN };
}
