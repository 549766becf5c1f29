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

/** Two 32-bit lanes over the words of the columns, multiplied and rotated with different odd constants. */
export function contentHash(columns: readonly Column[]): string {
  let a = 0x9e3779b9;
  let b = 0x85ebca6b;
  for (const column of columns) {
    const words = wordsOf(column);
    a ^= words.length;
    for (let i = 0; i < words.length; i++) {
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
 * share a key however the hash collides. Content that left the cache gets a new serial when it comes back.
 * @param kind what the columns are; the same content of another kind has another key
 * @param extra whatever else the key must stand for
 */
export function contentKey(cache: Cache, kind: string, columns: readonly Column[], extra = ''): string {
  const place = `${kind}|${columns.map((column) => column.length).join(',')}|${contentHash(columns)}|${extra}`;
  // Only this function stores under these places.
  const found = cache.find(place) as Content | undefined;
  if (found !== undefined) {
    const same = columns.every((column, index) => sameColumn(column, found.columns[index]));
    return same ? found.key : `${kind}#${cache.nextSerial()}`;
  }
  const key = `${kind}#${cache.nextSerial()}`;
  return cache.remember(place, (): Content => ({ columns, key })).key;
}
