import { describe, expect, test } from '@jest/globals';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { drivingReadings } from '../../../core/judge/influence.ts';
import { residualTable } from '../../../core/judge/residuals.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import { expectDigits } from '../../expectDigits.ts';
import { ourLaws, type ReferenceLine, referenceSets } from '../fit/rSets.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

// Source: R 4.2.2, hatvalues, rstandard and cooks.distance of lm (see test/reference/README.md for the data sets).

interface PerPoint {
  readonly hat: readonly number[];
  readonly standardizedResidual: readonly number[];
  readonly cooksDistance: readonly number[];
}

/** The reference files hold diagnostics for most lines. */
type Diagnosed = ReferenceLine & { readonly perPoint?: PerPoint };

const cases = referenceSets().flatMap((set) =>
  set.laws.flatMap((reference) => {
    const ours = ourLaws[reference.law];
    if (ours === undefined) return [];
    const lines: readonly (readonly [Diagnosed | undefined, GivenTexts, string])[] = [
      [reference.ols, {}, 'unweighted'],
      [reference.wls?.weights === 'w = 1/x' ? undefined : reference.wls, { uY: 'equal' }, 'weighted'],
    ];
    return lines.flatMap(([line, given, how]) =>
      line?.perPoint === undefined
        ? []
        : [{ title: `${set.id}: ${reference.law}, ${how}`, set, ours, given, line, points: line.perPoint }],
    );
  }),
);

/** Digits that residuals keep where readings lie close to their line. */
function digitsOf(fit: Fit, most: number): number {
  const { lineWeight, residualStandardDeviation } = fit.line;
  const size = fit.axes.vertical.reduce(
    (top, value, i) => Math.max(top, Math.abs(value) * Math.sqrt(lineWeight[i] ?? 0)),
    0,
  );
  return Math.min(most, 13 - Math.log10(size / residualStandardDeviation));
}

describe('leverage, standardised residuals and influence against R', () => {
  test('there are enough of them', () => {
    expect(cases.length).toBeGreaterThan(150);
  });

  test.each(cases)('$title', ({ set, ours, given, points }) => {
    const form = compileLaw(ours.law, []).forms.find(
      (one) => `${one.plot} against ${one.against}` === ours.plot,
    );
    const settings = settingsFrom({ ...given, options: `form=${form?.number}` });
    const fit = fitLaw(readingsFrom(set.x, set.y), ours.law, settings);
    const table = residualTable(fit);
    expect(table).toHaveLength(set.x.length);
    const digits = digitsOf(fit, 9);
    table.forEach((row, i) => {
      expect(row.reading).toBe(i + 1);
      // Leverages are shares of 1: those of readings that hardly count have no digits of their own.
      expect(Math.abs(Number(row.leverage) - (points.hat[i] ?? Number.NaN))).toBeLessThan(1e-10);
      // A residual of nothing has no digits of its own: measured against one standard deviation.
      const standardised = points.standardizedResidual[i] ?? Number.NaN;
      expect(Math.abs(Number(row.standardised) - standardised)).toBeLessThan(
        10 ** -digits * Math.max(1, Math.abs(standardised)),
      );
      const influence = points.cooksDistance[i] ?? Number.NaN;
      expect(Math.abs(Number(row.influence) - influence)).toBeLessThan(
        10 ** -digits * Math.max(1, Math.abs(influence)),
      );
    });
  });
});

