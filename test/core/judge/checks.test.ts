import { describe, expect, test } from '@jest/globals';
import { seededRandom } from '../../../core/constants/random.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { checks, type Finding } from '../../../core/judge/checks.ts';
import { readCells } from '../../../core/readings/readCells.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import { referenceSets } from '../fit/rSets.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

function findings(
  law: string,
  x: readonly Cell[],
  y: readonly Cell[],
  given: GivenTexts = {},
): readonly Finding[] {
  return checks(fitLaw(readingsFrom(x, y), law, settingsFrom(given, x.length)));
}

function saying(found: readonly Finding[], pattern: RegExp): Finding | undefined {
  return found.find(({ text }) => pattern.test(text));
}

const twelve = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12];
const scatter = [0.6, -0.9, 0.2, 1.1, -0.4, -0.8, 0.9, 0.1, -1.2, 0.5, 0.7, -0.6];

function noisy(curve: (x: number) => number, size: number, x: readonly number[] = twelve): number[] {
  return x.map((at, i) => curve(at) + size * (scatter[i % scatter.length] ?? 0));
}

describe('the law', () => {
  test('curvature left: the tempting straight line through a root law', () => {
    const y = noisy((x) => 10 * Math.sqrt(x), 0.2);
    const found = findings('straight line', twelve, y);
    expect(found[0]).toMatchObject({
      level: 'stop',
      text: expect.stringMatching(
        /^Curvature is left: the middle of the readings lies above the line .* r squared = 0\.9\d+ does not show it, so a straight line is not the whole story\.$/,
      ),
    });
    expect(saying(found, /support the root law far better than a straight line/)?.level).toBe('caution');
    expect(saying(findings('root', twelve, y), /Curvature/)).toBeUndefined();
  });

  test('good readings of the right law leave nothing serious to say', () => {
    const found = findings(
      'straight line',
      twelve,
      noisy((x) => 5 + 2 * x, 0.3),
    );
    expect(found.filter(({ level }) => level !== 'note')).toEqual([]);
  });

  test('false alarms: of the right law with scatter of its own kind, few sets have a stop', () => {
    // Four tests at 5 % and their stops at 0.1 %; over 100 seeded sets.
    const random = seededRandom(11);
    let stops = 0;
    let curved = 0;
    for (let set = 0; set < 100; set++) {
      const y = twelve.map((x) => 4 * Math.exp(-0.2 * x) * Math.exp(0.03 * random.normal()));
      const found = findings('exponential', twelve, y);
      if (found.some(({ level }) => level === 'stop')) stops++;
      if (saying(found, /urvature is left/)) curved++;
    }
    expect(stops).toBeLessThanOrEqual(1);
    expect(curved).toBeLessThanOrEqual(11);
  });

  test('runs: a slow wave that no parabola shows', () => {
    const x = Array.from({ length: 24 }, (_, i) => i);
    const y = x.map((at) => 3 + 2 * at + Math.sin((2 * Math.PI * at) / 12));
    expect(saying(findings('straight line', x, y), /same sign in long stretches along x/)?.level).toBe(
      'caution',
    );
  });

  test('lack of fit against repeats: Puromycin on a straight line (R 4.2.2: F = 19.03, p = 0.0015)', () => {
    const set = referenceSets().find(({ id }) => id === 'r-puromycin-treated');
    const found = findings('straight line', set?.x ?? [], set?.y ?? []);
    expect(saying(found, /^Lack of fit: .*\(6 places\) .* \(F = 19, p = 0\.0015\)/)?.level).toBe('caution');
    expect(saying(found, /support the saturation law|support the logarithmic law/)).toBeDefined();
    expect(
      saying(findings('saturation', set?.x ?? [], set?.y ?? [], { options: 'form=2' }), /Lack of fit/),
    ).toBeUndefined();
  });

  test('repeats that are identical say nothing of the scatter', () => {
    const x = [1, 1, 2, 2, 3, 3, 4, 4];
    const y = [1, 1, 2.1, 2.1, 2.9, 2.9, 4.1, 4.1];
    const found = findings('straight line', x, y);
    expect(saying(found, /^Repeated readings are identical/)?.level).toBe('note');
    expect(saying(found, /Lack of fit/)).toBeUndefined();
  });

  test('scatter that is the same in y is unequal on logarithmic axes', () => {
    const x = Array.from({ length: 16 }, (_, i) => i);
    const y = noisy((at) => 100 * Math.exp(-0.2 * at), 1.2, x);
    const found = findings('exponential', x, y);
    expect(saying(found, /shrinks with ln y .* give u_y as equal/)?.level).toBe('caution');
    expect(saying(findings('exponential', x, y, { uY: 'equal' }), /scatter is not the same/)).toBeUndefined();
  });

  test('stated uncertainties that are too small, and too large', () => {
    const y = noisy((x) => 5 + 2 * x, 0.3);
    expect(
      saying(findings('straight line', twelve, y, { uY: 0.05 }), /scatter more than the stated/)?.level,
    ).toBe('caution');
    expect(
      saying(findings('straight line', twelve, y, { uY: 2 }), /scatter much less than the stated/)?.level,
    ).toBe('note');
    expect(saying(findings('straight line', twelve, y, { uY: 0.22 }), /than the stated/)).toBeUndefined();
  });
});

