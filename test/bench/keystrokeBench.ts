import type { FunctionsScript } from '../sheet/functionsScript.ts';
import { type HeadlessSheet, openSheet } from '../sheet/headless.ts';
import { decayReadings } from './readingsToTime.ts';
import { type Row, timeText } from './row.ts';
import { median } from './timing.ts';

const FORMULAS = 1_000;
const READINGS = 50;
const KEYSTROKES = 15;

/** A function of the same shape that does nothing, to show what the sheet itself takes. */
const nothing: FunctionsScript = {
  text: `CustomFunctions.associate('CONSTANT', function () { return 1 + Math.random(); });`,
  metadata: {
    functions: [
      {
        id: 'CONSTANT',
        parameters: ['x', 'y', 'law', 'name', 'part'].map((name, index) => ({
          name,
          dimensionality: index < 2 ? 'matrix' : 'scalar',
          optional: name === 'part',
        })),
      },
    ],
  },
};

/**
 * One reading typed in a sheet of a thousand formulas without a screen: until everything that depends on it is
 * calculated. A tenth of the formulas depend on the reading.
 */
export async function keystrokeBench(): Promise<Row[]> {
  const ours = await keystroke(undefined);
  const idle = await keystroke(nothing);
  return [
    {
      what: 'a keystroke among 1,000 formulas, 100 of which depend on it',
      size: `${READINGS} readings each`,
      time: timeText(ours),
      against: `functions that do nothing, in the same sheet (${timeText(idle)})`,
      ratio: ours / idle,
    },
  ];
}

async function keystroke(functions: FunctionsScript | undefined): Promise<number> {
  const sheet = await openSheet(functions === undefined ? {} : { functions });
  // Ten tables of readings side by side, a hundred formulas each.
  const tables = 10;
  for (let table = 0; table < tables; table++) {
    const { x, y } = decayReadings(READINGS);
    const [left, right] = [letter(2 * table), letter(2 * table + 1)];
    sheet.set(
      `${left}1`,
      x.map(([t]) => [Number(t)]),
    );
    sheet.set(
      `${right}1`,
      y.map(([c]) => [Number(c)]),
    );
    const part = (index: number) => ['value', 'u', 'low', 'high'][index % 4] ?? 'value';
    const law = (index: number) => (index % 3 === 0 ? 'exponential' : 'first order');
    const name = (index: number) => (index % 3 === 0 ? 'q' : 'k');
    const range = (column: string) => `${column}1:${column}${READINGS}`;
    sheet.set(
      `${letter(20 + table)}1`,
      Array.from({ length: FORMULAS / tables }, (_, i) => [
        `=TAUT.CONSTANT(${range(left)},${range(right)},"${law(i)}","${name(i)}","${part(i)}")`,
      ]),
    );
  }
  await sheet.settle(60_000);
  const took: number[] = [];
  for (let stroke = 0; stroke < KEYSTROKES; stroke++) took.push(await typeOnce(sheet, stroke));
  sheet.close();
  return median(took);
}

async function typeOnce(sheet: HeadlessSheet, stroke: number): Promise<number> {
  const before = sheet.get('U1');
  const started = performance.now();
  sheet.set('B25', 0.9 + stroke / 1e4);
  await sheet.settle();
  const took = performance.now() - started;
  if (sheet.get('U1') === before) throw new Error('the keystroke changed nothing');
  return took;
}

function letter(column: number): string {
  return column < 26 ? String.fromCharCode(65 + column) : `A${letter(column - 26)}`;
}
