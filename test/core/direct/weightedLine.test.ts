import { describe, expect, test } from '@jest/globals';
import { weightedLine } from '../../../core/direct/weightedLine.ts';
import { expectDigits } from '../../expectDigits.ts';

const column = (...values: number[]): Float64Array => Float64Array.from(values);
const none = { slope: NaN, intercept: NaN };

describe('weightedLine', () => {
  // Whole numbers, so that the normal equations can be solved by hand.
  const x = column(0, 1, 3, 2);
  const y = column(1, 2, 6, 5);
  const w = column(1, 2, 1, 3);

  test('both terms', () => {
    // Sw = 7, Swx = 11, Swy = 26, Swxx = 23, Swxy = 52: slope = (7·52 − 11·26)/(7·23 − 11²) = 78/40.
    const line = weightedLine(x, y, w, 'both', none);
    expectDigits(line?.slope ?? NaN, 78 / 40, 14);
    expectDigits(line?.intercept ?? NaN, (26 - (11 * 78) / 40) / 7, 14);
  });

  test('one term held', () => {
    expectDigits(
      weightedLine(x, y, w, 'slope', { slope: NaN, intercept: 1 })?.slope ?? NaN,
      (52 - 11) / 23,
      14,
    );
    expectDigits(
      weightedLine(x, y, w, 'intercept', { slope: 2, intercept: NaN })?.intercept ?? NaN,
      (26 - 22) / 7,
      14,
    );
    expect(weightedLine(x, y, w, 'neither', { slope: 2, intercept: 3 })).toEqual({ slope: 2, intercept: 3 });
  });

  test('readings that cannot take part are left out', () => {
    const holed = weightedLine(
      column(0, 1, 3, 2, NaN, 4),
      column(1, 2, 6, 5, 1, NaN),
      column(1, 2, 1, 3, 1, 1),
      'both',
      none,
    );
    expectDigits(holed?.slope ?? NaN, 78 / 40, 14);
  });

  test('a large offset in x costs no digits of the slope', () => {
    const far = weightedLine(
      x.map((value) => value + 2 ** 40),
      y,
      w,
      'both',
      none,
    );
    expectDigits(far?.slope ?? NaN, 78 / 40, 14);
  });

  test('null when the readings do not determine the line', () => {
    expect(weightedLine(column(2, 2), column(1, 3), column(1, 1), 'both', none)).toBeNull();
    expect(weightedLine(column(2), column(1), column(1), 'both', none)).toBeNull();
    expect(
      weightedLine(column(NaN), column(1), column(1), 'intercept', { slope: 1, intercept: NaN }),
    ).toBeNull();
  });
});
