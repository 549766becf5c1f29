import type { Book } from '../book.ts';
import { itemNotFound } from '../hostError.ts';
import { type Definition, member } from '../remote.ts';
import { asText } from './arguments.ts';

interface SettingTarget {
  readonly book: Book;
  readonly key: string;
}

const setting: Definition<SettingTarget> = {
  type: 'Setting',
  properties: {
    key: { get: ({ key }) => key },
    value: {
      get: ({ book, key }) => structuredClone(book.settings.get(key)),
      set: ({ book, key }, value) => put(book, key, value),
    },
  },
  methods: {
    delete: (self) =>
      self.act('delete', ({ book, key }) => {
        book.settings.delete(key);
        book.keepSettings();
      }),
  },
};

/** A setting is kept as JSON text in the workbook: what JSON loses is lost. */
function put(book: Book, key: string, value: unknown): void {
  book.settings.set(key, JSON.parse(JSON.stringify(value ?? null)) as unknown);
  book.keepSettings();
}

const find = (book: Book, key: unknown): SettingTarget | null => {
  const text = asText(key, 'SettingCollection.getItem');
  return book.settings.has(text) ? { book, key: text } : null;
};

export const settingCollection: Definition<{ book: Book }> = {
  type: 'SettingCollection',
  items: {
    list: (self, { book }) =>
      [...book.settings.keys()].map((key) => member(self.context, setting, { book, key })),
  },
  methods: {
    add: (self, key, value) => {
      const copy: unknown = JSON.parse(JSON.stringify(value ?? null));
      return self.child(setting, ({ book }) => {
        const text = asText(key, 'SettingCollection.add');
        put(book, text, copy);
        return { book, key: text };
      });
    },
    getItem: (self, key) =>
      self.child(setting, ({ book }) => {
        const found = find(book, key);
        if (!found) throw itemNotFound('SettingCollection.getItem');
        return found;
      }),
    getItemOrNullObject: (self, key) => self.child(setting, ({ book }) => find(book, key)),
    getCount: (self) => self.ask('getCount', ({ book }) => book.settings.size),
  },
};
