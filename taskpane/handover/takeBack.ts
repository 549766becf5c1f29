import { handoverWords } from '../../core/words/handoverWords.ts';
import { splitAddress } from '../host/address.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Ask } from './handOver.ts';
import type { Placed } from './records.ts';

/**
 * Removes what was placed and puts back what stood there before; what was deleted in the sheet is gone already.
 * @param ask asked before a sheet is deleted on which others have written
 * @returns false when the user would rather keep it
 */
export async function takeBack(workbook: Workbook, placed: Placed, ask: Ask): Promise<boolean> {
  if (placed.ownSheet) {
    const { others, sheet } = await workbook.run((context) => cellsOfOthers(context, placed));
    if (others > 0 && !(await ask(handoverWords.others(others, sheet), handoverWords.deleteSheet)))
      return false;
  }
  await workbook.run(async (context) => {
    const named = context.workbook.names.getItemOrNullObject(placed.areaName);
    const range = named.getRangeOrNullObject();
    range.load('address');
    const sources = placed.sourceNames.map((name) =>
      context.workbook.names.getItemOrNullObject(name).load('name'),
    );
    await context.sync();
    // The names first: a host may drop one together with its sheet.
    for (const name of [named, ...sources]) if (!name.isNullObject) name.delete();
    if (!range.isNullObject) {
      const { sheet, cells } = splitAddress(range.address);
      const worksheet = context.workbook.worksheets.getItem(sheet);
      if (placed.ownSheet) worksheet.delete();
      else restore(worksheet.getRange(cells), placed);
    }
    await context.sync();
  });
  return true;
}

function restore(range: Excel.Range, { before, widths }: Placed): void {
  range.clear('All');
  for (const { row, column, content } of before) {
    range.getCell(row, column).formulas = [
      [typeof content === 'string' && !content.startsWith('=') ? `'${content}` : content],
    ];
  }
  widths.forEach((width, column) => {
    range.getColumn(column).format.columnWidth = width;
  });
}

/** Filled cells outside the area of what was placed, on its sheet. */
async function cellsOfOthers(
  context: Excel.RequestContext,
  { areaName }: Placed,
): Promise<{ readonly others: number; readonly sheet: string }> {
  const range = context.workbook.names.getItemOrNullObject(areaName).getRangeOrNullObject();
  range.load('rowIndex,columnIndex,rowCount,columnCount');
  await context.sync();
  if (range.isNullObject) return { others: 0, sheet: '' };
  const { worksheet } = range;
  worksheet.load('name');
  const used = worksheet.getUsedRange(true).load('rowIndex,columnIndex,values');
  await context.sync();
  let others = 0;
  used.values.forEach((line: unknown[], row: number) => {
    line.forEach((value, column) => {
      const down = used.rowIndex + row - range.rowIndex;
      const across = used.columnIndex + column - range.columnIndex;
      const inside = down >= 0 && across >= 0 && down < range.rowCount && across < range.columnCount;
      if (value !== '' && !inside) others++;
    });
  });
  return { others, sheet: worksheet.name };
}
