import { bitOf, type Node } from './algebra.ts';
import type { StraightForm } from './law.ts';
import { axesOf, type LineNodes } from './lines.ts';
import { lineCost, sameLine } from './rankLines.ts';
import { findRelations, linesOf, PREDICTOR_BIT, RESPONSE_BIT } from './relations.ts';
import { type CertifiedForm, type FormTask, straightForm } from './straightForm.ts';

/** Constants that a line settles, and trial constants that may be added. */
const PER_LINE = 2;
export const MOST_TRIALS = 2;
/** Forms kept for one set of trials, by the number of trials. */
const MOST_FORMS: readonly number[] = [4, 2, 1];

/** A form that costs so much more than the best is no help to anyone. */
const COSTLIER = 16;

interface Ranked {
  readonly form: CertifiedForm;
  readonly cost: number;
}

/**
 * The straight forms of a law with as few trial constants as possible, best first.
 * @param equation left − right
 * @param decimal true when the law is written with powers or logarithms of 10
 * @returns empty when two trial constants do not make it straight
 */
export function findForms(equation: Node, task: Omit<FormTask, 'trials'>, decimal: boolean): StraightForm[] {
  const { unknown } = task;
  const fewest = Math.max(0, unknown.length - PER_LINE);
  const most = Math.min(MOST_TRIALS, unknown.length - 1);
  for (let count = fewest; count <= most; count++) {
    const ranked = subsets(unknown, count).flatMap((trials) =>
      formsFor(equation, { ...task, trials }, decimal),
    );
    if (ranked.length === 0) continue;
    const plain = ranked.filter(({ form }) => count === 0 || !form.responseOnBothAxes);
    return (plain.length > 0 ? plain : ranked)
      .sort((a, b) => a.cost - b.cost)
      .map(({ form }, i) => form.numbered(i + 1));
  }
  return [];
}

/**
 * The straight forms of a law that is solved without a search, however many trial constants a line leaves over: the
 * first two constants that a line settles.
 */
export function findWideForms(
  equation: Node,
  task: Omit<FormTask, 'trials'>,
  decimal: boolean,
): StraightForm[] {
  const { unknown } = task;
  for (const pair of subsets(unknown, PER_LINE)) {
    const trials = unknown.filter((index) => !pair.includes(index));
    const ranked = formsFor(equation, { ...task, trials }, decimal);
    if (ranked.length > 0) return ranked.map(({ form }, i) => form.numbered(i + 1));
  }
  return [];
}

function formsFor(equation: Node, task: FormTask, decimal: boolean): Ranked[] {
  const { g } = task;
  const maskOf = (indices: readonly number[]): number =>
    indices.reduce((mask, index) => mask | bitOf(index), 0);
  const trials = maskOf(task.trials);
  const unknown = maskOf(task.unknown) & ~trials;
  const lines = findRelations(g, equation, unknown)
    .flatMap((relation) => linesOf(g, relation, unknown))
    .flatMap((line) => axesOf(g, line, unknown, decimal))
    .filter((line) => settles(line, unknown))
    .map((line) => ({ line, cost: lineCost(line, trials, unknown) }))
    .sort((a, b) => a.cost - b.cost);
  const kept: { readonly line: LineNodes; readonly form: Ranked }[] = [];
  for (const { line, cost } of lines) {
    const best = kept[0];
    if (kept.length >= (MOST_FORMS[task.trials.length] ?? 1) || cost > (best?.form.cost ?? cost) + COSTLIER)
      break;
    // Where y itself is drawn against x alone, dividing through only bends the scatter.
    if (best !== undefined && best.line.vertical === g.symbol(1) && isDivided(line)) continue;
    if (kept.some((other) => redundant(line, other.line, task))) continue;
    const form = straightForm(line, task);
    if (form !== null) kept.push({ line, form: { form, cost } });
  }
  return kept.map(({ form }) => form);
}

/** Every unknown constant stands in the slope or the intercept, and they are no more than the terms they stand in. */
function settles(line: LineNodes, unknown: number): boolean {
  const inSlope = line.slope.mask & unknown;
  const inIntercept = line.intercept.mask & unknown;
  if ((inSlope | inIntercept) !== unknown) return false;
  const terms = (inSlope !== 0 ? 1 : 0) + (inIntercept !== 0 ? 1 : 0);
  return bits(unknown) <= terms && bits(inSlope | inIntercept) > 0;
}

function bits(mask: number): number {
  let count = 0;
  for (let rest = mask; rest !== 0; rest &= rest - 1) count++;
  return count;
}

function isDivided({ vertical, horizontal }: LineNodes): boolean {
  return (vertical.mask & PREDICTOR_BIT) !== 0 || (horizontal.mask & RESPONSE_BIT) !== 0;
}

function redundant(line: LineNodes, other: LineNodes, { g, rows }: FormTask): boolean {
  const sameKind = (line.intercept === g.zero) === (other.intercept === g.zero);
  return sameKind && sameLine(line, other, rows);
}

function subsets(items: readonly number[], size: number): number[][] {
  if (size === 0) return [[]];
  return items.flatMap((item, i) => subsets(items.slice(i + 1), size - 1).map((rest) => [item, ...rest]));
}
