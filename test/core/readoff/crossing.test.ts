import { describe, expect, test } from '@jest/globals';
import { crossingBetween } from '../../../core/readoff/crossing.ts';

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
