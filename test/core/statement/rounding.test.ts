import { describe, expect, test } from '@jest/globals';
import { bracketForm, rounded, roundingFor, withPower } from '../../../core/statement/rounding.ts';

const pair = (value: number, u: number): string => {
  const rounding = roundingFor(value, u);
  return withPower(`${rounded(value, rounding)} ± ${rounded(u, rounding)}`, rounding);
};

describe('JCGM 100:2008, 7.2.6: two digits of the uncertainty, the value to the same place', () => {
  test.each([
    // The guide's own example of 7.2.2: m_S = 100.021 47 g with u_c = 0.35 mg.
    [100.02147, 0.00035, '100.02147 ± 0.00035', '100.02147(35)'],
    // And of 7.2.6: y = 10.057 62 Ω with u = 27 mΩ becomes 10.058 Ω.
    [10.05762, 0.027, '10.058 ± 0.027', '10.058(27)'],
    [0.04123, 0.00132, '0.0412 ± 0.0013', '0.0412(13)'],
    [-0.17120379, 0.0028776, '−0.1712 ± 0.0029', '−0.1712(29)'],
    [12.34, 5.6789, '12.3 ± 5.7', '12.3(5.7)'],
    [4998.3, 1.2, '4998.3 ± 1.2', '4998.3(1.2)'],
    [98765, 12, '98765 ± 12', '98765(12)'],
    [1.0972e-9, 1.23e-11, '1.097 ± 0.012 × 10⁻⁹', '1.097(12) × 10⁻⁹'],
    [123456789, 1234.5, '1.234568 ± 0.000012 × 10⁸', '1.234568(12) × 10⁸'],
    [53120, 1240, '5.31 ± 0.12 × 10⁴', '5.31(12) × 10⁴'],
    [0.001, 0.5, '0.00 ± 0.50', '0.00(50)'],
    [-0.001, 0.5, '0.00 ± 0.50', '0.00(50)'],
    // From 10⁻⁴ to below 10⁷ without a power of ten.
    [0.0001234, 0.0000012, '0.0001234 ± 0.0000012', '0.0001234(12)'],
    [0.00001234, 0.00000012, '1.234 ± 0.012 × 10⁻⁵', '1.234(12) × 10⁻⁵'],
    [1234567.8, 12.3, '1234568 ± 12', '1234568(12)'],
    [12345678, 12.3, '1.2345678 ± 0.0000012 × 10⁷', '1.2345678(12) × 10⁷'],
    // Exponents of two digits lose none to a multiplication.
    [1.0972e-19, 1.23e-21, '1.097 ± 0.012 × 10⁻¹⁹', '1.097(12) × 10⁻¹⁹'],
    [0, 0.0131, '0.000 ± 0.013', '0.000(13)'],
    [5.25, 1.0, '5.3 ± 1.0', '5.3(1.0)'],
    [7.04, 10.2, '7 ± 10', '7(10)'],
    // 0.0996 becomes 0.10: the place moves with it.
    [3.14, 0.0996, '3.14 ± 0.10', '3.14(10)'],
  ])('%p ± %p', (value, u, written, brackets) => {
    expect(pair(value, u)).toBe(written);
    expect(bracketForm(value, u)).toBe(brackets);
  });

  test('without an uncertainty six digits are written', () => {
    expect(rounded(Math.PI, roundingFor(Math.PI, Number.NaN))).toBe('3.14159');
    expect(rounded(0, roundingFor(0, 0))).toBe('0.00000');
  });
});
