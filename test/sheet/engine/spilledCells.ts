/** The engine's spilled cells of one workbook: by sheet, row and column. */
export type SpilledCells = Readonly<Record<string, object | null | undefined>>;

/** Which columns of which rows hold a spilled value, small enough to keep between calculations. */
export function spilledColumns(cells: SpilledCells): Map<string, string[]> {
  const rows = new Map<string, string[]>();
  for (const [sheet, matrix] of Object.entries(cells)) {
    for (const [row, line] of Object.entries<object | null | undefined>({ ...matrix })) {
      const columns = Object.entries<unknown>({ ...line }).flatMap(([column, cell]) =>
        cell ? [column] : [],
      );
      if (columns.length > 0) rows.set(`${sheet}/${row}`, columns);
    }
  }
  return rows;
}

/** Tells whether any cell that was spilled over before no longer is. */
export function spillVanished(
  before: ReadonlyMap<string, string[]>,
  after: ReadonlyMap<string, string[]>,
): boolean {
  for (const [row, columns] of before) {
    const now = after.get(row);
    if (!now) return true;
    if (now.length < columns.length) return true;
    const held = new Set(now);
    if (columns.some((column) => !held.has(column))) return true;
  }
  return false;
}
