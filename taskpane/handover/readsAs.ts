import { parseBlock } from '../host/address.ts';
import type { Choice, Place } from '../state/choice.ts';

/** What a hand-over was written for, to know whether the panel still shows the same. */
export interface WrittenFor {
  /** Law, known constants, options and where the readings begin. */
  readonly key: string;
  /** The last row of the readings then, and the last that its formulas read. */
  readonly rows: readonly [last: number, room: number];
}

/** @param roomy the choice as the formulas read it, with room for readings to come */
export function writtenFor(choice: Choice, roomy: Choice): WrittenFor {
  return { key: keyOf(choice), rows: [lastRow(choice.y), lastRow(roomy.y)] };
}

/** Whether the panel's choice is what a hand-over reads, be it that readings were added within its room. */
export function readsAs({ key, rows: [last, room] }: WrittenFor, choice: Choice): boolean {
  const now = lastRow(choice.y);
  return key === keyOf(choice) && last <= now && now <= room;
}

function keyOf({ x, y, law, known, options }: Choice): string {
  return JSON.stringify([start(x), start(y), law, known, [...options]]);
}

function start({ sheet, address }: Place): string {
  return `${sheet}!${address.split(':')[0] ?? ''}`;
}

function lastRow({ address }: Place): number {
  return parseBlock(address)?.bottom ?? -1;
}