describe('single readings', () => {
  test('one that drives a constant and lies far out is named', () => {
    const y = noisy((x) => 5 + 2 * x, 0.3);
    y[11] = 40;
    const found = findings('straight line', twelve, y);
    expect(
      saying(found, /^Reading 12 drives [ab]: without it [ab] would be .* standard uncertainties away\.$/)
        ?.level,
    ).toBe('caution');
    expect(saying(found, /^Reading 12 is outlying: .*nothing has been left out\.$/)).toBeDefined();
  });

  test('set aside, below detection with its bias, and blanks that arrived as zeros', () => {
    const x = [1, 2, 3, 4, 5, 6, 7, 8];
    const y = [5, 4, 3.3, 'spilt', 2, 1.7, '<0.5', '<0.5'];
    const found = findings('exponential', x, y);
    expect(saying(found, /^Reading 4 is set aside: its y is the text 'spilt'/)?.level).toBe('caution');
    expect(saying(found, /^Reading 7 is set aside: .* below a detection limit/)).toBeDefined();
    expect(saying(found, /below detection, the fall of y looks slower than it is/)?.level).toBe('caution');
    const zeros = readCells([[1], [2], [3], [4]], [[3], [2.1], [1], [0]], { blanks: 'maybeZero' });
    const text = checks(fitLaw(zeros, 'straight line', settingsFrom())).map((one) => one.text);
    expect(text.some((one) => /The last 1 pair with y = 0 was taken as blank/.test(one))).toBe(true);
  });

  test('many set aside are counted, not listed', () => {
    const y: Cell[] = noisy((x) => 5 + 2 * x, 0.3);
    for (let i = 2; i < 10; i++) y[i] = 'lost';
    const found = findings('straight line', twelve, y);
    expect(found.filter(({ text }) => /is set aside: its y/.test(text))).toHaveLength(5);
    expect(saying(found, /^3 more readings are set aside for such reasons\.$/)).toBeDefined();
  });

  test('a reading outside the straight axes that the direct fit keeps is told', () => {
    const x = [0, 1, 2, 4, 6, 9, 12, 16, 24, 30, 36, 48];
    const y = [1.85, 1.58, 1.39, 1.01, 0.79, 0.56, 0.44, 0.32, 0.22, 0.22, 0.2, 0.18];
    const found = findings('offset decay', x, y);
    expect(
      saying(found, /^Reading 12 is not on the line, where .* takes part in the direct fit\.$/)?.level,
    ).toBe('note');
    // What is judged is the scatter that the constants were settled with.
    expect(found.every(({ level }) => level !== 'stop')).toBe(true);
  });
});

describe('what is known, and what the readings say', () => {
  const y = noisy((x) => Math.exp(1 - 0.1 * x), 0.005);

  test('a known constant that the leftover term contradicts, agrees with, and in between', () => {
    const law = 'C(t) = C0*exp(-k*t)';
    const of = (c0: number) => saying(findings(law, twelve, y, { known: `C0=${c0}` }), /fitted intercept/);
    expect(of(2.5)).toMatchObject({
      level: 'stop',
      text: expect.stringMatching(
        /^The fitted intercept is .*, but the given C0 says 0\.916291: they are \d+ standard uncertainties apart\.$/,
      ),
    });
    expect(of(Math.E)).toMatchObject({
      level: 'note',
      text: expect.stringMatching(/agrees with the given C0/),
    });
  });

  test('line and direct fit that disagree', () => {
    // A floor that a single exponential cannot show.
    const x = [0, 1, 2, 4, 6, 9, 12, 16, 24, 30, 36, 48];
    const c = [1.85, 1.58, 1.39, 1.01, 0.79, 0.56, 0.44, 0.32, 0.22, 0.22, 0.2, 0.18];
    const finding = saying(
      findings('first order', x, c),
      /^Line and direct fit disagree on k: .* so state u_y\.$/,
    );
    expect(finding?.level).toBe('caution');
    expect(saying(findings('exponential', twelve, y), /disagree/)).toBeUndefined();
  });

  test('simulated intervals that first order does not give', () => {
    const x = [1, 2, 3, 4, 5, 6];
    const ys = [2.6, 3.9, 3.1, 5.2, 4.4, 6.1];
    const found = findings('y(x) = a + x/b', x, ys, { options: 'interval=montecarlo' });
    expect(saying(found, /^For b the first-order interval .*JCGM 101:2008, clause 8.*\.$/)?.level).toBe(
      'caution',
    );
    expect(saying(findings('y(x) = a + x/b', x, ys), /JCGM 101/)).toBeUndefined();
  });
});

