import { operations as is, type Operation, powerByBase, powerByExponent, unary } from './operations.ts';

/** The value of one operation on plain numbers. */
export function applyScalar(operation: Operation, a: number, b: number): number {
  switch (operation) {
    case is.add:
      return a + b;
    case is.subtract:
      return a - b;
    case is.multiply:
      return a * b;
    case is.divide:
      return a / b;
    case is.power:
      return a ** b;
    default:
      return unary[operation]?.[0](a) ?? Number.NaN;
  }
}

/**
 * One operation down `n` rows: `a` from row `fromA`, `b` from row `fromB`, into `out` from row `fromOut`. Every
 * frequent operation has a loop of its own, which the engine turns into plain machine code.
 */
export function applyColumn(
  operation: Operation,
  a: Float64Array,
  fromA: number,
  b: Float64Array,
  fromB: number,
  out: Float64Array,
  fromOut: number,
  n: number,
): void {
  // Reading inside the arrays' length by construction; `as number` only drops the undefined of an index out of it.
  switch (operation) {
    case is.add:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) + (b[fromB + i] as number);
      return;
    case is.subtract:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) - (b[fromB + i] as number);
      return;
    case is.multiply:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) * (b[fromB + i] as number);
      return;
    case is.divide:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) / (b[fromB + i] as number);
      return;
    case is.power:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) ** (b[fromB + i] as number);
      return;
    case is.negate:
      for (let i = 0; i < n; i++) out[fromOut + i] = -(a[fromA + i] as number);
      return;
    case is.invert:
      for (let i = 0; i < n; i++) out[fromOut + i] = 1 / (a[fromA + i] as number);
      return;
    case is.square:
      for (let i = 0; i < n; i++) out[fromOut + i] = (a[fromA + i] as number) * (a[fromA + i] as number);
      return;
    case is.sqrt:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.sqrt(a[fromA + i] as number);
      return;
    case is.exp:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.exp(a[fromA + i] as number);
      return;
    case is.expm1:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.expm1(a[fromA + i] as number);
      return;
    case is.ln:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.log(a[fromA + i] as number);
      return;
    case is.log1p:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.log1p(a[fromA + i] as number);
      return;
    case is.log10:
      for (let i = 0; i < n; i++) out[fromOut + i] = Math.log10(a[fromA + i] as number);
      return;
    default: {
      const value = unary[operation]?.[0];
      if (value === undefined) return;
      for (let i = 0; i < n; i++) out[fromOut + i] = value(a[fromA + i] as number);
    }
  }
}

/** Rows of one step for the way back: values of operands and result, and their adjoints (null where not wanted). */
export interface BackRows {
  readonly a: Float64Array;
  readonly fromA: number;
  readonly b: Float64Array;
  readonly fromB: number;
  readonly out: Float64Array;
  readonly fromOut: number;
  readonly adjoint: Float64Array;
  readonly toA: Float64Array | null;
  readonly toB: Float64Array | null;
}

/** Adds what a step's result owes to its operands: reverse mode of automatic differentiation. */
export function applyBack(operation: Operation, rows: BackRows, n: number): void {
  const { a, fromA, b, fromB, out, fromOut, adjoint, toA, toB } = rows;
  // Loops of their own for the frequent operations, as above.
  switch (operation) {
    case is.add:
      addTo(toA, adjoint, 1, n);
      addTo(toB, adjoint, 1, n);
      return;
    case is.subtract:
      addTo(toA, adjoint, 1, n);
      addTo(toB, adjoint, -1, n);
      return;
    case is.negate:
      addTo(toA, adjoint, -1, n);
      return;
    case is.multiply:
      addProduct(toA, adjoint, b, fromB, n);
      addProduct(toB, adjoint, a, fromA, n);
      return;
    case is.divide:
      addQuotient(toA, adjoint, b, fromB, n);
      if (toB === null) return;
      for (let i = 0; i < n; i++) {
        const owed = ((adjoint[i] as number) * (out[fromOut + i] as number)) / (b[fromB + i] as number);
        toB[i] = (toB[i] as number) - owed;
      }
      return;
    case is.exp:
      addProduct(toA, adjoint, out, fromOut, n);
      return;
    case is.ln:
      addQuotient(toA, adjoint, a, fromA, n);
      return;
    case is.power:
      for (let i = 0; i < n; i++) {
        const [base, exponent, owed] = [a[fromA + i] as number, b[fromB + i] as number, adjoint[i] as number];
        if (toA !== null) toA[i] = (toA[i] as number) + owed * powerByBase(base, exponent);
        if (toB !== null)
          toB[i] = (toB[i] as number) + owed * powerByExponent(base, exponent, out[fromOut + i] as number);
      }
      return;
    default: {
      const slope = unary[operation]?.[1];
      if (slope === undefined || toA === null) return;
      for (let i = 0; i < n; i++) {
        const factor = slope(a[fromA + i] as number, out[fromOut + i] as number);
        toA[i] = (toA[i] as number) + (adjoint[i] as number) * factor;
      }
    }
  }
}

function addTo(to: Float64Array | null, adjoint: Float64Array, sign: 1 | -1, n: number): void {
  if (to === null) return;
  for (let i = 0; i < n; i++) to[i] = (to[i] as number) + sign * (adjoint[i] as number);
}

function addProduct(
  to: Float64Array | null,
  adjoint: Float64Array,
  factor: Float64Array,
  from: number,
  n: number,
): void {
  if (to === null) return;
  for (let i = 0; i < n; i++)
    to[i] = (to[i] as number) + (adjoint[i] as number) * (factor[from + i] as number);
}

function addQuotient(
  to: Float64Array | null,
  adjoint: Float64Array,
  divisor: Float64Array,
  from: number,
  n: number,
): void {
  if (to === null) return;
  for (let i = 0; i < n; i++)
    to[i] = (to[i] as number) + (adjoint[i] as number) / (divisor[from + i] as number);
}
