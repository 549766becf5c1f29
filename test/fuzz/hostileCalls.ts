import fc from 'fast-check';
import { sheetFunctions } from '../../functions/sheetFunctions.ts';
import { HostError } from '../hostCalls.ts';

/** One call of a sheet function: what a host would pass, cell by cell. */
export interface HostileCall {
  readonly id: string;
  readonly given: readonly unknown[];
}

const ERRORS = [
  '#N/A',
  '#DIV/0!',
  '#VALUE!',
  '#REF!',
  '#NAME?',
  '#NUM!',
  '#NULL!',
  '#SPILL!',
  '#CALC!',
  '#BUSY!',
];

const NAMES_OF_THE_LANGUAGE = [
  '__proto__',
  'constructor',
  'toString',
  'hasOwnProperty',
  'prototype',
  'valueOf',
];

/** Numbers that a cell can hold, the awkward ones often. */
const numbers: fc.Arbitrary<number> = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.integer({ min: -5, max: 20 }),
  fc.double({ min: 0.01, max: 100, noNaN: true }),
  fc.constantFrom(
    0,
    -0,
    1,
    -1,
    5e-324,
    -5e-324,
    2.2e-308,
    1e-300,
    1e300,
    1.7976931348623157e308,
    1e10,
    1e10 + 1,
    2 ** 53,
  ),
);

const texts: fc.Arbitrary<string> = fc.oneof(
  fc.string({ maxLength: 20, unit: 'binary' }),
  fc.constantFrom(
    '',
    ' ',
    'n/a',
    '<0.02',
    '1,5',
    '1e5',
    '2%',
    '½',
    '−3',
    '٣',
    '0x10',

    '=1',
    "'",
    '\u0000',
  ),
  fc.constantFrom(...NAMES_OF_THE_LANGUAGE),
  fc.constantFrom('9'.repeat(400), '('.repeat(3000), ' '.repeat(40_000), 'a'.repeat(40_000)),
);

/** Anything that a host may say is in a cell. */
const cells: fc.Arbitrary<unknown> = fc.oneof(
  { weight: 8, arbitrary: numbers },
  { weight: 2, arbitrary: fc.constantFrom(null, '', 0) },
  { weight: 1, arbitrary: texts },
  { weight: 1, arbitrary: fc.boolean() },
  { weight: 1, arbitrary: fc.constantFrom(...ERRORS).map((code) => new HostError(code)) },
  {
    weight: 1,
    arbitrary: fc.constantFrom(
      { type: 'Entity', basicValue: 3 },
      { type: 'WebImage', address: 'x' },
      undefined,
    ),
  },
);

const ranges: fc.Arbitrary<unknown[][]> = fc.oneof(
  fc.array(cells, { minLength: 1, maxLength: 14 }).map((column) => column.map((cell) => [cell])),
  fc.array(cells, { minLength: 1, maxLength: 14 }).map((row) => [row]),
  fc.array(fc.array(cells, { minLength: 1, maxLength: 4 }), { minLength: 1, maxLength: 5 }),
);

const scatters = fc.double({ min: -0.1, max: 0.1, noNaN: true });

/** Readings as they may be found: on some curve, with scatter, with a few cells that are something else. */
const readings: fc.Arbitrary<{ readonly x: unknown[][]; readonly y: unknown[][] }> = fc
  .record({
    from: fc.double({ min: 0.05, max: 5, noNaN: true }),
    step: fc.oneof(
      { weight: 6, arbitrary: fc.double({ min: 0.1, max: 3, noNaN: true }) },
      { weight: 1, arbitrary: fc.double({ min: 0, max: 1, noNaN: true }) },
    ),
    shape: fc.constantFrom<(x: number) => number>(
      (x) => 3 * Math.exp(-0.4 * x),
      (x) => 2 * x ** 1.5,
      (x) => (5 * x) / (1.2 + x),
      (x) => 0.5 + 2 * x,
      (x) => 1 + 4 * Math.exp(-0.7 * x),
      () => 7,
    ),
    scale: fc.constantFrom(1, 1, 1, 1, 1e-300, 1e-12, 1e10, 1e150, 1e300, -1),
    offset: fc.constantFrom(0, 0, 0, 0, 0, 0, 1e10, -3),
    scatter: fc.oneof(
      { weight: 1, arbitrary: fc.array(scatters, { maxLength: 4 }) },
      { weight: 5, arbitrary: fc.array(scatters, { minLength: 6, maxLength: 16 }) },
    ),
    odd: fc.oneof(
      { weight: 6, arbitrary: fc.constant([]) },
      { weight: 2, arbitrary: fc.array(fc.tuple(fc.nat(15), fc.boolean(), cells), { maxLength: 3 }) },
    ),
    across: fc.boolean(),
  })
  .map(({ from, step, shape, scale, offset, scatter, odd, across }) => {
    const x: unknown[] = scatter.map((_, i) => offset + from + step * i);
    const y: unknown[] = scatter.map((e, i) => scale * shape(from + step * i) * (1 + e));
    for (const [index, inX, cell] of odd) if (index < x.length) (inX ? x : y)[index] = cell;
    return across ? { x: [x], y: [y] } : { x: x.map((cell) => [cell]), y: y.map((cell) => [cell]) };
  });

