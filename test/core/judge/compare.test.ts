import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { compare, compareSteps } from '../../../core/judge/compare.ts';
import { judgesDisagree } from '../../../core/judge/judgesDisagree.ts';
import { generalLaws } from '../../../core/law/catalogue.ts';
import { straightness } from '../../../core/straightness/straightness.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from '../fit/settings.ts';

const x = [1, 2, 3, 4, 5, 6, 8, 10];
const y = [4.1, 3.25, 2.75, 2.2, 1.75, 1.48, 0.98, 0.62];

function rowsOf(
  laws: readonly string[],
  given: GivenTexts = {},
  xs: readonly number[] = x,
  ys: readonly number[] = y,
) {
  return compare(readingsFrom(xs, ys), laws, settingsFrom(given, xs.length)).rows;
}

describe('the figures of a law', () => {
  test.each<[string, GivenTexts]>([
    ['straight line', {}],
    ['exponential', {}],
    ['exponential', { uY: 'equal' }],
    ['reciprocal', { uY: '2%' }],
    ['saturation', { options: 'form=2' }],
    ['proportional', {}],
    ['y(x) = p*exp(q*x)', { known: 'p=5' }],
    ['y(x) = p*exp(q*x)', { known: 'p=5', options: 'intercept=held' }],
    ['y(x) = (a + b*x)^2', {}],
    ['exponential', { options: 'fit=direct' }],
  ])('%s %o: those of STRAIGHTNESS', (law, given) => {
    const [row] = rowsOf([law], given);
    const found = straightness(fitLaw(readingsFrom(x, y), law, settingsFrom(given, x.length)));
    expectDigits(Number(row?.aicc), found.aicc, 12);
    expectDigits(Number(row?.rSquared), found.rSquared, 12);
    expectDigits(Number(row?.bowPercent), found.bowPercent, 9);
    expectDigits(Number(row?.misfit), found.misfit, 12);
    expect(row?.rank).toBe(1);
    expect(row?.support).toBe(100);
  });

  test('a law with trial constants is judged by its direct fit, its constants counted', () => {
    const [row] = rowsOf(['offset decay']);
    const fit = fitLaw(readingsFrom(x, y), 'offset decay', settingsFrom());
    const n = x.length;
    const likelihood = (-n / 2) * (Math.log((2 * Math.PI * (fit.direct?.sumOfSquares ?? 0)) / n) + 1);
    // a, c, k and the scale.
    expectDigits(Number(row?.aicc), -2 * likelihood + 8 + 40 / (n - 5), 12);
  });

  test('y on both axes: judged on another form of the same law', () => {
    const [both] = rowsOf(['saturation'], { options: 'form=3' });
    const [first] = rowsOf(['saturation']);
    expect(both?.reason).toBe('');
    expectDigits(Number(both?.aicc), Number(first?.aicc), 13);
  });

  test('errors in both axes: ranked by the weighted sum of squares, without a likelihood', () => {
    const rows = rowsOf(['straight line', 'exponential'], { uY: '2%', uX: 0.02 });
    expect(rows.map(({ law }) => law)).toEqual(['exponential', 'straight line']);
    expect(rows.every((row) => row.aicc === '' && row.support === '' && row.rSquared === '')).toBe(true);
    expect(rows.every((row) => row.reason === '' && typeof row.misfit === 'number')).toBe(true);
  });
});

describe('laws that cannot be judged', () => {
  const reasonOf = (law: string, given: GivenTexts, xs: readonly number[], ys: readonly number[]): string =>
    rowsOf([law], given, xs, ys)[0]?.reason ?? '';
  const six = [0, 1, 2, 3, 4, 5];

  test.each<[string, readonly number[], string]>([
    ['exponential', [5, 4, 3, 0, 1, 2], 'ln y: reading 4 is 0'],
    ['exponential', [5, 4, 3, -2, 1, 2], 'ln y: reading 4 is −2'],
    ['power', [5, 4, 3, 2, 1, 2], 'ln x: reading 1 is 0'],
    ['reciprocal', [5, 4, 3, 2, 0, 2], '1/y: reading 5 is 0'],
    ['rise and decay', [5, 4, 3, 2, 1, 2], 'ln(y/x): reading 1 is x = 0, y = 5'],
    [
      'exponential',
      [0, 4, 3, 2, 1, 2],
      'ln y: reading 1 is 0; the law exponential cannot pass through the origin',
    ],
  ])('%s of %j: %s', (law, ys, reason) => {
    expect(reasonOf(law, {}, six, ys)).toBe(reason);
    // Setting the reading aside would judge the law on fewer readings than the others.
    expect(reasonOf(law, { options: 'outside=set aside' }, six, ys)).toBe(reason);
  });

  test('positions are those of the cells', () => {
    const readings = readingsFrom([1, 2, null, 4, 5, 6, 7], [3, 'lost', 1, 0, 2, 3, 4]);
    expect(compare(readings, ['exponential'], settingsFrom()).rows[0]?.reason).toBe('ln y: reading 4 is 0');
  });

  test('by their direct fits laws may take what their straight axes cannot', () => {
    const ys = [0, 1.7, 2.6, 3.1, 3.5, 3.7];
    expect(reasonOf('saturation', {}, six, ys)).toBe('1/y: reading 1 is 0');
    const [row] = rowsOf(['saturation'], { options: 'judge=direct' }, six, ys);
    expect(row?.reason).toBe('');
    expect(row?.aicc).toEqual(expect.any(Number));
    expect(reasonOf('logarithmic', { options: 'judge=direct' }, six, ys)).toBe('ln x: reading 1 is 0');
  });

  test('too few readings for AICc', () => {
    expect(reasonOf('exponential', {}, [1, 2, 3, 4], [5, 4, 3, 2])).toBe(
      'needs 5 readings to be compared; there are 4',
    );
    const [waiting] = compare(readingsFrom([null], [null]), ['exponential'], settingsFrom()).rows;
    expect(waiting?.reason).toBe('needs 5 readings to be compared; there are 0');
    // Stated uncertainties leave no scale to estimate; a proportional law has one constant less.
    expect(reasonOf('exponential', { uY: '2%' }, [1, 2, 3, 4], [5, 4, 3, 2])).toBe('');
    expect(reasonOf('proportional', {}, [1, 2, 3, 4], [5, 4, 3, 2])).toBe('');
    expect(reasonOf('offset decay', {}, [1, 2, 3, 4, 5], [5, 4, 3, 2, 1])).toMatch(/^needs 6 readings/);
  });

  test('they stand last, without numbers', () => {
    const rows = rowsOf(['exponential', 'straight line', 'power'], {}, six, [5, 4, 3, 0, 1, 2]);
    expect(rows.map(({ rank, law }) => [rank, law])).toEqual([
      [1, 'straight line'],
      ['', 'exponential'],
      ['', 'power'],
    ]);
    expect(rows[1]).toMatchObject({ support: '', aicc: '', rSquared: '', bowPercent: '', misfit: '' });
  });

  test('a law that cannot settle its constants keeps its row', () => {
    expect(reasonOf('V(t) = V0*exp(-t/(R*C))', {}, x, y)).toMatch(/only R·C is settled/);
    expect(reasonOf('V(t) = V0*exp(-t/(R*C))', { known: 'R=2' }, x, y)).toBe('');
  });
});

