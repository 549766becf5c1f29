/** What a step of a tape does. Plain numbers, so that the loops over columns switch on them cheaply. */
export const operations = {
  constant: 0,
  input: 1,
  add: 2,
  subtract: 3,
  multiply: 4,
  divide: 5,
  power: 6,
  negate: 7,
  invert: 8,
  square: 9,
  sqrt: 10,
  exp: 11,
  expm1: 12,
  ln: 13,
  log1p: 14,
  log10: 15,
  abs: 16,
  sin: 17,
  cos: 18,
  tan: 19,
  asin: 20,
  acos: 21,
  atan: 22,
  sinh: 23,
  cosh: 24,
  tanh: 25,
} as const;

export type Operation = (typeof operations)[keyof typeof operations];

type Unary = (u: number) => number;
/** Derivative from the operand u and the result v. */
type UnarySlope = (u: number, v: number) => number;

/** Functions of one operand with their derivatives, at the place of their operation. */
export const unary: readonly (readonly [Unary, UnarySlope] | undefined)[] = [
  undefined,
  undefined,
  undefined,
  undefined,
  undefined,
  undefined,
  undefined,
  [(u) => -u, () => -1],
  [(u) => 1 / u, (_, v) => -v * v],
  [(u) => u * u, (u) => 2 * u],
  [Math.sqrt, (_, v) => 0.5 / v],
  [Math.exp, (_, v) => v],
  [Math.expm1, (_, v) => v + 1],
  [Math.log, (u) => 1 / u],
  [Math.log1p, (u) => 1 / (1 + u)],
  [Math.log10, (u) => Math.LOG10E / u],
  [Math.abs, (u) => Math.sign(u)],
  [Math.sin, (u) => Math.cos(u)],
  [Math.cos, (u) => -Math.sin(u)],
  [Math.tan, (_, v) => 1 + v * v],
  [Math.asin, (u) => 1 / Math.sqrt((1 - u) * (1 + u))],
  [Math.acos, (u) => -1 / Math.sqrt((1 - u) * (1 + u))],
  [Math.atan, (u) => 1 / (1 + u * u)],
  [Math.sinh, (u) => Math.cosh(u)],
  [Math.cosh, (u) => Math.sinh(u)],
  [Math.tanh, (_, v) => (1 - v) * (1 + v)],
];

/** Derivative of bᵉ by e, 0 where b = 0 and e > 0. */
export function powerByExponent(base: number, exponent: number, value: number): number {
  return base === 0 && exponent > 0 ? 0 : value * Math.log(base);
}

/** Derivative of bᵉ by b. */
export function powerByBase(base: number, exponent: number): number {
  return exponent * base ** (exponent - 1);
}
