import { formatRect, quoteSheet } from '../../grid/address.ts';
import { itemNotFound } from '../hostError.ts';
import type { Definition } from '../remote.ts';
import { member } from '../remote.ts';
import { columnCount, type Place, rowCount, sheetName } from './place.ts';
import { range } from './range.ts';
import { worksheet } from './worksheet.ts';

/** One or more rectangles of one sheet. */
export type Areas = readonly Place[];

const first = (areas: Areas): Place => {
  const place = areas[0];
  if (!place) throw itemNotFound('RangeAreas');
  return place;
};

const areaCollection: Definition<Areas> = {
  type: 'RangeCollection',
  items: {
    list: (self, areas) => areas.map((place) => member(self.context, range, place)),
  },
  methods: {
    getItemAt: (self, index) => self.child(range, (areas) => areas[Number(index)] ?? notThere()),
    getCount: (self) => self.ask('getCount', (areas) => areas.length),
  },
};

function notThere(): never {
  throw itemNotFound('RangeCollection.getItemAt');
}

export const rangeAreas: Definition<Areas> = {
  type: 'RangeAreas',
  properties: {
    address: {
      get: (areas) => {
        const sheet = quoteSheet(sheetName(first(areas).book, first(areas).sheet));
        return areas.map((place) => `${sheet}!${formatRect(place.rect)}`).join(',');
      },
    },
    areaCount: { get: (areas) => areas.length },
    cellCount: {
      get: (areas) => areas.reduce((sum, { rect }) => sum + rowCount(rect) * columnCount(rect), 0),
    },
  },
  links: {
    areas: (self) => self.child(areaCollection, (areas) => areas, false),
    worksheet: (self) => self.child(worksheet, (areas) => first(areas), false),
  },
  methods: {
    getUsedRangeAreasOrNullObject: (self) =>
      self.child(rangeAreas, (areas) => {
        const used = first(areas).book.grid.usedRect(first(areas).sheet);
        if (!used) return null;
        const parts = areas.flatMap((place) => {
          const rect = {
            top: Math.max(used.top, place.rect.top),
            left: Math.max(used.left, place.rect.left),
            bottom: Math.min(used.bottom, place.rect.bottom),
            right: Math.min(used.right, place.rect.right),
          };
          return rect.top <= rect.bottom && rect.left <= rect.right ? [{ ...place, rect }] : [];
        });
        return parts.length > 0 ? parts : null;
      }),
    select: (self) =>
      self.act('select', (areas) =>
        first(areas).book.grid.select(
          first(areas).sheet,
          areas.map((place) => place.rect),
        ),
      ),
  },
};
