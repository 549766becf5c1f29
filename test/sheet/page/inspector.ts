import { formatRect } from '../grid/address.ts';
import { isCellError } from '../grid/cell.ts';
import type { Grid } from '../grid/grid.ts';

/** Shows the selected cell's full value and, for an error, the sentence that came with it. */
export function attachInspector(grid: Grid): void {
  const [where, what, why] = ['where', 'what', 'why'].map((id) => document.getElementById(id));
  if (!where || !what || !why) throw new Error('the page lacks its inspector line');
  const showCell = (sheet: string, row: number, column: number) => {
    const cell = grid.read(sheet, row, column);
    const { value } = cell;
    where.textContent = formatRect({ top: row, left: column, bottom: row, right: column });
    what.textContent = value === null ? '' : isCellError(value) ? value.error : String(value);
    why.textContent = isCellError(value) ? (value.message ?? '') : '';
  };
  const refresh = () => {
    const { sheet, rects } = grid.selection();
    const last = rects.at(-1);
    if (last) showCell(sheet, last.top, last.left);
  };
  grid.listen((event) => {
    if (event.type === 'selected' || event.type === 'calculated' || event.type === 'activated') refresh();
  });
}
