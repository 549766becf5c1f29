import type { Node } from './algebra.ts';
import type { LineNodes } from './lines.ts';
import { nodeValue } from './nodes.ts';
import { PREDICTOR_BIT, READING_BITS, RESPONSE_BIT } from './relations.ts';

/**
 * How hard a line is to read and how far its axes bend the readings' scatter: small for y against x, larger for
 * every function, and much larger where the response stands on both axes or a trial constant shapes an axis.
 * @param trials mask of the trial constants
 * @param unknown mask of the other unknown constants
 */
export function lineCost(line: LineNodes, trials: number, unknown: number): number {
  const tellsNothing = (term: Node): boolean =>
    (term.mask & unknown) === 0 &&
    (trials !== 0 || term.mask === 0) &&
    !(term.kind === 'number' && term.value === 0);
  const { vertical, horizontal, slope, intercept, merged } = line;
  const axes = cost(vertical) + cost(horizontal);
  const terms = 0.3 * (cost(slope) + cost(intercept));
  return (
    axes +
    terms +
    ((vertical.mask & PREDICTOR_BIT) === 0 ? 0 : isAdded(vertical) ? 2 : 4) +
    (horizontal.kind === 'symbol' ? 0 : 0.7) +
    ((horizontal.mask & RESPONSE_BIT) !== 0 ? 12 : 0) +
    (mixesLogarithm(vertical) || mixesLogarithm(horizontal) ? 20 : 0) +
    (shapes(vertical, trials) || shapes(horizontal, trials) ? 10 : 0) +
    (invertsInside(vertical) ? 3 : 0) +
    // A known term is a check worth drawing; a term that only a trial constant fills is not.
    (merged && trials === 0 ? 10 : 0) +
    (tellsNothing(intercept) || (trials === 0 && slope.mask === 0 && intercept.mask !== 0) ? 8 : 0)
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

/** True where response and predictor stand in terms of their own: y − c·x². */
function isAdded(node: Node): boolean {
  return node.kind === 'sum' && node.parts.every(({ mask }) => (mask & READING_BITS) !== READING_BITS);
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

/**
 * True when both lines have the same axes but for factors and offsets free of readings, or the same axes exchanged.
 * @param rows points on the curve, each row with the same constants
 */
export function sameLine(a: LineNodes, b: LineNodes, rows: readonly (readonly Float64Array[])[]): boolean {
  const same = (p: Node, q: Node): boolean => p === q || isAffine(p, q, rows);
  return (
    (same(a.vertical, b.vertical) && same(a.horizontal, b.horizontal)) ||
    (same(a.vertical, b.horizontal) && same(a.horizontal, b.vertical))
  );
}

/** True when p is a straight line in q while the constants stay the same. */
function isAffine(p: Node, q: Node, rows: readonly (readonly Float64Array[])[]): boolean {
  let equal = 0;
  let tested = 0;
  for (const row of rows) {
    const ps = row.map((point) => nodeValue(p, point));
    const qs = row.map((point) => nodeValue(q, point));
    const [p0 = 0, p1 = 0] = ps;
    const [q0 = 0, q1 = 0] = qs;
    for (let i = 2; i < row.length; i++) {
      const left = ((ps[i] ?? 0) - p0) * (q1 - q0);
      const right = ((qs[i] ?? 0) - q0) * (p1 - p0);
      if (!Number.isFinite(left + right)) continue;
      tested++;
      if (Math.abs(left - right) <= 1e-6 * (Math.abs(left) + Math.abs(right))) equal++;
    }
  }
  // Rounding near a limit of the response may spoil a few.
  return equal > 2 && equal >= 0.7 * tested;
}
