import { type AcceptanceCheck, type Argument, acceptanceChecks } from './acceptanceChecks.ts';
import { acceptanceData, type DataName } from './acceptanceData.ts';
import type { Expected } from './computeCheck.ts';

/** A check with its formula and the value that it must show. */
export interface SheetRow {
  readonly check: AcceptanceCheck;
  readonly formula: string;
  readonly expected: Expected;
}

/** Sheet row of the first reading and of the first check. */
export const FIRST_ROW = 5;
const CHECK_COLUMNS = { what: 'J', formula: 'K', expected: 'L', verdict: 'M' } as const;
/** Without it the host would read the file in the system's old alphabet, and ± would not survive. */
const BYTE_ORDER_MARK = '\uFEFF';
const RELATIVE_TOLERANCE = '1E-9';

/** The checks as rows of the sheet, their values computed. */
export function sheetRows(compute: (check: AcceptanceCheck) => Expected): SheetRow[] {
  return acceptanceChecks.map((check) => ({ check, formula: formulaOf(check), expected: compute(check) }));
}

/** The formula as typed into the sheet, shown in one cell. */
export function formulaOf({ id, arguments: list, cell }: AcceptanceCheck): string {
  const call = `TAUT.${id}(${list.map(argumentText).join(',')})`;
  return cell === undefined ? `=${call}` : `=INDEX(${call},${cell.join(',')})`;
}

function argumentText(argument: Argument): string {
  if (typeof argument === 'number') return String(argument);
  if (typeof argument === 'string') return argument === '' ? '' : `"${argument.replaceAll('"', '""')}"`;
  const { cells, column, first } = argument;
  const letter = dataColumns(cells)[column];
  const count = first ?? acceptanceData()[cells].x.length;
  return `$${letter}$${FIRST_ROW}:$${letter}$${FIRST_ROW + count - 1}`;
}

function dataColumns(name: DataName): { x: string; y: string } {
  const place = Object.keys(acceptanceData()).indexOf(name);
  return { x: String.fromCharCode(65 + 2 * place), y: String.fromCharCode(66 + 2 * place) };
}

/** A file that a spreadsheet opens: readings on the left, on the right each formula, its value and a verdict. */
export function acceptanceCsv(rows: readonly SheetRow[]): string {
  const data = Object.values(acceptanceData());
  const last = FIRST_ROW + rows.length - 1;
  const { formula, expected, verdict } = CHECK_COLUMNS;
  const length = Math.max(rows.length, ...data.map(({ x }) => x.length));
  const gap = '';
  const lines: (string | number)[][] = [
    ['Tautline: acceptance sheet'],
    ['agreeing:', `=COUNTIF(${verdict}${FIRST_ROW}:${verdict}${last},"agrees")`, 'of', rows.length],
    [...data.flatMap(({ title, source }) => [title, source])],
    [
      ...data.flatMap(({ xHeading, yHeading }) => [xHeading, yHeading]),
      gap,
      'check',
      'formula',
      'expected',
      'verdict',
    ],
  ];
  for (let i = 0; i < length; i++) {
    const readings = data.flatMap(({ x, y }) => [x[i] ?? '', y[i] ?? '']);
    const row = rows[i];
    const place = FIRST_ROW + i;
    const check = row && [
      row.check.what,
      row.formula,
      row.expected,
      verdictOf(row.expected, `${formula}${place}`, `${expected}${place}`),
    ];
    lines.push([...readings, gap, ...(check ?? [])]);
  }
  return `${BYTE_ORDER_MARK}${lines.map((line) => line.map(csvCell).join(',')).join('\r\n')}\r\n`;
}

function verdictOf(expected: Expected, got: string, wanted: string): string {
  if (typeof expected === 'number') {
    return `=IFERROR(IF(ABS(${got}-${wanted})<=${RELATIVE_TOLERANCE}*ABS(${wanted}),"agrees","differs"),"differs")`;
  }
  // ERROR.TYPE: 3 is #VALUE!, 7 is #N/A. A file's #N/A text becomes the error itself on opening.
  if (expected === '#VALUE!') return `=IFERROR(IF(ERROR.TYPE(${got})=3,"agrees","differs"),"differs")`;
  if (expected === '#N/A') return `=IF(ISNA(${got}),"agrees","differs")`;
  return `=IFERROR(IF(EXACT(${got},${wanted}),"agrees","differs"),"differs")`;
}

/** RFC 4180: text with a comma, a quote or a line's end stands in quotes, quotes in it doubled. */
function csvCell(cell: string | number): string {
  const text = String(cell);
  return /[",\r\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text;
}
