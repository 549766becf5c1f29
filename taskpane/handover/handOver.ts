import type { Fit } from '../../core/fit/fit.ts';
import { handoverWords } from '../../core/words/handoverWords.ts';
import { workings } from '../../core/workings/workings.ts';
import { formatBlock, splitAddress } from '../host/address.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice, Place } from '../state/choice.ts';
import type { Block } from './block.ts';
import { cardBlock } from './cardBlock.ts';
import { chartsBlock } from './chartsBlock.ts';
import { drawCharts } from './drawCharts.ts';
import { fitHeights } from './fitHeights.ts';
import { formatNumbers } from './formatNumbers.ts';
import { freeSheetName } from './freeSheetName.ts';
import { type Corner, liveBlock } from './liveBlock.ts';
import { signal } from './looks.ts';
import { type FilledCell, filledCells } from './occupied.ts';
import { type CardPicture, showPictures } from './pictures.ts';
import { writtenFor } from './readsAs.ts';
import type { HandoverKind, Placed } from './records.ts';
import { literalArguments } from './sheetCall.ts';
import { workingsSource } from './workingsSource.ts';
import { writeBlock } from './writeBlock.ts';

/** What is to be handed over. */
export interface HandoverTask {
  readonly kind: HandoverKind;
  /** What the formulas read, with room for readings to come. */
  readonly choice: Choice;
  /** The panel's choice. */
  readonly of: Choice;
  /** The fit of every reading in the cells. */
  readonly fit: Fit;
  /** The constant in large type. */
  readonly constant: string;
  /** Where the live block goes; the others get a sheet of their own. */
  readonly corner: Corner;
  /** The day, written as it is. */
  readonly date: string;
  /** Draws the card's pictures. */
  readonly draw: (choice: Choice, fit: Fit) => Promise<readonly CardPicture[]>;
  /** Numbers what is placed: part of the names of areas and charts. */
  readonly number: number;
}

/** Asks the user; resolves to false when nothing may be written. */
export type Ask = (question: string, yes: string) => Promise<boolean>;

/**
 * Writes one hand-over into the workbook.
 * @param ask asked before cells that are not empty are overwritten
 * @returns what was placed; null when the user would rather not
 */
export async function handOver(workbook: Workbook, task: HandoverTask, ask: Ask): Promise<Placed | null> {
  switch (task.kind) {
    case 'block':
      return placeBlock(workbook, task, ask);
    case 'charts':
      return placeCharts(workbook, task);
    case 'card':
      return placeCard(workbook, task);
    case 'workings':
      return placeWorkings(workbook, task);
  }
}

async function placeBlock(workbook: Workbook, task: HandoverTask, ask: Ask): Promise<Placed | null> {
  const { choice, fit, corner, constant } = task;
  const { block } = liveBlock(choice, fit, corner, constant);
  const areaOf = (context: Excel.RequestContext): Excel.Range => rangeOf(context, corner, block);
  const found = await workbook.run(async (context) => {
    const range = areaOf(context);
    const cells = await filledCells(context, range);
    const columns = block.widths.map((_, k) => range.getColumn(k).load('format/columnWidth'));
    await context.sync();
    return { ...cells, widths: columns.map((column) => column.format.columnWidth) };
  });
  if (found.count > 0) {
    const question = handoverWords.occupied(found.count, splitAddress(found.address).cells);
    if (!(await ask(question, handoverWords.overwrite))) return null;
  }
  return workbook.run(async (context) => {
    const sheet = context.workbook.worksheets.getItem(corner.sheet);
    const range = areaOf(context);
    if (found.count > 0) range.clear('Contents');
    await writeBlock(context, sheet, corner, block);
    await formatNumbers(context, range, null);
    return record(context, task, sheet, range, {
      ownSheet: false,
      before: found.filled,
      widths: found.widths,
    });
  });
}

async function placeCharts(workbook: Workbook, task: HandoverTask): Promise<Placed> {
  return workbook.run(async (context) => {
    const { sheet, name } = await newSheet(context, handoverWords.sheetName.charts);
    const corner = { sheet: name, row: 0, column: 9 };
    const given = literalArguments(task.choice, task.fit, name);
    const { block, charts } = chartsBlock(task.choice, task.fit, given, corner);
    await writeBlock(context, sheet, corner, block);
    const range = rangeOf(context, corner, block);
    await formatNumbers(context, range, { column: 0, row: 3 });
    const over = [
      ['A1', 'H20'],
      ['A22', 'H41'],
    ] as const;
    const names = await drawCharts(context, sheet, charts, over, markOf(task));
    sheet.showGridlines = false;
    return record(context, task, sheet, range, { ownSheet: true, charts: names });
  });
}

