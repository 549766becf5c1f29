import { describe, expect, test } from '@jest/globals';
import {
  crossingAlong,
  crossingBetween,
  crossingNear,
  leavingAt,
  outward,
} from '../../../core/readoff/crossing.ts';

/** A function that counts how often it was asked. */
function counted(f: (x: number) => number): { readonly f: (x: number) => number; count: number } {
  const one = {
    count: 0,
    f: (x: number): number => {
      one.count++;
      return f(x);
    },
  };
  return one;
}

describe('crossingBetween', () => {
  // Roots that are known in closed form.
  test.each<[string, (x: number) => number, number, number, number]>([
    ['a line', (x) => 3 * x - 1, 0, 1, 1 / 3],
    ['x² − 2', (x) => x * x - 2, 0, 2, Math.SQRT2],
    ['eˣ − 1000', (x) => Math.exp(x) - 1000, 0, 40, Math.log(1000)],
    ['ln x', (x) => Math.log(x), 1e-3, 50, 1],
    ['a flat cubic', (x) => (x - 0.3) ** 3, -1, 5, 0.3],
    ['a small root', (x) => x - 3e-12, -1, 1, 3e-12],
    ['from the far end', (x) => 2 - x * x, 9, 1, Math.SQRT2],
  ])('%s, to the last digits and in few steps', (_, f, from, to, root) => {
    const one = counted(f);
    const found = crossingBetween(one.f, from, to) ?? Number.NaN;
    // A root of third order is settled by the cube of the rounding alone.
    const tolerance = _ === 'a flat cubic' ? 1e-5 : 4 * Number.EPSILON;
    expect(Math.abs(found - root)).toBeLessThanOrEqual(tolerance * Math.max(Math.abs(root), 1e-5));
    expect(one.count).toBeLessThan(200);
  });

  test('takes far fewer steps than halving where the function is smooth', () => {
    const one = counted((x) => Math.exp(x) - 1000);
    crossingBetween(one.f, 0, 40);
    expect(one.count).toBeLessThan(20);
  });

  test('no crossing at a pole, in a gap or without a change of sign', () => {
    expect(crossingBetween((x) => 1 / (x - 0.4), 0, 1)).toBeNull();
    expect(crossingBetween((x) => (x > 0.2 && x < 0.7 ? Number.NaN : x - 0.5), 0, 1)).toBeNull();
    expect(crossingBetween((x) => x * x + 1, -1, 1)).toBeNull();
  });

  test('an end that is a root is the answer', () => {
    expect(crossingBetween((x) => x - 1, 1, 2)).toBe(1);
    expect(crossingBetween((x) => x - 2, 1, 2)).toBe(2);
  });
});

describe('crossingNear', () => {
  const inside = [1, 2, 3, 4];

  test('a crossing inside the range comes first, the lowest of several', () => {
    expect(crossingNear((x) => (x - 2.5) * (x - 3.5), inside)).toBeCloseTo(2.5, 14);
    expect(crossingNear((x) => x - 3, inside)).toBe(3);
  });

  test('else the nearest outside, on either side', () => {
    expect(crossingNear((x) => x - 7, inside)).toBeCloseTo(7, 13);
    expect(crossingNear((x) => x - 0.2, inside)).toBeCloseTo(0.2, 14);
    expect(crossingNear((x) => (x - 4.5) * (x + 5), inside)).toBeCloseTo(4.5, 13);
    expect(crossingNear((x) => (x - 9) * (x - 0.5), inside)).toBeCloseTo(0.5, 14);
  });

  test('towards zero the steps shrink: a root many decades below the readings is found', () => {
    expect((crossingNear((x) => Math.log(x / 1e-9), inside) ?? 0) / 1e-9).toBeCloseTo(1, 10);
    expect((crossingNear((x) => Math.log(-x / 1e-9), [-4, -3, -2]) ?? 0) / -1e-9).toBeCloseTo(1, 10);
  });

  test('none where there is none, or beyond where the function ceases to exist', () => {
    expect(crossingNear((x) => x * x + 1, inside)).toBeNull();
    expect(crossingNear((x) => (x > 5 ? Number.NaN : 10 - x), inside)).toBeNull();
    expect(crossingNear((x) => 1 / (x - 6), inside)).toBeNull();
  });

  test('a gap among the readings does not hide a crossing after it; outside it ends the walk', () => {
    const gap = (x: number): number => (x > 1.5 && x < 2.5 ? Number.NaN : 3.5 - x);
    expect(crossingAlong(gap, [1, 2, 3, 4], true)).toBeCloseTo(3.5, 14);
    expect(crossingAlong(gap, [1, 2, 3, 4])).toBeNull();
    const pole = (x: number): number => (x < 2 ? 1 / (x - 2) : x - 3.25);
    expect(crossingAlong(pole, [1, 2.5, 3, 4], true)).toBeCloseTo(3.25, 14);
  });
});

describe('where to look outside a range', () => {
  test('the points lead away from it, each further than the one before', () => {
    for (const [from, to, side] of [
      [1, 4, 'above'],
      [1, 4, 'below'],
      [-4, -1, 'above'],
      [0, 0, 'below'],
      [2, 2, 'above'],
    ] as const) {
      const points = outward(from, to, side);
      const sign = side === 'above' ? 1 : -1;
      const edge = side === 'above' ? to : from;
      expect(sign * ((points[0] ?? 0) - edge)).toBeGreaterThan(0);
      expect(points.every((x, i) => i === 0 || sign * (x - (points[i - 1] ?? 0)) >= 0)).toBe(true);
      expect(Math.abs((points.at(-1) ?? 0) - edge)).toBeGreaterThan(1e8);
    }
    expect(outward(1, 4, 'below').filter((x) => x > 0 && x < 1e-6)).not.toHaveLength(0);
  });
});

describe('leavingAt', () => {
  test('the first zero in the direction of the step, however small or large the step', () => {
    for (const step of [1e-6, 0.3, 1, 50]) {
      expect(leavingAt((x) => x - 10, 2, step)).toBeCloseTo(10, 12);
      expect(leavingAt((x) => -x - 10, 2, -step)).toBeCloseTo(-10, 12);
    }
  });

  test('none at the end of the domain, or where it stays negative for ever', () => {
    expect(leavingAt((x) => (x < 3 ? -1 : Number.NaN), 0, 1)).toBeNull();
    expect(leavingAt(() => -1, 0, 1)).toBeNull();
  });

  test('a zero close before the end of the domain is found', () => {
    expect(leavingAt((x) => (x < 3 ? x - 2.999 : Number.NaN), 0, 1)).toBeCloseTo(2.999, 12);
  });
});