describe('a reading that drives a constant', () => {
  const x = [0, 1, 2, 3, 4, 5, 6, 7, 20];
  const y = [10.1, 9.0, 8.3, 7.3, 6.8, 6.0, 5.5, 5.0, 3.4];

  function refitted(law: string, given: GivenTexts, left: number): Fit {
    const without = (column: readonly number[]) => column.filter((_, i) => i !== left);
    return fitLaw(readingsFrom(without(x), without(y)), law, settingsFrom(given));
  }

  test.each([
    ['exponential', {}],
    ['exponential', { uY: 'equal' }],
    ['straight line', {}],
    ['reciprocal', { uY: '3%' }],
    ['y(x) = p*exp(q*x)', { known: 'p=10' }],
    ['y(x) = p*exp(q*x)', { known: 'p=10', options: 'intercept=held' }],
  ] as const)('%s %o: what it would be without is what a refit without gives', (law, given) => {
    const fit = fitLaw(readingsFrom(x, y), law, settingsFrom(given));
    const driving = drivingReadings(fit);
    expect(driving.map(({ index }) => index)).toContain(8);
    for (const { index, constant, without, shift } of driving) {
      const estimate = fit.constants.find(({ name }) => name === constant);
      const other = refitted(law, given, index).constants.find(({ name }) => name === constant);
      expectDigits(without, other?.value ?? Number.NaN, 11);
      const u = estimate?.standardUncertainty ?? Number.NaN;
      expectDigits(shift, Math.abs((other?.value ?? 0) - (estimate?.value ?? 0)) / u, 9);
      expect(shift).toBeGreaterThan(1);
    }
  });

  test('every reading that moves a constant by its standard uncertainty is found', () => {
    const fit = fitLaw(readingsFrom(x, y), 'exponential', settingsFrom());
    const found = new Set(drivingReadings(fit).map(({ index }) => index));
    x.forEach((_, i) => {
      const other = refitted('exponential', {}, i);
      const moves = fit.constants
        .filter(({ derived }) => !derived)
        .some(
          ({ value, standardUncertainty }, k) =>
            Math.abs((other.constants[k]?.value ?? 0) - value) > standardUncertainty,
        );
      expect(found.has(i)).toBe(moves);
    });
  });

  test('after a direct fit: a law linear in its constants changes exactly as a refit says', () => {
    const direct = { options: 'fit=direct' };
    const fit = fitLaw(readingsFrom(x, y), 'straight line', settingsFrom(direct));
    const driving = drivingReadings(fit);
    expect(driving.length).toBeGreaterThan(0);
    for (const { index, constant, without } of driving) {
      const other = refitted('straight line', direct, index).constants.find(({ name }) => name === constant);
      expectDigits(without, other?.value ?? Number.NaN, 11);
    }
  });
});

describe('findings', () => {
  test('a gross error is outlying and drives the result; the rest is quiet', () => {
    const x = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
    const y = [3.1, 4.9, 7.05, 9.02, 10.9, 13.1, 14.95, 17, 19.1, 25];
    const table = residualTable(fitLaw(readingsFrom(x, y), 'straight line', settingsFrom()));
    expect(table[9]?.finding).toMatch(/^Outlying: .*Drives the result: without it [ab] would change/);
    expect(table.slice(0, 9).every(({ finding }) => !finding.includes('Outlying'))).toBe(true);
  });

  test('a reading far out along the line has high leverage', () => {
    const x = [1, 2, 3, 4, 5, 6, 7, 40];
    const y = [3.1, 4.9, 7.05, 9.02, 10.9, 13.1, 14.95, 81.2];
    const table = residualTable(fitLaw(readingsFrom(x, y), 'straight line', settingsFrom()));
    expect(table[7]?.finding).toMatch(/High leverage: at x = 40 it alone holds 9\d % of its place/);
  });

  test('rows stand in place: waiting pairs are empty, those set aside say why', () => {
    const fit = fitLaw(
      readingsFrom([1, 2, 3, null, 5, 6], [2, 'lost', 6.1, 7, 10, 12.2]),
      'straight line',
      settingsFrom(),
    );
    const table = residualTable(fit);
    expect(table.map(({ reading }) => reading)).toEqual([1, 2, 3, '', 5, 6]);
    expect(table[1]).toMatchObject({ residual: '', leverage: '', finding: expect.stringContaining('lost') });
    expect(table[3]).toMatchObject({ residual: '', finding: '' });
  });

  test('readings exactly on the line have no findings made of rounding', () => {
    const x = [0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 5];
    const table = residualTable(
      fitLaw(
        readingsFrom(
          x,
          x.map((value) => 3 * value + 1),
        ),
        'straight line',
        settingsFrom(),
      ),
    );
    expect(table.every(({ finding }) => !/Outlying|Drives/.test(finding))).toBe(true);
  });
});