async function placeCard(workbook: Workbook, task: HandoverTask): Promise<Placed> {
  const drawn = await task.draw(task.choice, task.fit);
  return workbook.run(async (context) => {
    const { sheet, name } = await newSheet(context, handoverWords.sheetName.card);
    const corner = { sheet: name, row: 0, column: 0 };
    const given = literalArguments(task.choice, task.fit, name);
    const { block, pictures } = cardBlock(task.choice, task.fit, given, corner, task.constant, task.date);
    await writeBlock(context, sheet, corner, block);
    const range = rangeOf(context, corner, block);
    await formatNumbers(context, range, null);
    await fitHeights(context, range, block);
    const shapes = await showCardPictures(context, sheet, drawn, pictures, task);
    sheet.showGridlines = false;
    const page = sheet.pageLayout;
    page.orientation = 'Portrait';
    page.centerHorizontally = true;
    page.zoom = { horizontalFitToPages: 1, verticalFitToPages: 1 };
    page.setPrintArea(range);
    return record(context, task, sheet, range, { ownSheet: true, shapes });
  });
}

async function showCardPictures(
  context: Excel.RequestContext,
  sheet: Excel.Worksheet,
  drawn: readonly CardPicture[],
  { top, bottom }: { readonly top: number; readonly bottom: number },
  task: HandoverTask,
): Promise<string[]> {
  const room = sheet.getRangeByIndexes(top, 1, bottom - top + 1, 5).load('left,top,width,height');
  await context.sync();
  return showPictures(context, sheet, drawn, room, markOf(task));
}

async function placeWorkings(workbook: Workbook, task: HandoverTask): Promise<Placed> {
  return workbook.run(async (context) => {
    const { sheet, name } = await newSheet(context, handoverWords.sheetName.workings);
    const corner = { sheet: name, row: 0, column: 0 };
    const plan = workings(task.fit, workingsSource(task.choice, task.fit, name));
    const block: Block = {
      cells: plan.cells.map(({ style, ...cell }) => ({ ...cell, look: style })),
      rows: plan.rows,
      columns: plan.columns,
      widths: plan.columnWidths,
    };
    await writeBlock(context, sheet, corner, block);
    const range = rangeOf(context, corner, block);
    await formatNumbers(context, range, { column: 5, row: plan.frozenRows });
    sheet.freezePanes.freezeRows(plan.frozenRows);
    sheet.showGridlines = false;
    const page = sheet.pageLayout;
    page.orientation = 'Landscape';
    page.zoom = { horizontalFitToPages: 1 };
    return record(context, task, sheet, range, { ownSheet: true });
  });
}

async function newSheet(
  context: Excel.RequestContext,
  wanted: string,
): Promise<{ readonly sheet: Excel.Worksheet; readonly name: string }> {
  const name = await freeSheetName(context, wanted);
  const sheet = context.workbook.worksheets.add(name);
  sheet.tabColor = signal;
  await context.sync();
  return { sheet, name };
}

function rangeOf(context: Excel.RequestContext, { sheet, row, column }: Corner, block: Block): Excel.Range {
  return context.workbook.worksheets.getItem(sheet).getRangeByIndexes(row, column, block.rows, block.columns);
}

function markOf({ kind, number }: HandoverTask): string {
  return `Tautline ${kind} ${number}`;
}

async function record(
  context: Excel.RequestContext,
  task: HandoverTask,
  sheet: Excel.Worksheet,
  range: Excel.Range,
  more: {
    readonly ownSheet: boolean;
    readonly charts?: readonly string[];
    readonly shapes?: readonly string[];
    readonly before?: readonly FilledCell[];
    readonly widths?: readonly number[];
  },
): Promise<Placed> {
  const { kind, number, choice, of } = task;
  const areaName = `Tautline_${kind}_${number}`;
  const sources = sourcesOf(choice);
  const sourceNames = sources.map((_, k) => `${areaName}_source_${k + 1}`);
  const { names, worksheets } = context.workbook;
  // What was deleted in the sheet may have left its names behind.
  const stale = [areaName, ...sourceNames].map((name) => names.getItemOrNullObject(name).load('name'));
  await context.sync();
  for (const old of stale) if (!old.isNullObject) old.delete();
  names.add(areaName, range).visible = false;
  sources.forEach((place, k) => {
    names.add(sourceNames[k] ?? '', worksheets.getItem(place.sheet).getRange(place.address)).visible = false;
  });
  sheet.activate();
  range.getCell(0, 0).select();
  sheet.load('name');
  range.load('rowIndex,columnIndex,rowCount,columnCount');
  await context.sync();
  const { rowIndex: top, columnIndex: left, rowCount, columnCount } = range;
  return {
    id: `${kind}-${number}`,
    kind,
    areaName,
    sourceNames,
    sheet: sheet.name,
    address: formatBlock({ top, left, bottom: top + rowCount - 1, right: left + columnCount - 1 }),
    ownSheet: more.ownSheet,
    charts: more.charts ?? [],
    shapes: more.shapes ?? [],
    before: more.before ?? [],
    widths: more.widths ?? [],
    frozen: null,
    of: writtenFor(of, choice),
  };
}

/** The ranges that the formulas of a choice read. */
function sourcesOf({ x, y, spreadY, spreadX }: Choice): Place[] {
  return [x, y, ...[spreadY, spreadX].flatMap((entry) => (entry.kind === 'range' ? [entry.place] : []))];
}
