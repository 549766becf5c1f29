import type { FUniver } from '@univerjs/core/facade';
import type { FWorkbook } from '@univerjs/sheets/facade';
import { createElement } from 'react';
import type { PictureLayer } from '../engine/univerGrid.ts';
import type { Picture } from '../grid/grid.ts';

const KEY = 'StandInPicture';

/** Pictures that were removed: the engine keeps those of a sheet out of sight and would show them again. */
const removed = new Set<string>();

/** Pictures that float over the cells and scroll with them. */
export class FloatingPictures implements PictureLayer {
  private readonly book: FWorkbook;
  private readonly shown = new Map<string, { picture: Picture; remove: () => void }>();
  /** Pictures of sheets out of sight: the engine places by the columns of the sheet in sight. */
  private readonly waiting = new Map<string, { sheet: string; picture: Picture }>();

  constructor(api: FUniver, book: FWorkbook) {
    this.book = book;
    api.registerComponent(KEY, PictureElement);
    book.onCommandExecuted(({ id }) => {
      if (id === 'sheet.operation.set-worksheet-active') setTimeout(() => this.showWaiting(), 50);
    });
  }

  private showWaiting(): void {
    const active = this.book.getActiveSheet().getSheetId();
    for (const [id, { sheet, picture }] of this.waiting) {
      if (sheet === active) this.show(sheet, id, picture);
    }
  }

  show(sheet: string, id: string, picture: Picture): void {
    const worksheet = this.book.getSheetBySheetId(sheet);
    if (!worksheet) return;
    removed.delete(id);
    const known = this.shown.get(id);
    if (known && samePlace(known.picture, picture)) {
      if (known.picture.source === picture.source) return;
      known.picture = picture;
      for (const element of document.querySelectorAll<HTMLImageElement>(`img[data-picture="${id}"]`)) {
        element.src = picture.source;
      }
      worksheet.updateFloatDom(id, { data: dataOf(id, picture) });
      return;
    }
    known?.remove();
    this.shown.delete(id);
    if (this.book.getActiveSheet().getSheetId() !== sheet) {
      this.waiting.set(id, { sheet, picture });
      return;
    }
    this.waiting.delete(id);
    const added = worksheet.addFloatDomToPosition(
      {
        componentKey: KEY,
        allowTransform: true,
        initPosition: positionOf(picture),
        data: dataOf(id, picture),
      },
      id,
    );
    if (added) this.shown.set(id, { picture, remove: added.dispose });
  }

  hide(_sheet: string, id: string): void {
    removed.add(id);
    for (const element of document.querySelectorAll<HTMLImageElement>(`img[data-picture="${id}"]`)) {
      // The element is the engine's own to remove.
      element.alt = '';
      element.style.display = 'none';
    }
    this.shown.get(id)?.remove();
    this.shown.delete(id);
    this.waiting.delete(id);
  }
}

/** The engine counts from the corner of its headers, a picture from the corner of cell A1. */
const ROW_HEADER = 46;
const COLUMN_HEADER = 20;

function positionOf({ left, top, width, height }: Picture) {
  const startX = ROW_HEADER + left;
  const startY = COLUMN_HEADER + top;
  return { startX, endX: startX + width, startY, endY: startY + height };
}

interface PictureData {
  readonly id: string;
  readonly source: string;
  readonly name: string;
}

function dataOf(id: string, picture: Picture): PictureData & Record<string, string> {
  return { id, source: picture.source, name: picture.name };
}

function PictureElement({ data }: { data?: PictureData }) {
  if (!data || removed.has(data.id)) return null;
  return createElement('img', {
    className: 'chart-picture',
    'data-picture': data.id,
    src: data.source,
    alt: data.name,
    draggable: false,
  });
}

function samePlace(one: Picture, other: Picture): boolean {
  return (['left', 'top', 'width', 'height'] as const).every((key) => one[key] === other[key]);
}
