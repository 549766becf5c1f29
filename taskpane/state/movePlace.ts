import { type Block, formatBlock, LAST_COLUMN, LAST_ROW, parseBlock } from '../host/address.ts';
import type { CellChange } from '../host/workbook.ts';
import type { Choice, Place, SpreadEntry } from './choice.ts';

/**
 * Where a place is after whole rows or columns came or went, as a formula's ranges would move.
 * @returns the same place when it stays; undefined when nothing of it is left
 */
export function movePlace(place: Place, change: CellChange): Place | undefined {
  const block = parseBlock(place.address);
  const changed = parseBlock(change.address);
  if (block === undefined || changed === undefined || change.sheet !== place.sheet) return place;
  const moved = moveBlock(block, changed, change.kind);
  if (moved === undefined) return undefined;
  const address = formatBlock(moved);
  return address === formatBlock(block) ? place : { sheet: place.sheet, address };
}

function moveBlock(block: Block, changed: Block, kind: CellChange['kind']): Block | undefined {
  const rows = kind === 'rowsInserted' || kind === 'rowsDeleted';
  if (!rows && kind !== 'columnsInserted' && kind !== 'columnsDeleted') return block;
  const [from, to, last]: [number, number, number] = rows
    ? [block.top, block.bottom, LAST_ROW]
    : [block.left, block.right, LAST_COLUMN];
  const [start, end] = rows ? [changed.top, changed.bottom] : [changed.left, changed.right];
  const span =
    kind === 'rowsInserted' || kind === 'columnsInserted'
      ? inserted(from, to, start, end - start + 1)
      : deleted(from, to, start, end);
  if (span === undefined || span[1] > last) return undefined;
  return rows ? { ...block, top: span[0], bottom: span[1] } : { ...block, left: span[0], right: span[1] };
}

function inserted(from: number, to: number, at: number, count: number): [number, number] {
  if (at <= from) return [from + count, to + count];
  return at <= to ? [from, to + count] : [from, to];
}

function deleted(from: number, to: number, start: number, end: number): [number, number] | undefined {
  if (start <= from && to <= end) return undefined;
  const before = (bound: number) => Math.max(0, Math.min(bound, end + 1) - start);
  const first = from - before(from);
  const gone = Math.max(0, Math.min(to, end) - Math.max(from, start) + 1);
  return [first, first + (to - from) - gone];
}

/** A choice whose places have moved with the sheet; the same choice when none has, undefined when readings are gone. */
export function moveChoice(choice: Choice, change: CellChange): Choice | undefined {
  const x = movePlace(choice.x, change);
  const y = movePlace(choice.y, change);
  if (x === undefined || y === undefined) return undefined;
  const spreadY = moveSpread(choice.spreadY, change);
  const spreadX = moveSpread(choice.spreadX, change);
  const same = x === choice.x && y === choice.y && spreadY === choice.spreadY && spreadX === choice.spreadX;
  return same ? choice : { ...choice, x, y, spreadY, spreadX };
}

function moveSpread(spread: SpreadEntry, change: CellChange): SpreadEntry {
  if (spread.kind === 'text') return spread;
  const place = movePlace(spread.place, change);
  if (place === undefined) return { kind: 'text', text: '' };
  return place === spread.place ? spread : { kind: 'range', place };
}

/** A choice whose sheet has another name now. */
export function renameSheet(choice: Choice, was: string, is: string): Choice {
  const place = (one: Place): Place => (one.sheet === was ? { ...one, sheet: is } : one);
  const spread = (one: SpreadEntry): SpreadEntry =>
    one.kind === 'range' ? { kind: 'range', place: place(one.place) } : one;
  return {
    ...choice,
    x: place(choice.x),
    y: place(choice.y),
    spreadY: spread(choice.spreadY),
    spreadX: spread(choice.spreadX),
  };
}
