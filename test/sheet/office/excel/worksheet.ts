import { formatRect, MAX_COLUMNS, MAX_ROWS } from '../../grid/address.ts';
import type { GridEvent } from '../../grid/grid.ts';
import type { Book } from '../book.ts';
import { HostError, invalidArgument, itemNotFound } from '../hostError.ts';
import { contextBehind, type Definition, member, remoteBehind } from '../remote.ts';
import type { RequestContext } from '../requestContext.ts';
import { asInteger, asText, remembered } from './arguments.ts';
import { chartCollection } from './chartCollection.ts';
import { namedItems } from './names.ts';
import { findSheet, inside, type Place, sheetName } from './place.ts';
import { placesOf } from './placesOf.ts';
import { range } from './range.ts';
import { rangeAreas } from './rangeAreas.ts';
import { shapeCollection } from './shapes.ts';
import { tableCollection } from './table.ts';

/** What a worksheet proxy stands for. */
export interface SheetTarget {
  readonly book: Book;
  readonly sheet: string;
}

const whole = (target: SheetTarget): Place => ({
  ...target,
  rect: { top: 0, left: 0, bottom: MAX_ROWS - 1, right: MAX_COLUMNS - 1 },
});

/** The used part of a sheet; an empty sheet's is A1, as on a host. */
function used(target: SheetTarget): Place | null {
  const rect = target.book.grid.usedRect(target.sheet);
  return rect && { ...target, rect };
}

const bag = (name: string) => (target: SheetTarget) => target.book.bag(`${name}/${target.sheet}`);

const protection: Definition<SheetTarget> = {
  type: 'WorksheetProtection',
  properties: { protected: { get: ({ book, sheet }) => book.protectedSheets.has(sheet) } },
  methods: {
    protect: (self) => self.act('protect', ({ book, sheet }) => void book.protectedSheets.add(sheet)),
    unprotect: (self) => self.act('unprotect', ({ book, sheet }) => void book.protectedSheets.delete(sheet)),
  },
};

const freezePanes: Definition<SheetTarget> = {
  type: 'WorksheetFreezePanes',
  methods: {
    freezeRows: (self, count = 1) =>
      self.act('freezeRows', ({ book, sheet }) =>
        book.grid.freezeRows(sheet, asInteger(count, 'freezeRows')),
      ),
    freezeColumns: (self, count = 1) =>
      self.act('freezeColumns', ({ book, sheet }) =>
        book.grid.freezeColumns(sheet, asInteger(count, 'freezeColumns')),
      ),
    unfreeze: (self) => self.act('unfreeze', ({ book, sheet }) => book.grid.freezeRows(sheet, 0)),
  },
};

const pageLayout: Definition<SheetTarget> = {
  type: 'PageLayout',
  properties: remembered(
    {
      orientation: 'Portrait',
      paperSize: 'A4',
      zoom: null,
      centerHorizontally: false,
      centerVertically: false,
      printGridlines: false,
      printHeadings: false,
      blackAndWhite: false,
      leftMargin: 50,
      rightMargin: 50,
      topMargin: 54,
      bottomMargin: 54,
    },
    bag('pageLayout'),
  ),
  methods: {
    setPrintArea: (self, area) =>
      self.act('setPrintArea', (target) => {
        const behind = remoteBehind(area);
        const rect = behind
          ? (behind.target() as Place).rect
          : placesOf(target, String(area), 'setPrintArea')[0]?.rect;
        bag('pageLayout')(target)['printArea'] = rect && formatRect(rect);
      }),
  },
};

