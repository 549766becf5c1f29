import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { expectDigits } from '../../expectDigits.ts';
import { nistSet } from '../direct/nistSets.ts';
import { readingsFrom, settingsFrom } from './settings.ts';

// NIST StRD, nonlinear least squares, certified results recomputed in 60-digit arithmetic: from the law's text and the
// readings alone, without starting values.

/** Sets that the law's own straight forms lead to, with the digits that the constants must reach. */
const reached = [
  ['Misra1a', 10],
  ['BoxBOD', 10],
  ['Rat42', 10],
  ['Eckerle4', 10],
  ['Chwirut2', 10],
  ['MGH09', 10],
  ['Kirby2', 10],
  ['Thurber', 10],
] as const;

/** Sets that have a line without trial constants: least squares in y is asked for. */
const byLine = [
  ['DanWood', 10],
  ['Misra1d', 10],
] as const;

/** Sums of exponentials, peaks and waves with more constants than a line with two trial constants settles. */
const refused = ['ENSO', 'Gauss1', 'Lanczos3'] as const;

function lawText(expression: string): string {
  return `y(x) = ${expression.replace(/^.*?=\s*/, '').replaceAll('**', '^')}`;
}

describe('certified constants without starting values', () => {
  test.each([
    ...reached.map((one) => [...one, ''] as const),
    ...byLine.map((one) => [...one, 'fit=direct'] as const),
  ])('%s to %p digits', (name, digits, options) => {
    const set = nistSet(name);
    const readings = readingsFrom(Array.from(set.x), Array.from(set.y));
    const fit = fitLaw(readings, lawText(set.expression), settingsFrom({ options }));
    set.constants.forEach((symbol, k) => {
      const estimate = fit.constants.find((constant) => constant.name === symbol);
      expectDigits(estimate?.value ?? Number.NaN, set.parameters[k] ?? '', digits);
      expectDigits(estimate?.standardUncertainty ?? Number.NaN, set.standardDeviations[k] ?? '', 9);
    });
    expectDigits(fit.direct?.sumOfSquares ?? Number.NaN, set.residualSumOfSquares, 10);
  });

  test.each(refused)('%s has too many constants for a line, and says so', (name) => {
    const set = nistSet(name);
    const readings = readingsFrom(Array.from(set.x), Array.from(set.y));
    expect(() => fitLaw(readings, lawText(set.expression), settingsFrom())).toThrow(/unknown constants/);
  });
});
