import { MAX_COLUMNS, MAX_ROWS, type Rect } from '../../grid/address.ts';
import { HostError, invalidArgument, itemNotFound } from '../hostError.ts';
import { type Definition, type Remote, remoteBehind } from '../remote.ts';
import { asInteger, POINTS_PER_PIXEL } from './arguments.ts';
import {
  addressOf,
  bounding,
  checkWritable,
  columnCount,
  inside,
  intersection,
  isUnbounded,
  type Place,
  rowCount,
} from './place.ts';
import { placesOf } from './placesOf.ts';
import { eachCell, listedValue, spread, typeIn, valueType } from './rangeCells.ts';
import { rangeFormat } from './rangeFormat.ts';
import { tablesIn } from './table.ts';
import { worksheet } from './worksheet.ts';

type Self = Remote<Place>;

const part = (self: Self, find: (rect: Rect, place: Place) => Rect | null, where: string) =>
  self.child(range, (place) => {
    const rect = find(place.rect, place);
    return rect === null ? null : { ...place, rect: inside(rect, where) };
  });

const needed = (rect: Rect | null, where: string): Rect => {
  if (!rect) throw itemNotFound(where);
  return rect;
};

const other = (argument: unknown, self: Self, where: string): ((place: Place) => Rect) => {
  const remote = remoteBehind(argument);
  if (remote && remote.definition.type === 'Range') return () => rangePlace(remote).rect;
  if (typeof argument !== 'string') throw invalidArgument(where);
  const found = self.context.book;
  return (place) => placesOf({ ...place, book: found }, argument, where)[0]?.rect ?? needed(null, where);
};

/** The place behind a range proxy. */
export function rangePlace(remote: Remote<never>): Place {
  if (remote.definition.type !== 'Range') throw invalidArgument('range');
  // The definition's type says what it stands for.
  return remote.target() as Place;
}

const used = (place: Place): Rect | null => {
  const rect = place.book.grid.usedRect(place.sheet);
  return rect && intersection(rect, place.rect);
};

const spilling = ({ book, sheet, rect }: Place): Rect | null =>
  book.grid.read(sheet, rect.top, rect.left).spill;

const spillParent = ({ book, sheet, rect }: Place): Rect | null => {
  const cell = book.grid.read(sheet, rect.top, rect.left);
  const over = cell.spill ?? cell.spilledFrom;
  return over && { ...over, bottom: over.top, right: over.left };
};

/** The block of filled cells around a cell, bounded by blank rows and columns. */
function surrounding({ book, sheet, rect }: Place): Rect {
  const filled = (row: number, column: number) => book.grid.read(sheet, row, column).value !== null;
  let block = rect;
  for (let grown = true; grown; ) {
    const next = {
      top: Math.max(0, block.top - 1),
      left: Math.max(0, block.left - 1),
      bottom: block.bottom + 1,
      right: block.right + 1,
    };
    const anyRow = (row: number) => span(next.left, next.right).some((column) => filled(row, column));
    const anyColumn = (column: number) => span(next.top, next.bottom).some((row) => filled(row, column));
    const larger = {
      top: anyRow(next.top) ? next.top : block.top,
      left: anyColumn(next.left) ? next.left : block.left,
      bottom: anyRow(next.bottom) ? next.bottom : block.bottom,
      right: anyColumn(next.right) ? next.right : block.right,
    };
    grown = JSON.stringify(larger) !== JSON.stringify(block);
    block = larger;
  }
  return block;
}

function span(from: number, to: number): number[] {
  return Array.from({ length: to - from + 1 }, (_, index) => from + index);
}

function sumOf(count: number, from: number, size: (index: number) => number): number {
  let sum = 0;
  for (let index = from; index < from + Math.min(count, 5000); index++) sum += size(index);
  return sum * POINTS_PER_PIXEL;
}

