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
  const each = (to: Float64Array | null, factor: (i: number) => number): void => {
    if (to === null) return;
    for (let i = 0; i < n; i++) to[i] = (to[i] as number) + (adjoint[i] as number) * factor(i);
  };
  const valueA = (i: number): number => a[fromA + i] as number;
  const valueB = (i: number): number => b[fromB + i] as number;
  const valueOut = (i: number): number => out[fromOut + i] as number;
  switch (operation) {
    case is.add:
      each(toA, () => 1);
      each(toB, () => 1);
      return;
    case is.subtract:
      each(toA, () => 1);
      each(toB, () => -1);
      return;
    case is.multiply:
      each(toA, valueB);
      each(toB, valueA);
      return;
    case is.divide:
      each(toA, (i) => 1 / valueB(i));
      each(toB, (i) => -valueOut(i) / valueB(i));
      return;
    case is.power:
      each(toA, (i) => powerByBase(valueA(i), valueB(i)));
      each(toB, (i) => powerByExponent(valueA(i), valueB(i), valueOut(i)));
      return;
    default: {
      const slope = unary[operation]?.[1];
      if (slope === undefined) return;
      each(toA, (i) => slope(valueA(i), valueOut(i)));
    }
  }
}
