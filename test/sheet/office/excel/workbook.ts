import type { Book } from '../book.ts';
import { HostError } from '../hostError.ts';
import type { Definition } from '../remote.ts';
import { application } from './application.ts';
import { namedItems } from './names.ts';
import type { Place } from './place.ts';
import { range } from './range.ts';
import { rangeAreas } from './rangeAreas.ts';
import { settingCollection } from './settings.ts';
import { tableCollection } from './table.ts';
import { worksheetCollection } from './worksheet.ts';

const selected = (book: Book): Place[] => {
  const { sheet, rects } = book.grid.selection();
  return rects.map((rect) => ({ book, sheet, rect }));
};

export const workbook: Definition<{ book: Book }> = {
  type: 'Workbook',
  properties: {
    name: { get: () => 'Demo.xlsx' },
    isDirty: { get: () => true },
    readOnly: { get: () => false },
  },
  links: {
    worksheets: (self) => self.child(worksheetCollection, (target) => target, false),
    names: (self) => self.child(namedItems, ({ book }) => ({ book, sheet: null }), false),
    tables: (self) => self.child(tableCollection, ({ book }) => ({ book, sheet: null }), false),
    settings: (self) => self.child(settingCollection, (target) => target, false),
    application: (self) => self.child(application, (target) => target, false),
  },
  methods: {
    getSelectedRange: (self) =>
      self.child(range, ({ book }): Place => {
        const [place, ...more] = selected(book);
        if (!place || more.length > 0) {
          throw new HostError(
            'InvalidSelection',
            'The current selection is invalid for this operation: it has several areas.',
            'Workbook.getSelectedRange',
          );
        }
        return place;
      }),
    getSelectedRanges: (self) => self.child(rangeAreas, ({ book }) => selected(book)),
    getActiveCell: (self) =>
      self.child(range, ({ book }): Place => {
        const last = selected(book).at(-1);
        if (!last) throw new HostError('InvalidSelection', 'Nothing is selected.', 'Workbook.getActiveCell');
        return { ...last, rect: { ...last.rect, bottom: last.rect.top, right: last.rect.left } };
      }),
  },
  events: {
    onSelectionChanged: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'selected') send({ type: 'SelectionChanged' });
      }),
  },
};
