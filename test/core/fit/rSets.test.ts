import { describe, expect, test } from '@jest/globals';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import { responseAt } from '../../../core/readoff/responseAt.ts';
import { expectDigits } from '../../expectDigits.ts';
import { ourLaws, type ReferenceLine, referenceSets } from './rSets.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from './settings.ts';

// Sources: NIST StRD, data sets of R and handbook tables, fitted with R 4.2.2 (see test/reference/README.md,
// where each set's citation stands). R prints 15 digits, of which about 12 are good.

/** The number of the straight form whose axes are named. */
function formOf(law: string, plot: string): number {
  const form = compileLaw(law, []).forms.find((one) => `${one.plot} against ${one.against}` === plot);
  if (form === undefined) throw new Error(`${law} has no form ${plot}`);
  return form.number;
}

const sets = referenceSets();

/**
 * Digits that survive in a scatter: readings on a line to within 10⁻ᵏ of their size leave 15 − k digits in their
 * residuals, in double precision and by any method, and one less after the logarithms.
 */
function digitsOfScatter(fit: Fit, most: number): number {
  const { lineWeight, residualStandardDeviation } = fit.line;
  const size = fit.axes.vertical.reduce(
    (top, value, i) => Math.max(top, Math.abs(value) * Math.sqrt(lineWeight[i] ?? 0)),
    0,
  );
  return Math.min(most, 14 - Math.log10(size / residualStandardDeviation));
}

/** An intercept that is nothing beside the readings has the readings' last digit as its own first. */
function expectIntercept(fit: Fit, expected: number): void {
  const size = fit.axes.vertical.reduce((top, value) => Math.max(top, Math.abs(value)), 0);
  if (Math.abs(expected) > 1e-6 * size) expectDigits(fit.line.intercept, expected, 9);
  else expect(Math.abs(fit.line.intercept - expected)).toBeLessThan(2e-15 * size);
}

function expectLine(fit: Fit, line: ReferenceLine, symbols: Readonly<Record<string, string>>): void {
  const scatterDigits = digitsOfScatter(fit, 9);
  expectDigits(fit.line.slope, line.coefficients.c1, 10);
  expectDigits(Math.sqrt(fit.line.varianceSlope), line.standardErrors.c1, scatterDigits);
  if (line.coefficients.c0 !== undefined && line.standardErrors.c0 !== undefined) {
    expectIntercept(fit, line.coefficients.c0);
    expectDigits(Math.sqrt(fit.line.varianceIntercept), line.standardErrors.c0, scatterDigits);
  }
  expectDigits(fit.line.rSquared, line.rSquared, 10);
  expectDigits(fit.line.residualStandardDeviation, line.sigma, scatterDigits);
  for (const [name, symbol] of Object.entries(symbols)) {
    const estimate = fit.constants.find((constant) => constant.name === symbol);
    expectDigits(estimate?.value ?? Number.NaN, line.natural.parameters[name] ?? Number.NaN, 9);
    expectDigits(
      estimate?.standardUncertainty ?? Number.NaN,
      line.natural.deltaMethodStandardErrors[name] ?? Number.NaN,
      scatterDigits,
    );
  }
}

const cases = sets.flatMap((set) =>
  set.laws.flatMap((reference) => {
    const ours = ourLaws[reference.law];
    return ours === undefined ? [] : [{ set, reference, ours, title: `${set.id}: ${reference.law}` }];
  }),
);

function fitOf({ set, ours }: (typeof cases)[number], given: GivenTexts): Fit {
  const form = formOf(ours.law, ours.plot);
  const options = [given.options, `form=${form}`].filter(Boolean).join('; ');
  return fitLaw(readingsFrom(set.x, set.y), ours.law, settingsFrom({ ...given, options }));
}

describe('lines on straight axes', () => {
  test('there are enough of them', () => {
    expect(cases.length).toBeGreaterThan(120);
  });

  test.each(cases)('$title, unweighted', (one) => {
    const fit = fitOf(one, {});
    expectLine(fit, one.reference.ols, one.ours.symbols);
    if (fit.form.responseOnBothAxes) return;
    for (const prediction of one.reference.ols.predict) {
      const { y, conf95, pred95 } = prediction.backTransformed ?? {
        y: prediction.Yfit,
        conf95: prediction.conf95,
        pred95: prediction.pred95,
      };
      if (!conf95.every(Number.isFinite) || !(Math.min(...conf95) <= y && y <= Math.max(...conf95))) continue;
      const curve = responseAt(fit, prediction.x);
      expectDigits(curve.value, y, 9);
      expectDigits(curve.low, Math.min(...conf95), 8);
      expectDigits(curve.high, Math.max(...conf95), 8);
      if (!pred95.every(Number.isFinite) || !(Math.min(...pred95) <= y && y <= Math.max(...pred95))) continue;
      const reading = responseAt(fitOf(one, { options: 'band=reading' }), prediction.x);
      expectDigits(reading.low, Math.min(...pred95), 8);
      expectDigits(reading.high, Math.max(...pred95), 8);
    }
  });

  const weighted = cases.filter(({ reference }) => reference.wls && reference.wls.weights !== 'w = 1/x');
  test.each(weighted)('$title, weights for equal scatter in y', (one) => {
    const { wls } = one.reference;
    if (wls) expectLine(fitOf(one, { uY: 'equal' }), wls, one.ours.symbols);
  });
});

describe('direct fits', () => {
  const converged = cases.filter(
    ({ reference: { direct } }) => direct?.converged && !direct.error && direct.relativeOffset < 1e-9,
  );

  test('there are enough of them', () => {
    expect(converged.length).toBeGreaterThan(60);
  });

  test.each(converged)('$title', (one) => {
    const { direct } = one.reference;
    if (!direct) return;
    const fit = fitOf(one, { options: 'fit=direct' });
    // (a + b·x)² is the same law with both signs changed: R kept those of its start, ours are the positive ones.
    const mirrored = one.reference.law === 'square' && (direct.coefficients['a'] ?? 0) < 0 ? -1 : 1;
    for (const [name, symbol] of Object.entries(one.ours.symbols)) {
      const estimate = fit.constants.find((constant) => constant.name === symbol);
      expectDigits(estimate?.value ?? Number.NaN, mirrored * (direct.coefficients[name] ?? Number.NaN), 9);
      expectDigits(estimate?.standardUncertainty ?? Number.NaN, direct.standardErrors[name] ?? Number.NaN, 8);
    }
    expectDigits(fit.direct?.residualStandardDeviation ?? Number.NaN, direct.sigma, 9);
    for (const prediction of direct.predict) {
      const read = responseAt(fit, prediction.x);
      expectDigits(read.value, prediction.fit, 9);
      expectDigits(read.standardUncertainty, prediction.seFit, 8);
      expectDigits(read.low, prediction.conf95[0], 8);
    }
  });
});
