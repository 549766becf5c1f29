import type { Cell } from '../../core/readings/readings.ts';
import { hostWords } from '../../core/words/panelWords.ts';
import type { Place } from '../state/choice.ts';
import { formatBlock, LAST_ROW, parseBlock, splitAddress } from './address.ts';
import { cellOf } from './cellOf.ts';
import { subscribe } from './hostEvents.ts';
import { asHostTrouble } from './hostTrouble.ts';
import { type CellChange, HostTrouble, type SelectedArea, type Workbook } from './workbook.ts';

/** One request stays well below the 5 MB that hosts allow. */
const CELLS_PER_REQUEST = 40_000;

/** Blank cells at the end of a selection are places for readings to come; beyond so many the whole column is meant. */
const MOST_BLANK_ROWS = 500;

const AREA = 'address,rowIndex,columnIndex,rowCount,columnCount';

const changeKinds: ReadonlyMap<string, CellChange['kind']> = new Map<string, CellChange['kind']>([
  ['RangeEdited', 'cells'],
  ['RowInserted', 'rowsInserted'],
  ['RowDeleted', 'rowsDeleted'],
  ['ColumnInserted', 'columnsInserted'],
  ['ColumnDeleted', 'columnsDeleted'],
]);

/** Whether the host can undo everything that one batch did in a single step. */
function undoesTogether(): boolean {
  return typeof Office !== 'undefined' && Office.context.requirements.isSetSupported('ExcelApi', '1.20');
}

async function run<T>(work: (context: Excel.RequestContext) => Promise<T>): Promise<T> {
  try {
    return await (undoesTogether() ? Excel.run({ mergeUndoGroup: true }, work) : Excel.run(work));
  } catch (error) {
    throw asHostTrouble(error);
  }
}

function areaOf(range: Excel.Range, sheet: string): SelectedArea {
  return {
    sheet,
    address: splitAddress(range.address).cells.replaceAll('$', ''),
    row: range.rowIndex,
    column: range.columnIndex,
    rows: range.rowCount,
    columns: range.columnCount,
  };
}

function area(sheet: string, row: number, column: number, rows: number, columns: number): SelectedArea {
  const address = formatBlock({
    top: row,
    left: column,
    bottom: row + rows - 1,
    right: column + columns - 1,
  });
  return { sheet, address, row, column, rows, columns };
}

/** Areas that span whole columns end where the longest of them ends. */
function levelled(areas: readonly SelectedArea[], whole: boolean): SelectedArea[] {
  if (!whole) return [...areas];
  const top = Math.min(...areas.map(({ row }) => row));
  const end = Math.max(...areas.map(({ row, rows }) => row + rows));
  return areas.map(({ sheet, column, columns }) => area(sheet, top, column, end - top, columns));
}

/** Whether a selection means "this column" rather than these cells. */
function isWhole(range: Excel.Range, used: Excel.Range | undefined): boolean {
  const filled = used === undefined || used.isNullObject ? 0 : used.rowCount;
  return range.rowCount - filled > MOST_BLANK_ROWS;
}

async function readSelection(context: Excel.RequestContext): Promise<SelectedArea[]> {
  const selected = context.workbook.getSelectedRanges();
  selected.worksheet.load('name');
  selected.areas.load('items');
  await context.sync();
  const { name } = selected.worksheet;
  const ranges = selected.areas.items;
  for (const range of ranges) range.load(`${AREA},cellCount`);
  const used = ranges.map((range) => range.getUsedRangeOrNullObject(true).load(AREA));
  await context.sync();
  const [only] = ranges;
  if (only !== undefined && ranges.length === 1 && only.cellCount === 1) {
    const block = only.getSurroundingRegion().load(AREA);
    await context.sync();
    return [areaOf(block, name)];
  }
  const filled = used.filter((range) => !range.isNullObject);
  if (filled.length === 0 && only !== undefined)
    throw new HostTrouble('selection', hostWords.blankSelection());
  const whole = filled.length > 0 && ranges.every((range, index) => isWhole(range, used[index]));
  if (!whole) return ranges.map((range) => areaOf(range, name));
  return levelled(
    filled.map((range) => areaOf(range, name)),
    whole,
  );
}

const nowhere: CellChange = { sheet: '', address: '', kind: 'other' };

/** Ids of sheets by the names under which they were met: an id outlives a new name. */
const idsByName = new Map<string, string>();