export const worksheet: Definition<SheetTarget> = {
  type: 'Worksheet',
  properties: {
    id: { get: ({ sheet, book }) => sheetName(book, sheet) && sheet },
    name: {
      get: ({ book, sheet }) => sheetName(book, sheet),
      set: ({ book, sheet }, name) => book.grid.renameSheet(sheet, checkedName(book, name, sheet)),
    },
    position: {
      get: ({ book, sheet }) => book.grid.sheets().findIndex((one) => one.id === sheet),
      set: () => {
        throw new HostError('NotImplemented', 'the stand-in does not move sheets');
      },
    },
    visibility: { get: ({ book, sheet }) => (hidden(book, sheet) ? 'Hidden' : 'Visible') },
    showGridlines: {
      get: (target) => bag('view')(target)['gridlines'] ?? true,
      set: (target, shown) => {
        bag('view')(target)['gridlines'] = shown;
        target.book.grid.showGridlines(target.sheet, shown === true);
      },
    },
    ...remembered<SheetTarget>({ tabColor: '', showHeadings: true, standardWidth: 48 }, bag('view')),
  },
  links: {
    charts: (self) => self.child(chartCollection, (target) => target, false),
    tables: (self) => self.child(tableCollection, ({ book, sheet }) => ({ book, sheet }), false),
    shapes: (self) => self.child(shapeCollection, (target) => target, false),
    names: (self) => self.child(namedItems, ({ book, sheet }) => ({ book, sheet }), false),
    protection: (self) => self.child(protection, (target) => target, false),
    freezePanes: (self) => self.child(freezePanes, (target) => target, false),
    pageLayout: (self) => self.child(pageLayout, (target) => target, false),
  },
  methods: {
    getRange: (self, address) =>
      self.child(range, (target): Place => {
        sheetName(target.book, target.sheet);
        if (address === undefined || address === null || address === '') return whole(target);
        const places = placesOf(target, asText(address, 'Worksheet.getRange'), 'Worksheet.getRange');
        const [place] = places;
        if (!place || places.length > 1) throw invalidArgument('Worksheet.getRange');
        return place;
      }),
    getRanges: (self, address) =>
      self.child(rangeAreas, (target) =>
        placesOf(target, asText(address, 'getRanges'), 'Worksheet.getRanges'),
      ),
    getRangeByIndexes: (self, row, column, rows, columns) =>
      self.child(range, (target): Place => {
        const where = 'Worksheet.getRangeByIndexes';
        const [top, left] = [asInteger(row, where), asInteger(column, where)];
        const [bottom, right] = [top + asInteger(rows, where) - 1, left + asInteger(columns, where) - 1];
        return { ...target, rect: inside({ top, left, bottom, right }, where) };
      }),
    getCell: (self, row, column) =>
      self.child(range, (target): Place => {
        const [top, left] = [asInteger(row, 'Worksheet.getCell'), asInteger(column, 'Worksheet.getCell')];
        return { ...target, rect: inside({ top, left, bottom: top, right: left }, 'Worksheet.getCell') };
      }),
    getUsedRange: (self) =>
      self.child(
        range,
        (target): Place => used(target) ?? { ...target, rect: { top: 0, left: 0, bottom: 0, right: 0 } },
      ),
    getUsedRangeOrNullObject: (self) => self.child(range, used),
    activate: (self) => self.act('activate', ({ book, sheet }) => book.grid.activateSheet(sheet)),
    delete: (self) =>
      self.act(
        'delete',
        ({ book, sheet }) => {
          sheetName(book, sheet);
          if (book.grid.sheets().length === 1)
            throw new HostError('InvalidOperation', 'A workbook keeps one sheet.');
          book.grid.deleteSheet(sheet);
        },
        true,
      ),
    calculate: (self) => self.act('calculate', ({ book }) => book.grid.recalculate(), true),
    getNextOrNullObject: (self) => self.child(worksheet, (target) => neighbour(target, 1)),
    getPreviousOrNullObject: (self) => self.child(worksheet, (target) => neighbour(target, -1)),
  },
  events: {
    onChanged: (self, target, send) =>
      target.book.grid.listen((event) => {
        if ((event.type === 'edited' || event.type === 'moved') && event.sheet === target.sheet)
          send(changedEvent(self.context, event));
      }),
    onSelectionChanged: (_, target, send) =>
      target.book.grid.listen((event) => {
        if (event.type === 'selected' && event.selection.sheet === target.sheet) send(selectionEvent(event));
      }),
    onActivated: (_, target, send) =>
      target.book.grid.listen((event) => {
        if (event.type === 'activated' && event.sheet === target.sheet) {
          send({ type: 'WorksheetActivated', worksheetId: event.sheet });
        }
      }),
    onDeactivated: (_, target, send) =>
      target.book.grid.listen((event) => {
        if (event.type === 'activated' && event.previous === target.sheet) {
          send({ type: 'WorksheetDeactivated', worksheetId: target.sheet });
        }
      }),
    onCalculated: (_, target, send) =>
      target.book.grid.listen((event) => {
        if (event.type === 'calculated')
          send({ type: 'WorksheetCalculated', worksheetId: target.sheet, address: '' });
      }),
  },
};

function hidden(book: Book, sheet: string): boolean {
  return book.grid.sheets().some((one) => one.id === sheet && one.hidden);
}

function neighbour({ book, sheet }: SheetTarget, step: number): SheetTarget | null {
  const sheets = book.grid.sheets();
  const at = sheets.findIndex((one) => one.id === sheet);
  const next = sheets[at + step];
  return next ? { book, sheet: next.id } : null;
}

