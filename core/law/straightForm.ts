import { lawWords } from '../words/lawWords.ts';
import { bitOf, MOST_SYMBOLS, type Node } from './algebra.ts';
import { columnFunction } from './columnFunction.ts';
import { type Expression, functionOf, negate, symbolsIn } from './expression.ts';
import { isolate } from './isolate.ts';
import type { ColumnFunction, StraightForm } from './law.ts';
import { lazy } from './lazy.ts';
import { lineSolver } from './lineSolver.ts';
import type { LineNodes } from './lines.ts';
import { nodeValue, substitute } from './nodes.ts';
import { present } from './present.ts';
import { folds, PrincipalBranch } from './principalBranch.ts';
import { printExpression } from './printExpression.ts';
import { READING_BITS, RESPONSE_BIT } from './relations.ts';
import { SidedAxis } from './sidedAxis.ts';
import { type Ground, strictFunction } from './strictFunction.ts';

/** What a form is made for: which symbols are unknown and which of them are trials. */
export interface FormTask extends Ground {
  /** Unknown constants as indices of symbols, trials among them. */
  readonly unknown: readonly number[];
  readonly trials: readonly number[];
  readonly linear: boolean;
  readonly curve: ColumnFunction | null;
  /** Points on the curve in rows with the same constants. */
  readonly rows: readonly (readonly Float64Array[])[];
}

/** A line that has proved to be a straight form of the law; only its number is missing. */
export interface CertifiedForm {
  readonly responseOnBothAxes: boolean;
  /** The form with its number; its inverse, its solutions and its edges are worked out when first asked for. */
  readonly numbered: (number: number) => StraightForm;
}

/** Points that must lie on the line before a form is believed. */
const FEWEST_CERTIFIED = 4;

/**
 * Makes a straight form of a line and certifies it: at random points of the curve, its vertical axis must equal
 * slope · horizontal + intercept.
 * @returns null when it does not
 */
export function straightForm(line: LineNodes, task: FormTask): CertifiedForm | null {
  const { g, symbols, plain, wide } = task;
  const presentation = { g, names: symbols, plain, wide };
  const vertical = present(line.vertical, presentation);
  const horizontal = present(line.horizontal, presentation);
  const slope = present(line.slope, { ...presentation, like: vertical.sides[0] });
  const intercept = present(line.intercept, { ...presentation, like: vertical.sides[0] });
  const axis = (expression: Expression): ColumnFunction => columnFunction(expression, symbols);
  const verticalOf = axis(vertical.expression);
  const horizontalOf = axis(horizontal.expression);
  const slopeOf = axis(slope.expression);
  const interceptOf = axis(intercept.expression);

  let hits = 0;
  let misses = 0;
  for (const point of [...plain, ...wide]) {
    const onLine = slopeOf.at(point) * horizontalOf.at(point);
    const offset = interceptOf.at(point);
    const value = verticalOf.at(point);
    const gap = Math.abs(value - (onLine + offset)) / (Math.abs(value) + Math.abs(onLine) + Math.abs(offset));
    if (gap < 1e-6) hits++;
    else if (gap > 1e-4 && isSteady(verticalOf, point, value)) misses++;
  }
  if (hits < FEWEST_CERTIFIED) return null;

  const proportional = line.intercept === g.zero;
  const both = (line.horizontal.mask & RESPONSE_BIT) !== 0;
  const inNode = (node: Node): string[] =>
    task.unknown
      .filter((index) => (node.mask & bitOf(index)) !== 0 && !task.trials.includes(index))
      .map((index) => symbols[index] ?? '');
  const trials = task.trials.map((index) => symbols[index] ?? '');
  const sides = [...vertical.sides, ...horizontal.sides];
  const notes = [
    ...(both ? [lawWords.noteBothAxes(symbols[1] ?? '')] : []),
    ...(misses > 0 ? [lawWords.noteBranch()] : []),
    ...(sides.length > 0 ? [lawWords.noteSides(), ...otherSide(vertical.expression)] : []),
    ...(task.linear && trials.length > 0 ? [lawWords.noteLinear()] : []),
    ...(!task.linear && trials.length > 0 ? [lawWords.noteTrial(trials)] : []),
    ...knownTerm(line, task),
  ];
  const sided = sides.length > 0;
  const back = lazy(() => (both || sided ? null : responseFrom(line.vertical, verticalOf, task)));
  const [side] = vertical.sides;
  const upright = (axis: ColumnFunction): ColumnFunction => {
    if (side === undefined) return folded === null ? axis : new PrincipalBranch(axis, folded);
    return new SidedAxis(axis, {
      argument: strictFunction(side, task),
      curve: task.curve,
      unknown: task.unknown,
      byMajority: task.trials.length === 0,
    });
  };
  const folded = !both && !sided && folds(line.vertical) ? back() : null;
  const solver = lazy(() => lineSolver(line, task, slopeOf, interceptOf));
  const edges = lazy(() => task.trials.map((trial) => edgesOf(line, trial, task)));
  const form = {
    plot: textOf(vertical.expression),
    against: textOf(horizontal.expression),
    slope: textOf(slope.expression),
    intercept: textOf(intercept.expression),
    trials,
    note: notes.join('; '),
    proportional,
    responseOnBothAxes: both,
    vertical: upright(verticalOf),
    horizontal: horizontalOf,
    slopeOf,
    interceptOf,
    inSlope: inNode(line.slope),
    inIntercept: inNode(line.intercept),
  };
  return {
    responseOnBothAxes: both,
    numbered: (number) => ({
      number,
      ...form,
      get responseFrom() {
        return back();
      },
      solve: (...args) => solver()(...args),
      get trialEdges() {
        return edges();
      },
    }),
  };
}

