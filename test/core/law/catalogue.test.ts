import { describe, expect, test } from '@jest/globals';
import { cautionOf, generalLaws, listForms, listLaws, namedLaws } from '../../../core/law/catalogue.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import { Problem } from '../../../core/problem.ts';

/** name, equation, known constants, the forms that must be among the first ones, trial of the first form */
type Wanted = readonly [
  name: string,
  equation: string,
  known: readonly string[],
  forms: readonly (readonly [
    plot: string,
    against: string,
    slope: string,
    intercept: string,
    trial?: string,
  ])[],
];

const wanted: readonly Wanted[] = [
  ['straight line', 'y(x) = a + b*x', [], [['y', 'x', 'b', 'a']]],
  ['power', 'y(x) = p*x^q', [], [['ln y', 'ln x', 'q', 'ln p']]],
  ['exponential', 'y(x) = p*exp(q*x)', [], [['ln y', 'x', 'q', 'ln p']]],
  ['logarithmic', 'y(x) = a + b*ln(x)', [], [['y', 'ln x', 'b', 'a']]],
  ['reciprocal', 'y(x) = 1/(a + b*x)', [], [['1/y', 'x', 'b', 'a']]],
  [
    'saturation',
    'y(x) = p*x/(q + x)',
    [],
    [
      ['1/y', '1/x', 'q/p', '1/p'],
      ['x/y', 'x', '1/p', 'q/p'],
      ['y', 'y/x', '−q', 'p'],
    ],
  ],
  ['hyperbolic', 'y(x) = a + b/x', [], [['y', '1/x', 'b', 'a']]],
  ['root', 'y(x) = a + b*sqrt(x)', [], [['y', '√x', 'b', 'a']]],
  ['square', 'y(x) = a + b*x^2', [], [['y', 'x²', 'b', 'a']]],
  ['inverse exponential', 'y(x) = p*exp(q/x)', [], [['ln y', '1/x', 'q', 'ln p']]],
  ['rise and decay', 'y(x) = p*x*exp(q*x)', [], [['ln(y/x)', 'x', 'q', 'ln p']]],
  ['proportional', 'y(x) = b*x', [], [['y', 'x', 'b', '0']]],
  ['arrhenius', 'k(T) = A*exp(-Ea/(Rgas*T))', [], [['ln k', '1/T', '−Ea/Rgas', 'ln A']]],
  ['thermistor', 'R(T) = R0*exp(B*(1/T - 1/T0))', [], [['ln R', '1/T − 1/T0', 'B', 'ln R0']]],
  ['first order', 'C(t) = C0*exp(-k*t)', [], [['ln C', 't', '−k', 'ln C0']]],
  ['second order', 'C(t) = 1/(1/C0 + k*t)', [], [['1/C', 't', 'k', '1/C0']]],
  ['approach', 'y(t) = yf + (y0 - yf)*exp(-t/tau)', ['yf'], [['ln(y − yf)', 't', '−1/tau', 'ln(y0 − yf)']]],
  ['approach', 'y(t) = yf + (y0 - yf)*exp(-t/tau)', [], [['ln(y − yf)', 't', '−1/tau', 'ln(y0 − yf)', 'yf']]],
  ['saturating rise', 'y(x) = m*(1 - exp(-k*x))', [], [['ln(1 − y/m)', 'x', '−k', '0', 'm']]],
  ['logistic', 'y(x) = L/(1 + exp(a - b*x))', ['L'], [['ln(y/(L − y))', 'x', 'b', '−a']]],
  ['logistic', 'y(x) = L/(1 + exp(a - b*x))', [], [['ln(y/(L − y))', 'x', 'b', '−a', 'L']]],
  ['weibull', 'F(t) = 1 - exp(-(t/eta)^beta)', [], [['ln(−ln(1 − F))', 'ln t', 'beta', '−beta·ln eta']]],
  ['hill', 'y(x) = m*x^n/(K^n + x^n)', [], [['ln(y/(m − y))', 'ln x', 'n', '−n·ln K', 'm']]],
  ['shifted power', 'Q(h) = c*(h - h0)^b', [], [['ln Q', 'ln(h − h0)', 'b', 'ln c', 'h0']]],
  ['offset decay', 'y(x) = c + a*exp(-k*x)', [], [['ln(y − c)', 'x', '−k', 'ln a', 'c']]],
  ['langmuir', 'q(c) = qm*K*c/(1 + K*c)', [], [['1/q', '1/c', '1/(qm·K)', '1/qm']]],
  ['freundlich', 'q(c) = K*c^(1/n)', [], [['ln q', 'ln c', '1/n', 'ln K']]],
  ['antoine', 'P(T) = 10^(A - B/(T + C))', [], [['log10 P', '1/(T + C)', '−B', 'A', 'C']]],
  ['basquin', 'N(S) = A*S^(-m)', [], [['ln N', 'ln S', '−m', 'ln A']]],
];

