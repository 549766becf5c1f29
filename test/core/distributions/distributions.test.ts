import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import stdlibTQuantile from '@stdlib/stats-base-dists-t-quantile';
import { jStat } from 'jstat';
import { coverageFactor } from '../../../core/distributions/coverageFactor.ts';
import { normalQuantile, normalTail } from '../../../core/distributions/normal.ts';
import { studentQuantile, studentTail } from '../../../core/distributions/student.ts';
import { chiSquaredTail, fTail } from '../../../core/distributions/tails.ts';
import { expectDigits } from '../../expectDigits.ts';

// test/reference/E-distributions.json: 30-digit arithmetic (HP) and R 4.2.2.
interface ByDf {
  readonly df: number;
  readonly df1: number;
  readonly df2: number;
  readonly qHP: readonly string[];
  readonly upperHP: readonly string[];
}
const [reference] = JSON.parse(
  readFileSync(new URL('../../reference/E-distributions.json', import.meta.url), 'utf8'),
) as {
  // As listed in the file's own record.
  p: number[];
  qnormHP: string[];
  qt: ByDf[];
  pnorm: { z: number[]; upperHP: string[] };
  pt: { t: number[]; byDf: ByDf[] };
  pchisq: { x: number[]; byDf: ByDf[] };
  pf: { F: number[]; byDf: ByDf[] };
}[];
if (reference === undefined) throw new Error('no reference');

describe('quantiles, against 30-digit arithmetic', () => {
  test.each(reference.p.map((p, i) => [p, reference.qnormHP[i] ?? ''] as const))('normal, p = %p', (p, q) => {
    // 1 − p loses digits that p has: the tail is what the function takes.
    expectDigits(normalQuantile(1 - p), q, p === 0.5 ? 16 : 12);
  });

  test.each(reference.qt.map((row) => [row.df, row.qHP] as const))(
    't with %p degrees of freedom',
    (df, q) => {
      reference.p.forEach((p, i) => {
        const tail = Number((1 - p).toPrecision(12));
        expectDigits(studentQuantile(tail, df), q[i] ?? '', 12);
      });
    },
  );
});

describe('probabilities, against 30-digit arithmetic', () => {
  test('normal', () => {
    reference.pnorm.z.forEach((z, i) => {
      expectDigits(normalTail(z), reference.pnorm.upperHP[i] ?? '', 13);
    });
  });

  test.each(reference.pt.byDf.map((row) => [row.df, row.upperHP] as const))('t, %p', (df, upper) => {
    reference.pt.t.forEach((t, i) => {
      expectDigits(studentTail(t, df), upper[i] ?? '', 12);
    });
  });

  test.each(reference.pchisq.byDf.map((row) => [row.df, row.upperHP] as const))(
    'chi-squared, %p',
    (df, upper) => {
      reference.pchisq.x.forEach((x, i) => {
        expectDigits(chiSquaredTail(x, df), upper[i] ?? '', 12);
      });
    },
  );

  test.each(reference.pf.byDf.map((row) => [row.df1, row.df2, row.upperHP] as const))(
    'F, %p and %p',
    (a, b, upper) => {
      reference.pf.F.forEach((f, i) => {
        expectDigits(fTail(f, a, b), upper[i] ?? '', 12);
      });
    },
  );
});

describe('coverage factors', () => {
  test.each([1, 2, 5, 13, 60, 1000, 100_000])(
    'against a general-purpose library, %p degrees of freedom',
    (df) => {
      for (const probability of [0.5, 0.683, 0.9, 0.95, 0.99, 0.999]) {
        expectDigits(coverageFactor(probability, 't', df), stdlibTQuantile(1 - (1 - probability) / 2, df), 9);
      }
    },
  );

  test.each([1, 2, 5, 13, 60, 1000])(
    'against jstat, good to 7 digits itself, %p degrees of freedom',
    (df) => {
      for (const probability of [0.5, 0.683, 0.9, 0.95, 0.99, 0.999]) {
        const upper = 1 - (1 - probability) / 2;
        expectDigits(coverageFactor(probability, 't', df), jStat.studentt.inv(upper, df), 7);
        expectDigits(coverageFactor(probability, 'normal', df), jStat.normal.inv(upper, 0, 1), 7);
      }
    },
  );

  test('a normal one does not know degrees of freedom', () => {
    expect(coverageFactor(0.95, 'normal', 3)).toBe(coverageFactor(0.95, 'normal', 300));
  });
});
