import { formatRect, quoteSheet } from '../../grid/address.ts';
import type { Book } from '../book.ts';
import { HostError, invalidArgument, itemNotFound } from '../hostError.ts';
import { type Definition, member, remoteBehind } from '../remote.ts';
import { asText } from './arguments.ts';
import { sheetName } from './place.ts';
import { placesOf } from './placesOf.ts';
import { range, rangePlace } from './range.ts';

interface NameTarget {
  readonly book: Book;
  readonly name: string;
}

/** The names of a workbook (or those seen from a sheet: the stand-in keeps all names in the workbook). */
export interface NamesTarget {
  readonly book: Book;
  readonly sheet: string | null;
}

const formulaOf = ({ book, name }: NameTarget): string => {
  const found = book.grid.names().find((one) => one.name.toLowerCase() === name.toLowerCase());
  if (!found) throw itemNotFound('NamedItem');
  return `=${found.formula.replace(/^=/, '')}`;
};

const placeOf = (target: NameTarget) =>
  placesOf(
    { book: target.book, sheet: target.book.grid.activeSheet() },
    formulaOf(target).slice(1),
    'NamedItem',
  )[0];

const namedItem: Definition<NameTarget> = {
  type: 'NamedItem',
  properties: {
    name: { get: ({ name }) => name },
    formula: { get: formulaOf },
    type: { get: () => 'Range' },
    value: { get: (target) => formulaOf(target).slice(1) },
    // Hidden or not, the stand-in shows no list of names.
    visible: { get: () => true, set: () => undefined },
    scope: { get: () => 'Workbook' },
  },
  methods: {
    getRange: (self) => self.child(range, (target) => placeOf(target) ?? notThere('NamedItem.getRange')),
    getRangeOrNullObject: (self) => self.child(range, (target) => placeOf(target) ?? null),
    delete: (self) => self.act('delete', ({ book, name }) => book.grid.deleteName(name), true),
  },
};

function notThere(where: string): never {
  throw itemNotFound(where);
}

const find = ({ book }: NamesTarget, key: unknown): NameTarget | null => {
  const wanted = asText(key, 'NamedItemCollection.getItem').toLowerCase();
  const found = book.grid.names().find((one) => one.name.toLowerCase() === wanted);
  return found ? { book, name: found.name } : null;
};

export const namedItems: Definition<NamesTarget> = {
  type: 'NamedItemCollection',
  items: {
    list: (self, { book }) =>
      book.grid.names().map(({ name }) => member(self.context, namedItem, { book, name })),
  },
  methods: {
    getItem: (self, key) =>
      self.child(namedItem, (target) => find(target, key) ?? notThere('NamedItemCollection')),
    getItemOrNullObject: (self, key) => self.child(namedItem, (target) => find(target, key)),
    getCount: (self) => self.ask('getCount', ({ book }) => book.grid.names().length),
    add: (self, name, reference) => {
      const behind = remoteBehind(reference);
      return self.child(namedItem, (target) => {
        const text = asText(name, 'NamedItemCollection.add');
        if (!/^[A-Za-z_\\][\w.\\]*$/.test(text)) throw invalidArgument('NamedItemCollection.add');
        if (find(target, text)) throw new HostError('ItemAlreadyExists', 'A name exists already.');
        target.book.grid.addName(
          text,
          behind ? absolute(rangePlace(behind)) : asText(reference, 'reference'),
        );
        return { book: target.book, name: text };
      });
    },
  },
};

function absolute(place: { book: Book; sheet: string; rect: Parameters<typeof formatRect>[0] }): string {
  const fixed = formatRect(place.rect).replace(/([A-Z]+)(\d+)/g, '$$$1$$$2');
  return `${quoteSheet(sheetName(place.book, place.sheet))}!${fixed}`;
}