describe('laws by name', () => {
  test.each(wanted)('%s, %s, known %j', (name, equation, known, forms) => {
    const law = compileLaw(` ${name.toUpperCase()} `, known);
    expect(law.name).toBe(name);
    expect(law.equation).toBe(equation);
    const rows = listForms(law).map(({ plot, against, slope, intercept, trial }) => [
      plot,
      against,
      slope,
      intercept,
      trial,
    ]);
    for (const [i, [plot, against, slope, intercept, trial = '']] of forms.entries()) {
      expect(rows[i]).toEqual([plot, against, slope, intercept, trial]);
    }
  });

  test('all of them are listed with their first form', () => {
    const rows = listLaws();
    expect(rows.map(({ name }) => name)).toEqual([...new Set(wanted.map(([name]) => name))]);
    for (const row of rows) for (const text of Object.values(row)) expect(text).not.toBe('');
    expect(generalLaws).toEqual(wanted.slice(0, 11).map(([name]) => name));
    for (const name of generalLaws) expect(compileLaw(name, []).unknown).toHaveLength(2);
  });
});

describe('what the catalogue adds to an equation', () => {
  test('constants with a value of their own', () => {
    const arrhenius = compileLaw('arrhenius', []);
    // CODATA 2018: R = 8.314 462 618… J/(mol K), exact.
    expect(arrhenius.builtIn.get('Rgas')).toBe(8.314462618);
    expect(arrhenius).toMatchObject({ known: ['Rgas'], unknown: ['A', 'Ea'] });
    expect(compileLaw('thermistor', []).builtIn.get('T0')).toBe(298.15);
    expect(compileLaw('thermistor', ['T0']).builtIn.size).toBe(0);
    expect(compileLaw('thermistor', ['T0']).known).toEqual(['T0']);
  });

  test('derived constants where they exist', () => {
    const valuesAt = (name: string, constant: number): (readonly [string, number])[] =>
      compileLaw(name, []).derived.map((one) => [one.name, one.value(constant)] as const);
    expect(valuesAt('exponential', -0.1)).toEqual([
      ['time constant', 10],
      ['half-life', Math.LN2 / 0.1],
      ['doubling time', Number.NaN],
    ]);
    expect(valuesAt('exponential', 0.1)).toEqual([
      ['time constant', Number.NaN],
      ['half-life', Number.NaN],
      ['doubling time', Math.LN2 / 0.1],
    ]);
    expect(valuesAt('first order', 0.2)).toEqual([['half-life', Math.LN2 / 0.2]]);
    expect(compileLaw('exponential', ['q']).derived).toEqual([]);
    for (const { derived } of namedLaws) {
      for (const one of derived) {
        for (const constant of [-0.3, 0.3]) {
          if (Number.isNaN(one.value(constant))) continue;
          const difference = (one.value(constant + 1e-6) - one.value(constant - 1e-6)) / 2e-6;
          expect(one.slope(constant) / difference).toBeCloseTo(1, 8);
        }
      }
    }
  });

  test('cautions', () => {
    expect(cautionOf(compileLaw('basquin', []))).toMatch(/^Fatigue/);
    expect(cautionOf(compileLaw('power', []))).toBeNull();
    expect(cautionOf(compileLaw('N(S) = A*S^(-m)', []))).toBeNull();
  });

  test('the same law is compiled once', () => {
    expect(compileLaw('power', [])).toBe(compileLaw('power', []));
    expect(compileLaw('hill', ['m', 'n'])).toBe(compileLaw('hill', ['n', 'm', 'n']));
    const problems = [1, 2].map(() => {
      try {
        return compileLaw('y(x) = a*b*x', []);
      } catch (error) {
        return error;
      }
    });
    expect(problems[0]).toBeInstanceOf(Problem);
    expect(problems[0]).toBe(problems[1]);
  });
});
