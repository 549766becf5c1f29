import { handoverWords } from '../../core/words/handoverWords.ts';
import { HostTrouble, type Workbook } from '../host/workbook.ts';
import type { FrozenFormula, Placed } from './records.ts';
import { standingAlone } from './spills.ts';
import { asTyped } from './writeBlock.ts';

/** In the workings only what calls the add-in is frozen: their plain formulas are what they are for. */
function toFreeze({ kind }: Placed, formula: string): boolean {
  return kind !== 'workings' || /TAUT\./i.test(formula);
}

/** Puts values in place of the formulas of what was placed. */
export async function freeze(workbook: Workbook, placed: Placed): Promise<Placed> {
  return workbook.run(async (context) => {
    const { range, at } = await areaNow(context, placed);
    range.load('formulas,values');
    await context.sync();
    // What a cell may hold, as the host lists it.
    const values = range.values as (string | number | boolean)[][];
    const listed = range.formulas.flatMap((line: unknown[], row: number) =>
      line.flatMap((formula, column) =>
        typeof formula === 'string' && formula.startsWith('=') && toFreeze(placed, formula)
          ? [{ row, column, formula }]
          : [],
      ),
    );
    const alone = await standingAlone(context, range, listed);
    const found = alone.map((cell) => ({
      ...cell,
      spill: range.getCell(cell.row, cell.column).getSpillingToRangeOrNullObject(),
    }));
    for (const { spill } of found) spill.load('rowCount,columnCount');
    await context.sync();
    const formulas: FrozenFormula[] = found.map(({ row, column, formula, spill }) => ({
      row,
      column,
      formula,
      rows: spill.isNullObject ? 1 : spill.rowCount,
      columns: spill.isNullObject ? 1 : spill.columnCount,
    }));
    for (const { row, column, rows, columns } of formulas) {
      const cells = range.getCell(row, column).getAbsoluteResizedRange(rows, columns);
      cells.clear('Contents');
      cells.values = Array.from({ length: rows }, (_, down) =>
        Array.from({ length: columns }, (_unused, across) => written(values[row + down]?.[column + across])),
      );
    }
    await context.sync();
    return { ...placed, frozen: { at, formulas } };
  });
}

function written(value: string | number | boolean | undefined): string | number | boolean {
  if (typeof value !== 'string') return value ?? '';
  // An error stays an error; other text stays text.
  return /^#[A-Z/0!?]+$/.test(value) ? value : asTyped({ kind: 'text', content: value });
}

/** Puts the formulas back. @throws HostTrouble when the cells have moved since */
export async function thaw(workbook: Workbook, placed: Placed): Promise<Placed> {
  const { frozen } = placed;
  if (frozen === null) return placed;
  return workbook.run(async (context) => {
    const { range, at } = await areaNow(context, placed);
    if (at !== frozen.at) throw new HostTrouble('gone', handoverWords.movedAway());
    for (const { row, column, rows, columns } of frozen.formulas) {
      range.getCell(row, column).getAbsoluteResizedRange(rows, columns).clear('Contents');
    }
    for (const { row, column, formula } of frozen.formulas) range.getCell(row, column).formulas = [[formula]];
    await context.sync();
    return { ...placed, frozen: null };
  });
}

/** The area as it lies now, and where it and what it reads are. */
async function areaNow(
  context: Excel.RequestContext,
  { areaName, sourceNames }: Placed,
): Promise<{ readonly range: Excel.Range; readonly at: string }> {
  const { names } = context.workbook;
  const range = names.getItem(areaName).getRange().load('address');
  const sources = sourceNames.map((name) =>
    names.getItemOrNullObject(name).getRangeOrNullObject().load('address'),
  );
  await context.sync();
  // A range whose cells were deleted has no address any more.
  const places = sources.map((source) => (source.isNullObject ? '' : source.address));
  return { range, at: [range.address, ...places].join(' ') };
}
