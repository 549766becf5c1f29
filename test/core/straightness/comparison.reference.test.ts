import { readFileSync } from 'node:fs';
import { describe, expect, test } from '@jest/globals';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { compare } from '../../../core/judge/compare.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import { expectDigits } from '../../expectDigits.ts';
import { ourLaws, referenceSets } from '../fit/rSets.ts';
import { readingsFrom, settingsFrom } from '../fit/settings.ts';

// Source: test/reference/F-model-comparison.json, the Gaussian log-likelihood in original units with the Jacobian
// term, from R 4.2.2 and 50-digit arithmetic, for the sets of A-nist-straightened, C and D.

interface ReferenceFit {
  readonly fit: string;
  readonly k: number;
  readonly logLikOriginal_HP: string;
  readonly AICc_HP: string;
  /** Absent where n − k − 1 is not above 0. */
  readonly AICc?: number;
}

// The file's shape is described in test/reference/README.md.
const records = JSON.parse(
  readFileSync(new URL('../../reference/F-model-comparison.json', import.meta.url), 'utf8'),
) as { readonly id: string; readonly comparison: readonly ReferenceFit[] }[];
const sets = new Map(referenceSets().map((set) => [set.id, set]));

const cases = records.flatMap(({ id, comparison }) =>
  comparison.map((reference) => {
    const [kind = '', law = ''] = reference.fit.split(': ');
    return { id, kind, law, reference, title: `${id}: ${reference.fit}` };
  }),
);

/**
 * Digits that a likelihood keeps. Readings on their line to within 10⁻ᵏ of their size leave 15 − k digits in their
 * residuals in double precision, by any method; each of the n readings brings that error of ln s.
 */
function digitsOf(fit: Fit, value: string, most: number): number {
  const { lineWeight, residualStandardDeviation } = fit.line;
  const size = fit.axes.vertical.reduce(
    (top, entry, i) => Math.max(top, Math.abs(entry) * Math.sqrt(lineWeight[i] ?? 0)),
    0,
  );
  const error = (1e-15 * fit.used.length * size) / residualStandardDeviation;
  return Math.min(most, Math.log10(Math.abs(Number(value)) / error));
}

/** Our names of the laws that the file fits directly. */
const directNames: Readonly<Record<string, string>> = {
  'y = a*x^b': 'power',
  'y = a*exp(b*x)': 'exponential',
  'y = (a + b*x)^2': 'square',
  'y = a*x/(b + x)': 'saturation_reciprocal',
  'y = a*exp(b/x)': 'arrhenius',
  'y = 1/(a + b*x)': 'reciprocal',
};

/** Whether R's direct fit of a law came to rest; R itself calls an offset of 1e-5 converged. */
function convergedInR(id: string, law: string): boolean {
  const direct = sets.get(id)?.laws.find((one) => one.law === law)?.direct;
  return direct?.converged === true && direct.error === undefined && direct.relativeOffset < 1e-9;
}

function readingsOf(id: string) {
  const set = sets.get(id);
  if (set === undefined) throw new Error(`no set ${id}`);
  return readingsFrom(set.x, set.y);
}

describe('lines on straight axes', () => {
  const lines = cases.filter(({ kind, law }) => kind === 'straight line' && ourLaws[law] !== undefined);

  test('there are enough of them', () => {
    expect(new Set(lines.map(({ id }) => id)).size).toBe(30);
    expect(lines.length).toBeGreaterThan(130);
  });

  test.each(lines)('$title', ({ id, law, reference }) => {
    const ours = ourLaws[law];
    if (ours === undefined) return;
    const form = compileLaw(ours.law, []).forms.find(
      (one) => `${one.plot} against ${one.against}` === ours.plot,
    );
    const fit = fitLaw(readingsOf(id), ours.law, settingsFrom({ options: `form=${form?.number}` }));
    const found = straightness(fit);
    expectDigits(
      found.logLikelihood,
      reference.logLikOriginal_HP,
      digitsOf(fit, reference.logLikOriginal_HP, 10),
    );
    if (reference.AICc === undefined) expect(found.aicc).toBeNaN();
    else expectDigits(found.aicc, reference.AICc_HP, digitsOf(fit, reference.AICc_HP, 10));
  });
});

describe('the judge by direct fits', () => {
  const direct = cases.filter(
    ({ id, kind, law, reference }) =>
      kind === 'direct' && reference.AICc !== undefined && convergedInR(id, directNames[law] ?? ''),
  );

  test('there are enough of them', () => {
    expect(direct.length).toBeGreaterThan(60);
  });

  test.each(direct)('$title', ({ id, law, reference }) => {
    const [row] = compare(readingsOf(id), [law], settingsFrom({ options: 'judge=direct' })).rows;
    expect(row?.reason).toBe('');
    const line = fitLaw(readingsOf(id), law, settingsFrom());
    expectDigits(Number(row?.aicc), reference.AICc_HP, digitsOf(line, reference.AICc_HP, 9));
  });
});

describe('the ranking', () => {
  const firstForms = new Map(
    Object.entries(ourLaws)
      .filter(([, { law, plot }]) => {
        const [form] = compileLaw(law, []).forms;
        return `${form?.plot} against ${form?.against}` === plot;
      })
      .map(([name, { law }]) => [name, law]),
  );

  test.each(records)('$id', ({ id, comparison }) => {
    const expected = comparison.flatMap((reference) => {
      const [kind, name = ''] = reference.fit.split(': ');
      const law = firstForms.get(name);
      return kind === 'straight line' && law !== undefined && reference.AICc !== undefined
        ? [{ law, aicc: reference.AICc_HP }]
        : [];
    });
    const laws = expected.map(({ law }) => law).reverse();
    const { rows } = compare(readingsOf(id), laws, settingsFrom());
    expect(rows.map(({ law }) => law)).toEqual(expected.map(({ law }) => law));
    rows.forEach((row, index) => {
      expect(row.rank).toBe(index + 1);
      const aicc = expected[index]?.aicc ?? '';
      const fit = fitLaw(readingsOf(id), row.law, settingsFrom());
      expectDigits(Number(row.aicc), aicc, digitsOf(fit, aicc, 9));
    });
    const supports = rows.map(({ support }) => Number(support));
    const total = supports.reduce((sum, support) => sum + support, 0);
    if (rows.length > 0) expectDigits(total, 100, 12);
    // Burnham & Anderson (2002), equation 2.9: evidence ratios are exp(ΔAICc/2).
    const [first, second] = expected;
    if (first && second && Number(supports[1]) > 1e-9) {
      const ratio = Math.exp((Number(second.aicc) - Number(first.aicc)) / 2);
      expectDigits(Number(supports[0]) / Number(supports[1]), ratio, 8);
    }
  });
});
