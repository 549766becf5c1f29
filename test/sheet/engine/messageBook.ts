import { type CellValue, isCellError } from '../grid/cell.ts';
import type { CallResult } from '../grid/grid.ts';
import { type CalledFrom, isMatrix } from './hostFunction.ts';

/** Remembers the sentences that came with errors, by the cell whose formula made them. */
export class MessageBook {
  private readonly kept = new Map<string, { whole: string | undefined; cells: Map<string, string> }>();

  keep(from: CalledFrom, result: CallResult): void {
    const key = `${from.sheet}/${from.row}/${from.column}`;
    const cells = new Map<string, string>();
    let whole: string | undefined;
    if (isMatrix(result)) {
      result.forEach((row, down) => {
        row.forEach((cell, across) => {
          const message = sentence(cell);
          if (message !== undefined) cells.set(`${down}/${across}`, message);
        });
      });
    } else {
      whole = sentence(result);
    }
    this.kept.set(key, { whole, cells });
  }

  /** The sentence for a cell, given the cell that holds the formula. */
  at(
    sheet: string,
    originRow: number,
    originColumn: number,
    row: number,
    column: number,
  ): string | undefined {
    const kept = this.kept.get(`${sheet}/${originRow}/${originColumn}`);
    return kept?.cells.get(`${row - originRow}/${column - originColumn}`) ?? kept?.whole;
  }
}

function sentence(value: CellValue): string | undefined {
  return isCellError(value) ? value.message : undefined;
}
