import { describe, expect, test } from '@jest/globals';
import { columnFunction } from '../../../core/law/columnFunction.ts';
import type { ColumnFunction } from '../../../core/law/law.ts';
import { parseLaw } from '../../../core/law/parseLaw.ts';
import { randomNumbers } from '../../../core/law/samplePoints.ts';

const SYMBOLS = ['x', 'y', 'a', 'b', 'c'];

function compiled(right: string): ColumnFunction {
  return columnFunction(parseLaw(`y(x) = ${right}`).right, SYMBOLS);
}

const expressions = [
  'a + b*x',
  'a*exp(-b*x) + c',
  'a*(1 - exp(-b*x))',
  'a*x^b',
  'x^2/(a + x)',
  'a/(1 + exp(b - c*x))',
  'ln(1 + a*x)',
  'log10(a*x) - log2(b + x)',
  'sqrt(a + b*x)',
  'a^x + x^c',
  'sin(a*x)*cos(b*x) + tan(c*x/9)',
  'asin(x/9) + acos(a/9) + atan(b*x)',
  'sinh(a*x/3) - cosh(b*x/3) + tanh(c*x)',
  'abs(a - b*x)',
  '(a + x)^(-b)*x*x - a/(b*c)',
  'exp(x*a)/exp(x*b) - 1',
];

describe.each(expressions)('%s', (text) => {
  const f = compiled(text);
  const random = randomNumbers(77);
  const rows = 37;
  const columns = SYMBOLS.map(() => Float64Array.from({ length: rows }, () => 0.4 + 1.3 * random()));
  const point = (i: number): number[] => columns.map((column) => column[i] ?? Number.NaN);

  test('columns, plain numbers and single points agree', () => {
    const values = f.evaluate(columns, rows);
    for (let i = 0; i < rows; i++) expect(values[i]).toBe(f.at(point(i)));
    const mixed = f.evaluate([columns[0] ?? 0, 0, 1.1, 0.7, 0.9], rows);
    for (let i = 0; i < rows; i++) expect(mixed[i]).toBe(f.at([columns[0]?.[i] ?? 0, 0, 1.1, 0.7, 0.9]));
    const out = new Float64Array(rows);
    expect(f.evaluate(columns, rows, out)).toBe(out);
  });

  test('the gradient agrees with central differences', () => {
    const wrt = [0, 2, 3, 4];
    const { value, partials } = f.gradient(columns, rows, wrt);
    expect(value).toEqual(f.evaluate(columns, rows));
    for (const [k, symbol] of wrt.entries()) {
      for (let i = 0; i < rows; i++) {
        const step = 1e-5;
        const moved = (by: number): number => {
          const values = point(i);
          values[symbol] = (values[symbol] ?? 0) + by;
          return f.at(values);
        };
        // Richardson's extrapolation of two central differences: error of order step⁴.
        const coarse = (moved(2 * step) - moved(-2 * step)) / (4 * step);
        const fine = (moved(step) - moved(-step)) / (2 * step);
        const difference = (4 * fine - coarse) / 3;
        const exact = partials[k]?.[i] ?? Number.NaN;
        expect(Math.abs(exact - difference)).toBeLessThan(
          2e-9 * (1 + Math.abs(exact) + Math.abs(value[i] ?? 0)),
        );
      }
    }
  });
});

test('NaN marks what lies outside the domain, and nothing is infinite', () => {
  const x = Float64Array.of(-1, 0, 1, 1000);
  expect(Array.from(compiled('ln(x)').evaluate([x, 0, 0, 0, 0], 4), Number.isFinite)).toEqual([
    false,
    false,
    true,
    true,
  ]);
  expect(Array.from(compiled('1/x').evaluate([x, 0, 0, 0, 0], 4), Number.isFinite)).toEqual([
    true,
    false,
    true,
    true,
  ]);
  expect(Array.from(compiled('exp(x)').evaluate([x, 0, 0, 0, 0], 4), Number.isFinite)).toEqual([
    true,
    true,
    true,
    false,
  ]);
  expect(Array.from(compiled('sqrt(x)').evaluate([x, 0, 0, 0, 0], 4), Number.isFinite)).toEqual([
    false,
    true,
    true,
    true,
  ]);
});

test('long columns are the same as short ones', () => {
  const n = 5000;
  const x = Float64Array.from({ length: n }, (_, i) => 0.001 * (i + 1));
  const f = compiled('a*(1 - exp(-b*x)) + c');
  const inputs = [x, 0, 2, 0.3, 1];
  const values = f.evaluate(inputs, n);
  const { partials } = f.gradient(inputs, n, [3]);
  for (const i of [0, 1023, 1024, 2047, 2048, 4999]) {
    const at = x[i] ?? 0;
    expect(values[i]).toBe(f.at([at, 0, 2, 0.3, 1]));
    expect(partials[0]?.[i]).toBeCloseTo(2 * at * Math.exp(-0.3 * at), 13);
  }
});

test('differences of nearly equal numbers keep their digits', () => {
  // exp(u) − 1 and ln(1 + u) for small u, from their series.
  expect(compiled('exp(x) - 1').at([1e-10, 0, 0, 0, 0]) / (1e-10 + 5e-21)).toBeCloseTo(1, 15);
  expect(compiled('1 - exp(-x)').at([1e-10, 0, 0, 0, 0]) / (1e-10 - 5e-21)).toBeCloseTo(1, 15);
  expect(compiled('ln(1 + x)').at([1e-10, 0, 0, 0, 0]) / (1e-10 - 5e-21)).toBeCloseTo(1, 15);
});
