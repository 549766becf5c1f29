import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { Problem } from '../../../core/problem.ts';
import { statement } from '../../../core/statement/statement.ts';
import { calibrationLine, columnOf } from '../fit/calibrationLines.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

const t = [0, 1, 2, 4, 6, 9, 12, 18];
const c = [1.98, 1.83, 1.69, 1.46, 1.24, 0.96, 0.77, 0.47];

function say(constant: string, unit: string, given: GivenTexts = {}, law = 'C(t) = C0*exp(-k*t)'): string {
  return statement(fitLaw(readingsFrom(t, c), law, settingsFrom(given, t.length)), constant, unit);
}

describe('a statement', () => {
  test('JCGM 100:2008, H.3: intercept and slope of a thermometer, rounded as the guide prints them', () => {
    // The guide: y1 = −0.1712 °C with u = 0.0029 °C, y2 = 0.00218 with u = 0.00067, t referred to 20 °C.
    const line = calibrationLine('gum-h3');
    const readings = readingsFrom(columnOf(line, 't'), columnOf(line, 'y'));
    const fit = fitLaw(readings, 'b(t) = y1 + y2*(t - t0)', settingsFrom({ known: 't0=20' }));
    expect(statement(fit, 'y1', '°C')).toMatch(
      /^y1 = −0\.1712 °C with standard uncertainty 0\.0029 °C; the 95 % coverage interval is −0\.17\d\d to −0\.16\d\d °C \(Student's t with 9 degrees of freedom, coverage factor 2\.26\); from 11 readings with b\(t\) = /,
    );
    expect(statement(fit, 'y2', '')).toMatch(/^y2 = 0\.00218 with standard uncertainty 0\.00067;/);
    expect(statement(fit, 'y2', '')).toMatch(/with t0 = 20 given\.$/);
  });

  test('is one sentence with value, uncertainty, interval, readings, law and method', () => {
    // Slope −0.0798549, u 0.00049858 by the textbook formulas for a line of ln C against t; t(0.975; 6) = 2.446912.
    expect(say('k', '1/h')).toBe(
      "k = 0.07985 1/h with standard uncertainty 0.00050 1/h; the 95 % coverage interval is 0.07863 to 0.08107 1/h (Student's t with 6 degrees of freedom, coverage factor 2.45); from 8 readings with C(t) = C0*exp(-k*t), by a straight line of ln C against t, with equal weights.",
    );
  });

  test.each<[GivenTexts, RegExp]>([
    [
      { uY: 'equal' },
      /by a straight line of ln C against t, weighted for the same scatter in C everywhere\.$/,
    ],
    [{ uY: 'proportional' }, /weighted for scatter in proportion to C\.$/],
    [
      { uY: '2%' },
      /\(normal distribution, coverage factor 1\.96\); from 8 readings .* weighted by the stated uncertainties of C\.$/,
    ],
    [{ uY: 0.02, uX: 0.1 }, /with the stated uncertainties of C and t\.$/],
    [{ options: 'fit=direct' }, /by least squares in the units of C, with equal weights\.$/],
    [
      { known: 'C0=2±0.01', options: 'intercept=held' },
      /with the intercept held at the value of the known constants, with C0 = 2 ± 0\.01 given\.$/,
    ],
    [{ options: 'coverage=0.99' }, /the 99 % coverage interval/],
  ])('%o is said in words', (given, expected) => {
    expect(say('k', '1/h', given)).toMatch(expected);
  });

  test('trial constants are said to be found with the others', () => {
    expect(say('k', '1/h', {}, 'y(x) = c + a*exp(-k*x)')).toMatch(
      /by least squares in the units of y, (c|k) included, with equal weights\.$/,
    );
  });

  test('readings set aside are counted, derived constants stated', () => {
    const readings = readingsFrom([...t, 24], [...c, 'lost']);
    const fit = fitLaw(readings, 'first order', settingsFrom());
    expect(statement(fit, 'half-life', 'h')).toMatch(
      /^half-life = 8\.680 h with standard uncertainty 0\.054 h; .*; 1 reading set aside\. /,
    );
  });

  test('a law with a caution has it as a second sentence', () => {
    const s = [100, 150, 200, 300, 400];
    const n = [9.8e6, 1.95e6, 6.2e5, 1.21e5, 3.9e4];
    const sentence = statement(fitLaw(readingsFrom(s, n), 'basquin', settingsFrom()), 'm', '');
    expect(sentence).toMatch(/with equal weights\. Fatigue: .*design code.*licensed engineer\.$/);
  });

  test('very large and very small constants have one power of ten', () => {
    const fit = fitLaw(
      readingsFrom(
        t,
        c.map((value) => value * 1e-9),
      ),
      'C(t) = C0*exp(-k*t)',
      settingsFrom(),
    );
    expect(statement(fit, 'C0', 'kg/L')).toMatch(
      /^C0 = 1\.98\d\d × 10⁻⁹ kg\/L with standard uncertainty 0\.00\d\d × 10⁻⁹ kg\/L; .* × 10⁻⁹ to .* × 10⁻⁹ kg\/L/,
    );
  });

  test('in brackets the uncertainty stands in the last digits', () => {
    expect(say('k', '1/h', { options: 'style=brackets' })).toBe('k = 0.07985(50) 1/h');
  });
});

describe('where there is no uncertainty', () => {
  test('two readings: it says so', () => {
    const fit = fitLaw(readingsFrom([1, 2], [4, 2]), 'straight line', settingsFrom());
    expect(statement(fit, 'b', 'm')).toBe(
      'b = −2 m, for which no uncertainty can be stated, because 2 readings leave no scatter to judge by; from 2 readings with straight line, y(x) = a + b*x, by a straight line of y against x, with equal weights.',
    );
    const brackets = fitLaw(
      readingsFrom([1, 2], [4, 2]),
      'straight line',
      settingsFrom({ options: 'style=brackets' }),
    );
    expect(statement(brackets, 'b', 'm')).toBe('b = −2 m (no uncertainty can be stated)');
  });

  test('readings exactly on the law: rounding is not stated as an uncertainty', () => {
    const x = [0.1, 0.2, 0.3, 0.4, 0.7];
    const fit = fitLaw(
      readingsFrom(
        x,
        x.map((value) => 0.1 + 0.3 * value),
      ),
      'straight line',
      settingsFrom(),
    );
    expect(statement(fit, 'b', '')).toMatch(/^b = 0\.3, for which .* because the readings show no scatter;/);
  });

  test('an interval without an end is not made up', () => {
    // The slope cannot be told from zero: 1/slope has no interval.
    const fit = fitLaw(
      readingsFrom([1, 2, 3, 4, 5], [3, 3.2, 2.9, 3.1, 3.05]),
      'y(x) = a + x/b',
      settingsFrom(),
    );
    expect(statement(fit, 'b', '')).toMatch(/; there is no 95 % coverage interval with both ends; from 5/);
  });

  test('another name is refused with those there are', () => {
    expect(() => say('z', '')).toThrow(Problem);
    expect(() => say('z', '')).toThrow(/name must be .*C0.*k.*'z'/);
  });
});
