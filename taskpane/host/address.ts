/** A block of cells by zero-based, inclusive bounds. */
export interface Block {
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

export const LAST_ROW = 1_048_575;
export const LAST_COLUMN = 16_383;

function columnName(index: number): string {
  let name = '';
  for (let rest = index + 1; rest > 0; rest = Math.floor((rest - 1) / 26)) {
    name = String.fromCharCode(65 + ((rest - 1) % 26)) + name;
  }
  return name;
}

function columnIndex(name: string): number {
  let index = 0;
  for (const letter of name.toUpperCase()) index = 26 * index + letter.charCodeAt(0) - 64;
  return index - 1;
}

/** A block as `B4` or `B4:B60`. */
export function formatBlock({ top, left, bottom, right }: Block): string {
  const first = `${columnName(left)}${top + 1}`;
  const last = `${columnName(right)}${bottom + 1}`;
  return first === last ? first : `${first}:${last}`;
}

const END = /^\$?([A-Za-z]{1,3})?\$?([1-9]\d{0,6})?$/;

/** Reads `B4`, `$B$4:B60`, `A:B` or `2:9`; undefined for anything else. */
export function parseBlock(address: string): Block | undefined {
  const ends = address
    .trim()
    .split(':')
    .map((end) => END.exec(end.trim()));
  const [first, last = first] = ends;
  if (ends.length > 2 || !first || !last) return undefined;
  const columns = [first[1], last[1]].filter((name) => name !== undefined).map(columnIndex);
  const rows = [first[2], last[2]].filter((row) => row !== undefined).map((row) => Number(row) - 1);
  const whole = ends.length === 2;
  // Both ends say their column, both their row; only a span of two ends may leave one of them out.
  if (columns.length === 1 || rows.length === 1 || columns.length + rows.length === 0) return undefined;
  if (!whole && (columns.length === 0 || rows.length === 0)) return undefined;
  const block = {
    top: rows.length === 0 ? 0 : Math.min(...rows),
    bottom: rows.length === 0 ? LAST_ROW : Math.max(...rows),
    left: columns.length === 0 ? 0 : Math.min(...columns),
    right: columns.length === 0 ? LAST_COLUMN : Math.max(...columns),
  };
  return block.bottom <= LAST_ROW && block.right <= LAST_COLUMN ? block : undefined;
}

/** Splits `'My sheet'!A2:A9` into the sheet's name, empty when there is none, and the cells. */
export function splitAddress(address: string): { readonly sheet: string; readonly cells: string } {
  const mark = address.lastIndexOf('!');
  if (mark < 0) return { sheet: '', cells: address };
  const sheet = address
    .slice(0, mark)
    .replace(/^'(.*)'$/s, '$1')
    .replaceAll("''", "'");
  return { sheet, cells: address.slice(mark + 1) };
}

/** A place as a formula names it: `Weir!A2:A9`, `'Cold room'!A2:A9`. */
export function qualified(sheet: string, cells: string): string {
  const plain =
    /^[A-Za-z_\u00C0-\uFFFF][\w.\u00C0-\uFFFF]*$/.test(sheet) && !/^[A-Za-z]{1,3}\d+$/.test(sheet);
  return `${plain ? sheet : `'${sheet.replaceAll("'", "''")}'`}!${cells}`;
}
