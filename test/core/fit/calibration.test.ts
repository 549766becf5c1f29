import { describe, expect, test } from '@jest/globals';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { predictorAt } from '../../../core/readoff/predictorAt.ts';
import { responseAt } from '../../../core/readoff/responseAt.ts';
import { expectDigits } from '../../expectDigits.ts';
import { calibrationLine, columnOf } from './calibrationLines.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from './settings.ts';

function fitLine(id: string, given: GivenTexts = {}, law = 'straight line'): Fit {
  const line = calibrationLine(id);
  const x = columnOf(line, 'x');
  return fitLaw(readingsFrom(x, columnOf(line, 'y')), law, settingsFrom(given, x.length));
}

describe('ISO/TS 28037:2010', () => {
  const equal = calibrationLine('iso28037-6-equal');

  test('clause 6.3: known uncertainties of y', () => {
    const fit = fitLine(equal.id, { uY: columnOf(equal, 'u_y') });
    const { knownUncertainty: known } = equal.highPrecision;
    expectDigits(fit.line.slope, known?.slope ?? '', 14);
    expectDigits(fit.line.intercept, known?.intercept ?? '', 13);
    expectDigits(Math.sqrt(fit.line.varianceSlope), known?.u_slope ?? '', 13);
    expectDigits(Math.sqrt(fit.line.varianceIntercept), known?.u_intercept ?? '', 13);
    expectDigits(fit.line.covariance, known?.covariance ?? '', 12);
    expectDigits(fit.line.weightedSumOfSquares, known?.chiSquared ?? '', 12);
    expect(fit.coverage.distribution).toBe('normal');
  });

  test('clause 6.3: x at a new reading of y, with its own uncertainty', () => {
    // The standard's u(y0) = 0.5 is the u_y of every reading, here given as one number so that a new reading has it.
    const [inverse] = equal.highPrecision.inverse ?? [];
    const read = predictorAt(fitLine(equal.id, { uY: 0.5, options: 'band=reading' }), 10.5);
    expectDigits(read.value, inverse?.x0 ?? '', 13);
    expectDigits(read.standardUncertainty, inverse?.u_x0 ?? '', 12);
  });

  test('clause 7.4: known uncertainties of x and y', () => {
    const both = calibrationLine('iso28037-7-both');
    const fit = fitLine(both.id, { uY: columnOf(both, 'u_y'), uX: columnOf(both, 'u_x') });
    const { slope = '', intercept = '', S = '', standardErrors } = both.highPrecision;
    const errors = standardErrors?.expectedInformationAdjustedPoints;
    expectDigits(fit.line.slope, slope, 12);
    expectDigits(fit.line.intercept, intercept, 11);
    expectDigits(Math.sqrt(fit.line.varianceSlope), errors?.u_slope ?? '', 11);
    expectDigits(Math.sqrt(fit.line.varianceIntercept), errors?.u_intercept ?? '', 11);
    expectDigits(fit.line.covariance, errors?.covariance ?? '', 11);
    expectDigits(fit.line.weightedSumOfSquares, S, 11);
    expect(fit.line.rSquared).toBeNaN();
    // The same line read off: first-order u of y at x = 3.5.
    const { u_slope = '', u_intercept = '', covariance = '' } = errors ?? {};
    const variance =
      Number(u_intercept) ** 2 + 3.5 ** 2 * Number(u_slope) ** 2 + 2 * 3.5 * Number(covariance);
    expectDigits(responseAt(fit, 3.5).standardUncertainty, Math.sqrt(variance), 10);
  });

  test('annex E: unknown scale; reading off both ways with the limits of Fieller', () => {
    const line = calibrationLine('iso28037-e-unknown');
    const [forward] = line.highPrecision.forward ?? [];
    const [inverse] = line.highPrecision.inverse ?? [];
    const curve = responseAt(fitLine(line.id), 3.5);
    expectDigits(curve.value, forward?.y0 ?? '', 13);
    expectDigits(curve.standardUncertainty, forward?.seMean ?? '', 12);
    expectDigits(curve.low, forward?.conf95?.[0] ?? '', 12);
    expectDigits(curve.high, forward?.conf95?.[1] ?? '', 12);
    const reading = responseAt(fitLine(line.id, { options: 'band=reading' }), 3.5);
    expectDigits(reading.standardUncertainty, forward?.sePrediction ?? '', 12);
    expectDigits(reading.high, forward?.pred95?.[1] ?? '', 12);
    const back = predictorAt(fitLine(line.id, { options: 'band=reading' }), 10.5);
    expectDigits(back.value, inverse?.x0 ?? '', 13);
    expectDigits(back.standardUncertainty, inverse?.standardError ?? '', 12);
    expectDigits(back.low, inverse?.fieller95?.[0] ?? '', 12);
    expectDigits(back.high, inverse?.fieller95?.[1] ?? '', 12);
  });
});