export const range: Definition<Place> = {
  type: 'Range',
  properties: {
    address: { get: addressOf },
    addressLocal: { get: addressOf },
    rowIndex: { get: ({ rect }) => rect.top },
    columnIndex: { get: ({ rect }) => rect.left },
    rowCount: { get: ({ rect }) => rowCount(rect) },
    columnCount: { get: ({ rect }) => columnCount(rect) },
    cellCount: { get: ({ rect }) => rowCount(rect) * columnCount(rect) },
    isEntireColumn: { get: ({ rect }) => rowCount(rect) === MAX_ROWS },
    isEntireRow: { get: ({ rect }) => columnCount(rect) === MAX_COLUMNS },
    values: {
      get: (place) => eachCell(place, (cell) => listedValue(cell.value)),
      set: (place, value) => typeIn(place, value, 'Range.values'),
      readsCells: true,
      writesCells: true,
    },
    formulas: {
      get: (place) => eachCell(place, (cell) => cell.formula ?? listedValue(cell.value)),
      set: (place, value) => typeIn(place, value, 'Range.formulas'),
      readsCells: true,
      writesCells: true,
    },
    text: { get: (place) => eachCell(place, (cell) => cell.text), readsCells: true },
    valueTypes: { get: (place) => eachCell(place, (cell) => valueType(cell.value)), readsCells: true },
    numberFormat: {
      get: (place) =>
        eachCell(place, (_, row, column) => place.book.grid.format(place.sheet, row, column).numberFormat),
      set: (place, value) => {
        checkWritable(place.book, place.sheet, 'Range.numberFormat');
        setNumberFormats(place, value);
      },
    },
    hasSpill: {
      get: (place) => {
        const spills =
          eachCell(place, (cell) => cell.spill !== null || cell.spilledFrom !== null)?.flat() ?? [];
        if (spills.every(Boolean)) return true;
        return spills.some(Boolean) ? null : false;
      },
      readsCells: true,
    },
    left: {
      get: ({ book, sheet, rect }) => sumOf(rect.left, 0, (column) => book.grid.columnWidth(sheet, column)),
    },
    top: { get: ({ book, sheet, rect }) => sumOf(rect.top, 0, (row) => book.grid.rowHeight(sheet, row)) },
    width: {
      get: ({ book, sheet, rect }) =>
        sumOf(columnCount(rect), rect.left, (column) => book.grid.columnWidth(sheet, column)),
    },
    height: {
      get: ({ book, sheet, rect }) =>
        sumOf(rowCount(rect), rect.top, (row) => book.grid.rowHeight(sheet, row)),
    },
    hidden: { get: () => false },
  },
  links: {
    format: (self) => self.child(rangeFormat, (place) => ({ place }), false),
    worksheet: (self) => self.child(worksheet, ({ book, sheet }) => ({ book, sheet }), false),
  },
  methods: {
    getCell: (self, row, column) =>
      part(
        self,
        (rect) => {
          const top = rect.top + asInteger(row, 'Range.getCell');
          const left = rect.left + asInteger(column, 'Range.getCell');
          return { top, left, bottom: top, right: left };
        },
        'Range.getCell',
      ),
    getRow: (self, row) =>
      part(
        self,
        (rect) => {
          const top = rect.top + asInteger(row, 'Range.getRow');
          return { ...rect, top, bottom: top };
        },
        'Range.getRow',
      ),
    getColumn: (self, column) =>
      part(
        self,
        (rect) => {
          const left = rect.left + asInteger(column, 'Range.getColumn');
          return { ...rect, left, right: left };
        },
        'Range.getColumn',
      ),
    getOffsetRange: (self, rows, columns) =>
      part(
        self,
        (rect) => shift(rect, asInteger(rows, 'offset'), asInteger(columns, 'offset')),
        'Range.getOffsetRange',
      ),
    getResizedRange: (self, rows, columns) =>
      part(
        self,
        (rect) => ({
          ...rect,
          bottom: rect.bottom + asInteger(rows, 'Range.getResizedRange'),
          right: rect.right + asInteger(columns, 'Range.getResizedRange'),
        }),
        'Range.getResizedRange',
      ),
    getAbsoluteResizedRange: (self, rows, columns) =>
      part(
        self,
        (rect) => ({
          ...rect,
          bottom: rect.top + asInteger(rows, 'Range.getAbsoluteResizedRange') - 1,
          right: rect.left + asInteger(columns, 'Range.getAbsoluteResizedRange') - 1,
        }),
        'Range.getAbsoluteResizedRange',
      ),
    getRowsAbove: (self, count = 1) =>
      part(
        self,
        (rect) => ({ ...rect, top: rect.top - asInteger(count, 'count'), bottom: rect.top - 1 }),
        'Range.getRowsAbove',
      ),
    getRowsBelow: (self, count = 1) =>
      part(
        self,
        (rect) => ({ ...rect, top: rect.bottom + 1, bottom: rect.bottom + asInteger(count, 'count') }),
        'Range.getRowsBelow',
      ),
    getColumnsBefore: (self, count = 1) =>
      part(
        self,
        (rect) => ({ ...rect, left: rect.left - asInteger(count, 'count'), right: rect.left - 1 }),
        'Range.getColumnsBefore',
      ),
    getColumnsAfter: (self, count = 1) =>
      part(
        self,
        (rect) => ({ ...rect, left: rect.right + 1, right: rect.right + asInteger(count, 'count') }),
        'Range.getColumnsAfter',
      ),
    getEntireColumn: (self) => part(self, (rect) => ({ ...rect, top: 0, bottom: MAX_ROWS - 1 }), 'Range'),
    getEntireRow: (self) => part(self, (rect) => ({ ...rect, left: 0, right: MAX_COLUMNS - 1 }), 'Range'),
    getLastCell: (self) => part(self, (rect) => ({ ...rect, top: rect.bottom, left: rect.right }), 'Range'),
    getLastRow: (self) => part(self, (rect) => ({ ...rect, top: rect.bottom }), 'Range'),
    getLastColumn: (self) => part(self, (rect) => ({ ...rect, left: rect.right }), 'Range'),
    getUsedRange: (self) => part(self, (_, place) => needed(used(place), 'Range.getUsedRange'), 'Range'),
    getUsedRangeOrNullObject: (self) => part(self, (_, place) => used(place), 'Range'),
    getSurroundingRegion: (self) => part(self, (_, place) => surrounding(place), 'Range'),
    getBoundingRect: (self, with_) => {
      const find = other(with_, self, 'Range.getBoundingRect');
      return part(self, (rect, place) => bounding(rect, find(place)), 'Range.getBoundingRect');
    },
    getIntersection: (self, with_) => {
      const find = other(with_, self, 'Range.getIntersection');
      return part(
        self,
        (rect, place) => needed(intersection(rect, find(place)), 'Range.getIntersection'),
        'Range',
      );
    },
    getIntersectionOrNullObject: (self, with_) => {
      const find = other(with_, self, 'Range.getIntersectionOrNullObject');
      return part(self, (rect, place) => intersection(rect, find(place)), 'Range');
    },
    getSpillingToRange: (self) =>
      part(self, (_, place) => needed(spilling(place), 'Range.getSpillingToRange'), 'Range'),
    getSpillingToRangeOrNullObject: (self) => part(self, (_, place) => spilling(place), 'Range'),
    getSpillParent: (self) =>
      part(self, (_, place) => needed(spillParent(place), 'Range.getSpillParent'), 'Range'),
    getSpillParentOrNullObject: (self) => part(self, (_, place) => spillParent(place), 'Range'),
    getTables: (self) => tablesIn(self),
    clear: (self, what = 'All') =>
      self.act(
        'clear',
        ({ book, sheet, rect }) => {
          checkWritable(book, sheet, 'Range.clear');
          const kinds = { all: 'all', contents: 'contents', formats: 'formats' } as const;
          const kind = String(what).toLowerCase();
          if (kind !== 'all' && kind !== 'contents' && kind !== 'formats')
            throw invalidArgument('Range.clear');
          book.grid.clear(sheet, rect, kinds[kind]);
        },
        true,
      ),
    insert: (self, shiftTo) => {
      self.act(
        'insert',
        ({ book, sheet, rect }) => {
          checkWritable(book, sheet, 'Range.insert');
          book.grid.insert(sheet, rect, String(shiftTo).toLowerCase() === 'right' ? 'right' : 'down');
        },
        true,
      );
      return part(self, (rect) => rect, 'Range.insert');
    },
    delete: (self, shiftTo) =>
      self.act(
        'delete',
        ({ book, sheet, rect }) => {
          checkWritable(book, sheet, 'Range.delete');
          book.grid.remove(sheet, rect, String(shiftTo).toLowerCase() === 'left' ? 'left' : 'up');
        },
        true,
      ),
    merge: (self) => self.act('merge', ({ book, sheet, rect }) => book.grid.merge(sheet, rect)),
    unmerge: (self) => self.act('unmerge', ({ book, sheet, rect }) => book.grid.unmerge(sheet, rect)),
    select: (self) => self.act('select', ({ book, sheet, rect }) => book.grid.select(sheet, [rect])),
    calculate: (self) => self.act('calculate', ({ book }) => book.grid.recalculate(), true),
    copyFrom: (self, source, kind = 'All') => {
      const remote = remoteBehind(source);
      self.act('copyFrom', (place) => copyInto(place, remote, source, String(kind).toLowerCase()), true);
    },
  },
};

