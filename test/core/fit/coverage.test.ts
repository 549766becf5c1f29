import { describe, expect, test } from '@jest/globals';
import { seededRandom } from '../../../core/constants/random.ts';
import type { Fit } from '../../../core/fit/fit.ts';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { type GivenTexts, readingsFrom, settingsFrom } from './settings.ts';

const SETS = 2000;
const x = [0.5, 1, 1.5, 2, 3, 4, 5, 6, 8, 10, 12, 15];

interface Case {
  readonly law: string;
  readonly truth: Readonly<Record<string, number>>;
  readonly curve: (at: number) => number;
  readonly scatter: (response: number) => number;
  readonly given: GivenTexts;
}

const cases: readonly (readonly [string, Case])[] = [
  [
    'exponential, 2 % of y stated',
    {
      law: 'exponential',
      truth: { p: 3, q: -0.2 },
      curve: (at) => 3 * Math.exp(-0.2 * at),
      scatter: (response) => 0.02 * response,
      given: { uY: '2%' },
    },
  ],
  [
    'exponential, scatter estimated',
    {
      law: 'exponential',
      truth: { p: 3, q: -0.2 },
      curve: (at) => 3 * Math.exp(-0.2 * at),
      scatter: (response) => 0.02 * response,
      given: { uY: 'proportional' },
    },
  ],
  [
    'power, 2 % of y stated',
    {
      law: 'power',
      truth: { p: 1.4, q: 1.5 },
      curve: (at) => 1.4 * at ** 1.5,
      scatter: (response) => 0.02 * response,
      given: { uY: '2%' },
    },
  ],
  [
    'saturation, equal scatter stated',
    {
      law: 'saturation',
      truth: { p: 40, q: 3 },
      curve: (at) => (40 * at) / (3 + at),
      scatter: () => 0.3,
      given: { uY: 0.3 },
    },
  ],
  [
    'saturation by the direct fit, scatter estimated',
    {
      law: 'saturation',
      truth: { p: 40, q: 3 },
      curve: (at) => (40 * at) / (3 + at),
      scatter: () => 0.3,
      given: { options: 'fit=direct' },
    },
  ],
];

function simulated({ law, curve, scatter, given }: Case, random: ReturnType<typeof seededRandom>): Fit {
  const y = x.map((at) => curve(at) + scatter(curve(at)) * random.normal());
  return fitLaw(readingsFrom(x, y), law, settingsFrom(given, x.length));
}

// The binomial spread of a share of 0.95 in 2,000 sets is 0.005: 93.5 % to 96.5 % is three of it.
describe('95 % intervals hold the truth 93.5 % to 96.5 % of the time', () => {
  test.each(cases)('%s', (_, one) => {
    const random = seededRandom(4711);
    const held: Record<string, number> = {};
    for (let set = 0; set < SETS; set++) {
      for (const { name, low, high } of simulated(one, random).constants) {
        const truth = one.truth[name];
        if (truth !== undefined && low <= truth && truth <= high) held[name] = (held[name] ?? 0) + 1;
      }
    }
    for (const name of Object.keys(one.truth)) {
      const share = (held[name] ?? 0) / SETS;
      expect({ name, inside: share >= 0.935 && share <= 0.965, share }).toMatchObject({ inside: true });
    }
  });
});

describe('Monte Carlo intervals (JCGM 101:2008)', () => {
  const random = seededRandom(12);
  const one = cases[0]?.[1] as Case; // the list has a first case
  const y = x.map((at) => one.curve(at) + one.scatter(one.curve(at)) * random.normal());
  const fitWith = (options: string) =>
    fitLaw(readingsFrom(x, y), 'exponential', settingsFrom({ uY: '2%', options }));
  const first = fitWith('interval=line');
  const sampled = fitWith('interval=montecarlo');

  test('agree with the carried interval within their own scatter, and are the same every time', () => {
    first.constants.forEach((estimate, k) => {
      const other = sampled.constants[k];
      // A decay has no doubling time.
      if (estimate.name === 'doubling time') return;
      expect(other?.standardUncertainty).toBe(estimate.standardUncertainty);
      // The 2.5 % point of 10,000 trials scatters by 0.027 standard uncertainties.
      const room = 0.1 * estimate.standardUncertainty;
      expect(Math.abs((other?.low ?? Number.NaN) - estimate.low)).toBeLessThan(room);
      expect(Math.abs((other?.high ?? Number.NaN) - estimate.high)).toBeLessThan(room);
    });
    expect(fitWith('interval=montecarlo').constants).toEqual(sampled.constants);
  });

  test('are refused for constants of the direct fit', () => {
    expect(() => fitWith('interval=montecarlo; fit=direct').constants).toThrow(/montecarlo/);
  });
});