/** @throws InvalidArgument for a name that a host refuses, or that another sheet has */
function checkedName(book: Book, name: unknown, except: string | null): string {
  const text = asText(name, 'Worksheet.name');
  const taken = findSheet(book, text);
  if (taken !== null && taken !== except) {
    throw new HostError('ItemAlreadyExists', 'A resource with the same name or identifier already exists.');
  }
  if (text === '' || text.length > 31 || /[\\/?*[\]:]/.test(text) || /^'|'$/.test(text)) {
    throw invalidArgument('Worksheet.name');
  }
  return text;
}

function changedEvent(
  context: RequestContext,
  event: Extract<GridEvent, { type: 'edited' | 'moved' }>,
): object {
  const place: Place = { book: context.book, sheet: event.sheet, rect: event.rect };
  // A handler passes the context it reads with; the batch must be that one's.
  const at = (own: unknown): object => member(contextBehind(own) ?? context, range, place).proxy;
  return {
    type: 'WorksheetChanged',
    address: formatRect(event.rect),
    worksheetId: event.sheet,
    changeType: event.type === 'moved' ? event.change : 'RangeEdited',
    source: context.book.coauthoring ? 'Remote' : 'Local',
    triggerSource:
      event.type === 'edited' && event.source === 'program' && !context.book.coauthoring
        ? 'ThisLocalAddin'
        : 'Unknown',
    getRange: at,
    getRangeOrNullObject: at,
  };
}

function selectionEvent(event: Extract<GridEvent, { type: 'selected' }>): object {
  return {
    type: 'WorksheetSelectionChanged',
    worksheetId: event.selection.sheet,
    address: event.selection.rects.map(formatRect).join(','),
    isInsideTable: false,
  };
}

const found = (target: { book: Book }, key: unknown): SheetTarget | null => {
  const sheet = findSheet(target.book, asText(key, 'WorksheetCollection.getItem'));
  return sheet === null ? null : { book: target.book, sheet };
};

const missing = (where: string): never => {
  throw itemNotFound(where);
};

const end = (book: Book, which: 0 | -1): SheetTarget => {
  const sheet = book.grid.sheets().at(which);
  return sheet ? { book, sheet: sheet.id } : missing('WorksheetCollection');
};

export const worksheetCollection: Definition<{ book: Book }> = {
  type: 'WorksheetCollection',
  items: {
    list: (self, { book }) =>
      book.grid.sheets().map(({ id }) => member(self.context, worksheet, { book, sheet: id })),
  },
  methods: {
    getItem: (self, key) =>
      self.child(worksheet, (target) => found(target, key) ?? missing('WorksheetCollection.getItem')),
    getItemOrNullObject: (self, key) => self.child(worksheet, (target) => found(target, key)),
    getActiveWorksheet: (self) =>
      self.child(worksheet, ({ book }) => ({ book, sheet: book.grid.activeSheet() })),
    getFirst: (self) => self.child(worksheet, ({ book }) => end(book, 0)),
    getLast: (self) => self.child(worksheet, ({ book }) => end(book, -1)),
    getCount: (self) => self.ask('getCount', ({ book }) => book.grid.sheets().length),
    add: (self, name) =>
      self.child(worksheet, ({ book }) => {
        const own = name === undefined || name === null ? freeName(book) : checkedName(book, name, null);
        return { book, sheet: book.grid.addSheet(own) };
      }),
  },
  events: {
    onActivated: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'activated') send({ type: 'WorksheetActivated', worksheetId: event.sheet });
      }),
    onDeactivated: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'activated' && event.previous !== null) {
          send({ type: 'WorksheetDeactivated', worksheetId: event.previous });
        }
      }),
    onAdded: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'added')
          send({ type: 'WorksheetAdded', worksheetId: event.sheet, source: 'Local' });
      }),
    onDeleted: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'deleted')
          send({ type: 'WorksheetDeleted', worksheetId: event.sheet, source: 'Local' });
      }),
    onChanged: (self, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'edited' || event.type === 'moved') send(changedEvent(self.context, event));
      }),
    onSelectionChanged: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'selected') send(selectionEvent(event));
      }),
    onCalculated: (_, { book }, send) =>
      book.grid.listen((event) => {
        if (event.type === 'calculated') {
          send({ type: 'WorksheetCalculated', worksheetId: book.grid.activeSheet(), address: '' });
        }
      }),
  },
};

function freeName(book: Book): string {
  for (let number = 1; ; number++) if (findSheet(book, `Sheet${number}`) === null) return `Sheet${number}`;
}
