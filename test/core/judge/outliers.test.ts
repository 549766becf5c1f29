import { describe, expect, test } from '@jest/globals';
import { seededRandom } from '../../../core/constants/random.ts';
import { normalTwoSided } from '../../../core/distributions/normal.ts';
import { studentTwoSided } from '../../../core/distributions/student.ts';
import { outlierP } from '../../../core/judge/outliers.ts';
import { fitLine } from '../../../core/line/fitLine.ts';
import { standardisedResiduals } from '../../../core/straightness/studentised.ts';
import { expectDigits } from '../../expectDigits.ts';

const random = seededRandom(5);
const x = Float64Array.from({ length: 60 }, (_, i) => i);
const y = x.map((value) => 2 + 0.5 * value + random.normal());
y[17] = (y[17] ?? 0) + 5;
y[40] = (y[40] ?? 0) - 4;

describe('the Bonferroni probability of each residual', () => {
  test('from the scatter: t of the externally studentised residual, with one degree of freedom fewer', () => {
    const line = fitLine(x, y, null, 'estimated', 'free');
    const standardised = standardisedResiduals(line);
    const found = outlierP(line, standardised);
    expect(found.filter((p) => p < 1).length).toBeGreaterThanOrEqual(2);
    standardised.forEach((r, i) => {
      // 58 degrees of freedom, of which the reading itself takes one.
      const p = 60 * studentTwoSided(r * Math.sqrt(57 / (58 - r * r)), 57);
      if (p < 1) expectDigits(found[i] ?? 0, p, 14);
      else expect(found[i]).toBe(1);
    });
  });

  test('from stated uncertainties: normal', () => {
    const line = fitLine(x, y, new Float64Array(60).fill(1), 'known', 'free');
    const standardised = standardisedResiduals(line);
    const found = outlierP(line, standardised);
    standardised.forEach((r, i) => {
      const p = 60 * normalTwoSided(r * line.residualStandardDeviation);
      if (p < 1) expectDigits(found[i] ?? 0, p, 14);
      else expect(found[i]).toBe(1);
    });
  });

  test('the order of the readings does not matter', () => {
    const line = fitLine(x, y, null, 'estimated', 'free');
    const standardised = standardisedResiduals(line);
    const reversed = outlierP(line, standardised.slice().reverse());
    expect(Array.from(reversed.reverse())).toEqual(Array.from(outlierP(line, standardised)));
  });

  test('1 where there is nothing to judge by', () => {
    const alone = fitLine(
      Float64Array.of(0, 0, 0, 5),
      Float64Array.of(1, 1.3, 0.9, 7),
      null,
      'estimated',
      'free',
    );
    expect(outlierP(alone, standardisedResiduals(alone))[3]).toBe(1);
    const three = fitLine(Float64Array.of(1, 2, 3), Float64Array.of(1, 2.5, 3), null, 'estimated', 'free');
    expect(Array.from(outlierP(three, standardisedResiduals(three)))).toEqual([1, 1, 1]);
  });

  test('0 for a reading that takes all of the scatter', () => {
    const line = fitLine(
      Float64Array.of(1, 2, 3, 4, 5),
      Float64Array.of(1, 2, 30, 4, 5),
      null,
      'estimated',
      'absent',
    );
    expect(outlierP(line, Float64Array.of(0, 0, 2, 0, 0))).toEqual(Float64Array.of(1, 1, 0, 1, 1));
  });
});
