import type { FitSettings, Spread } from '../../core/given/given.ts';
import { parseKnown } from '../../core/given/parseKnown.ts';
import { parseOptions } from '../../core/given/parseOptions.ts';
import { parseSpread, requireKnownUncertainty, type SpreadArgument } from '../../core/given/parseSpread.ts';
import type { Problem } from '../../core/problem.ts';
import type { Cell } from '../../core/readings/readings.ts';
import type { Choice, SpreadEntry } from './choice.ts';
import { attempt, problemIn } from './outcome.ts';
import type { SheetCells } from './sheetCells.ts';

/** The options that say how the chosen law is drawn and settled; a comparison of laws goes without them. */
const OWN_OPTIONS: ReadonlySet<string> = new Set(['form', 'fit', 'intercept', 'interval', 'band', 'outside']);

/** Known constants of a choice that a law has, as the sheet functions take them: `R=1000; V0=12±0.05`. */
export function knownText(choice: Choice, constants: readonly string[]): string {
  return choice.known
    .filter(({ name, text }) => text.trim() !== '' && constants.includes(name))
    .map(({ name, text }) => `${name}=${text}`)
    .join('; ');
}

/** Options of a choice as the sheet functions take them: `coverage=0.99; intercept=held`. */
export function optionsText(choice: Choice): string {
  return [...choice.options].map(([name, value]) => `${name}=${value}`).join('; ');
}

/**
 * What a fit of a law depends on besides the readings.
 * @param constants the constants of the law; what is known of others is not asked
 * @param count number of pairs of cells
 * @throws Problem `argument` that names what cannot be read
 */
export function settingsFor(
  choice: Choice,
  constants: readonly string[],
  cells: SheetCells,
  count: number,
): FitSettings {
  const known = parseKnown(knownText(choice, constants));
  return { known, ...spreadsOf(choice, cells, count), options: parseOptions(optionsText(choice)) };
}

/** As `settingsFor`, for judging a law beside others: without what was set for the chosen law alone. */
export function comparisonSettings(
  choice: Choice,
  constants: readonly string[],
  cells: SheetCells,
  count: number,
): FitSettings {
  const options = new Map([...choice.options].filter(([name]) => !OWN_OPTIONS.has(name)));
  return settingsFor({ ...choice, options }, constants, cells, count);
}

function spreadsOf(
  choice: Choice,
  cells: SheetCells,
  count: number,
): { readonly spreadY: Spread; readonly spreadX: Spread } {
  const spreadY = spreadOf('u_y', choice.spreadY, cells.spreadY, count);
  const spreadX = spreadOf('u_x', choice.spreadX, cells.spreadX, count);
  requireKnownUncertainty(spreadY, spreadX);
  return { spreadY, spreadX };
}

function spreadOf(
  argument: SpreadArgument,
  entry: SpreadEntry,
  range: readonly (readonly Cell[])[] | null,
  count: number,
): Spread {
  return parseSpread(argument, entry.kind === 'range' ? (range ?? []) : entry.text, count);
}

/** What is wrong with each input on its own: known constants by name, and `u_y`, `u_x`, `options`. */
export function inputProblems(
  choice: Choice,
  constants: readonly string[],
  cells: SheetCells | null,
  count: number,
): ReadonlyMap<string, Problem> {
  const problems = new Map<string, Problem>();
  const note = (input: string, compute: () => unknown): void => {
    const problem = problemIn(attempt(compute));
    if (problem !== undefined) problems.set(input, problem);
  };
  for (const { name, text } of choice.known) {
    if (constants.includes(name) && text.trim() !== '')
      note(`known:${name}`, () => parseKnown(`${name}=${text}`));
  }
  if (cells !== null) {
    note('u_y', () => spreadOf('u_y', choice.spreadY, cells.spreadY, count));
    note('u_x', () => spreadOf('u_x', choice.spreadX, cells.spreadX, count));
    if (!problems.has('u_y') && !problems.has('u_x')) note('u_x', () => spreadsOf(choice, cells, count));
  }
  note('options', () => parseOptions(optionsText(choice)));
  return problems;
}
