/**
 * A Householder factorisation with column pivoting of a matrix whose columns were first scaled to length 1:
 * A·N⁻¹·P = Q·R. One object serves many matrices of the same size, so that an iteration allocates nothing.
 */
export interface Factorisation {
  readonly rows: number;
  readonly columns: number;
  /** Column-major, rows × columns: R above the diagonal, the Householder vectors on and below it. */
  readonly packed: Float64Array;
  /** Diagonal of R, by pivoted column. */
  readonly diagonal: Float64Array;
  /** Length of each column of A, by original column; 1 where the column is zero. */
  readonly columnNorm: Float64Array;
  /** Original column that stands at each pivoted place. */
  readonly order: Int32Array;
}

/** Room for the factorisation of matrices of one size; rows ≥ columns ≥ 1. */
export function factorisationSpace(rows: number, columns: number): Factorisation {
  return {
    rows,
    columns,
    packed: new Float64Array(rows * columns),
    diagonal: new Float64Array(columns),
    columnNorm: new Float64Array(columns),
    order: new Int32Array(columns),
  };
}

/**
 * Factorises a matrix into `space`, which it returns.
 * @param matrix column-major, rows × columns, finite; not changed
 * @see Golub & Van Loan (2013), Matrix Computations, 4th ed., algorithms 5.1.1 and 5.4.1
 */
export function factorise(space: Factorisation, matrix: Float64Array): Factorisation {
  const { rows, columns, packed, diagonal, columnNorm, order } = space;
  for (let j = 0; j < columns; j++) {
    const norm = length(matrix, j * rows, rows);
    columnNorm[j] = norm > 0 ? norm : 1;
    order[j] = j;
    for (let i = 0; i < rows; i++) packed[j * rows + i] = at(matrix, j * rows + i) / at(columnNorm, j);
  }
  for (let k = 0; k < columns; k++) {
    exchange(space, k, longestFrom(space, k));
    const start = k * rows + k;
    const norm = length(packed, start, rows - k);
    if (norm === 0) {
      diagonal[k] = 0;
      continue;
    }
    const head = at(packed, start);
    const signed = head > 0 ? -norm : norm;
    diagonal[k] = signed;
    // v = x − signed·e₁, scaled so that the reflection is I − v vᵀ.
    const scale = Math.sqrt(norm * (norm + Math.abs(head)));
    packed[start] = head - signed;
    for (let i = 0; i < rows - k; i++) packed[start + i] = at(packed, start + i) / scale;
    for (let j = k + 1; j < columns; j++) reflect(packed, start, packed, j * rows + k, rows - k);
  }
  return space;
}

/** Smallest over largest diagonal entry of R: near 0 when the columns are linearly dependent. */
export function reciprocalCondition({ diagonal }: Factorisation): number {
  let smallest = Number.POSITIVE_INFINITY;
  let largest = 0;
  for (const entry of diagonal) {
    smallest = Math.min(smallest, Math.abs(entry));
    largest = Math.max(largest, Math.abs(entry));
  }
  return largest > 0 ? smallest / largest : 0;
}

/**
 * The original columns, ascending, that depend on each other: those that the pivoting left without a direction of
 * their own, and those that they are made of.
 * @param threshold relative size on the diagonal of R below which a direction counts as absent
 */
export function dependentColumns(
  { rows, columns, packed, diagonal, order }: Factorisation,
  threshold: number,
): number[] {
  const largest = Math.abs(at(diagonal, 0));
  const rank = diagonal.findIndex((entry) => !(Math.abs(entry) > threshold * largest));
  if (rank < 0) return [];
  const dependent = new Set<number>();
  for (let j = rank; j < columns; j++) {
    dependent.add(at(order, j));
    const parts = new Float64Array(rank);
    for (let k = rank - 1; k >= 0; k--) {
      let sum = at(packed, j * rows + k);
      for (let m = k + 1; m < rank; m++) sum -= at(packed, m * rows + k) * at(parts, m);
      parts[k] = sum / at(diagonal, k);
      if (Math.abs(at(parts, k)) > 1e-3) dependent.add(at(order, k));
    }
  }
  return Array.from(dependent).sort((p, q) => p - q);
}

