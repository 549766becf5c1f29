import { describe, expect, test } from '@jest/globals';
import { inverse, Matrix, solve } from 'ml-matrix';
import {
  applyTransposed,
  factorisationSpace,
  factorise,
  inverseNormal,
  reciprocalCondition,
  solveRotated,
} from '../../../core/direct/qr.ts';
import { expectDigits } from '../../expectDigits.ts';

/** A fixed, irregular matrix: column-major, its columns of very different size. */
function irregular(rows: number, columns: number): Float64Array {
  const matrix = new Float64Array(rows * columns);
  for (let j = 0; j < columns; j++) {
    for (let i = 0; i < rows; i++)
      matrix[j * rows + i] = Math.sin(1 + 3.7 * i + i * i * j + 2 * j) * 10 ** (3 * j - 4);
  }
  return matrix;
}

const asRows = (matrix: Float64Array, rows: number, columns: number): Matrix =>
  new Matrix(
    Array.from({ length: rows }, (_, i) =>
      Array.from({ length: columns }, (_, j) => matrix[j * rows + i] ?? NaN),
    ),
  );

describe('factorise', () => {
  const rows = 12;
  const columns = 4;
  const matrix = irregular(rows, columns);
  const right = Float64Array.from({ length: rows }, (_, i) => Math.cos(i * i));

  test('solves least squares as ml-matrix does with its QR', () => {
    const space = factorise(factorisationSpace(rows, columns), matrix);
    const rotated = Float64Array.from(right);
    applyTransposed(space, rotated);
    const solution = new Float64Array(columns);
    solveRotated(space, rotated, solution);
    const reference = solve(asRows(matrix, rows, columns), Matrix.columnVector(right));
    for (let j = 0; j < columns; j++) expectDigits(solution[j] ?? NaN, reference.get(j, 0), 11);
  });

  test('gives (AᵀA)⁻¹ as ml-matrix does by inversion', () => {
    const a = asRows(matrix, rows, columns);
    // Scaled to equal columns first, so that the inversion of the reference keeps its digits.
    const scaled = a.clone();
    for (let j = 0; j < columns; j++) scaled.mulColumn(j, 10 ** (4 - 3 * j));
    const reference = inverse(scaled.transpose().mmul(scaled));
    const covariance = inverseNormal(factorise(factorisationSpace(rows, columns), matrix));
    for (let j = 0; j < columns; j++) {
      for (let k = 0; k < columns; k++) {
        expectDigits(covariance[j]?.[k] ?? NaN, reference.get(j, k) * 10 ** (8 - 3 * j - 3 * k), 11);
      }
    }
  });

  test('the length of a rotated column stays', () => {
    const space = factorise(factorisationSpace(rows, columns), matrix);
    const rotated = Float64Array.from(right);
    applyTransposed(space, rotated);
    expectDigits(Math.hypot(...rotated), Math.hypot(...right), 14);
  });

  test('does not change its argument, and one space serves many matrices', () => {
    const before = Float64Array.from(matrix);
    const space = factorisationSpace(rows, columns);
    const first = Array.from(factorise(space, matrix).diagonal);
    factorise(space, irregular(rows, columns).reverse());
    expect(Array.from(factorise(space, matrix).diagonal)).toEqual(first);
    expect(matrix).toEqual(before);
  });

  test('shows dependent columns', () => {
    const twin = irregular(rows, 3);
    for (let i = 0; i < rows; i++) twin[2 * rows + i] = 2 * (twin[i] ?? 0) - 1e-6 * (twin[rows + i] ?? 0);
    expect(reciprocalCondition(factorise(factorisationSpace(rows, 3), twin))).toBeLessThan(1e-14);
    expect(reciprocalCondition(factorise(factorisationSpace(rows, columns), matrix))).toBeGreaterThan(0.01);
  });

  test.each([1e-160, 1e160])('columns of size %p neither overflow nor vanish', (size) => {
    const space = factorise(
      factorisationSpace(rows, columns),
      matrix.map((entry) => entry * size),
    );
    const rotated = Float64Array.from(right);
    applyTransposed(space, rotated);
    const solution = new Float64Array(columns);
    solveRotated(space, rotated, solution);
    const reference = solve(asRows(matrix, rows, columns), Matrix.columnVector(right));
    for (let j = 0; j < columns; j++) expectDigits((solution[j] ?? NaN) * size, reference.get(j, 0), 11);
  });
});
