import type { Rect } from '../../grid/address.ts';
import { formatRect } from '../../grid/address.ts';
import type { Book, TableState } from '../book.ts';
import { HostError, invalidArgument, itemNotFound } from '../hostError.ts';
import { type Definition, member, type Remote, remoteBehind } from '../remote.ts';
import { asText, remembered } from './arguments.ts';
import { checkWritable, intersection, type Place } from './place.ts';
import { placesOf } from './placesOf.ts';
import { range, rangePlace } from './range.ts';
import { listedValue } from './rangeCells.ts';
import { worksheet } from './worksheet.ts';

interface TableTarget {
  readonly book: Book;
  readonly table: TableState;
}

interface ColumnTarget extends TableTarget {
  readonly index: number;
}

/** Tables of a sheet, of the workbook (sheet null), or of a range. */
export interface TablesTarget {
  readonly book: Book;
  readonly sheet: string | null;
  readonly within?: Rect;
}

const whole = ({ book, table }: TableTarget): Place => ({ book, sheet: table.sheet, rect: table.rect });

const header = (target: TableTarget): Place => {
  const place = whole(target);
  return { ...place, rect: { ...place.rect, bottom: place.rect.top } };
};

const body = (target: TableTarget): Place => {
  const place = whole(target);
  const top = target.table.showHeaders ? place.rect.top + 1 : place.rect.top;
  return { ...place, rect: { ...place.rect, top } };
};

const narrow = (place: Place, index: number): Place => {
  const left = place.rect.left + index;
  return { ...place, rect: { ...place.rect, left, right: left } };
};

const column: Definition<ColumnTarget> = {
  type: 'TableColumn',
  properties: {
    index: { get: ({ index }) => index },
    id: { get: ({ index }) => index + 1 },
    name: { get: (target) => columnName(target) },
  },
  methods: {
    getRange: (self) => self.child(range, (target) => narrow(whole(target), target.index)),
    getDataBodyRange: (self) => self.child(range, (target) => narrow(body(target), target.index)),
    getHeaderRowRange: (self) => self.child(range, (target) => narrow(header(target), target.index)),
  },
};

function columnName({ book, table, index }: ColumnTarget): string {
  const cell = book.grid.read(table.sheet, table.rect.top, table.rect.left + index);
  return table.showHeaders ? String(listedValue(cell.value)) : `Column${index + 1}`;
}

const columnsOf = (target: TableTarget): ColumnTarget[] =>
  Array.from({ length: target.table.rect.right - target.table.rect.left + 1 }, (_, index) => ({
    ...target,
    index,
  }));

const findColumn = (target: TableTarget, key: unknown): ColumnTarget | null => {
  const columns = columnsOf(target);
  if (typeof key === 'number') return columns[key - 1] ?? null;
  const wanted = asText(key, 'TableColumnCollection.getItem').toLowerCase();
  return columns.find((one) => columnName(one).toLowerCase() === wanted) ?? null;
};

const columnCollection: Definition<TableTarget> = {
  type: 'TableColumnCollection',
  properties: { count: { get: (target) => columnsOf(target).length } },
  items: {
    list: (self, target) => columnsOf(target).map((one) => member(self.context, column, one)),
  },
  methods: {
    getItem: (self, key) =>
      self.child(column, (target) => findColumn(target, key) ?? missing('TableColumnCollection')),
    getItemOrNullObject: (self, key) => self.child(column, (target) => findColumn(target, key)),
    getItemAt: (self, index) =>
      self.child(column, (target) => columnsOf(target)[Number(index)] ?? missing('TableColumnCollection')),
    getCount: (self) => self.ask('getCount', (target) => columnsOf(target).length),
  },
};

const rowCollection: Definition<TableTarget> = {
  type: 'TableRowCollection',
  properties: { count: { get: (target) => body(target).rect.bottom - body(target).rect.top + 1 } },
};

function missing(where: string): never {
  throw itemNotFound(where);
}

