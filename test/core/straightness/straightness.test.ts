import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import { sumOfLogarithms } from '../../../core/straightness/sumOfLogarithms.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

const x = [0.5, 1, 2, 3, 4.5, 6, 8];
const y = [1.77, 1.71, 1.55, 1.42, 1.2, 1.05, 0.86];

function fitOf(law: string, given: GivenTexts, xs = x, ys = y) {
  return fitLaw(readingsFrom(xs, ys), law, settingsFrom(given, xs.length));
}

/** By refitting without each reading in turn. */
function byRefits(law: string, given: GivenTexts): number {
  const errors = x.map((at, left) => {
    const without = (column: readonly number[]) => column.filter((_, i) => i !== left);
    const fit = fitOf(law, given, without(x), without(y));
    return (y[left] ?? 0) - (fit.law.curve?.at([at, Number.NaN, ...fit.values]) ?? Number.NaN);
  });
  return Math.sqrt(errors.reduce((sum, error) => sum + error * error, 0) / errors.length);
}

describe('leave-one-out misfit', () => {
  test.each<[string, GivenTexts]>([
    ['straight line', {}],
    ['exponential', {}],
    ['exponential', { uY: 'equal' }],
    ['exponential', { uY: '2%' }],
    ['reciprocal', { uY: 'proportional' }],
    ['rise and decay', {}],
    ['proportional', {}],
    ['y(x) = p*exp(q*x)', { known: 'p=1.9', options: 'intercept=held' }],
    // y on both axes: the refitted line turned back into constants.
    ['saturation', { options: 'form=3' }],
    // Linear in its constants: what is first order in general is exact.
    ['logarithmic', { options: 'fit=direct' }],
  ])('%s %o is that of refits', (law, given) => {
    expectDigits(straightness(fitOf(law, given)).leaveOneOutMisfit, byRefits(law, given), 10);
  });

  test('after a direct fit of a curved law it is so to first order', () => {
    const given = { options: 'fit=direct' };
    const found = straightness(fitOf('exponential', given)).leaveOneOutMisfit;
    const refits = byRefits('exponential', given);
    expect(Math.abs(found / refits - 1)).toBeLessThan(0.02);
    expect(found).not.toBe(refits);
  });
});

describe('misfit', () => {
  test.each<[string, GivenTexts]>([
    ['straight line', {}],
    ['root', { uY: 'proportional' }],
    ['exponential', {}],
    ['saturation', { options: 'form=2' }],
    ['y(x) = a + b*x', { known: 'a=1.8' }],
    ['exponential', { options: 'fit=direct' }],
    ['offset decay', {}],
  ])('%s %o is the distance of readings and curve in the units of y', (law, given) => {
    const fit = fitOf(law, given);
    const sum = x.reduce(
      (total, at, i) =>
        total + ((y[i] ?? 0) - (fit.law.curve?.at([at, Number.NaN, ...fit.values]) ?? Number.NaN)) ** 2,
      0,
    );
    expectDigits(straightness(fit).misfit, Math.sqrt(sum / fit.coverage.degreesOfFreedom), 12);
  });
});

describe('what does not exist is absent', () => {
  test('two readings: no degrees of freedom', () => {
    const found = straightness(fitOf('straight line', {}, [1, 2], [2, 1]));
    expect(found).toMatchObject({
      readingsUsed: 2,
      degreesOfFreedom: 0,
      residualStandardDeviation: Number.NaN,
      bowPercent: Number.NaN,
      bowP: Number.NaN,
      misfit: Number.NaN,
      leaveOneOutMisfit: Number.NaN,
      aicc: Number.NaN,
      chiSquaredP: Number.NaN,
    });
  });

  test('errors in both axes have no r squared and no likelihood', () => {
    const found = straightness(fitOf('straight line', { uY: 0.02, uX: 0.05 }));
    expect(found.rSquared).toBeNaN();
    expect(found.logLikelihood).toBeNaN();
    expect(found.aicc).toBeNaN();
    expect(found.chiSquaredP).toBeGreaterThan(0);
  });

  test('y on both axes has no likelihood', () => {
    expect(straightness(fitOf('saturation', { options: 'form=3' })).logLikelihood).toBeNaN();
  });
});

describe('the likelihood', () => {
  test('does not change with the unit of y but for the Jacobian of the unit', () => {
    const metres = straightness(fitOf('exponential', {})).logLikelihood;
    const millimetres = straightness(
      fitOf(
        'exponential',
        {},
        x,
        y.map((value) => 1000 * value),
      ),
    ).logLikelihood;
    expectDigits(millimetres, metres - x.length * Math.log(1000), 11);
  });

  test('of known uncertainties is −½ Σ w r² with its constants', () => {
    const fit = fitOf('exponential', { uY: 0.02 });
    const direct = x.reduce((sum, _, i) => {
      const r = (fit.line.residual[i] ?? 0) * (y[i] ?? 0);
      // u(ln y) = u/y; the density of y is that of ln y over y: the y's cancel.
      return sum - 0.5 * (r / 0.02) ** 2 - Math.log(0.02) - 0.5 * Math.log(2 * Math.PI);
    }, 0);
    expectDigits(straightness(fit).logLikelihood, direct, 12);
  });

  test('sums of logarithms survive factors of every size', () => {
    const column = Float64Array.of(1e-300, 1e300, -3, 1e-308, 5e-324, 1e10, 0.5);
    expectDigits(
      sumOfLogarithms(column),
      column.reduce((sum, value) => sum + Math.log(Math.abs(value)), 0),
      14,
    );
    expect(sumOfLogarithms(Float64Array.of(2, 0))).toBe(Number.NEGATIVE_INFINITY);
    expect(sumOfLogarithms(new Float64Array(0))).toBe(0);
  });
});