/** Replaces `column` (rows) by Qᵀ·column. */
export function applyTransposed({ rows, columns, packed }: Factorisation, column: Float64Array): void {
  for (let k = 0; k < columns; k++) reflect(packed, k * rows + k, column, k, rows - k);
}

/**
 * The least-squares solution of A·solution ≈ right side, from Qᵀ·(right side).
 * @param rotated first `columns` entries of Qᵀ·(right side)
 * @param solution written to, by original column
 */
export function solveRotated(space: Factorisation, rotated: Float64Array, solution: Float64Array): void {
  const { rows, columns, packed, diagonal, columnNorm, order } = space;
  for (let k = columns - 1; k >= 0; k--) {
    let sum = at(rotated, k);
    for (let j = k + 1; j < columns; j++) {
      const original = at(order, j);
      sum -= at(packed, j * rows + k) * at(solution, original) * at(columnNorm, original);
    }
    const original = at(order, k);
    solution[original] = sum / at(diagonal, k) / at(columnNorm, original);
  }
}

/** (AᵀA)⁻¹ from R, by original column. */
export function inverseNormal(space: Factorisation): Float64Array[] {
  const { columns, order, columnNorm } = space;
  const inverse = inverseTriangle(space);
  const result = Array.from({ length: columns }, () => new Float64Array(columns));
  for (let p = 0; p < columns; p++) {
    for (let q = 0; q <= p; q++) {
      let sum = 0;
      for (let k = p; k < columns; k++) sum += at(inverse, k * columns + p) * at(inverse, k * columns + q);
      const i = at(order, p);
      const j = at(order, q);
      const entry = sum / at(columnNorm, i) / at(columnNorm, j);
      const rowI = result[i];
      const rowJ = result[j];
      if (rowI) rowI[j] = entry;
      if (rowJ) rowJ[i] = entry;
    }
  }
  return result;
}

/** R⁻¹, column-major, in pivoted order. */
function inverseTriangle({ rows, columns, packed, diagonal }: Factorisation): Float64Array {
  const inverse = new Float64Array(columns * columns);
  for (let k = 0; k < columns; k++) {
    inverse[k * columns + k] = 1 / at(diagonal, k);
    for (let i = k - 1; i >= 0; i--) {
      let sum = 0;
      for (let j = i + 1; j <= k; j++) sum += at(packed, j * rows + i) * at(inverse, k * columns + j);
      inverse[k * columns + i] = -sum / at(diagonal, i);
    }
  }
  return inverse;
}

function longestFrom({ rows, columns, packed }: Factorisation, k: number): number {
  let longest = k;
  let best = -1;
  for (let j = k; j < columns; j++) {
    const norm = length(packed, j * rows + k, rows - k);
    if (norm > best) {
      best = norm;
      longest = j;
    }
  }
  return longest;
}

function exchange({ rows, packed, order }: Factorisation, p: number, q: number): void {
  if (p === q) return;
  for (let i = 0; i < rows; i++) {
    const kept = at(packed, p * rows + i);
    packed[p * rows + i] = at(packed, q * rows + i);
    packed[q * rows + i] = kept;
  }
  const kept = at(order, p);
  order[p] = at(order, q);
  order[q] = kept;
}

/** target ← (I − v vᵀ)·target over `count` entries; v stands in `source` from `from`. */
function reflect(
  source: Float64Array,
  from: number,
  target: Float64Array,
  start: number,
  count: number,
): void {
  let dot = 0;
  for (let i = 0; i < count; i++) dot += at(source, from + i) * at(target, start + i);
  if (dot === 0) return;
  for (let i = 0; i < count; i++) target[start + i] = at(target, start + i) - dot * at(source, from + i);
}

/** Euclidean length of a stretch of `values`, safe against overflow and underflow. */
function length(values: Float64Array, start: number, count: number): number {
  let largest = 0;
  for (let i = start; i < start + count; i++) largest = Math.max(largest, Math.abs(at(values, i)));
  if (largest === 0 || !Number.isFinite(largest)) return largest;
  let sum = 0;
  for (let i = start; i < start + count; i++) sum += (at(values, i) / largest) ** 2;
  return largest * Math.sqrt(sum);
}

/** An entry that the caller knows to be there. */
function at(values: ArrayLike<number>, index: number): number {
  return values[index] ?? Number.NaN;
}
