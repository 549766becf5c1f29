import { Problem } from '../problem.ts';
import { approximateBytes } from './approximateBytes.ts';

/** Where the one store of a page lives, for every script on it. */
const PLACE = Symbol.for('tautline.cache');
/** Changes whenever the shape of what is stored does: scripts of another shape keep their own store. */
const VERSION = 1;

export interface CacheLimits {
  readonly entries: number;
  /** Approximate, as `approximateBytes` counts. */
  readonly bytes: number;
}

const pageLimits: CacheLimits = { entries: 4000, bytes: 96 * 2 ** 20 };

type Outcome = { readonly value: unknown } | { readonly problem: Problem };

interface Entry {
  readonly outcome: Outcome;
  readonly bytes: number;
}

interface Store {
  readonly version: number;
  /** Least recently used first. */
  readonly entries: Map<string, Entry>;
  bytes: number;
  serial: number;
}

export interface Cache {
  /** The value for a key, computed at most once while it stays in the cache; a Problem is remembered as well. */
  remember<T>(key: string, compute: () => T): T;
  /** The value for a key if it is in the cache. */
  find(key: string): unknown;
  /** Puts a value in the place of whatever the key held. */
  replace(key: string, value: unknown): void;
  /** A number that this store has not given before. */
  nextSerial(): number;
  clear(): void;
  readonly size: { readonly entries: number; readonly bytes: number };
}

function createStore(): Store {
  return { version: VERSION, entries: new Map(), bytes: 0, serial: 0 };
}

/** The store that all scripts of the page share. */
function pageStore(): Store {
  // globalThis has no typed slot for our symbol; what another script left there is checked before use.
  const page = globalThis as { [PLACE]?: Partial<Store> };
  const found = page[PLACE];
  if (found === undefined) {
    const store = createStore();
    Object.defineProperty(globalThis, PLACE, { value: store, configurable: true });
    return store;
  }
  // The version says that the shape is ours.
  return found.version === VERSION ? (found as Store) : createStore();
}

/**
 * A cache bounded in entries and in approximate bytes; the least recently used go first. A value too large for the
 * bound is handed over without being kept. Keys must determine the value: nothing is ever recomputed for a known key.
 */
export function createCache(limits: CacheLimits, store: Store = createStore()): Cache {
  const keep = (key: string, outcome: Outcome): void => {
    const old = store.entries.get(key);
    if (old !== undefined) {
      store.entries.delete(key);
      store.bytes -= old.bytes;
    }
    const bytes =
      2 * key.length + 100 + approximateBytes('value' in outcome ? outcome.value : outcome.problem.message);
    if (bytes > limits.bytes) return;
    store.entries.set(key, { outcome, bytes });
    store.bytes += bytes;
    for (const [oldest, entry] of store.entries) {
      if (store.entries.size <= limits.entries && store.bytes <= limits.bytes) break;
      store.entries.delete(oldest);
      store.bytes -= entry.bytes;
    }
  };
  const touch = (key: string): Outcome | undefined => {
    const entry = store.entries.get(key);
    if (entry === undefined) return undefined;
    store.entries.delete(key);
    store.entries.set(key, entry);
    return entry.outcome;
  };
  return {
    remember<T>(key: string, compute: () => T): T {
      const known = touch(key);
      if (known !== undefined) {
        if ('problem' in known) throw ownProblem(known.problem);
        // The key names the kind of value, so what was stored under it is a T.
        return known.value as T;
      }
      try {
        const value = compute();
        keep(key, { value });
        return value;
      } catch (error) {
        if (error instanceof Problem) keep(key, { problem: error });
        throw error;
      }
    },
    find(key) {
      const known = touch(key);
      return known !== undefined && 'value' in known ? known.value : undefined;
    },
    replace: (key, value) => keep(key, { value }),
    nextSerial: () => ++store.serial,
    clear() {
      store.entries.clear();
      store.bytes = 0;
    },
    get size() {
      return { entries: store.entries.size, bytes: store.bytes };
    },
  };
}

/** The same problem as an instance of this script's class, for it may have been thrown by another script's. */
function ownProblem(problem: Problem): Problem {
  const { code, argument, message, position, cellError } = problem;
  return new Problem(code, argument, message, {
    ...(position === undefined ? {} : { position }),
    ...(cellError === undefined ? {} : { cellError }),
  });
}

/** The cache that sheet functions and the side panel share. */
export const sharedCache: Cache = createCache(pageLimits, pageStore());