const LAWS = [
  'straight line',
  'power',
  'exponential',
  'logarithmic',
  'reciprocal',
  'saturation',
  'hyperbolic',
  'root',
  'square',
  'inverse exponential',
  'rise and decay',
  'proportional',
  'arrhenius',
  'thermistor',
  'first order',
  'second order',
  'approach',
  'saturating rise',
  'logistic',
  'weibull',
  'hill',
  'shifted power',
  'offset decay',
  'langmuir',
  'freundlich',
  'antoine',
  'basquin',
  'V(t) = V0*exp(-t/tau)',
  'y = a + b*x^2',
  'v(x): x/(v*(1-x)) = 1/(vm*c) + (c-1)*x/(vm*c)',
  'y(x) = a*b*x',
  'y(x) = a + b*x + c*x^2',
  'y(x) = sin(a*x)',
  'y(x) = x^x^a',
  'y(x) = ln(ln(a*x)) + b',
];

/** Expressions of the law language, and of what looks like it. */
const expressions: fc.Arbitrary<string> = fc.letrec<{
  all: string;
  leaf: string;
  binary: string;
  call: string;
}>((tie) => ({
  all: fc.oneof({ maxDepth: 5, withCrossShrink: true }, tie('leaf'), tie('binary'), tie('call')),
  leaf: fc.oneof(
    fc.constantFrom(
      'x',
      'x',
      'a',
      'b',
      'c',
      'd',
      'y',
      'k1',
      'τ',
      '1',
      '2',
      '0',
      '1e308',
      '1e-320',
      '0.5',
      ...NAMES_OF_THE_LANGUAGE,
    ),
    fc.nat(9).map((n) => `q${n}`),
  ),
  binary: fc
    .tuple(tie('all'), fc.constantFrom('+', '-', '*', '/', '^', '·', '**', ' '), tie('all'))
    .map(([left, operator, right]) => `(${left})${operator}(${right})`),
  call: fc
    .tuple(fc.constantFrom('exp', 'ln', 'log', 'sqrt', 'abs', 'sin', 'constructor', '-'), tie('all'))
    .map(([name, inner]) => `${name}(${inner})`),
})).all;

/** Texts that make careless parsers and rewriters slow. */
const towers: fc.Arbitrary<string> = fc
  .tuple(
    fc.constantFrom('(', '-', 'exp(', 'x^', 'a+', '1/(1+', 'a*x+', 'ln('),
    fc.integer({ min: 1, max: 600 }),
  )
  .map(([part, times]) => `y(x) = ${part.repeat(times)}x${')'.repeat(part.endsWith('(') ? times : 0)}`);

const polynomials: fc.Arbitrary<string> = fc
  .tuple(
    fc.integer({ min: 1, max: 30 }),
    fc.constantFrom('a#*x^#', 'a#*exp(b#*x)', '(x - a#)', 'a#/(b# + x)'),
    fc.constantFrom(' + ', '*', '/', '^'),
  )
  .map(
    ([count, term, between]) =>
      `y(x) = ${Array.from({ length: count }, (_, i) => term.replaceAll('#', String(i))).join(between)}`,
  );

const laws: fc.Arbitrary<unknown> = fc.oneof(
  { weight: 6, arbitrary: fc.constantFrom(...LAWS) },
  { weight: 4, arbitrary: expressions.map((right) => `y(x) = ${right}`) },
  {
    weight: 1,
    arbitrary: fc.tuple(expressions, expressions).map(([left, right]) => `y(x): ${left} = ${right}`),
  },
  { weight: 1, arbitrary: towers },
  { weight: 1, arbitrary: polynomials },
  { weight: 1, arbitrary: cells },
);

const known: fc.Arbitrary<unknown> = fc.oneof(
  { weight: 6, arbitrary: fc.constant(null) },
  {
    weight: 2,
    arbitrary: fc
      .array(
        fc.tuple(
          fc.constantFrom('a', 'b', 'p', 'q', 'k', 'yf', 'c', 'h0', 'T0', 'V0', 'R0', '__proto__', 'x'),
          numbers,
          fc.option(numbers),
        ),
        { minLength: 1, maxLength: 3 },
      )
      .chain((rows) =>
        fc.constantFrom<unknown>(
          rows.map(([name, value, u]) => `${name}=${value}${u === null ? '' : `±${u}`}`).join('; '),
          rows.map((row) => [...row]),
        ),
      ),
  },
  { weight: 1, arbitrary: ranges },
  { weight: 1, arbitrary: texts },
);

