import type { Known } from '../given/given.ts';
import type { Inputs, Law } from '../law/law.ts';

/** Positions of the predictor and of the response among a law's symbols; the constants follow. */
export const PREDICTOR = 0;
export const RESPONSE = 1;
export const FIRST_CONSTANT = 2;

/** A law's inputs from columns (or single values) of x and y and the values of all its constants. */
export function lawInputs(
  x: Float64Array | number,
  y: Float64Array | number,
  constants: ArrayLike<number>,
): Inputs {
  return [x, y, ...Array.from(constants)];
}

/** The values of a law's constants before the fit: known and built-in ones filled in, NaN for the unknown. */
export function givenConstants(law: Law, known: Known): Float64Array {
  return Float64Array.from(
    law.constants,
    (name) => known.get(name)?.value ?? law.builtIn.get(name) ?? Number.NaN,
  );
}

/** The entries of `column` at `indices`; the column itself when all are wanted. */
export function pick(column: Float64Array, indices: Int32Array): Float64Array {
  if (indices.length === column.length) return column;
  const picked = new Float64Array(indices.length);
  for (let i = 0; i < indices.length; i++) picked[i] = column[indices[i] ?? 0] ?? Number.NaN;
  return picked;
}

/** The unknown constants' entries of a full vector of constants. */
export function unknownOf(law: Law, constants: ArrayLike<number>): Float64Array {
  return Float64Array.from(law.unknown, (name) => constants[law.constants.indexOf(name)] ?? Number.NaN);
}

/** A full vector of constants with the unknown ones replaced by `theta`. */
export function withUnknown(law: Law, constants: Float64Array, theta: ArrayLike<number>): Float64Array {
  const full = Float64Array.from(constants);
  law.unknown.forEach((name, k) => {
    full[law.constants.indexOf(name)] = theta[k] ?? Number.NaN;
  });
  return full;
}

/** 0, 1, …, n − 1: a stretch of one column that all share, so never written to. */
export function indices(n: number): Int32Array {
  if (n > sharedIndices.length) sharedIndices = countedTo(Math.max(n, 2 * sharedIndices.length));
  return sharedIndices.subarray(0, n);
}

let sharedIndices = countedTo(4096);

function countedTo(n: number): Int32Array {
  const all = new Int32Array(n);
  for (let i = 0; i < n; i++) all[i] = i;
  return all;
}
