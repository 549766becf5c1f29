import type { Book, ShapeState } from '../book.ts';
import { invalidArgument, itemNotFound } from '../hostError.ts';
import { type Definition, member, type Property } from '../remote.ts';
import { asNumber, asText, POINTS_PER_PIXEL, remembered } from './arguments.ts';

interface ShapeTarget {
  readonly book: Book;
  readonly shape: ShapeState;
}

interface SheetOfShapes {
  readonly book: Book;
  readonly sheet: string;
}

function show({ book, shape }: ShapeTarget): void {
  const { source, name, left, top, width, height } = shape;
  const pixels = [left, top, width, height].map((points) => points / POINTS_PER_PIXEL);
  const [x = 0, y = 0, w = 0, h = 0] = pixels;
  book.grid.showPicture(shape.sheet, shape.id, { source, name, left: x, top: y, width: w, height: h });
}

function measure(key: 'left' | 'top' | 'width' | 'height'): Property<ShapeTarget> {
  return {
    get: ({ shape }) => shape[key],
    set: (target, value) => {
      target.shape[key] = asNumber(value, `Shape.${key}`);
      show(target);
    },
  };
}

const shape: Definition<ShapeTarget> = {
  type: 'Shape',
  properties: {
    id: { get: (target) => target.shape.id },
    name: {
      get: (target) => target.shape.name,
      set: (target, value) => {
        target.shape.name = asText(value, 'Shape.name');
        show(target);
      },
    },
    type: { get: () => 'Image' },
    left: measure('left'),
    top: measure('top'),
    width: measure('width'),
    height: measure('height'),
    ...remembered<ShapeTarget>(
      {
        altTextTitle: '',
        altTextDescription: '',
        lockAspectRatio: true,
        placement: 'TwoCell',
        visible: true,
      },
      (target) => target.shape.bag,
    ),
  },
  methods: {
    delete: (self) =>
      self.act('delete', ({ book, shape: state }) => {
        book.shapes.splice(book.shapes.indexOf(state), 1);
        book.grid.hidePicture(state.sheet, state.id);
      }),
  },
};

const find = ({ book, sheet }: SheetOfShapes, key: unknown): ShapeTarget | null => {
  const found = book.shapes.find((one) => one.sheet === sheet && (one.name === key || one.id === key));
  return found ? { book, shape: found } : null;
};

export const shapeCollection: Definition<SheetOfShapes> = {
  type: 'ShapeCollection',
  items: {
    list: (self, { book, sheet }) =>
      book.shapes
        .filter((one) => one.sheet === sheet)
        .map((one) => member(self.context, shape, { book, shape: one })),
  },
  methods: {
    getCount: (self) =>
      self.ask('getCount', ({ book, sheet }) => book.shapes.filter((one) => one.sheet === sheet).length),
    getItem: (self, key) =>
      self.child(shape, (target) => {
        const found = find(target, key);
        if (!found) throw itemNotFound('ShapeCollection.getItem');
        return found;
      }),
    getItemOrNullObject: (self, key) => self.child(shape, (target) => find(target, key)),
    addImage: (self, base64) =>
      self.child(shape, ({ book, sheet }) => {
        const text = asText(base64, 'ShapeCollection.addImage');
        const kind = text.startsWith('iVBOR') ? 'png' : text.startsWith('/9j/') ? 'jpeg' : null;
        // A host takes PNG and JPEG here, and no SVG.
        if (!kind) throw invalidArgument('ShapeCollection.addImage');
        const id = book.id('shape');
        const size = kind === 'png' ? pngSize(text) : { width: 400, height: 300 };
        const state: ShapeState = {
          id,
          sheet,
          name: id,
          source: `data:image/${kind};base64,${text}`,
          left: 0,
          top: 0,
          width: size.width * POINTS_PER_PIXEL,
          height: size.height * POINTS_PER_PIXEL,
          bag: {},
        };
        book.shapes.push(state);
        show({ book, shape: state });
        return { book, shape: state };
      }),
  },
};

/** The size in a PNG's header: two big-endian numbers from byte 16. */
function pngSize(base64: string): { width: number; height: number } {
  const header = atob(base64.slice(0, 32));
  const at = (index: number) =>
    [0, 1, 2, 3].reduce((sum, byte) => sum * 256 + (header.charCodeAt(index + byte) || 0), 0);
  return { width: at(16) || 400, height: at(20) || 300 };
}