/** False where rounding of the response alone moves the axis: near a limit that the response tends to. */
function isSteady(vertical: ColumnFunction, point: Float64Array, value: number): boolean {
  const moved = Float64Array.from(point);
  moved[1] = (point[1] ?? 0) * (1 + 1e-9);
  return Math.abs(vertical.at(moved) - value) <= 1e-5 * Math.abs(value);
}

function knownTerm(line: LineNodes, task: FormTask): string[] {
  const unknown = task.unknown.reduce((mask, index) => mask | bitOf(index), 0);
  if (line.intercept.kind === 'number' && line.intercept.value === 0) return [];
  if ((line.slope.mask & unknown) === 0) return [lawWords.noteKnownTerm('slope')];
  return (line.intercept.mask & unknown) === 0 ? [lawWords.noteKnownTerm('intercept')] : [];
}

/** Text for people; ln|u| of a sum whose sign is not known beforehand is shown as ln(u), on one side. */
function textOf(expression: Expression): string {
  return printExpression(openSides(expression), 'text');
}

/** ln|u| of a plain difference, written for readings on the other side: ln(yf − y). */
function otherSide(expression: Expression): string[] {
  const inner = expression.kind === 'function' && expression.name === 'ln' ? expression.argument : undefined;
  const sum = inner?.kind === 'function' && inner.name === 'abs' ? inner.argument : undefined;
  if (sum?.kind !== 'sum') return [];
  const turned: Expression = { kind: 'sum', terms: [...sum.terms].reverse().map(negate) };
  return [lawWords.noteSide(printExpression(functionOf('ln', turned), 'text'))];
}

function openSides(part: Expression): Expression {
  switch (part.kind) {
    case 'sum':
      return { kind: 'sum', terms: part.terms.map(openSides) };
    case 'product':
      return { kind: 'product', factors: part.factors.map(openSides) };
    case 'power':
      return { kind: 'power', base: openSides(part.base), exponent: openSides(part.exponent) };
    case 'function': {
      const inner = part.argument;
      const bare = part.name === 'ln' && inner.kind === 'function' && inner.name === 'abs';
      return { ...part, argument: openSides(bare ? inner.argument : inner) };
    }
    default:
      return part;
  }
}

/** The response from a value of the vertical axis, which takes the response's slot. */
function responseFrom(vertical: Node, axis: ColumnFunction, task: FormTask): ColumnFunction | null {
  const { g, symbols, plain } = task;
  const free = symbols.length;
  if (free >= MOST_SYMBOLS) return null;
  const points = plain.map((point) => Float64Array.of(...point, axis.at(point)));
  let best: Node | undefined;
  let most = 2;
  for (const node of isolate(g, g.subtract(vertical, g.symbol(free)), 1)) {
    const hits = points.filter((point) => {
      const wanted = point[1] ?? Number.NaN;
      return Math.abs(nodeValue(node, point) - wanted) <= 1e-6 * Math.abs(wanted);
    }).length;
    if (hits > most) [best, most] = [node, hits];
  }
  if (best === undefined) return null;
  const moved = points.map((point) => {
    const inputs = Float64Array.from(point.subarray(0, free));
    inputs[1] = point[free] ?? Number.NaN;
    return inputs;
  });
  const node = substitute(g, best, free, g.symbol(1));
  return strictFunction(node, { ...task, plain: moved, wide: [] });
}

/** Most edges per trial constant. */
const MOST_EDGES = 4;

/** Where sums inside the axes become zero, as values of the trial constant. */
function edgesOf(line: LineNodes, trial: number, task: FormTask): ColumnFunction[] {
  const { g, symbols } = task;
  const sums = new Set<Node>();
  const collect = (node: Node): void => {
    if ((node.mask & bitOf(trial)) === 0) return;
    if (node.kind === 'sum' && (node.mask & READING_BITS) !== 0) sums.add(node);
    for (const part of node.parts) collect(part);
  };
  collect(line.vertical);
  collect(line.horizontal);
  const hidden = new Set(
    task.unknown.filter((index) => !task.trials.includes(index)).map((index) => symbols[index] ?? ''),
  );
  const edges: ColumnFunction[] = [];
  for (const sum of sums) {
    for (const node of isolate(g, sum, trial)) {
      const edge = strictFunction(node, task);
      if (edges.length < MOST_EDGES && ![...symbolsIn(edge.expression)].some((name) => hidden.has(name)))
        edges.push(edge);
    }
  }
  return edges;
}
