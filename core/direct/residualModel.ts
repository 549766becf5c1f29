/**
 * What a least-squares iteration minimises: residuals r(θ) = √ω (y − ŷ) and the derivatives of the fitted values,
 * √ω ∂ŷ/∂θ, both as plain columns.
 */
export interface ResidualModel {
  /** Number of residuals. */
  readonly readings: number;
  /** Number of constants θ. */
  readonly constants: number;
  /** Length of the response, √Σ ω y²: what a change of the fitted values is measured against. */
  readonly responseLength: number;
  /** Writes r(θ) and returns Σ r²; +∞ where the law does not exist at θ. */
  residuals(theta: Float64Array, residual: Float64Array): number;
  /** Writes r(θ) and √ω ∂ŷ/∂θ (column-major, readings × constants); returns Σ r², +∞ where either does not exist. */
  jacobian(theta: Float64Array, residual: Float64Array, jacobian: Float64Array): number;
}

/** Σ of squares of a column; +∞ when it is not a number. */
export function sumOfSquaresOf(column: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < column.length; i++) sum += (column[i] ?? 0) ** 2;
  return Number.isNaN(sum) ? Number.POSITIVE_INFINITY : sum;
}
