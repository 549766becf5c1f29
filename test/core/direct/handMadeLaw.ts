import type { ColumnFunction, Inputs, Law, StraightForm } from '../../../core/law/law.ts';

/** Value and derivatives by the constants of a curve at one x. */
type Point = (x: number, constants: readonly number[]) => readonly [value: number, ...partials: number[]];

/** A law written out by hand, derivatives included: what the direct fit needs of one, and no more. */
export function handMadeLaw(
  equation: string,
  constants: readonly string[],
  point: Point,
  linear = false,
): Law {
  return {
    name: '',
    equation,
    response: 'y',
    predictor: 'x',
    constants,
    known: [],
    unknown: constants,
    symbols: ['x', 'y', ...constants],
    builtIn: new Map(),
    curve: curveFrom(point, constants.length),
    inverse: null,
    linearInConstants: linear,
    forms: [],
    derived: [],
  };
}

/** The same law with some constants known. */
export function withKnown(law: Law, known: readonly string[]): Law {
  return { ...law, known, unknown: law.constants.filter((name) => !known.includes(name)) };
}

function curveFrom(point: Point, count: number): ColumnFunction {
  const row = (inputs: Inputs, i: number): readonly [number, ...number[]] => {
    const values = inputs.map((input) => (typeof input === 'number' ? input : (input[i] ?? Number.NaN)));
    return point(values[0] ?? Number.NaN, values.slice(2));
  };
  return {
    expression: { kind: 'number', value: 0 },
    uses: [0, ...Array.from({ length: count }, (_, k) => k + 2)],
    evaluate(inputs, length, out = new Float64Array(length)) {
      for (let i = 0; i < length; i++) out[i] = row(inputs, i)[0];
      return out;
    },
    gradient(inputs, length, wrt) {
      const rows = Array.from({ length }, (_, i) => row(inputs, i));
      return {
        value: Float64Array.from(rows, (entry) => entry[0]),
        partials: wrt.map((symbol) => Float64Array.from(rows, (entry) => entry[symbol - 1] ?? 0)),
      };
    },
    at: (values) => point(values[0] ?? Number.NaN, Array.from(values).slice(2))[0],
  };
}

export const exponentialLaw = handMadeLaw('y(x) = p*exp(q*x)', ['p', 'q'], (x, [p = NaN, q = NaN]) => {
  const e = Math.exp(q * x);
  return [p * e, e, p * x * e];
});

export const riseLaw = handMadeLaw('y(x) = b1*(1 - exp(-b2*x))', ['b1', 'b2'], (x, [b1 = NaN, b2 = NaN]) => {
  const e = Math.exp(-b2 * x);
  return [b1 * (1 - e), 1 - e, b1 * x * e];
});

export const peakLaw = handMadeLaw(
  'y(x) = b1/b2*exp(-0.5*((x - b3)/b2)^2)',
  ['b1', 'b2', 'b3'],
  (x, [b1 = NaN, b2 = NaN, b3 = NaN]) => {
    const z = (x - b3) / b2;
    const e = Math.exp(-0.5 * z * z);
    const y = (b1 / b2) * e;
    return [y, e / b2, (y * (z * z - 1)) / b2, (y * z) / b2];
  },
);

export const shiftedPowerLaw = handMadeLaw(
  'Q(h) = c*(h - h0)^b',
  ['c', 'h0', 'b'],
  (h, [c = NaN, h0 = NaN, b = NaN]) => {
    const power = (h - h0) ** b;
    return [c * power, power, -c * b * (h - h0) ** (b - 1), c * power * Math.log(h - h0)];
  },
);

export const parabolaLaw = handMadeLaw(
  'y(x) = a + b*x + c*x^2',
  ['a', 'b', 'c'],
  (x, [a = NaN, b = NaN, c = NaN]) => [a + b * x + c * x * x, 1, x, x * x],
  true,
);

/** A form written out by hand; derivatives of its axes are central differences, for they only weight starts. */
export interface HandMadeForm {
  readonly trials: readonly string[];
  readonly inSlope: readonly string[];
  readonly inIntercept: readonly string[];
  readonly vertical: AxisFunction;
  readonly horizontal: AxisFunction;
  readonly responseFrom: AxisFunction | null;
  readonly slopeOf?: AxisFunction;
  readonly interceptOf?: AxisFunction;
  readonly solve: (slope: number, intercept: number, constants: readonly number[]) => readonly number[];
  readonly trialEdges: readonly (readonly AxisFunction[])[];
}

type AxisFunction = (x: number, y: number, constants: readonly number[]) => number;

/** A law with hand-made straight forms. */
export function withForms(law: Law, forms: readonly HandMadeForm[]): Law {
  return { ...law, forms: forms.map((form, i) => straightForm(form, i + 1)) };
}

function straightForm(form: HandMadeForm, number: number): StraightForm {
  const horizontal = axis(form.horizontal);
  return {
    number,
    plot: '',
    against: '',
    slope: '',
    intercept: '',
    trials: form.trials,
    note: '',
    proportional: form.inIntercept.length === 0 && !form.interceptOf,
    responseOnBothAxes: horizontal.uses.includes(1),
    vertical: axis(form.vertical),
    horizontal,
    slopeOf: axis(form.slopeOf ?? (() => Number.NaN)),
    interceptOf: axis(form.interceptOf ?? (() => 0)),
    inSlope: form.inSlope,
    inIntercept: form.inIntercept,
    responseFrom: form.responseFrom ? axis(form.responseFrom) : null,
    solve: (slope, intercept, constants) => [
      Float64Array.from(form.solve(slope, intercept, Array.from(constants))),
    ],
    trialEdges: form.trialEdges.map((edges) => edges.map(axis)),
  };
}

function axis(value: AxisFunction): ColumnFunction {
  const at = (values: ArrayLike<number>): number =>
    value(values[0] ?? Number.NaN, values[1] ?? Number.NaN, Array.from(values).slice(2));
  const row = (inputs: Inputs, i: number, shift = 0): number[] =>
    inputs.map((input, k) => {
      const entry = typeof input === 'number' ? input : (input[i] ?? Number.NaN);
      return k === 1 ? entry + shift : entry;
    });
  const column = (inputs: Inputs, length: number, shift = 0): Float64Array =>
    Float64Array.from({ length }, (_, i) => at(row(inputs, i, shift)));
  return {
    expression: { kind: 'number', value: 0 },
    uses: at([0.5, 2, 1.25, 1.5, 1.75, 3]) === at([0.5, 2.25, 1.25, 1.5, 1.75, 3]) ? [0] : [0, 1],
    evaluate: (inputs, length) => column(inputs, length),
    gradient: (inputs, length) => {
      const size = 1e-6;
      const above = column(inputs, length, size);
      const below = column(inputs, length, -size);
      return {
        value: column(inputs, length),
        partials: [above.map((entry, i) => (entry - (below[i] ?? Number.NaN)) / (2 * size))],
      };
    },
    at,
  };
}
