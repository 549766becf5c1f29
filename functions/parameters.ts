import type { Parameter } from './sheetFunction.ts';

function parameter(name: string, dimensionality: 'scalar' | 'matrix', description: string): Parameter {
  return { name, description, optional: false, dimensionality };
}

function optional(name: string, dimensionality: 'scalar' | 'matrix', description: string): Parameter {
  return { name, description, optional: true, dimensionality };
}

/** The readings and the law, with which every fitting function begins. */
export const x = parameter('x', 'matrix', 'Predictor cells, any shape.');
export const y = parameter('y', 'matrix', 'Response cells, as many as x.');
export const law = parameter(
  'law',
  'scalar',
  'A law of TAUT.LAWS, or an equation such as "C(t) = C0*exp(-k*t)".',
);

export const name = parameter('name', 'scalar', 'Symbol of one constant of the law, such as "k".');
export const key = parameter('key', 'matrix', 'One cell per reading that says which series it belongs to.');
export const at = parameter('at', 'matrix', 'Values to read the curve at, one or a range.');
export const low = parameter('low', 'scalar', 'Lowest x at which a reading can be taken.');
export const high = parameter('high', 'scalar', 'Highest x at which a reading can be taken.');
export const part = optional('part', 'scalar', '"value" (default), "u", "low" or "high".');
export const laws = optional(
  'laws',
  'matrix',
  "Laws to compare: cells, or text separated by ';'. Default: the general laws.",
);
export const unit = optional('unit', 'scalar', 'Unit to write after the value.');

/** Known constants, which also the functions without readings take. */
export const known = optional(
  'known',
  'matrix',
  'Given constants: "R=1000; V0=12±0.05", or rows of name, value, uncertainty.',
);

/** What every fitting function ends with. */
export const shared: readonly Parameter[] = [
  known,
  optional('u_y', 'matrix', 'Standard uncertainty of y: a number, "2%", a range, "equal" or "proportional".'),
  optional('u_x', 'matrix', 'Standard uncertainty of x: a number, "2%" or a range.'),
  optional(
    'options',
    'matrix',
    'Such as "coverage=0.99; intercept=held; fit=direct", or rows of option and value.',
  ),
];