function shift(rect: Rect, rows: number, columns: number): Rect {
  return {
    top: rect.top + rows,
    left: rect.left + columns,
    bottom: rect.bottom + rows,
    right: rect.right + columns,
  };
}

function setNumberFormats(place: Place, value: unknown): void {
  const { book, sheet, rect } = place;
  if (isUnbounded(rect) || !Array.isArray(value)) {
    const one: unknown = Array.isArray(value) ? value.flat()[0] : value;
    if (typeof one !== 'string') throw invalidArgument('Range.numberFormat');
    book.grid.setFormat(sheet, rect, { numberFormat: one });
    return;
  }
  spread(place, value, 'Range.numberFormat').forEach((row, down) => {
    row.forEach((format, across) => {
      if (format === null || format === undefined) return;
      if (typeof format !== 'string') throw invalidArgument('Range.numberFormat');
      const [top, left] = [rect.top + down, rect.left + across];
      book.grid.setFormat(sheet, { top, left, bottom: top, right: left }, { numberFormat: format });
    });
  });
}

function copyInto(place: Place, remote: Remote<never> | null, source: unknown, kind: string): void {
  checkWritable(place.book, place.sheet, 'Range.copyFrom');
  if (kind !== 'values') {
    throw new HostError('NotImplemented', 'the stand-in copies values only (Excel.RangeCopyType.values)');
  }
  const from = remote ? rangePlace(remote) : placesOf(place, String(source), 'Range.copyFrom')[0];
  const cells = from && eachCell(from, (cell) => listedValue(cell.value));
  if (!cells) throw invalidArgument('Range.copyFrom');
  place.book.grid.writePlain(
    place.sheet,
    place.rect.top,
    place.rect.left,
    cells.map((row) => row.map((value) => (value === '' ? null : value))),
  );
}