async function sheetOf(context: Excel.RequestContext, name: string): Promise<Excel.Worksheet> {
  const { worksheets } = context.workbook;
  const known = idsByName.get(name);
  const named = worksheets.getItemOrNullObject(name).load('name,id');
  const renamed = known === undefined ? named : worksheets.getItemOrNullObject(known).load('name,id');
  await context.sync();
  const sheet = named.isNullObject ? renamed : named;
  if (sheet.isNullObject) throw new HostTrouble('gone', hostWords.noSheet(name));
  idsByName.set(sheet.name, sheet.id);
  return sheet;
}

async function located(context: Excel.RequestContext, place: Place): Promise<SelectedArea> {
  const block = parseBlock(place.address);
  const sheet = await sheetOf(context, place.sheet);
  const range = sheet.getRange(place.address).load(AREA);
  const used = range.getUsedRangeOrNullObject(true).load(AREA);
  await context.sync();
  // Whole columns and rows mean what is in use of them; a name means its cells.
  const whole = block !== undefined && (range.rowCount === LAST_ROW + 1 || !/\d/.test(place.address));
  if (!whole) return areaOf(range, sheet.name);
  if (used.isNullObject) throw new HostTrouble('selection', hostWords.blankSelection());
  return areaOf(used, sheet.name);
}

async function readBlocks(context: Excel.RequestContext, place: Place): Promise<Cell[][]> {
  const { sheet, row, column, rows, columns } = await located(context, place);
  const worksheet = context.workbook.worksheets.getItem(sheet);
  const step = Math.max(1, Math.floor(CELLS_PER_REQUEST / columns));
  const cells: Cell[][] = [];
  for (let from = 0; from < rows; from += step) {
    const range = worksheet.getRangeByIndexes(row + from, column, Math.min(step, rows - from), columns);
    range.load('values,valueTypes');
    await context.sync();
    const types = range.valueTypes;
    range.values.forEach((line: readonly unknown[], down) => {
      cells.push(line.map((value, across) => cellOf(value, types[down]?.[across])));
    });
  }
  return cells;
}

/** The workbook of the spreadsheet program around the panel. */
export const excelWorkbook: Workbook = {
  run,
  selection: () => run(readSelection),
  readCells: (place) => run((context) => readBlocks(context, place)),
  locate: (place) => run((context) => located(context, place)),
  cellsAbove: (place, wanted) =>
    run(async (context) => {
      const { sheet, row, column, columns } = await located(context, place);
      const rows = Math.min(wanted, row);
      return rows === 0 ? [] : readBlocks(context, area(sheet, row - rows, column, rows, columns));
    }),
  select: (place) =>
    run(async (context) => {
      const { sheet, address } = await located(context, place);
      const worksheet = context.workbook.worksheets.getItem(sheet);
      worksheet.activate();
      worksheet.getRange(address).select();
      await context.sync();
    }),
  onChange: (heard) =>
    together([
      subscribe((context) =>
        context.workbook.worksheets.onChanged.add(async (event) => {
          const kind = changeKinds.get(event.changeType) ?? 'other';
          const { cells } = splitAddress(event.address);
          const sheet = await sheetName(event.worksheetId).catch(() => undefined);
          // Even when the host will not say where, something has changed.
          heard(sheet === undefined ? nowhere : { sheet, address: cells, kind });
        }),
      ),
      subscribe((context) => context.workbook.worksheets.onDeleted.add(async () => heard(nowhere))),
    ]),
  onCalculated: (heard) =>
    subscribe((context) => context.workbook.worksheets.onCalculated.add(async () => heard())),
  onSelection: (heard) =>
    together([
      subscribe((context) => context.workbook.onSelectionChanged.add(async () => heard())),
      subscribe((context) => context.workbook.worksheets.onActivated.add(async () => heard())),
    ]),
  loadSetting: (key) =>
    run(async (context) => {
      const setting = context.workbook.settings.getItemOrNullObject(key).load('value');
      await context.sync();
      return setting.isNullObject ? null : (setting.value as unknown);
    }),
  saveSetting: (key, value) =>
    run(async (context) => {
      context.workbook.settings.add(key, value);
      await context.sync();
    }),
};

/** One end for several subscriptions. */
function together(ends: readonly (() => void)[]): () => void {
  return () => {
    for (const end of ends) end();
  };
}

/** The name that a sheet has now; undefined for one that is gone again. */
async function sheetName(id: string): Promise<string | undefined> {
  return run(async (context) => {
    const sheet = context.workbook.worksheets.getItemOrNullObject(id).load('name');
    await context.sync();
    return sheet.isNullObject ? undefined : sheet.name;
  });
}
