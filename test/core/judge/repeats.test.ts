import { describe, expect, test } from '@jest/globals';
import { repeatsTest } from '../../../core/judge/repeats.ts';
import { scatterTest } from '../../../core/judge/scatter.ts';
import { fitLine } from '../../../core/line/fitLine.ts';
import { expectDigits } from '../../expectDigits.ts';
import { calibrationLine, columnOf } from '../fit/calibrationLines.ts';
import { referenceSets } from '../fit/rSets.ts';

const column = (values: readonly number[]): Float64Array => Float64Array.from(values);

describe('lack of fit against repeats', () => {
  test('Puromycin, straight line (R 4.2.2)', () => {
    const set = referenceSets().find(({ id }) => id === 'r-puromycin-treated');
    if (set === undefined) throw new Error('no Puromycin');
    const [x, y] = [column(set.x), column(set.y)];
    const found = repeatsTest(fitLine(x, y, null, 'estimated', 'free'), x, y);
    expect(found?.groups).toBe(6);
    expectDigits(found?.f ?? 0, 19.0313908692479, 12);
    expectDigits(found?.p ?? 0, '0.00147436515684842', 11);
  });

  test('Alaska pipeline, straight and in logarithms (NIST/SEMATECH e-Handbook 4.6.2; 50-digit arithmetic)', () => {
    const raw = calibrationLine('ehandbook-alaska-linear');
    const [x, y] = [column(columnOf(raw, 'x')), column(columnOf(raw, 'y'))];
    const straight = repeatsTest(fitLine(x, y, null, 'estimated', 'free'), x, y);
    expectDigits(straight?.f ?? 0, '0.985679183776585943', 12);
    expectDigits(straight?.p ?? 0, '0.536943984275922657', 12);
    expectDigits(straight?.pureErrorDeviation ?? 0, '6.11268701380461915', 13);
    const [lx, ly] = [x.map(Math.log), y.map(Math.log)];
    const logarithms = repeatsTest(fitLine(lx, ly, null, 'estimated', 'free'), lx, ly);
    expectDigits(logarithms?.f ?? 0, '1.70316129126569369', 11);
    expectDigits(logarithms?.p ?? 0, '0.0550770740179527691', 11);
  });

  test('EURACHEM/CITAC A5', () => {
    const line = calibrationLine('eurachem-a5');
    const [x, y] = [column(columnOf(line, 'x')), column(columnOf(line, 'y'))];
    const found = repeatsTest(fitLine(x, y, null, 'estimated', 'free'), x, y);
    expectDigits(found?.f ?? 0, '4.88515406162464986', 11);
    expectDigits(found?.p ?? 0, '0.0241530563471629634', 11);
  });

  test('needs repeats, and more groups than line terms', () => {
    const x = column([1, 2, 3, 4]);
    const y = column([1, 2, 3, 5]);
    expect(repeatsTest(fitLine(x, y, null, 'estimated', 'free'), x, y)).toBeNull();
    const two = column([1, 1, 2, 2]);
    expect(repeatsTest(fitLine(two, y, null, 'estimated', 'free'), two, y)).toBeNull();
  });
});

describe('unequal scatter', () => {
  const x = column(Array.from({ length: 40 }, (_, i) => i + 1));

  test('scatter that grows along the line is found, with its direction', () => {
    const y = x.map((value, i) => 3 + 2 * value + (i % 2 ? 0.05 : -0.05) * value * (1 + (i % 3)));
    const found = scatterTest(fitLine(x, y, null, 'estimated', 'free'));
    expect(found.p).toBeLessThan(0.01);
    expect(found.direction).toBe(1);
  });

  test('even scatter is not', () => {
    const y = x.map((value, i) => 3 + 2 * value + (i % 2 ? 0.5 : -0.5) * (1 + ((i * 7) % 5)));
    expect(scatterTest(fitLine(x, y, null, 'estimated', 'free')).p).toBeGreaterThan(0.1);
  });

  test('weights that follow the scatter even it out', () => {
    const y = x.map((value, i) => 3 + 2 * value + (i % 2 ? 0.05 : -0.05) * value * (1 + ((i * 7) % 5)));
    expect(
      scatterTest(
        fitLine(
          x,
          y,
          x.map((value) => 1 / value ** 2),
          'estimated',
          'free',
        ),
      ).p,
    ).toBeGreaterThan(0.1);
  });
});
