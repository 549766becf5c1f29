import type { Algebra, Node } from './algebra.ts';
import type { LineNodes } from './lines.ts';
import { valueOf } from './nodes.ts';
import { PREDICTOR_BIT, READING_BITS, RESPONSE_BIT } from './relations.ts';

/**
 * How hard a line is to read and how far its axes bend the readings' scatter: small for y against x, larger for
 * every function, and much larger where the response stands on both axes or a trial constant shapes an axis.
 * @param trials mask of the trial constants
 * @param unknown mask of the other unknown constants
 */
export function lineCost(line: LineNodes, trials: number, unknown: number): number {
  const isFilled = (term: Node): boolean => (term.mask & unknown) === 0;
  const { vertical, horizontal, slope, intercept, merged } = line;
  const axes = cost(vertical) + cost(horizontal);
  const terms = 0.3 * (cost(slope) + cost(intercept));
  return (
    axes +
    terms +
    ((vertical.mask & PREDICTOR_BIT) !== 0 ? 4 : 0) +
    ((horizontal.mask & RESPONSE_BIT) !== 0 ? 12 : 0) +
    (mixesLogarithm(vertical) || mixesLogarithm(horizontal) ? 20 : 0) +
    (shapes(vertical, trials) || shapes(horizontal, trials) ? 10 : 0) +
    (invertsInside(vertical) ? 3 : 0) +
    // A known term is a check worth drawing; a term that only a trial constant fills is not.
    (merged && trials === 0 ? 20 : 0) +
    (trials !== 0 && intercept.mask !== 0 && isFilled(intercept) ? 8 : 0)
  );
}

function cost(node: Node): number {
  const parts = node.parts.reduce((total, part) => total + cost(part), 0);
  switch (node.kind) {
    case 'number':
      return Math.abs(node.value) === 1 ? 0.2 : 0.5;
    case 'symbol':
      return 1;
    case 'sum':
      return parts + 0.5 * (node.parts.length - 1);
    case 'product':
      return parts;
    case 'function':
      return parts + 1.5;
    case 'power': {
      const exponent = node.parts[1];
      const plain = exponent?.kind === 'number' && Number.isInteger(exponent.value);
      return parts + (plain ? 0.6 : 1.7);
    }
  }
}

/** True for ln(L/y − 1), which reads better as ln(y/(L − y)). */
function invertsInside(node: Node): boolean {
  const [argument] = node.parts;
  if (node.kind !== 'function' || argument?.kind !== 'sum') return node.parts.some(invertsInside);
  return argument.parts.some((term) =>
    (term.kind === 'product' ? term.parts : [term]).some(
      (factor) =>
        factor.kind === 'power' &&
        (factor.mask & RESPONSE_BIT) !== 0 &&
        factor.parts[1]?.kind === 'number' &&
        factor.parts[1].value < 0,
    ),
  );
}

/** A logarithm of readings times other readings: ln(y)/x. */
function mixesLogarithm(node: Node): boolean {
  const terms = node.kind === 'sum' ? node.parts : [node];
  return terms.some((term) => {
    if (term.kind !== 'product') return false;
    const held = term.parts.filter((factor) => (factor.mask & READING_BITS) !== 0);
    return (
      held.length > 1 &&
      held.some((factor) => factor.kind === 'function' || factor.parts[0]?.kind === 'function')
    );
  });
}

/** True where a trial constant stands with readings in an exponent or a function: a rate, not a shift or a limit. */
function shapes(node: Node, trials: number): boolean {
  const both = (part: Node | undefined): boolean =>
    part !== undefined && (part.mask & trials) !== 0 && (part.mask & READING_BITS) !== 0;
  if (!both(node)) return false;
  const [base, exponent] = node.parts;
  if (node.kind === 'power' && exponent !== undefined && (exponent.mask & trials) !== 0) return true;
  if (node.kind === 'function' && node.name !== 'ln' && both(base)) return true;
  return node.parts.some((part) => shapes(part, trials));
}

/** True when both lines have the same axes but for a factor and an offset, or the same axes exchanged. */
export function sameLine(g: Algebra, a: LineNodes, b: LineNodes, points: readonly Float64Array[]): boolean {
  const same = (p: Node, q: Node): boolean => p === q || proportional(g, p, q, points);
  return (
    (same(a.vertical, b.vertical) && same(a.horizontal, b.horizontal)) ||
    (same(a.vertical, b.horizontal) && same(a.horizontal, b.vertical))
  );
}

/** True when p/q is the same number at every point. */
function proportional(g: Algebra, p: Node, q: Node, points: readonly Float64Array[]): boolean {
  const ratio = g.divide(p, q);
  if ((ratio.mask & READING_BITS) === 0) return true;
  // Points differ in their constants; moving the readings alone along the curve is not needed: a ratio that
  // depends on readings differs between any two points.
  const ratios = points.map((point) => valueOf(p, point) / valueOf(q, point)).filter(Number.isFinite);
  const middle = [...ratios].sort((a, b) => a - b)[ratios.length >> 1] ?? Number.NaN;
  // Rounding near a limit of the response may spoil a few.
  const equal = ratios.filter((one) => Math.abs(one - middle) <= 1e-7 * Math.abs(middle)).length;
  return equal > 2 && equal >= 0.7 * ratios.length;
}
