import type { ICellData, IStyleData, IWorkbookData, IWorksheetData } from '@univerjs/core';
import { BooleanNumber, BorderStyleTypes, CellValueType, HorizontalAlign } from '@univerjs/core';
import { rectOf } from '../grid/address.ts';
import type { CellInput } from '../grid/grid.ts';
import type { DemoSheet, DemoStyle } from './demoSheet.ts';

const STYLES: Readonly<Record<DemoStyle, IStyleData>> = {
  title: { bl: BooleanNumber.TRUE, fs: 15, cl: { rgb: '#1d3a4f' } },
  note: { cl: { rgb: '#5b646c' }, it: BooleanNumber.TRUE, fs: 10 },
  header: {
    bl: BooleanNumber.TRUE,
    bg: { rgb: '#e8eef2' },
    cl: { rgb: '#1d3a4f' },
    bd: { b: { s: BorderStyleTypes.THIN, cl: { rgb: '#9fb0bc' } } },
  },
  input: { bg: { rgb: '#fffdf3' } },
  heading: { bl: BooleanNumber.TRUE, cl: { rgb: '#1d3a4f' }, fs: 11 },
  result: {},
  statement: { fs: 11, cl: { rgb: '#1b1f23' } },
};

const ROWS = 400;
const COLUMNS = 40;

/** A workbook of these sheets, as the spreadsheet engine opens it. */
export function workbookData(id: string, sheets: readonly DemoSheet[]): Partial<IWorkbookData> {
  const made = sheets.map((sheet, index) => worksheetData(`sheet-${index + 1}`, sheet));
  return {
    id,
    name: 'Ellowmere Water',
    sheetOrder: made.map((sheet) => sheet.id),
    sheets: Object.fromEntries(made.map((sheet) => [sheet.id, sheet])),
  };
}

function worksheetData(id: string, sheet: DemoSheet): Partial<IWorksheetData> & { id: string } {
  const cells = new Map<string, ICellData>();
  const at = (row: number, column: number): ICellData => {
    const key = `${row}/${column}`;
    const cell = cells.get(key) ?? {};
    cells.set(key, cell);
    return cell;
  };
  for (const [address, rows] of Object.entries(sheet.blocks)) {
    const { top, left } = rectOf(address);
    rows.forEach((line, down) => {
      line.forEach((input, across) => {
        const cell = contents(input);
        if (cell) Object.assign(at(top + down, left + across), cell);
      });
    });
  }
  for (const [address, style] of Object.entries(sheet.styles)) restyle(address, STYLES[style], at);
  for (const [address, pattern] of Object.entries(sheet.numberFormats))
    restyle(address, { n: { pattern } }, at);
  for (const address of Object.keys(sheet.styles).filter((one) => sheet.styles[one] === 'header')) {
    const { left } = rectOf(address);
    if (left === 0) restyle(address, { ht: HorizontalAlign.CENTER }, at);
  }
  return {
    id,
    name: sheet.name,
    rowCount: ROWS,
    columnCount: COLUMNS,
    defaultColumnWidth: 88,
    defaultRowHeight: 22,
    showGridlines: BooleanNumber.TRUE,
    freeze: { xSplit: 0, ySplit: sheet.frozenRows, startRow: sheet.frozenRows, startColumn: -1 },
    columnData: Object.fromEntries(sheet.columnWidths.map((w, index) => [index, { w }])),
    rowData: { 0: { h: 30 } },
    cellData: matrixOf(cells),
  };
}

function restyle(address: string, style: IStyleData, at: (row: number, column: number) => ICellData): void {
  const rect = rectOf(address);
  for (let row = rect.top; row <= rect.bottom; row++) {
    for (let column = rect.left; column <= rect.right; column++) {
      const cell = at(row, column);
      const before = typeof cell.s === 'object' && cell.s !== null ? cell.s : {};
      cell.s = { ...before, ...style };
    }
  }
}

function contents(input: CellInput): ICellData | null {
  if (input === null || input === undefined) return null;
  if (typeof input === 'number') return { v: input, t: CellValueType.NUMBER };
  if (typeof input === 'boolean') return { v: input ? 1 : 0, t: CellValueType.BOOLEAN };
  return input.startsWith('=') ? { f: input } : { v: input, t: CellValueType.STRING };
}

function matrixOf(cells: ReadonlyMap<string, ICellData>): Record<number, Record<number, ICellData>> {
  const matrix: Record<number, Record<number, ICellData>> = {};
  for (const [key, cell] of cells) {
    const [row = 0, column = 0] = key.split('/').map(Number);
    matrix[row] = { ...matrix[row], [column]: cell };
  }
  return matrix;
}
