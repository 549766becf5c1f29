import { describe, expect, test } from '@jest/globals';
import { approximateBytes } from '../../../core/cache/approximateBytes.ts';
import { type Cache, createCache } from '../../../core/cache/cache.ts';
import { contentKey } from '../../../core/cache/contentKey.ts';
import { rememberReadings } from '../../../core/cache/rememberReadings.ts';
import { Problem } from '../../../core/problem.ts';
import type { Cell } from '../../../core/readings/readings.ts';

const roomy = (): Cache => createCache({ entries: 100, bytes: 2 ** 24 });

describe('createCache', () => {
  test('computes a key once', () => {
    const cache = roomy();
    let runs = 0;
    const compute = () => {
      runs++;
      return { answer: 42 };
    };
    expect(cache.remember('a', compute)).toBe(cache.remember('a', compute));
    expect(runs).toBe(1);
  });

  test('remembers a Problem with all it says, but no other error', () => {
    const cache = roomy();
    let runs = 0;
    const stop = () => {
      runs++;
      throw new Problem('domain', 'y', 'Reading 3 …', { position: 3 });
    };
    const bug = () => {
      runs++;
      throw new TypeError('bug');
    };
    for (let i = 0; i < 3; i++) expect(() => cache.remember('p', stop)).toThrow(Problem);
    expect(runs).toBe(1);
    try {
      cache.remember('p', stop);
    } catch (error) {
      expect(error).toMatchObject({ code: 'domain', argument: 'y', message: 'Reading 3 …', position: 3 });
    }
    for (let i = 0; i < 2; i++) expect(() => cache.remember('b', bug)).toThrow(TypeError);
    expect(runs).toBe(3);
  });

  test('the least recently used goes first', () => {
    const cache = createCache({ entries: 2, bytes: 2 ** 20 });
    cache.remember('a', () => 1);
    cache.remember('b', () => 2);
    cache.remember('a', () => 3);
    cache.remember('c', () => 4);
    expect([cache.find('a'), cache.find('b'), cache.find('c')]).toEqual([1, undefined, 4]);
  });

  test('stays within its bytes, and hands over what is too large for them', () => {
    const cache = createCache({ entries: 1000, bytes: 100_000 });
    for (let i = 0; i < 50; i++) {
      cache.remember(`column ${i}`, () => new Float64Array(1000));
      expect(cache.size.bytes).toBeLessThanOrEqual(100_000);
    }
    expect(cache.size.entries).toBe(12);
    const large = new Float64Array(100_000);
    expect(cache.remember('large', () => large)).toBe(large);
    expect(cache.find('large')).toBeUndefined();
    cache.clear();
    expect(cache.size).toEqual({ entries: 0, bytes: 0 });
  });

  test('bytes count typed arrays in full, and a ring once', () => {
    const ring: { column: Float64Array; self?: unknown } = { column: new Float64Array(500) };
    ring.self = ring;
    expect(approximateBytes(ring)).toBeGreaterThanOrEqual(4000);
    expect(approximateBytes(ring)).toBeLessThan(4300);
  });
});

describe('contentKey', () => {
  test('equal content, one key; any other bit, another', () => {
    const cache = roomy();
    const key = contentKey(cache, 'k', [Float64Array.of(1, 2, 3)]);
    expect(contentKey(cache, 'k', [Float64Array.of(1, 2, 3)])).toBe(key);
    const others = [
      contentKey(cache, 'k', [Float64Array.of(1, 2, 3 + 4e-16)]),
      contentKey(cache, 'k', [Float64Array.of(1, 2), Float64Array.of(3)]),
      contentKey(cache, 'k', [Float64Array.of(2, 1, 3)]),
      contentKey(cache, 'k', [Float64Array.of(1, 2, 3)], 'x'),
      contentKey(cache, 'other', [Float64Array.of(1, 2, 3)]),
    ];
    expect(new Set([key, ...others]).size).toBe(6);
  });

  test('contents that collide in the hash keep different keys', () => {
    const cache = roomy();
    const first = contentKey(cache, 'k', [Float64Array.of(7)]);
    // The same place holding other columns is what a collision looks like.
    const colliding: Cache = { ...cache, find: () => ({ columns: [Float64Array.of(8)], key: first }) };
    expect(contentKey(colliding, 'k', [Float64Array.of(7)])).not.toBe(first);
  });
});

describe('rememberReadings', () => {
  const column = (...cells: Cell[]): Cell[][] => cells.map((cell) => [cell]);

  test('the same cells in new arrays are the same readings', () => {
    const cache = roomy();
    const first = rememberReadings(column(1, null, 3, 4), column(1, 2, 'lost', { error: '#N/A' }), {}, cache);
    const again = rememberReadings(column(1, null, 3, 4), column(1, 2, 'lost', { error: '#N/A' }), {}, cache);
    expect(again.readings).toBe(first.readings);
    expect(again.key).toBe(first.key);
  });

  test.each([
    ['a number', column(1, 2.5, 3), column(1, 2, 'lost')],
    ['a text', column(1, 2, 3), column(1, 2, 'gone')],
    ['a blank', column(1, 2, 3), column(1, null, 'lost')],
    ['a length', column(1, 2, 3, 4), column(1, 2, 'lost', 4)],
  ])('%s that changes gives other readings', (_what, x, y) => {
    const cache = roomy();
    const first = rememberReadings(column(1, 2, 3), column(1, 2, 'lost'), {}, cache);
    expect(rememberReadings(x, y, {}, cache).key).not.toBe(first.key);
    expect(rememberReadings(column(1, 2, 3), column(1, 2, 'lost'), {}, cache).key).toBe(first.key);
  });

  test('what may be a blank is part of the content', () => {
    const cache = roomy();
    const x = column(1, 2, 0);
    const y = column(5, 6, 0);
    const stated = rememberReadings(x, y, {}, cache);
    const guessed = rememberReadings(x, y, { blanks: 'maybeZero' }, cache);
    const asked = rememberReadings(x, y, { blankPairs: Uint8Array.of(0, 0, 0) }, cache);
    expect(guessed.key).not.toBe(stated.key);
    expect(asked.readings.y).toEqual(stated.readings.y);
  });

  test('older readings are found again by their content', () => {
    const cache = roomy();
    const key = rememberReadings(column(1, 2), column(3, 4), {}, cache).key;
    for (let i = 0; i < 20; i++) rememberReadings(column(1, i + 10), column(3, 4), {}, cache);
    expect(rememberReadings(column(1, 2), column(3, 4), {}, cache).key).toBe(key);
  });
});
