import { parseBlock } from '../host/address.ts';
import type { Workbook } from '../host/workbook.ts';
import type { Choice } from '../state/choice.ts';
import type { Corner } from './liveBlock.ts';

/** The first room to the right of the readings, on their sheet, with a free column and row around it. */
export async function freeCorner(
  workbook: Workbook,
  choice: Choice,
  size: { readonly rows: number; readonly columns: number },
): Promise<Corner> {
  const { sheet } = choice.y;
  const blocks = [choice.x, choice.y]
    .filter((place) => place.sheet === sheet)
    .map(({ address }) => parseBlock(address));
  const right = Math.max(0, ...blocks.map((block) => block?.right ?? 0));
  const top = Math.max(0, Math.min(...blocks.map((block) => block?.top ?? 0)) - 1);
  return workbook.run(async (context) => {
    const used = context.workbook.worksheets.getItem(sheet).getUsedRangeOrNullObject(true);
    used.load('rowIndex,columnIndex,columnCount');
    await context.sync();
    if (used.isNullObject) return { sheet, row: top, column: right + 2 };
    const end = used.columnIndex + used.columnCount;
    if (end <= right + 1) return { sheet, row: top, column: right + 2 };
    const beside = context.workbook.worksheets
      .getItem(sheet)
      .getRangeByIndexes(top, right + 1, size.rows + 1, end - right - 1)
      .load('valueTypes');
    await context.sync();
    const free = Array.from({ length: end - right - 1 }, (_, column) =>
      beside.valueTypes.every((line) => line[column] === 'Empty'),
    );
    for (let column = 1; column < free.length; column++) {
      const wanted = Array.from({ length: size.columns + 2 }, (_, k) => free[column - 1 + k] ?? true);
      if (wanted.every(Boolean)) return { sheet, row: top, column: right + 1 + column };
    }
    return { sheet, row: top, column: end + 1 };
  });
}
