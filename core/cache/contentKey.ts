import type { Cache } from './cache.ts';

export type Column = Float64Array | Int32Array;

interface Content {
  readonly columns: readonly Column[];
  readonly key: string;
}

/** The 32-bit words of a column. */
function wordsOf(column: Column): Uint32Array {
  return new Uint32Array(column.buffer, column.byteOffset, column.byteLength >>> 2);
}

/** Longer columns are hashed by about this many of their words, evenly spread. */
const HASHED_WORDS = 4096;

/** Two 32-bit lanes over the words of the columns, multiplied and rotated with different odd constants. */
export function contentHash(columns: readonly Column[]): string {
  let a = 0x9e3779b9;
  let b = 0x85ebca6b;
  for (const column of columns) {
    const words = wordsOf(column);
    a ^= words.length;
    // An odd step meets the high and the low words of the numbers alike.
    const step = Math.floor(words.length / HASHED_WORDS) | 1;
    for (let i = 0; i < words.length; i += step) {
      const word = words[i] ?? 0;
      a = Math.imul(a ^ word, 0x01000193);
      a ^= a >>> 15;
      b = Math.imul(b ^ word, 0xcc9e2d51);
      b = (b << 13) | (b >>> 19);
    }
  }
  return `${(a >>> 0).toString(36)}.${(b >>> 0).toString(36)}`;
}

function sameColumn(a: Column, b: Column | undefined): boolean {
  if (b === undefined || a.length !== b.length) return false;
  const wordsA = wordsOf(a);
  const wordsB = wordsOf(b);
  for (let i = 0; i < wordsA.length; i++) if (wordsA[i] !== wordsB[i]) return false;
  return true;
}

/**
 * A short key that stands for the content of some columns, bit for bit. The hash only finds the candidate: the key is
 * a serial number, given again only to columns that were compared in full and found equal, so two contents never
 * share a key however the hash collides, and a cheap hash is enough. Content that left the cache, or whose place
 * another content took, gets a new serial when it comes back.
 * @param kind what the columns are; the same content of another kind has another key
 * @param extra whatever else the key must stand for
 */
export function contentKey(cache: Cache, kind: string, columns: readonly Column[], extra = ''): string {
  const place = `${kind}|${columns.map((column) => column.length).join(',')}|${contentHash(columns)}|${extra}`;
  // Only this function stores under these places.
  const found = cache.find(place) as Content | undefined;
  if (found?.columns.every((column, index) => sameColumn(column, columns[index]))) return found.key;
  const key = `${kind}#${cache.nextSerial()}`;
  cache.replace(place, { columns, key } satisfies Content);
  return key;
}
