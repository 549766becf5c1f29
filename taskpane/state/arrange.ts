import { Problem } from '../../core/problem.ts';
import type { Cell } from '../../core/readings/readings.ts';
import { readingsWords } from '../../core/words/panelWords.ts';
import { formatBlock } from '../host/address.ts';
import type { SelectedArea } from '../host/workbook.ts';
import type { Heading, Place } from './choice.ts';
import { parseHeading } from './heading.ts';

/** A header stands at most so many blank cells above its readings. */
const MOST_BLANKS = 2;

/** A selected area with its cells and the rows of cells above it, the farthest first. */
export interface AreaCells {
  readonly area: SelectedArea;
  readonly cells: readonly (readonly Cell[])[];
  readonly above: readonly (readonly Cell[])[];
}

/** Which cells hold the predictor, which the response, and what their headers call them. */
export interface Arrangement {
  readonly x: Place;
  readonly y: Place;
  readonly xHeading: Heading;
  readonly yHeading: Heading;
  /** Every series of numbers that was selected, x and y among them. */
  readonly columns: readonly Column[];
}

/** A series of numbers in the sheet with what its header calls it. */
export interface Column {
  readonly place: Place;
  readonly heading: Heading;
}

/** A row or a column of cells that may hold readings, or a whole block read row by row. */
interface Series {
  readonly sheet: string;
  readonly cells: readonly Cell[];
  /** Header cells before it, the nearest last. */
  readonly before: readonly Cell[];
  /** The place of the cells from the given one on. */
  from(index: number): Place;
}

/**
 * Finds predictor and response in what is selected: two columns, two rows, two areas, or the first two columns of a
 * table that hold numbers. Header cells inside the selection or right above it give the names and units.
 * @throws Problem `argument` saying what to select instead
 */
export function arrange(areas: readonly AreaCells[]): Arrangement {
  const series = seriesOf(areas).filter(({ cells }) => cells.some(isNumber));
  const [x, y] = series;
  if (x === undefined || y === undefined) {
    throw new Problem('argument', 'x', readingsWords.selectTwo(series.length));
  }
  if (x.cells.length !== y.cells.length) {
    throw new Problem('argument', 'y', readingsWords.selectEqual(x.cells.length, y.cells.length));
  }
  // Whatever stands before the first number in either column is header.
  const first = x.cells.findIndex((cell, index) => isNumber(cell) || isNumber(y.cells[index]));
  const columns = series
    .filter(({ cells }) => cells.length === x.cells.length)
    .map(
      (one): Column => ({
        place: one.from(first),
        heading: headingOf(one, first) ?? nameless(one.from(first)),
      }),
    );
  return {
    x: x.from(first),
    y: y.from(first),
    xHeading: headingOf(x, first) ?? { name: 'x', unit: '' },
    yHeading: headingOf(y, first) ?? { name: 'y', unit: '' },
    columns,
  };
}

/** A series without a header goes by its cells. */
function nameless({ address }: Place): Heading {
  return { name: address, unit: '' };
}

function isNumber(cell: Cell | undefined): boolean {
  return typeof cell === 'number';
}

function seriesOf(areas: readonly AreaCells[]): Series[] {
  const blocks = areas.filter(({ area }) => area.rows > 1 && area.columns > 1);
  const [one, other] = areas;
  if (areas.length === 2 && blocks.length === 2 && one && other && sameShape(one.area, other.area)) {
    return areas.map(wholeBlock);
  }
  const wide = areas.length === 1 && one !== undefined && one.area.rows === 2 && one.area.columns > 2;
  return areas.flatMap((block) => {
    const rows = wide || (block.area.rows === 1 && block.area.columns > 1);
    return rows ? block.cells.map((_, row) => rowSeries(block, row)) : columnsOf(block);
  });
}

function sameShape(one: SelectedArea, other: SelectedArea): boolean {
  return one.rows === other.rows && one.columns === other.columns;
}

function columnsOf(block: AreaCells): Series[] {
  const { area, cells, above } = block;
  return Array.from({ length: area.columns }, (_, column) => ({
    sheet: area.sheet,
    cells: cells.map((row) => row[column] ?? null),
    before: above.map((row) => row[column] ?? null),
    from: (index) => placeIn(area, index, column, area.rows - 1, column),
  }));
}

function rowSeries({ area, cells }: AreaCells, row: number): Series {
  return {
    sheet: area.sheet,
    cells: cells[row] ?? [],
    before: [],
    from: (index) => placeIn(area, row, index, row, area.columns - 1),
  };
}

function wholeBlock({ area, cells }: AreaCells): Series {
  return {
    sheet: area.sheet,
    cells: cells.flat(),
    before: [],
    from: () => placeIn(area, 0, 0, area.rows - 1, area.columns - 1),
  };
}

function placeIn(area: SelectedArea, top: number, left: number, bottom: number, right: number): Place {
  const { sheet, row, column } = area;
  return {
    sheet,
    address: formatBlock({
      top: row + top,
      left: column + left,
      bottom: row + bottom,
      right: column + right,
    }),
  };
}

/** The nearest text before a series' first reading, past readings that were not selected. */
function headingOf({ cells, before }: Series, first: number): Heading | undefined {
  const header = [...before, ...cells.slice(0, first)].reverse();
  const end = header.findIndex((cell) => !isNumber(cell));
  let blanks = 0;
  for (const cell of end < 0 ? [] : header.slice(end)) {
    if (typeof cell === 'string' && cell.trim() !== '') return parseHeading(cell);
    if ((cell !== null && cell !== '') || ++blanks > MOST_BLANKS) return undefined;
  }
  return undefined;
}
