import type { Book } from '../book.ts';
import { itemNotFound } from '../hostError.ts';
import { asRects } from './arguments.ts';
import { findSheet, type Place } from './place.ts';

/** The places that an address or a defined name gives, on a sheet unless it names another. @throws InvalidArgument, ItemNotFound */
export function placesOf(on: { book: Book; sheet: string }, address: string, where: string): Place[] {
  const { book } = on;
  const named = book.grid.names().find((one) => one.name.toLowerCase() === address.toLowerCase());
  const { sheet, rects } = asRects(named ? named.formula.replace(/^=/, '') : address, where);
  const id = sheet === null ? on.sheet : findSheet(book, sheet);
  if (id === null) throw itemNotFound(where);
  return rects.map((rect) => ({ book, sheet: id, rect }));
}
