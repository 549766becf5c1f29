/** A picture for the card: a PNG as base64 text, with what it shows in words. */
export interface CardPicture {
  readonly base64: string;
  readonly description: string;
}

/** A rectangle on a sheet in points. */
export interface Room {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** Size of each picture on the card in pixels; drawn at several times that for print. */
export const PICTURE = { width: 330, height: 280 };
const GAP = 8;

/** Places pictures side by side in a room on the sheet. @returns the shapes' names */
export async function showPictures(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  drawn: readonly CardPicture[],
  room: Room,
  mark: string,
): Promise<string[]> {
  const each = (room.width - GAP * (drawn.length - 1)) / Math.max(1, drawn.length);
  const scale = Math.min(each / PICTURE.width, room.height / PICTURE.height);
  const names = drawn.map((picture, k) => {
    const name = `${mark} picture ${k + 1}`;
    addPicture(sheet, picture, name, {
      left: room.left + k * (each + GAP),
      top: room.top,
      width: PICTURE.width * scale,
      height: PICTURE.height * scale,
    });
    return name;
  });
  await context.sync();
  return names;
}

/** Draws pictures anew where they are; those that the user has deleted stay away. */
export async function renewPictures(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  drawn: readonly CardPicture[],
  names: readonly string[],
): Promise<void> {
  const found = names.map((name) => sheet.shapes.getItemOrNullObject(name).load('left,top,width,height'));
  await context.sync();
  found.forEach((shape, k) => {
    const picture = drawn[k];
    if (shape.isNullObject || picture === undefined) return;
    const { left, top, width, height } = shape;
    shape.delete();
    addPicture(sheet, picture, names[k] ?? '', { left, top, width, height });
  });
  await context.sync();
}

function addPicture(
  sheet: Excel.Worksheet,
  { base64, description }: CardPicture,
  name: string,
  { left, top, width, height }: Room,
): void {
  const shape = sheet.shapes.addImage(base64);
  shape.name = name;
  shape.altTextDescription = description;
  shape.lockAspectRatio = false;
  shape.left = left;
  shape.top = top;
  shape.width = width;
  shape.height = height;
}
