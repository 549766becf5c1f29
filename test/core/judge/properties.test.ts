import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { checks } from '../../../core/judge/checks.ts';
import { compare } from '../../../core/judge/compare.ts';
import { residualTable } from '../../../core/judge/residuals.ts';
import { generalLaws } from '../../../core/law/catalogue.ts';
import { nextReading } from '../../../core/next/nextReading.ts';
import { Problem } from '../../../core/problem.ts';
import { eachSeries } from '../../../core/series/each.ts';
import { shareSlope } from '../../../core/series/share.ts';
import { statement } from '../../../core/statement/statement.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';
import { splitFrom } from '../series/splitFrom.ts';

const x = [1, 2, 3, 4, 5, 6, 7.5, 9];
const y = [4.2, 3.3, 2.85, 2.3, 1.9, 1.6, 1.15, 0.88];

function supportsOf(xs: readonly number[], ys: readonly number[], given: GivenTexts = {}) {
  const { rows } = compare(readingsFrom(xs, ys), generalLaws, settingsFrom(given, xs.length));
  return new Map(rows.map(({ law, support }) => [law, Number(support)]));
}

describe('units and order do not matter', () => {
  const before = supportsOf(x, y);
  const order = [3, 0, 7, 5, 1, 6, 2, 4];

  test.each([
    ['y in thousandths', x, y.map((value) => 1000 * value)],
    ['y in units of 1e-150', x, y.map((value) => 1e-150 * value)],
    ['x in thousandths', x.map((value) => 1000 * value), y],
    ['another order', order.map((i) => x[i] ?? 0), order.map((i) => y[i] ?? 0)],
  ])('%s', (_, xs, ys) => {
    const after = supportsOf(xs, ys);
    for (const [law, support] of before) {
      if (support > 1e-9) expectDigits(after.get(law) ?? Number.NaN, support, 8);
    }
  });

  test('findings follow their readings', () => {
    const ys = [...y];
    ys[2] = 4;
    const of = (xs: readonly number[], values: readonly number[]) =>
      residualTable(fitLaw(readingsFrom(xs, values), 'exponential', settingsFrom()));
    const straight = of(x, ys);
    const turned = of(
      order.map((i) => x[i] ?? 0),
      order.map((i) => ys[i] ?? 0),
    );
    expect(straight[2]?.finding).toMatch(/Outlying/);
    expect(turned.map(({ finding }) => finding === '')).toEqual(
      order.map((i) => straight[i]?.finding === ''),
    );
  });

  test('nothing is changed that was given', () => {
    const readings = readingsFrom(x, y);
    const settings = settingsFrom();
    const before = JSON.stringify([[...readings.x], [...readings.y], settings.options]);
    compare(readings, generalLaws, settings);
    const fit = fitLaw(readings, 'exponential', settings);
    checks(fit);
    residualTable(fit);
    straightness(fit);
    expect(JSON.stringify([[...readings.x], [...readings.y], settings.options])).toBe(before);
  });
});

test('whatever the readings, the answer is numbers, texts or a Problem', () => {
  const value = fc.oneof(
    fc.constantFrom(0, 0.1, 1, -1, 1e10, 1e10 + 1, 1e-12, 1e200, 1e-200, 5),
    fc.double({ min: -100, max: 100, noNaN: true }),
    fc.integer({ min: 1, max: 9 }),
  );
  const pairs = fc.array(fc.tuple(value, value), { minLength: 1, maxLength: 12 });
  const law = fc.constantFrom(...generalLaws, 'proportional', 'y(x) = a*x/(a + x)');
  const given = fc.constantFrom<GivenTexts>(
    {},
    { uY: 'equal' },
    { uY: 0.1 },
    { uY: '2%' },
    { uY: 0.1, uX: 0.1 },
    { options: 'outside=set aside' },
    { options: 'fit=direct' },
  );
  const tried = (run: () => unknown): unknown => {
    try {
      return run();
    } catch (error) {
      if (error instanceof Problem) return error.message;
      throw error;
    }
  };
  fc.assert(
    fc.property(pairs, law, given, (cells, name, texts) => {
      const [xs, ys] = [cells.map(([first]) => first), cells.map(([, second]) => second)];
      const settings = settingsFrom(texts, xs.length);
      const readings = readingsFrom(xs, ys);
      const fit = tried(() => fitLaw(readings, name, settings));
      const { rows } = compare(readings, generalLaws, settings);
      for (const row of rows) {
        for (const cell of [row.support, row.aicc, row.rSquared, row.bowPercent, row.misfit]) {
          expect(cell === '' || Number.isFinite(cell)).toBe(true);
        }
        expect(row.reason === '').toBe(row.rank !== '');
      }
      const keys = cells.map((_, index) => index % 2);
      const series = splitFrom(keys, xs, ys);
      tried(() => eachSeries(series, name, settings));
      tried(() => shareSlope(series, name, settings));
      if (typeof fit === 'string') return;
      // Anything that is no text is a fit.
      const fitted = fit as ReturnType<typeof fitLaw>;
      tried(() => straightness(fitted));
      const table = tried(() => residualTable(fitted));
      if (Array.isArray(table)) expect(table).toHaveLength(cells.length);
      const found = tried(() => checks(fitted));
      if (Array.isArray(found)) {
        for (const { text } of found) expect(text).not.toMatch(/NaN|undefined|Infinity|∞/);
      }
      const constant = fitted.law.unknown[0] ?? '';
      const sentence = tried(() => statement(fitted, constant, 'm'));
      expect(sentence).not.toMatch(/NaN|undefined|Infinity/);
      tried(() => nextReading(fitted, constant, 1, 10));
    }),
    { seed: 20260401, numRuns: 150 },
  );
});