const spreads: fc.Arbitrary<unknown> = fc.oneof(
  { weight: 5, arbitrary: fc.constant(null) },
  { weight: 3, arbitrary: fc.constantFrom('2%', 'equal', 'proportional', 0.1, '0.05', 1e-300, 1e300) },
  { weight: 1, arbitrary: ranges },
  { weight: 1, arbitrary: cells },
);

const options: fc.Arbitrary<unknown> = fc.oneof(
  { weight: 4, arbitrary: fc.constant(null) },
  {
    weight: 5,
    arbitrary: fc
      .array(
        fc.constantFrom(
          'coverage=0.99',
          'coverage=1',
          'coverage=1e-9',
          'intercept=held',
          'form=2',
          'form=3',
          'form=99',
          'form=1.5',
          'fit=direct',
          'band=reading',
          'outside=set aside',
          'interval=montecarlo',
          'judge=direct',
          'style=brackets',
          '__proto__=1',
          'constructor=line',
          '=',
          ';;',
          'coverage',
        ),
        { minLength: 1, maxLength: 3 },
      )
      .map((all) => all.join('; ')),
  },
  { weight: 1, arbitrary: ranges },
  { weight: 1, arbitrary: cells },
);

const names: fc.Arbitrary<unknown> = fc.oneof(
  {
    weight: 6,
    arbitrary: fc.constantFrom('a', 'b', 'p', 'q', 'k', 'half-life', 'tau', 'V0', ...NAMES_OF_THE_LANGUAGE),
  },
  { weight: 1, arbitrary: cells },
);

/** A law that suits many readings, with one of its constants. */
const PLAIN_LAWS: readonly (readonly [string, string])[] = [
  ['exponential', 'q'],
  ['exponential', 'half-life'],
  ['power', 'p'],
  ['saturation', 'q'],
  ['straight line', 'a'],
  ['proportional', 'b'],
  ['first order', 'k'],
  ['offset decay', 'k'],
  ['saturating rise', 'm'],
  ['shifted power', 'b'],
  ['langmuir', 'qm'],
  ['V(t) = V0*exp(-t/tau)', 'tau'],
];

/** What a careful person passes for a parameter by its name; what is not listed is left out. */
function plain(name: string, [law, constant]: readonly [string, string]): unknown {
  const values: Readonly<Record<string, unknown>> = {
    law,
    name: constant,
    at: [[1.5], [0.7]],
    low: 0.1,
    high: 12,
  };
  return values[name] ?? null;
}

/** What is passed for a parameter by its name at other times; x and y are passed together. */
const hostile: Readonly<Record<string, fc.Arbitrary<unknown>>> = {
  law: laws,
  laws: fc.oneof(fc.constantFrom('power; exponential', 'power', ';'), laws, ranges),
  known,
  u_y: spreads,
  u_x: spreads,
  options,
  name: names,
  part: fc.oneof(fc.constantFrom<unknown>('value', 'u', 'low', 'HIGH', 0), cells),
  unit: fc.oneof(fc.constantFrom<unknown>('mg/L', 0), cells),
  at: fc.oneof(ranges, numbers),
  low: cells,
  high: cells,
  key: ranges,
};

const pairs = fc.oneof(
  { weight: 16, arbitrary: readings },
  { weight: 2, arbitrary: ranges.chain((x) => ranges.map((y) => ({ x, y }))) },
  { weight: 1, arbitrary: fc.tuple(cells, cells).map(([x, y]) => ({ x, y })) },
);

/** Keys for readings: as many as there are, mostly. */
function keysFor(x: unknown): fc.Arbitrary<unknown> {
  const count = Array.isArray(x) ? x.flat().length : 1;
  const keys = fc.array(fc.constantFrom<unknown>('A', 'B', 'B ', 3, true, null, '__proto__'), {
    minLength: count,
    maxLength: count,
  });
  return fc.oneof(
    { weight: 5, arbitrary: keys.map((all) => all.map((key) => [key])) },
    { weight: 1, arbitrary: ranges },
  );
}

/** Calls of one sheet function. */
export function callsOf(id: string): fc.Arbitrary<HostileCall> {
  const found = sheetFunctions.find((one) => one.id === id);
  if (!found) throw new Error(`there is no function ${id}`);
  const { parameters } = found;
  return fc
    .tuple(pairs, fc.constantFrom(...PLAIN_LAWS))
    .chain(([{ x, y }, law]) => {
      const each = parameters.map(({ name }) => {
        if (name === 'x') return fc.constant<unknown>(x);
        if (name === 'y') return fc.constant<unknown>(y);
        if (name === 'key') return keysFor(x);
        const other = hostile[name];
        if (!other) throw new Error(`nothing is said of the argument ${name}`);
        return fc.oneof(
          { weight: 4, arbitrary: fc.constant(plain(name, law)) },
          { weight: 1, arbitrary: other },
        );
      });
      return fc.tuple(...each);
    })
    .map((given) => ({ id, given }));
}