describe('the readings as a whole', () => {
  test('none to spare, few, and all at two places', () => {
    expect(findings('straight line', [1, 2], [3, 4])).toContainEqual({
      level: 'caution',
      text: '2 readings settle the constants with none to spare: no uncertainty can be stated and nothing tests the law.',
    });
    // JCGM 100:2008, table E.1: 42 % for four degrees … here 1/√(2·2) = 50 %.
    expect(
      saying(
        findings('straight line', [1, 2, 3, 4], [1, 2.1, 2.9, 4.2]),
        /2 degrees of freedom .* about 50 % only/,
      )?.level,
    ).toBe('note');
    expect(
      saying(findings('straight line', [1, 1, 5, 5], [1, 1.1, 4.9, 5.2]), /two values of x/)?.level,
    ).toBe('caution');
  });

  test('a constant that is read far from the readings', () => {
    const t = [20, 21, 22, 23, 24, 25];
    const found = findings(
      'first order',
      t,
      t.map((at, i) => 5 * Math.exp(-0.1 * at) * (1 + 0.01 * (scatter[i] ?? 0))),
    );
    expect(
      saying(
        found,
        /^C0 is read where t = 0, but the readings run from 20 to 25: it is extrapolated by 4 times their range\.$/,
      )?.level,
    ).toBe('note');
  });

  test('a median is not a mean', () => {
    const y = twelve.map((x, i) => Math.exp(0.1 * x + 0.2 * (scatter[i] ?? 0)));
    // s near 0.16: exp(s²/2) − 1 near 1.3 %.
    expect(
      saying(
        findings('exponential', twelve, y),
        /median of y; where a mean is wanted, such as a total, it is higher by about 1\.\d %/,
      )?.level,
    ).toBe('note');
    expect(
      saying(
        findings(
          'exponential',
          twelve,
          noisy((x) => Math.exp(0.1 * x), 0.01),
        ),
        /median/,
      ),
    ).toBeUndefined();
  });

  test('readings exactly on the law are suspicious, and nothing is tested', () => {
    const found = findings(
      'straight line',
      twelve,
      twelve.map((x) => 0.1 + 0.3 * x),
    );
    expect(found.map(({ text }) => text)).toEqual([expect.stringMatching(/to the last digit/)]);
  });

  test.each([
    ['basquin', /^Fatigue/],
    ['antoine', /^Pressure/],
    ['hill', /^Dose/],
    ['approach', /energy is stored/],
    ['first order', /drinking water/],
  ])('%s has its caution', (law, pattern) => {
    const x = [1, 2, 3, 4, 5, 6, 7, 8];
    const y = [1.1, 1.9, 2.5, 2.9, 3.2, 3.45, 3.6, 3.7];
    const falling = [9, 7.4, 6.1, 5, 4.1, 3.35, 2.8, 2.25];
    const found = findings(law, x, law === 'hill' || law === 'antoine' ? y : falling);
    expect(saying(found, pattern)).toMatchObject({
      level: 'caution',
      text: expect.stringMatching(/local|code|rules/),
    });
  });
});

test('findings are sentences, the most serious first', () => {
  const y = noisy((x) => 10 * Math.sqrt(x), 0.2);
  const found = findings('straight line', [...twelve, 13], [...y, 'lost']);
  const order = ['stop', 'caution', 'note'];
  const levels = found.map(({ level }) => order.indexOf(level));
  expect(levels).toEqual([...levels].sort((a, b) => a - b));
  for (const { text } of found) expect(text).toMatch(/^[A-Z0-9].*\.$/);
});
