import { formatRect, MAX_COLUMNS, MAX_ROWS, quoteSheet, type Rect } from '../../grid/address.ts';
import type { Book } from '../book.ts';
import { accessDenied, invalidArgument, itemNotFound } from '../hostError.ts';

/** A rectangle on a sheet: what a range proxy stands for. */
export interface Place {
  readonly book: Book;
  readonly sheet: string;
  readonly rect: Rect;
}

export function sheetName(book: Book, id: string): string {
  const sheet = book.grid.sheets().find((one) => one.id === id);
  if (!sheet) throw itemNotFound('Worksheet');
  return sheet.name;
}

/** The sheet of that name (in any case) or id. */
export function findSheet(book: Book, key: string): string | null {
  const plain = key.toLowerCase();
  return book.grid.sheets().find((one) => one.id === key || one.name.toLowerCase() === plain)?.id ?? null;
}

export function addressOf(place: Place): string {
  return `${quoteSheet(sheetName(place.book, place.sheet))}!${formatRect(place.rect)}`;
}

export function rowCount(rect: Rect): number {
  return rect.bottom - rect.top + 1;
}

export function columnCount(rect: Rect): number {
  return rect.right - rect.left + 1;
}

export function isUnbounded(rect: Rect): boolean {
  return rowCount(rect) === MAX_ROWS || columnCount(rect) === MAX_COLUMNS;
}

/** A rectangle inside the sheet. @throws InvalidArgument when it leaves it */
export function inside(rect: Rect, where: string): Rect {
  const fits =
    rect.top >= 0 &&
    rect.left >= 0 &&
    rect.bottom >= rect.top &&
    rect.right >= rect.left &&
    rect.bottom < MAX_ROWS &&
    rect.right < MAX_COLUMNS;
  if (!fits) throw invalidArgument(where);
  return rect;
}

export function intersection(one: Rect, other: Rect): Rect | null {
  const rect = {
    top: Math.max(one.top, other.top),
    left: Math.max(one.left, other.left),
    bottom: Math.min(one.bottom, other.bottom),
    right: Math.min(one.right, other.right),
  };
  return rect.top <= rect.bottom && rect.left <= rect.right ? rect : null;
}

export function bounding(one: Rect, other: Rect): Rect {
  return {
    top: Math.min(one.top, other.top),
    left: Math.min(one.left, other.left),
    bottom: Math.max(one.bottom, other.bottom),
    right: Math.max(one.right, other.right),
  };
}

/** @throws AccessDenied when the sheet is protected */
export function checkWritable(book: Book, sheet: string, where: string): void {
  sheetName(book, sheet);
  if (book.protectedSheets.has(sheet)) throw accessDenied(where);
}
