/** Singular values with right singular vectors, in no particular order. */
export interface SingularValues {
  readonly values: Float64Array;
  /** Aligned with `values`; each of unit length, one entry per column. */
  readonly vectors: readonly Float64Array[];
}

/**
 * Singular values of a small matrix by rotations of its columns.
 * @param columns n columns of m entries; they are not changed
 * @see Golub & Van Loan (2013), Matrix Computations, 4th ed., section 8.6.3 (one-sided Jacobi)
 */
export function singularValues(columns: readonly Float64Array[]): SingularValues {
  const n = columns.length;
  const work = columns.map((column) => Float64Array.from(column));
  const vectors = columns.map((_, k) => Float64Array.from({ length: n }, (_, i) => (i === k ? 1 : 0)));
  for (let sweep = 0; sweep < 40; sweep++) {
    let turned = false;
    for (let p = 0; p < n; p++) {
      for (let q = p + 1; q < n; q++) turned = rotate(work[p], work[q], vectors[p], vectors[q]) || turned;
    }
    if (!turned) break;
  }
  return { values: Float64Array.from(work, (column) => Math.sqrt(dot(column, column))), vectors };
}

function rotate(
  a: Float64Array | undefined,
  b: Float64Array | undefined,
  va: Float64Array | undefined,
  vb: Float64Array | undefined,
): boolean {
  if (a === undefined || b === undefined || va === undefined || vb === undefined) return false;
  const aa = dot(a, a);
  const bb = dot(b, b);
  const ab = dot(a, b);
  if (Math.abs(ab) <= 1e-15 * Math.sqrt(aa * bb) || ab === 0) return false;
  const zeta = (bb - aa) / (2 * ab);
  const t = (zeta < 0 ? -1 : 1) / (Math.abs(zeta) + Math.sqrt(1 + zeta * zeta));
  const c = 1 / Math.sqrt(1 + t * t);
  turn(a, b, c, c * t);
  turn(va, vb, c, c * t);
  return true;
}

function turn(a: Float64Array, b: Float64Array, c: number, s: number): void {
  for (let i = 0; i < a.length; i++) {
    const p = a[i] ?? 0;
    const q = b[i] ?? 0;
    a[i] = c * p - s * q;
    b[i] = s * p + c * q;
  }
}

function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i++) sum += (a[i] ?? 0) * (b[i] ?? 0);
  return sum;
}
