interface CellPlace {
  readonly row: number;
  readonly column: number;
}

/** Cells asked about between two synchronisations. */
const CELLS_PER_SYNC = 1_000;

/**
 * Those cells of an area that stand on their own: not the ones into which another cell's formula spills. A host may
 * list the parent's formula for these.
 */
export async function standingAlone<C extends CellPlace>(
  context: Excel.RequestContext,
  range: Excel.Range,
  cells: readonly C[],
): Promise<C[]> {
  const alone: C[] = [];
  for (let from = 0; from < cells.length; from += CELLS_PER_SYNC) {
    const asked = cells.slice(from, from + CELLS_PER_SYNC).map((cell) => {
      const own = range.getCell(cell.row, cell.column).load('address');
      return { cell, own, parent: own.getSpillParentOrNullObject().load('address') };
    });
    await context.sync();
    for (const { cell, own, parent } of asked) {
      if (parent.isNullObject || parent.address === own.address) alone.push(cell);
    }
  }
  return alone;
}
