import { parseAddress, type Rect } from '../../grid/address.ts';
import { invalidArgument } from '../hostError.ts';
import type { Property } from '../remote.ts';

export function asText(value: unknown, where: string): string {
  if (typeof value !== 'string') throw invalidArgument(where);
  return value;
}

export function asNumber(value: unknown, where: string): number {
  if (typeof value !== 'number' || !Number.isFinite(value)) throw invalidArgument(where);
  return value;
}

export function asInteger(value: unknown, where: string): number {
  const number = asNumber(value, where);
  if (!Number.isInteger(number)) throw invalidArgument(where);
  return number;
}

export function asBoolean(value: unknown, where: string): boolean {
  if (typeof value !== 'boolean') throw invalidArgument(where);
  return value;
}

/** Reads an address on one sheet. @throws InvalidArgument */
export function asRects(address: unknown, where: string): { sheet: string | null; rects: Rect[] } {
  const parsed = parseAddress(asText(address, where));
  if (!parsed) throw invalidArgument(where);
  return parsed;
}

/** Properties that the stand-in only remembers, with their initial values. */
export function remembered<T>(
  initial: Readonly<Record<string, unknown>>,
  bagOf: (target: T) => Record<string, unknown>,
): Record<string, Property<T>> {
  const entries = Object.entries(initial).map(([name, value]): [string, Property<T>] => [
    name,
    {
      get: (target) => bagOf(target)[name] ?? value,
      set: (target, next) => {
        bagOf(target)[name] = next;
      },
    },
  ]);
  return Object.fromEntries(entries);
}

export function readOnly<T>(get: (target: T) => unknown): Property<T> {
  return { get };
}

export const POINTS_PER_PIXEL = 0.75;
