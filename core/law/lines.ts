import type { Algebra, Node } from './algebra.ts';
import { powerParts } from './nodes.ts';
import { type LineRelation, type Part, READING_BITS, RESPONSE_BIT } from './relations.ts';

/** A way of drawing the law: vertical = slope·horizontal + intercept. */
export interface LineNodes {
  readonly vertical: Node;
  readonly horizontal: Node;
  readonly slope: Node;
  readonly intercept: Node;
  /** True for the line through the origin that stands beside one with a known term. */
  readonly merged: boolean;
}

/** Every choice of axes that a relation allows. */
export function axesOf(g: Algebra, line: LineRelation, unknowns: number, decimal: boolean): LineNodes[] {
  const [a, b, c] = line.parts;
  if (a === undefined || b === undefined) return [];
  const choices: LineNodes[] = [];
  const add = (raw: LineNodes): void => {
    const { vertical, horizontal } = raw;
    if ((vertical.mask & RESPONSE_BIT) === 0 || (horizontal.mask & READING_BITS) === 0) return;
    choices.push(finished(g, raw, unknowns, decimal));
  };
  if (c === undefined) {
    for (const raw of [...proportional(g, a, b), ...proportional(g, b, a)])
      add({ ...raw, merged: line.merged });
    return choices;
  }
  const orders: readonly (readonly [Part, Part, Part])[] = [
    [a, b, c],
    [a, c, b],
    [b, a, c],
    [b, c, a],
    [c, a, b],
    [c, b, a],
  ];
  for (const [response, predictor, divisor] of orders) {
    add({
      vertical: g.divide(response.basis, divisor.basis),
      horizontal: g.divide(predictor.basis, divisor.basis),
      slope: negatedRatio(g, predictor.coefficient, response.coefficient),
      intercept: negatedRatio(g, divisor.coefficient, response.coefficient),
      merged: line.merged,
    });
  }
  return choices;
}

/** −a/b, term by term. */
function negatedRatio(g: Algebra, a: Node, b: Node): Node {
  return g.sum(...g.terms(a).map((term) => g.negate(g.divide(term, b))));
}

/** Lines through the origin: the response's factors against all others, as they stand and raised to plain powers. */
function proportional(g: Algebra, response: Part, predictor: Part): Omit<LineNodes, 'merged'>[] {
  if ((response.basis.mask & RESPONSE_BIT) === 0) return [];
  const ratio = g.divide(response.basis, predictor.basis);
  const factors = g.factors(ratio);
  const own = factors.filter((factor) => (factor.mask & RESPONSE_BIT) !== 0);
  const others = factors.filter((factor) => (factor.mask & RESPONSE_BIT) === 0);
  const exponents = new Set([1]);
  for (const factor of factors) {
    const power = powerParts(factor)?.[1];
    const exponent = power?.kind === 'number' ? power.value : 1;
    exponents.add(Math.abs(1 / exponent));
  }
  const vertical = g.product(...own);
  const horizontal = g.power(g.product(...others), g.minusOne);
  const slope = negatedRatio(g, predictor.coefficient, response.coefficient);
  const power = own.length === 1 && own[0] !== undefined ? powerParts(own[0])?.[1] : undefined;
  const upright = power?.kind === 'number' && power.value < 0 ? -1 : 1;
  return [...exponents]
    .map((exponent) => upright * exponent)
    .filter((exponent) => exponent === 1 || g.splitNumber(slope)[0] > 0)
    .map((exponent) => ({
      vertical: g.power(vertical, g.number(exponent)),
      horizontal: g.power(horizontal, g.number(exponent)),
      slope: g.power(slope, g.number(exponent)),
      intercept: g.zero,
    }));
}

/** Numbers pulled out, known multiples of the slope moved into the horizontal axis, signs and base of logarithms chosen. */
function finished(g: Algebra, raw: LineNodes, unknowns: number, decimal: boolean): LineNodes {
  let { vertical, horizontal, slope, intercept } = raw;
  const scaleVertical = (by: Node): void => {
    vertical = scaled(g, vertical, by);
    slope = scaled(g, slope, by);
    intercept = scaled(g, intercept, by);
  };
  const scaleHorizontal = (by: Node): void => {
    horizontal = scaled(g, horizontal, by);
    slope = scaled(g, slope, g.power(by, g.minusOne));
  };
  const pulled = (node: Node): Node => g.power(g.number(g.splitNumber(node)[0]), g.minusOne);
  if (vertical.kind !== 'sum') scaleVertical(pulled(vertical));
  if (horizontal.kind !== 'sum') scaleHorizontal(pulled(horizontal));

  if ((slope.mask & unknowns) !== 0) {
    for (const term of g.terms(intercept)) {
      const ratio = g.divide(term, slope);
      if ((term.mask & unknowns) === 0 || (ratio.mask & unknowns) !== 0 || ratio.kind === 'number') continue;
      horizontal = g.sum(horizontal, ratio);
      intercept = g.subtract(intercept, term);
    }
  }
  if (leadingSign(g, vertical, RESPONSE_BIT) < 0) scaleVertical(g.minusOne);
  if (horizontal.kind === 'sum' && g.splitNumber(slope)[0] < 0 && !isLogarithmic(g, horizontal)) {
    scaleHorizontal(g.minusOne);
  } else if (isLogarithmic(g, horizontal) && leadingSign(g, horizontal, READING_BITS) < 0) {
    scaleHorizontal(g.minusOne);
  }
  if (decimal) {
    const perDecade = g.power(g.ln(g.number(10)), g.minusOne);
    if (isLogarithmic(g, vertical)) scaleVertical(perDecade);
    if (isLogarithmic(g, horizontal)) scaleHorizontal(perDecade);
  }
  return { vertical, horizontal, slope, intercept, merged: raw.merged };
}

function scaled(g: Algebra, node: Node, by: Node): Node {
  return g.sum(...g.terms(node).map((term) => g.product(term, by)));
}

/** Sign of the smallest term that holds the bits. */
function leadingSign(g: Algebra, node: Node, bits: number): number {
  const terms = g.terms(node).filter((term) => (term.mask & bits) !== 0);
  const [lead] = [...terms].sort((a, b) => g.splitNumber(a)[1].size - g.splitNumber(b)[1].size);
  return lead === undefined ? 1 : Math.sign(g.splitNumber(lead)[0]);
}

/** A logarithm, or a sum of logarithms and nothing else. */
export function isLogarithmic(g: Algebra, node: Node): boolean {
  return g.terms(node).every((term) => {
    const inner = g.splitNumber(term)[1];
    return inner.kind === 'function' && inner.name === 'ln';
  });
}
