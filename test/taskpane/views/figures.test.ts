import { describe, expect, test } from '@jest/globals';
import { decimals, figures, percent, rounded } from '../../../taskpane/views/figures.ts';

describe('a number by its significant digits', () => {
  test.each<[number | '', number, string]>([
    [0, 4, '0'],
    [1234.56, 4, '1235'],
    [-0.0123456, 3, '−0.0123'],
    [2.5e-7, 4, '2.5 × 10⁻⁷'],
    [-123456789, 3, '−1.23 × 10⁸'],
    [9999999, 4, '10000000'],
    ['', 4, ''],
    [Number.NaN, 4, ''],
    [Number.POSITIVE_INFINITY, 4, ''],
  ])('%d to %d is %s', (value, digits, shown) => {
    expect(figures(value, digits)).toBe(shown);
  });

  test('by its decimals, without a negative zero', () => {
    expect([decimals(-0.04, 1), decimals(-1.26, 1), decimals(12.5, 0), decimals('', 1)]).toEqual([
      '0.0',
      '−1.3',
      '13',
      '',
    ]);
  });

  test('a probability in percent', () => {
    expect([percent(0.95), percent(0.999), percent(0.9973)]).toEqual(['95', '99.9', '99.73']);
  });
});

describe('a result to the second digit of its uncertainty (JCGM 100:2008, 7.2.6)', () => {
  // Example of JCGM 100:2008, 7.2.6: y = 10.057 62 Ω with u = 27 mΩ is given as 10.058 Ω.
  test('10.05762 with 0.027 is 10.058', () => {
    expect(rounded(10.05762, 0.027, 10.0046, 10.1106)).toEqual({
      value: '10.058',
      uncertainty: '0.027',
      low: '10.005',
      high: '10.111',
      power: '',
    });
  });

  test.each<[number, number, string, string, string]>([
    [0.094231, 0.00112, '0.0942', '0.0011', ''],
    [1234.56, 45.6, '1235', '46', ''],
    [12345.6, 1234, '1.23', '0.12', ' × 10⁴'],
    [3.2, 0.0996, '3.20', '0.10', ''],
    [2.3456e-7, 1.2e-9, '2.346', '0.012', ' × 10⁻⁷'],
    [8.314e9, 2.1e8, '8.31', '0.21', ' × 10⁹'],
    [-0.0005, 0.02, '−0.001', '0.020', ''],
  ])('%d ± %d', (value, uncertainty, shown, beside, power) => {
    expect(rounded(value, uncertainty, Number.NaN, Number.NaN)).toEqual({
      value: shown,
      uncertainty: beside,
      low: '',
      high: '',
      power,
    });
  });

  test('without an uncertainty the value has six digits', () => {
    expect(rounded(1.23456789, Number.NaN, Number.NaN, Number.NaN)).toMatchObject({
      value: '1.23457',
      uncertainty: '',
    });
    expect(rounded(1.23456789, 0, 1, 2)).toMatchObject({ value: '1.23457', uncertainty: '0' });
  });
});
