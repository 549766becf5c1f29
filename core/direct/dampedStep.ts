import { applyTransposed, type Factorisation, factorisationSpace, factorise, solveRotated } from './qr.ts';

/** Room for the small problem that adds the damping below R. */
export interface DampingSpace {
  readonly matrix: Float64Array;
  readonly rightSide: Float64Array;
  readonly pivoted: Float64Array;
  readonly factors: Factorisation;
}

export function dampingSpace(constants: number): DampingSpace {
  return {
    matrix: new Float64Array(2 * constants * constants),
    rightSide: new Float64Array(2 * constants),
    pivoted: new Float64Array(constants),
    factors: factorisationSpace(2 * constants, constants),
  };
}

/**
 * Solves min ‖r − J δ‖² + λ ‖D δ‖² from the factors of J.
 * @param space factors of J
 * @param rotated Qᵀr, at least its first p entries
 * @param scale diagonal of D, p, above 0
 * @param step receives δ, p
 * @returns the fall of ‖r − Jδ‖² + λ‖Dδ‖² from its value at δ = 0, in the form ‖Jδ‖² + 2λ‖Dδ‖² that cannot cancel
 * @see Moré (1978), in Watson (ed.), Numerical Analysis, Springer, 105, sections 3 and 4
 */
export function dampedStep(
  space: Factorisation,
  small: DampingSpace,
  rotated: Float64Array,
  lambda: number,
  scale: Float64Array,
  step: Float64Array,
): number {
  const { rows, columns, packed, diagonal, columnNorm, order } = space;
  const { matrix, rightSide, pivoted, factors } = small;
  const root = Math.sqrt(lambda);
  matrix.fill(0);
  rightSide.fill(0);
  for (let j = 0; j < columns; j++) {
    const original = order[j] ?? 0;
    const column = j * 2 * columns;
    for (let i = 0; i < j; i++) matrix[column + i] = packed[j * rows + i] ?? 0;
    matrix[column + j] = diagonal[j] ?? 0;
    matrix[column + columns + j] = (root * (scale[original] ?? 0)) / (columnNorm[original] ?? 1);
    rightSide[j] = rotated[j] ?? 0;
  }
  factorise(factors, matrix);
  applyTransposed(factors, rightSide);
  solveRotated(factors, rightSide, pivoted);
  let promised = 0;
  for (let i = 0; i < columns; i++) {
    let along = 0;
    for (let j = i; j < columns; j++) along += (matrix[j * 2 * columns + i] ?? 0) * (pivoted[j] ?? 0);
    const damped = (matrix[i * 2 * columns + columns + i] ?? 0) * (pivoted[i] ?? 0);
    promised += along ** 2 + 2 * damped ** 2;
  }
  for (let j = 0; j < columns; j++) {
    const original = order[j] ?? 0;
    step[original] = (pivoted[j] ?? 0) / (columnNorm[original] ?? 1);
  }
  return promised;
}
