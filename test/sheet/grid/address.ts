/** A rectangle of cells, zero-based and inclusive. */
export interface Rect {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

export const MAX_ROWS = 1_048_576;
export const MAX_COLUMNS = 16_384;

export function columnName(index: number): string {
  let name = '';
  for (let rest = index + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    name = String.fromCharCode(65 + ((rest - 1) % 26)) + name;
  }
  return name;
}

export function columnIndex(name: string): number {
  let index = 0;
  for (const letter of name.toUpperCase()) index = index * 26 + letter.charCodeAt(0) - 64;
  return index - 1;
}

/** Writes a rectangle as `B2` or `B2:C9`, whole columns as `A:C`, whole rows as `2:4`. */
export function formatRect(rect: Rect): string {
  const wholeColumns = rect.top === 0 && rect.bottom === MAX_ROWS - 1;
  if (wholeColumns) return `${columnName(rect.left)}:${columnName(rect.right)}`;
  if (rect.left === 0 && rect.right === MAX_COLUMNS - 1) return `${rect.top + 1}:${rect.bottom + 1}`;
  const first = `${columnName(rect.left)}${rect.top + 1}`;
  const last = `${columnName(rect.right)}${rect.bottom + 1}`;
  return first === last ? first : `${first}:${last}`;
}

/** Quotes a sheet's name where a formula needs it: `Weir`, `'Cold room'`. */
export function quoteSheet(name: string): string {
  const plain = /^[A-Za-z_\u00C0-\uFFFF][\w.\u00C0-\uFFFF]*$/.test(name) && !/^[A-Za-z]{1,3}\d+$/.test(name);
  return plain ? name : `'${name.replaceAll("'", "''")}'`;
}

export interface SheetAndRects {
  readonly sheet: string | null;
  readonly rects: Rect[];
}

const CORNER = /^\$?([A-Za-z]{1,3})\$?(\d{1,7})$/;
const COLUMN = /^\$?([A-Za-z]{1,3})$/;
const ROW = /^\$?(\d{1,7})$/;

function parseRect(text: string): Rect | null {
  const [from = '', to = from, ...more] = text.split(':');
  if (more.length > 0) return null;
  const first = CORNER.exec(from);
  const last = CORNER.exec(to);
  if (first && last) {
    const columns = [columnIndex(first[1] ?? ''), columnIndex(last[1] ?? '')];
    const rows = [Number(first[2]) - 1, Number(last[2]) - 1];
    return ordered(rows, columns);
  }
  if (!text.includes(':')) return null;
  const firstColumn = COLUMN.exec(from);
  const lastColumn = COLUMN.exec(to);
  if (firstColumn && lastColumn) {
    return ordered([0, MAX_ROWS - 1], [columnIndex(firstColumn[1] ?? ''), columnIndex(lastColumn[1] ?? '')]);
  }
  if (ROW.test(from) && ROW.test(to)) {
    const rows = [from, to].map((row) => Number(row.replace('$', '')) - 1);
    return ordered(rows, [0, MAX_COLUMNS - 1]);
  }
  return null;
}

function ordered(rows: number[], columns: number[]): Rect | null {
  const rect = {
    top: Math.min(...rows),
    left: Math.min(...columns),
    bottom: Math.max(...rows),
    right: Math.max(...columns),
  };
  return rect.top >= 0 && rect.bottom < MAX_ROWS && rect.right < MAX_COLUMNS ? rect : null;
}

/** Reads `A1`, `$A$1:B9`, `A:C`, `Sheet!A1:B2,Sheet!D1` and the like; null when it is no address. */
export function parseAddress(text: string): SheetAndRects | null {
  let sheet: string | null = null;
  const rects: Rect[] = [];
  for (const part of text.split(/[,;](?=(?:[^']*'[^']*')*[^']*$)/)) {
    const match = /^(?:(?:'((?:[^']|'')+)'|([^'!]+))!)?([^!]+)$/.exec(part.trim());
    const rect = match ? parseRect((match[3] ?? '').trim()) : null;
    if (!match || !rect) return null;
    const named = match[1]?.replaceAll("''", "'") ?? match[2] ?? null;
    if (named !== null) sheet = named;
    rects.push(rect);
  }
  return rects.length > 0 ? { sheet, rects } : null;
}

/** Reads the address of a rectangle on the current sheet. @throws RangeError when it is none. */
export function rectOf(address: string): Rect {
  const parsed = parseAddress(address);
  const rect = parsed?.rects[0];
  if (!rect || parsed.rects.length > 1) throw new RangeError(`not the address of a range: ${address}`);
  return rect;
}
