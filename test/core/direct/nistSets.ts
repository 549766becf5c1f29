import { readFileSync } from 'node:fs';
import type { DirectResult } from '../../../core/fit/fit.ts';
import { expectDigits } from '../../expectDigits.ts';

/** A NIST StRD nonlinear set: readings, both published starts, and the results recomputed in 60-digit arithmetic. */
export interface NistSet {
  readonly name: string;
  readonly expression: string;
  readonly x: Float64Array;
  readonly y: Float64Array;
  readonly constants: readonly string[];
  readonly start1: number[];
  readonly start2: number[];
  /** Certified values, to more digits than the eleven that the collection prints. */
  readonly parameters: readonly string[];
  readonly standardDeviations: readonly string[];
  readonly residualSumOfSquares: string;
  readonly residualStandardDeviation: string;
}

interface Entry {
  readonly name: string;
  readonly columns: readonly { readonly name: string; readonly values: number[] }[];
  readonly model: { readonly expression: string; readonly parameters: string[] };
  readonly start1: number[];
  readonly start2: number[];
  readonly highPrecision: Pick<
    NistSet,
    'parameters' | 'standardDeviations' | 'residualSumOfSquares' | 'residualStandardDeviation'
  >;
}

// The file's shape is described in test/reference/README.md.
const entries = JSON.parse(
  readFileSync(new URL('../../reference/A-nist-nonlinear.json', import.meta.url), 'utf8'),
) as Entry[];

/**
 * A set by its name in the collection.
 * @see NIST/ITL StRD, Nonlinear Least Squares Regression, https://www.itl.nist.gov/div898/strd/nls/nls_main.shtml
 */
export function nistSet(name: string): NistSet {
  const entry = entries.find((candidate) => candidate.name === name);
  if (!entry) throw new Error(`there is no set ${name}`);
  const column = (wanted: string): Float64Array =>
    Float64Array.from(entry.columns.find((candidate) => candidate.name === wanted)?.values ?? []);
  return {
    name,
    expression: entry.model.expression,
    x: column('x'),
    y: column('y'),
    constants: entry.model.parameters,
    start1: entry.start1,
    start2: entry.start2,
    ...entry.highPrecision,
  };
}

/** Square roots of the diagonal of a result's covariance. */
export function standardUncertainties({ covariance }: DirectResult): number[] {
  return covariance.map((row, k) => Math.sqrt(row[k] ?? Number.NaN));
}

/** Fails unless every number agrees with its certified value to `digits` significant digits. */
export function expectAllDigits(
  actual: ArrayLike<number>,
  certified: readonly (number | string)[],
  digits: number,
): void {
  certified.forEach((value, k) => {
    expectDigits(actual[k] ?? Number.NaN, value, digits);
  });
}
