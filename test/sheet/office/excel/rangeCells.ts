import { type CellValue, isCellError, isErrorText } from '../../grid/cell.ts';
import type { CellInput, GridCell } from '../../grid/grid.ts';
import { invalidArgument } from '../hostError.ts';
import { checkWritable, columnCount, isUnbounded, type Place, rowCount } from './place.ts';

/** Reads something of every cell, row by row; null for whole rows and columns, which a host does not list. */
export function eachCell<V>(
  place: Place,
  of: (cell: GridCell, row: number, column: number) => V,
): V[][] | null {
  if (isUnbounded(place.rect)) return null;
  const { book, sheet, rect } = place;
  const rows: V[][] = [];
  for (let row = rect.top; row <= rect.bottom; row++) {
    const line: V[] = [];
    for (let column = rect.left; column <= rect.right; column++) {
      line.push(of(book.grid.read(sheet, row, column), row, column));
    }
    rows.push(line);
  }
  return rows;
}

/** A value as the host lists it: a blank is an empty text, an error its text. */
export function listedValue(value: CellValue): number | string | boolean {
  if (value === null) return '';
  return isCellError(value) ? value.error : value;
}

export function valueType(value: CellValue): string {
  if (value === null) return 'Empty';
  if (isCellError(value)) return 'Error';
  if (typeof value === 'number') return 'Double';
  return typeof value === 'boolean' ? 'Boolean' : 'String';
}

/** Spreads what was assigned (one value or a table of the range's own size) over the cells of a range. */
export function spread(place: Place, assigned: unknown, where: string): unknown[][] {
  const rows = rowCount(place.rect);
  const columns = columnCount(place.rect);
  if (!Array.isArray(assigned)) {
    return Array.from({ length: rows }, () => Array.from({ length: columns }, () => assigned));
  }
  const table = assigned.map((row): unknown[] => (Array.isArray(row) ? row : []));
  if (table.length !== rows || table.some((row) => row.length !== columns)) throw invalidArgument(where);
  return table;
}

/** Writes cells as if each had been typed: `=…` is a formula, `'…` a text, a numeral a number; null is left alone. */
export function typeIn(place: Place, assigned: unknown, where: string): void {
  const { book, sheet, rect } = place;
  checkWritable(book, sheet, where);
  const table = spread(place, assigned, where);
  const typed = table.map((row, down) =>
    row.map((value, across) => {
      const format = book.grid.format(sheet, rect.top + down, rect.left + across).numberFormat;
      return typedCell(value, format === '@', where);
    }),
  );
  const formulas = typed.map((row) => row.map((cell) => cell.formula));
  const plain = typed.map((row) => row.map((cell) => cell.plain));
  if (plain.some((row) => row.some((cell) => cell !== undefined))) {
    book.grid.writePlain(sheet, rect.top, rect.left, plain);
  }
  if (formulas.some((row) => row.some((cell) => cell !== undefined))) {
    book.grid.write(sheet, rect.top, rect.left, formulas);
  }
}

function typedCell(
  value: unknown,
  asText: boolean,
  where: string,
): { formula?: CellInput; plain?: CellInput } {
  if (value === null || value === undefined) return {};
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw invalidArgument(where);
    return { plain: value };
  }
  if (typeof value === 'boolean') return { plain: value };
  if (typeof value !== 'string') throw invalidArgument(where);
  if (value === '') return { plain: null };
  if (asText) return { plain: value };
  if (value.startsWith("'")) return { plain: value.slice(1) };
  if (value.startsWith('=') && value.length > 1) return { formula: value };
  if (/^[+-]?(\d+\.?\d*|\.\d+)(e[+-]?\d+)?$/i.test(value)) return { plain: Number(value) };
  if (/^(true|false)$/i.test(value)) return { plain: value.toLowerCase() === 'true' };
  return { plain: isErrorText(value.toUpperCase()) ? value.toUpperCase() : value };
}
