import type { CellFormat } from '../../grid/grid.ts';
import { invalidArgument } from '../hostError.ts';
import type { Definition, Property } from '../remote.ts';
import { asInteger, asNumber, asText, POINTS_PER_PIXEL } from './arguments.ts';
import { checkWritable, type Place } from './place.ts';

export interface FormatTarget {
  readonly place: Place;
}

const first = ({ place }: FormatTarget): CellFormat =>
  place.book.grid.format(place.sheet, place.rect.top, place.rect.left);

const put = ({ place }: FormatTarget, format: Partial<CellFormat>, where: string): void => {
  checkWritable(place.book, place.sheet, where);
  place.book.grid.setFormat(place.sheet, place.rect, format);
};

/** A format property that reads the first cell's format and sets all cells'. */
function formatProperty<K extends keyof CellFormat>(
  key: K,
  toHost: (value: CellFormat[K]) => unknown,
  fromHost: (value: unknown) => CellFormat[K],
): Property<FormatTarget> {
  return {
    get: (target) => toHost(first(target)[key]),
    set: (target, value) => {
      const format: Partial<CellFormat> = {};
      Object.assign(format, { [key]: fromHost(value) });
      put(target, format, `RangeFormat.${key}`);
    },
  };
}

const same = (value: unknown): unknown => value;
const boolean = (value: unknown): boolean => value === true;
const color = (value: unknown): string => {
  const text = asText(value, 'color');
  const known = NAMED_COLORS[text.toLowerCase()] ?? text;
  if (!/^#[0-9a-f]{6}$/i.test(known)) throw invalidArgument('color');
  return known;
};

const NAMED_COLORS: Readonly<Record<string, string>> = {
  black: '#000000',
  white: '#ffffff',
  gray: '#808080',
  red: '#ff0000',
  green: '#008000',
  blue: '#0000ff',
};

const font: Definition<FormatTarget> = {
  type: 'RangeFont',
  properties: {
    bold: formatProperty('bold', same, boolean),
    italic: formatProperty('italic', same, boolean),
    underline: formatProperty(
      'underline',
      (value) => (value ? 'Single' : 'None'),
      (value) => value !== 'None',
    ),
    color: formatProperty('color', (value) => value ?? '#000000', color),
    size: formatProperty('fontSize', same, (value) => asNumber(value, 'RangeFont.size')),
    name: formatProperty('fontName', same, (value) => asText(value, 'RangeFont.name')),
  },
};

const fill: Definition<FormatTarget> = {
  type: 'RangeFill',
  properties: { color: formatProperty('fill', (value) => value ?? '#FFFFFF', color) },
  methods: { clear: (self) => self.act('clear', (target) => put(target, { fill: null }, 'RangeFill.clear')) },
};

type Side = keyof CellFormat['borders'];

interface BorderTarget extends FormatTarget {
  readonly sides: readonly Side[];
}

const SIDES: Readonly<Record<string, Side>> = {
  EdgeTop: 'top',
  EdgeBottom: 'bottom',
  EdgeLeft: 'left',
  EdgeRight: 'right',
};

const edge = ({ place }: FormatTarget, side: Side): Place => {
  const { rect } = place;
  const edges = {
    top: { ...rect, bottom: rect.top },
    bottom: { ...rect, top: rect.bottom },
    left: { ...rect, right: rect.left },
    right: { ...rect, left: rect.right },
  };
  return { ...place, rect: edges[side] };
};

const setBorder = (target: BorderTarget, value: string | null): void => {
  for (const side of target.sides)
    put({ place: edge(target, side) }, { borders: { [side]: value } }, 'RangeBorder');
};

const border: Definition<BorderTarget> = {
  type: 'RangeBorder',
  properties: {
    style: {
      get: (target) => (target.sides.some((side) => first(target).borders[side]) ? 'Continuous' : 'None'),
      set: (target, value) => setBorder(target, value === 'None' ? null : '#8a8a8a'),
    },
    color: {
      get: (target) => target.sides.map((side) => first(target).borders[side]).find(Boolean) ?? '#000000',
      set: (target, value) => setBorder(target, color(value)),
    },
    weight: { get: () => 'Thin', set: () => undefined },
  },
};

const borders: Definition<FormatTarget> = {
  type: 'RangeBorderCollection',
  methods: {
    getItem: (self, which) =>
      self.child(border, (target): BorderTarget => {
        const name = asText(which, 'RangeBorderCollection.getItem');
        const side = SIDES[name];
        if (!side && !name.startsWith('Inside') && !name.startsWith('Diagonal'))
          throw invalidArgument('borders');
        return { ...target, sides: side ? [side] : [] };
      }),
  },
};

const VERTICAL = { top: 'Top', middle: 'Center', bottom: 'Bottom' } as const;

function columnsOf({ place }: FormatTarget): number[] {
  const { left, right } = place.rect;
  return Array.from({ length: Math.min(right - left + 1, 200) }, (_, index) => left + index);
}

function rowsOf({ place }: FormatTarget): number[] {
  const { top, bottom } = place.rect;
  return Array.from({ length: Math.min(bottom - top + 1, 5000) }, (_, index) => top + index);
}

/** Makes each column as wide as its longest text, estimated from the number of characters. */
function autofitColumns(target: FormatTarget): void {
  const { book, sheet, rect } = target.place;
  const used = book.grid.usedRect(sheet);
  if (!used) return;
  for (const column of columnsOf(target)) {
    let longest = 0;
    for (let row = Math.max(rect.top, used.top); row <= Math.min(rect.bottom, used.bottom); row++) {
      longest = Math.max(longest, book.grid.read(sheet, row, column).text.length);
    }
    if (longest > 0) book.grid.setColumnWidth(sheet, column, Math.min(600, Math.max(40, 14 + longest * 7)));
  }
}

export const rangeFormat: Definition<FormatTarget> = {
  type: 'RangeFormat',
  properties: {
    columnWidth: {
      get: ({ place }) => place.book.grid.columnWidth(place.sheet, place.rect.left) * POINTS_PER_PIXEL,
      set: (target, value) => {
        const { book, sheet } = target.place;
        const pixels = asNumber(value, 'RangeFormat.columnWidth') / POINTS_PER_PIXEL;
        for (const column of columnsOf(target)) book.grid.setColumnWidth(sheet, column, pixels);
      },
    },
    rowHeight: {
      get: ({ place }) => place.book.grid.rowHeight(place.sheet, place.rect.top) * POINTS_PER_PIXEL,
      set: (target, value) => {
        const { book, sheet } = target.place;
        const pixels = asNumber(value, 'RangeFormat.rowHeight') / POINTS_PER_PIXEL;
        for (const row of rowsOf(target)) book.grid.setRowHeight(sheet, row, pixels);
      },
    },
    horizontalAlignment: formatProperty(
      'horizontal',
      (value) => value.charAt(0).toUpperCase() + value.slice(1),
      (value) => {
        const text = asText(value, 'RangeFormat.horizontalAlignment').toLowerCase();
        if (text === 'left' || text === 'center' || text === 'right') return text;
        return 'general';
      },
    ),
    verticalAlignment: formatProperty(
      'vertical',
      (value) => VERTICAL[value],
      (value) => {
        const text = asText(value, 'RangeFormat.verticalAlignment').toLowerCase();
        if (text === 'center') return 'middle';
        return text === 'top' ? 'top' : 'bottom';
      },
    ),
    wrapText: formatProperty('wrap', same, boolean),
    indentLevel: formatProperty('indent', same, (value) => asInteger(value, 'RangeFormat.indentLevel')),
  },
  links: {
    font: (self) => self.child(font, (target) => target, false),
    fill: (self) => self.child(fill, (target) => target, false),
    borders: (self) => self.child(borders, (target) => target, false),
  },
  methods: {
    autofitColumns: (self) => self.act('autofitColumns', autofitColumns),
    // Rows of the stand-in fit their text by themselves.
    autofitRows: (self) => self.act('autofitRows', () => undefined),
  },
};