describe('the comparison', () => {
  test('support divides 100 % among the eligible laws; the best comes first', () => {
    const rows = rowsOf(generalLaws);
    const eligible = rows.filter(({ reason }) => reason === '');
    expectDigits(
      eligible.reduce((sum, { support }) => sum + Number(support), 0),
      100,
      12,
    );
    const criteria = eligible.map(({ aicc }) => Number(aicc));
    expect(criteria).toEqual([...criteria].sort((a, b) => a - b));
    expect(eligible.map(({ rank }) => rank)).toEqual(eligible.map((_, index) => index + 1));
    expect(rows[0]?.law).toBe('exponential');
  });

  test("the user's own law stands beside the catalogue's; the same curve has the same support", () => {
    const rows = rowsOf(['exponential', 'first order', 'C(t) = A*exp(-t/tau)', 'straight line']);
    const supports = rows.slice(0, 3).map(({ support }) => Number(support));
    expectDigits(supports[1] ?? 0, supports[0] ?? 1, 9);
    expectDigits(supports[2] ?? 0, supports[0] ?? 1, 9);
  });

  test('readings exactly on a law support it alone', () => {
    const rows = rowsOf(
      ['straight line', 'power', 'exponential'],
      {},
      [1, 2, 4, 8, 16],
      [1, 2, 4, 8, 16].map((value) => 3 * value * value),
    );
    expect(rows[0]?.law).toBe('power');
    expect(Number(rows[0]?.support)).toBeGreaterThan(99.9999);
  });

  test('a law given twice counts once', () => {
    expect(rowsOf(['power', ' power', 'power'])).toHaveLength(1);
  });

  test('runs law by law and ends with the same', () => {
    const steps = compareSteps(readingsFrom(x, y), generalLaws, settingsFrom());
    for (let count = 0; ; count++) {
      const step = steps.next();
      if (step.done === true) {
        expect(count).toBe(generalLaws.length);
        expect(step.value.rows).toEqual(rowsOf(generalLaws));
        return;
      }
    }
  });

  test.each<[readonly string[], GivenTexts, string]>([
    [['power', 'no such law'], {}, 'laws'],
    [['power', 'y = a +'], {}, 'laws'],
    [['power', 'y = a +'], { known: 'a=1' }, 'laws'],
    [['power'], { known: 'z=1' }, 'known'],
    [['power'], { uY: 0.1, uX: 0.1, options: 'judge=direct' }, 'options'],
  ])('%j %o is refused', (laws, given, argument) => {
    expect(() => rowsOf(laws, given)).toThrow(expect.objectContaining({ code: 'argument', argument }));
  });

  test('a constant known in one law does not disturb the others', () => {
    const rows = rowsOf(['y(x) = p*exp(q*x)', 'straight line'], { known: 'p=5' });
    expect(rows.every(({ reason }) => reason === '')).toBe(true);
  });
});

describe('the two judges', () => {
  test('agree where the scatter tells them nothing', () => {
    expect(judgesDisagree(readingsFrom(x, y), generalLaws, settingsFrom())).toBeNull();
  });

  test('disagree where the shape of the scatter decides', () => {
    // A power law with the same scatter everywhere: on logarithmic axes the low readings scatter most.
    const xs = [1, 2, 3, 4, 5, 6, 7, 8, 9, 10];
    const noise = [1.5, -1.2, 0.8, -0.6, 1.1, -1.4, 0.9, -0.3, 0.7, -1];
    const ys = xs.map((value, i) => 2 * value ** 1.6 + (noise[i] ?? 0));
    const text = judgesDisagree(readingsFrom(xs, ys), ['power', 'square'], settingsFrom());
    expect(text).toMatch(/^On the straight axes square .*power .*shape of the scatter, not of the curve/);
  });

  test('have no quarrel over laws that are the same curve', () => {
    expect(judgesDisagree(readingsFrom(x, y), ['first order', 'exponential'], settingsFrom())).toBeNull();
  });
});
