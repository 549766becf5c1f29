import { describe, expect, test } from '@jest/globals';
import { columnFunction } from '../../../core/law/columnFunction.ts';
import { printExpression } from '../../../core/law/printExpression.ts';
import { differentiate } from '../../../core/workings/differentiate.ts';
import { expectDigits } from '../../expectDigits.ts';
import { parsed } from './parsed.ts';

/** Derivatives by x. Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 3.3, 4.1.46, 4.2.49, 4.3.105–116, 4.4.52–54, 4.5.71–73. */
const derivatives: readonly (readonly [string, string])[] = [
  ['k', '0'],
  ['3*x + k', '3'],
  ['x^2', '2*x'],
  ['x^n', 'n*x^(n - 1)'],
  ['x^x', 'x^x*(ln(x) + 1)'],
  ['ln(x)', '1/x'],
  ['ln(abs(x - 5))', '1/(x - 5)'],
  ['ln(k*x)', '1/x'],
  ['ln(x/(n - x))', '1/x + 1/(n - x)'],
  ['ln(exp(k*x)*x^n)', 'k + n/x'],
  ['log10(x)', '1/(x*ln(10))'],
  ['exp(-k*x)', '-k*exp(-k*x)'],
  ['exp(n/x)', '-n/x^2*exp(n/x)'],
  ['k^x', 'k^x*ln(k)'],
  ['1/x', '-1/x^2'],
  ['sqrt(x + k)', '1/(2*sqrt(x + k))'],
  ['x*exp(k*x)', 'exp(k*x)*(1 + k*x)'],
  ['k*x/(n + x)', 'k*n/(n + x)^2'],
  ['abs(-x)', '1'],
  ['sin(k*x)', 'k*cos(k*x)'],
  ['cos(x)', '-sin(x)'],
  ['tan(x)', '1/cos(x)^2'],
  ['asin(x)', '1/sqrt(1 - x^2)'],
  ['acos(x)', '-1/sqrt(1 - x^2)'],
  ['atan(x)', '1/(1 + x^2)'],
  ['sinh(x)', 'cosh(x)'],
  ['cosh(x)', 'sinh(x)'],
  ['tanh(x)', '1 - tanh(x)^2'],
];

const symbols = ['x', 'k', 'n'];
const at = [0.37, 1.3, 2.5];

describe('the derivative of an expression', () => {
  test.each(derivatives)('of %s by x is %s', (from, to) => {
    const found = columnFunction(differentiate(parsed(from), 'x'), symbols).at(at);
    expectDigits(found, columnFunction(parsed(to), symbols).at(at), 14);
    const [exact] = columnFunction(parsed(from), symbols).gradient(at, 1, [0]).partials;
    expectDigits(found, exact?.[0] ?? Number.NaN, 14);
  });

  test('is short: no zeros, ones or repeated factors', () => {
    const printed = (text: string, by: string) => printExpression(differentiate(parsed(text), by), 'formula');
    expect(printed('3*x + k', 'x')).toBe('3');
    expect(printed('x^2', 'x')).toBe('2*x');
    expect(printed('ln(k*x)', 'x')).toBe('1/x');
    expect(printed('exp(-k*x)', 'x')).toBe('-exp(-k*x)*k');
    expect(printed('k*x', 'n')).toBe('0');
    expect(printed('n*exp(-k*x)', 'n')).toBe('exp(-k*x)');
  });
});