const table: Definition<TableTarget> = {
  type: 'Table',
  properties: {
    id: { get: (target) => target.table.id },
    name: {
      get: (target) => target.table.name,
      set: (target, name) => {
        target.table.name = asText(name, 'Table.name');
      },
    },
    showHeaders: { get: (target) => target.table.showHeaders },
    ...remembered<TableTarget>(
      { style: 'TableStyleMedium2', showTotals: false, showBandedRows: true, showFilterButton: true },
      (target) => target.table.bag,
    ),
  },
  links: {
    columns: (self) => self.child(columnCollection, (target) => target, false),
    rows: (self) => self.child(rowCollection, (target) => target, false),
    worksheet: (self) =>
      self.child(worksheet, (target) => ({ book: target.book, sheet: target.table.sheet }), false),
  },
  methods: {
    getRange: (self) => self.child(range, whole),
    getHeaderRowRange: (self) => self.child(range, header),
    getDataBodyRange: (self) => self.child(range, body),
    delete: (self) =>
      self.act(
        'delete',
        (target) => {
          const { book, table: state } = target;
          checkWritable(book, state.sheet, 'Table.delete');
          book.grid.clear(state.sheet, state.rect, 'all');
          forget(target);
        },
        true,
      ),
    convertToRange: (self) => {
      const place = self.child(range, whole);
      self.act('convertToRange', forget);
      return place;
    },
    resize: (self, address) => {
      const behind = remoteBehind(address);
      self.act('resize', (target) => {
        const { book, table: state } = target;
        const place = behind
          ? rangePlace(behind)
          : placesOf({ book, sheet: state.sheet }, String(address), 'resize')[0];
        if (place) state.rect = place.rect;
      });
    },
  },
  events: {
    onChanged: (_, { book, table: state }, send) =>
      book.grid.listen((event) => {
        if (event.type !== 'edited' || event.sheet !== state.sheet) return;
        const touched = intersection(event.rect, state.rect);
        if (!touched) return;
        const ids = { tableId: state.id, worksheetId: state.sheet };
        send({
          type: 'TableChanged',
          ...ids,
          address: formatRect(touched),
          changeType: 'RangeEdited',
          source: 'Local',
        });
      }),
  },
};

function forget({ book, table: state }: TableTarget): void {
  const at = book.tables.indexOf(state);
  if (at >= 0) book.tables.splice(at, 1);
}

const present = ({ book, sheet, within }: TablesTarget): TableTarget[] =>
  book.tables
    .filter((one) => (sheet === null || one.sheet === sheet) && (!within || intersection(one.rect, within)))
    .map((one) => ({ book, table: one }));

const find = (target: TablesTarget, key: unknown): TableTarget | null =>
  present(target).find((one) => one.table.name === key || one.table.id === key) ?? null;

export const tableCollection: Definition<TablesTarget> = {
  type: 'TableCollection',
  properties: { count: { get: (target) => present(target).length } },
  items: {
    list: (self, target) => present(target).map((one) => member(self.context, table, one)),
  },
  methods: {
    getItem: (self, key) =>
      self.child(table, (target) => find(target, key) ?? missing('TableCollection.getItem')),
    getItemOrNullObject: (self, key) => self.child(table, (target) => find(target, key)),
    getItemAt: (self, index) =>
      self.child(table, (target) => present(target)[Number(index)] ?? missing('TableCollection')),
    getFirst: (self) =>
      self.child(table, (target) => present(target)[0] ?? missing('TableCollection.getFirst')),
    getCount: (self) => self.ask('getCount', (target) => present(target).length),
    add: (self, address, hasHeaders) => {
      const behind = remoteBehind(address);
      return self.child(table, ({ book, sheet }) => {
        const on = { book, sheet: sheet ?? book.grid.activeSheet() };
        const place = behind
          ? rangePlace(behind)
          : placesOf(on, asText(address, 'TableCollection.add'), 'add')[0];
        if (!place) throw invalidArgument('TableCollection.add');
        if (present({ book, sheet: place.sheet, within: place.rect }).length > 0) {
          throw new HostError('InvalidArgument', 'A table cannot overlap another table.');
        }
        const id = book.id('table');
        const name = `Table${id.split('-')[1] ?? ''}`;
        const state = {
          id,
          name,
          sheet: place.sheet,
          rect: place.rect,
          showHeaders: hasHeaders === true,
          bag: {},
        };
        book.tables.push(state);
        return { book, table: state };
      });
    },
  },
};

/** `range.getTables()`. */
export function tablesIn(self: Remote<Place>): object {
  return self.child(tableCollection, ({ book, sheet, rect }) => ({ book, sheet, within: rect }));
}