describe('other calibration lines', () => {
  test('JCGM 100:2008, H.3: the correction of a thermometer at 30 °C', () => {
    const line = calibrationLine('gum-h3');
    const fit = fitLine(line.id);
    const { unknownUncertainty: digits } = line.highPrecision;
    expectDigits(fit.line.slope, digits?.slope ?? '', 12);
    expectDigits(fit.line.intercept, digits?.intercept ?? '', 13);
    expectDigits(Math.sqrt(fit.line.varianceSlope), digits?.u_slope ?? '', 12);
    expectDigits(fit.line.correlation, digits?.correlation ?? '', 12);
    const [at30] = line.highPrecision.predict ?? [];
    const read = responseAt(fit, 10);
    expectDigits(read.value, at30?.y0 ?? '', 12);
    expectDigits(read.standardUncertainty, at30?.seMean ?? '', 11);
    // As printed in the guide: −0.1494 °C with u = 0.0041 °C.
    expect(read.value.toFixed(4)).toBe(line.published['correctionAt30']);
    expect(read.standardUncertainty.toFixed(4)).toBe(line.published['u_correctionAt30']);
  });

  test('the same, with the temperature itself and a known offset of 20 °C in the law', () => {
    const line = calibrationLine('gum-h3');
    const t = columnOf(line, 't');
    const law = 'b(t) = y1 + y2*(t - t0)';
    const fit = fitLaw(readingsFrom(t, columnOf(line, 'y')), law, settingsFrom({ known: 't0=20' }));
    const digits = line.highPrecision.unknownUncertainty;
    expectDigits(fit.constants[0]?.value ?? Number.NaN, digits?.intercept ?? '', 10);
    expectDigits(fit.constants[1]?.value ?? Number.NaN, digits?.slope ?? '', 10);
    expectDigits(fit.constants[0]?.standardUncertainty ?? Number.NaN, digits?.u_intercept ?? '', 9);
  });

  test('EURACHEM/CITAC CG 4, A5: concentration of a sample from its absorbance', () => {
    const line = calibrationLine('eurachem-a5');
    const [inverse] = line.highPrecision.inverse ?? [];
    const fit = fitLine(line.id);
    const read = predictorAt(fit, Number(inverse?.yMean));
    expectDigits(read.value, inverse?.x0 ?? '', 13);
    // The guide's u takes two readings of the sample: (s/b)² (1/2 + …). Ours of the curve has none of it, that of a
    // new reading one whole; the difference of the two is one reading's part.
    const one = predictorAt(fitLine(line.id, { options: 'band=reading' }), Number(inverse?.yMean));
    const half = (one.standardUncertainty ** 2 + read.standardUncertainty ** 2) / 2;
    expectDigits(Math.sqrt(half), inverse?.standardError ?? '', 12);
  });

  test.each(['pearson-ols', 'bevington-6-1'])('%s: x at y with the limits of Fieller', (id) => {
    const line = calibrationLine(id);
    const [inverse] = line.highPrecision.inverse ?? [];
    const back = predictorAt(fitLine(id, { options: 'band=reading' }), Number(inverse?.yMean));
    expectDigits(back.value, inverse?.x0 ?? '', 12);
    expectDigits(back.standardUncertainty, inverse?.standardError ?? '', 11);
    expectDigits(back.low, inverse?.fieller95?.[0] ?? '', 11);
    expectDigits(back.high, inverse?.fieller95?.[1] ?? '', 11);
  });

  test('Pearson (1901) with the weights of York (1966), both axes uncertain', () => {
    const line = calibrationLine('pearson-york');
    const uncertainty = (name: string): number[] =>
      columnOf(line, name).map((weight) => 1 / Math.sqrt(weight));
    const fit = fitLine(line.id, { uY: uncertainty('w_y'), uX: uncertainty('w_x') });
    const errors = line.highPrecision.standardErrors?.expectedInformationAdjustedPoints;
    expectDigits(fit.line.slope, line.highPrecision.slope ?? '', 11);
    expectDigits(fit.line.intercept, line.highPrecision.intercept ?? '', 11);
    expectDigits(Math.sqrt(fit.line.varianceSlope), errors?.u_slope ?? '', 10);
    expectDigits(Math.sqrt(fit.line.varianceIntercept), errors?.u_intercept ?? '', 10);
  });

  test('NIST/SEMATECH e-Handbook 4.6.2: Alaska pipeline, straight and as a power law', () => {
    const straight = calibrationLine('ehandbook-alaska-linear');
    const linear = fitLine(straight.id).line;
    expectDigits(linear.slope, straight.highPrecision.unknownUncertainty?.slope ?? '', 12);
    expectDigits(
      Math.sqrt(linear.varianceSlope),
      straight.highPrecision.unknownUncertainty?.u_slope ?? '',
      11,
    );
    const logarithms = calibrationLine('ehandbook-alaska-lnln');
    const raw = calibrationLine('ehandbook-alaska-linear');
    const fit = fitLaw(readingsFrom(columnOf(raw, 'x'), columnOf(raw, 'y')), 'power', settingsFrom());
    const digits = logarithms.highPrecision.unknownUncertainty;
    expectDigits(fit.line.slope, digits?.slope ?? '', 11);
    expectDigits(fit.line.intercept, digits?.intercept ?? '', 10);
    expectDigits(fit.line.residualStandardDeviation, digits?.sigma ?? '', 11);
    expectDigits(fit.constants[0]?.value ?? Number.NaN, Math.exp(Number(digits?.intercept)), 10);
  });
});
