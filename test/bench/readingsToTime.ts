import type { Cells } from '../hostCalls.ts';

/** A generator of numbers in [0, 1) that gives the same ones in every run (the "mulberry" recipe, public domain). */
export function seeded(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Readings of an exponential decay with 2 % scatter, one column each. */
export function decayReadings(count: number): { readonly x: Cells; readonly y: Cells } {
  const random = seeded(count);
  const x: Cells = [];
  const y: Cells = [];
  for (let i = 0; i < count; i++) {
    const t = 0.1 + (10 * i) / count;
    x.push([t]);
    y.push([1.9 * Math.exp(-0.3 * t) * (1 + 0.04 * (random() - 0.5))]);
  }
  return { x, y };
}

let typed = 0;

/**
 * Types one reading anew, as a person does between two calculations: no two calls then see the same readings, and
 * nothing is answered from memory.
 */
export function typeReading(y: Cells): void {
  typed = (typed + 1) % 1e6;
  const row = y[y.length >> 1];
  if (row) row[0] = 0.5 + typed * 1e-7;
}
