/** How deep a value is looked into: a fit's columns lie three levels down. */
const DEPTH = 5;

/** Roughly how much memory a value holds: its typed arrays and text exactly, 32 bytes for every other part. */
export function approximateBytes(value: unknown): number {
  return weigh(value, DEPTH, new Set());
}

/** Things of so many parts are few and shared, as laws are: they are weighed once. */
const MANY_PARTS = 20;
const manyParts = new WeakMap<object, number>();

function weigh(value: unknown, depth: number, seen: Set<unknown>): number {
  if (typeof value === 'string') return 2 * value.length + 16;
  if (typeof value !== 'object' || value === null) return 8;
  if (seen.has(value)) return 8;
  const known = manyParts.get(value);
  if (known !== undefined) return known;
  const before = seen.size;
  seen.add(value);
  if (ArrayBuffer.isView(value)) return value.byteLength + 64;
  if (depth === 0) return 32;
  const bytes = weighParts(value, depth, seen);
  // What is weighed itself may still grow; what it is made of does not.
  if (depth < DEPTH && seen.size - before > MANY_PARTS) manyParts.set(value, bytes);
  return bytes;
}

function weighParts(value: object, depth: number, seen: Set<unknown>): number {
  let bytes = 32;
  if (Array.isArray(value)) {
    // Long lists are of one kind: the first hundred speak for the rest.
    const looked = Math.min(value.length, 100);
    for (let i = 0; i < looked; i++) bytes += weigh(value[i], depth - 1, seen);
    return looked === 0 ? bytes : bytes * (value.length / looked);
  }
  if (value instanceof Map) {
    for (const [key, part] of value) bytes += weigh(key, depth - 1, seen) + weigh(part, depth - 1, seen);
    return bytes;
  }
  for (const part of Object.values(value)) bytes += weigh(part, depth - 1, seen);
  return bytes;
}
