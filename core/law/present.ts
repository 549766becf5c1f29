import type { Algebra, Node } from './algebra.ts';
import { type Expression, type FunctionName, functionOf, numberOf, powerOf, symbolOf } from './expression.ts';
import { nodeValue } from './nodes.ts';
import { READING_BITS, RESPONSE_BIT } from './relations.ts';

/** What is needed to write a node for people: names, and points that tell the signs of logarithms' arguments. */
export interface Presentation {
  readonly g: Algebra;
  readonly names: readonly string[];
  /** Points on the curve with everything positive. */
  readonly plain: readonly Float64Array[];
  /** Points with constants of either sign; they count where what is asked about has positive symbols only. */
  readonly wide: readonly Float64Array[];
  /** Argument of either sign that goes with this one: every logarithm's argument then has either sign, written as this. */
  readonly like?: Node | undefined;
}

/**
 * Writes a node as an expression on its strict domain: every logarithm gets the sign that its argument has on the
 * curve, logarithms that are added become one, ln u / ln 10 becomes log10 u.
 * @returns the expression and the arguments of logarithms that may have either sign (written as ln|u|)
 */
export function present(
  node: Node,
  { g, names, plain, wide, like }: Presentation,
): { expression: Expression; sides: Node[] } {
  const sides: Node[] = [];

  /** 1 or −1 when the node has that sign at every point, 0 otherwise. */
  const signOf = (one: Node): number =>
    signAt(one, [...plain, ...wide.filter((point) => like !== undefined || allPositive(one.mask, point))]);
  const signAt = (one: Node, points: readonly Float64Array[]): number => {
    let sign: number | undefined;
    for (const point of points) {
      const here = Math.sign(nodeValue(one, point));
      if (Number.isNaN(here) || here === 0) continue;
      if (sign !== undefined && here !== sign) return 0;
      sign = here;
    }
    return sign ?? 1;
  };

  const sum = (node: Node): Expression => {
    const terms = joinedLogarithms(node);
    const written = terms.map((term) => (typeof term === 'function' ? term() : write(term)));
    const positive = written.filter((term) => !startsNegative(term));
    const negative = written.filter(startsNegative);
    return { kind: 'sum', terms: [...positive, ...negative] };
  };

  /** Terms of a sum, with two or more logarithms of whole or reading-free multiples joined to one. */
  const joinedLogarithms = (node: Node): (Node | (() => Expression))[] => {
    const joinable: [Node, Node][] = [];
    const others: Node[] = [];
    for (const term of g.terms(node)) {
      const factors = g.factors(term);
      const logarithm = factors.find((factor) => factor.kind === 'function' && factor.name === 'ln');
      const argument = logarithm?.parts[0];
      const multiple = g.product(...factors.filter((factor) => factor !== logarithm));
      const axis = (node.mask & READING_BITS) !== 0;
      const fits = axis ? (multiple.mask & READING_BITS) === 0 : multiple.kind === 'number';
      if (argument !== undefined && fits) joinable.push([argument, multiple]);
      else others.push(term);
    }
    if (joinable.length < 2) return [...g.terms(node)];
    // A divisor common to all (ln 10 of a decimal axis) stays outside.
    const perDecade = g.power(g.ln(g.number(10)), g.minusOne);
    const decimal = joinable.every(([, multiple]) => g.factors(multiple).includes(perDecade));
    const powers = joinable.map(([argument, multiple]) =>
      powerFor(argument, decimal ? g.divide(multiple, perDecade) : multiple),
    );
    const logarithm = (): Expression => {
      const one = logarithmOf(powers);
      return decimal
        ? { kind: 'product', factors: [one, powerOf(functionOf('ln', numberOf(10)), numberOf(-1))] }
        : one;
    };
    return [logarithm, ...others];
  };

  const powerFor = (argument: Node, multiple: Node): readonly [Node, Node] => [argument, multiple];

  /** ln of a product of powers. */
  const logarithmOf = (powers: readonly (readonly [Node, Node])[]): Expression => {
    const oriented = powers.map(([argument, exponent]) => {
      const sign = signOf(argument);
      return { argument: sign < 0 ? g.negate(argument) : argument, exponent, sign };
    });
    const open = oriented.filter(({ sign }) => sign === 0);
    const whole = g.product(...open.map(({ argument, exponent }) => g.power(argument, exponent)));
    const together = open.length === 0 ? 1 : signOf(whole);
    const [lead] = open;
    const turned = together === 0 ? isTurned(whole) : together < 0;
    if (turned && lead !== undefined) lead.argument = g.negate(lead.argument);
    const factors = oriented.map(({ argument, exponent }) => {
      const base = write(argument);
      return exponent === g.one ? base : powerOf(base, write(exponent));
    });
    const argument = spread(factors);
    if (together !== 0) return functionOf('ln', argument);
    sides.push(turned ? g.negate(whole) : whole);
    return functionOf('ln', functionOf('abs', argument));
  };

  /** True for an argument of either sign that is better written the other way round: y − yf, and ln(y0 − yf) with it. */
  const isTurned = (whole: Node): boolean => {
    if (like !== undefined) return signOf(g.product(whole, like)) < 0;
    const usual = signAt(whole, plain);
    if (usual !== 0) return usual < 0;
    const term = g.terms(whole).find(({ mask }) => (mask & RESPONSE_BIT) !== 0) ?? g.terms(whole)[0];
    return term !== undefined && g.splitNumber(term)[0] < 0;
  };

  /** (m − y)/m as 1 − y/m: a single sum over a single divisor without readings is divided term by term. */
  const spread = (factors: readonly Expression[]): Expression => {
    const [top, bottom] = factors;
    if (factors.length === 2 && top?.kind === 'sum' && bottom?.kind === 'power') {
      const same = top.terms.some((term) => JSON.stringify(term) === JSON.stringify(bottom.base));
      if (same && bottom.exponent.kind === 'number' && bottom.exponent.value === -1) {
        return {
          kind: 'sum',
          terms: top.terms.map((term) =>
            JSON.stringify(term) === JSON.stringify(bottom.base) ? numberOf(1) : flatProduct([term, bottom]),
          ),
        };
      }
    }
    return flatProduct([...factors]);
  };

  const product = (node: Node): Expression => {
    const parts = [...node.parts].sort((a, b) => place(a) - place(b));
    const factors: Expression[] = [];
    const perDecade = g.power(g.ln(g.number(10)), g.minusOne);
    const logarithm = parts.findIndex((part) => part.kind === 'function' && part.name === 'ln');
    const decade = parts.indexOf(perDecade);
    if (logarithm >= 0 && decade >= 0) {
      const [one, other] = [parts[logarithm], parts[decade]];
      if (one !== undefined && other !== undefined) {
        const rest = parts.filter((part) => part !== one && part !== other);
        const log: Expression = { kind: 'product', factors: [write(one), write(other)] };
        return rest.length === 0 ? log : { kind: 'product', factors: [...rest.map(write), log] };
      }
    }
    const [first] = parts;
    if (first?.kind === 'number' && first.value < 0) {
      const turned = parts.findIndex((part) => {
        const [base, exponent] = g.splitPower(part);
        const odd = exponent.kind === 'number' && Math.abs(exponent.value % 2) === 1;
        return base.kind === 'sum' && odd && base.parts.some((term) => g.splitNumber(term)[0] < 0);
      });
      const part = parts[turned];
      if (part !== undefined) {
        const [base, exponent] = g.splitPower(part);
        const size = -first.value;
        if (size !== 1) factors.push(numberOf(size));
        for (const [i, one] of parts.entries()) {
          if (i === 0) continue;
          if (i !== turned) factors.push(write(one));
          else
            factors.push(
              exponent === g.one ? write(g.negate(base)) : powerOf(write(g.negate(base)), write(exponent)),
            );
        }
        return flatProduct(factors);
      }
    }
    return flatProduct(parts.map(write));
  };

  const write = (part: Node): Expression => {
    const [first, second] = part.parts;
    switch (part.kind) {
      case 'number':
        return numberOf(part.value);
      case 'symbol':
        return part.name === ''
          ? symbolOf(names[part.value] ?? '')
          : { kind: 'symbol', name: part.name, value: part.value };
      case 'sum':
        return single(sum(part));
      case 'product':
        return product(part);
      case 'power':
        return first !== undefined && second !== undefined
          ? powerOf(write(first), write(second))
          : numberOf(Number.NaN);
      case 'function':
        if (first === undefined) return numberOf(Number.NaN);
        if (part.name === 'ln') return logarithmOf([[first, g.one]]);
        // Nodes of this kind are made from function names alone.
        return functionOf(part.name as FunctionName, write(first));
    }
  };
  return { expression: write(node), sides };
}

/** Numbers first, then constants, readings, and all that needs parentheses: 2b·x·(a + x). */
function place(factor: Node): number {
  const base = factor.kind === 'power' ? factor.parts[0] : factor;
  if (factor.kind === 'number') return 0;
  if (base?.kind === 'number') return 1;
  if (base?.kind !== 'symbol' || base.name === 'E') return 4;
  return (base.mask & READING_BITS) === 0 ? 2 : 3;
}

function allPositive(mask: number, point: Float64Array): boolean {
  return point.every((value, index) => (mask & (1 << index)) === 0 || value > 0);
}

function single(expression: Expression): Expression {
  const [only] = expression.kind === 'sum' ? expression.terms : [];
  return expression.kind === 'sum' && expression.terms.length === 1 && only !== undefined ? only : expression;
}

/** Factors as one product, numbers first; a quotient of two logarithms' bases stays as it is. */
function flatProduct(factors: readonly Expression[]): Expression {
  const isDecimal = (factor: Expression): boolean =>
    factor.kind === 'product' && factor.factors.length === 2 && factor.factors[0]?.kind === 'function';
  const flat = factors.flatMap((factor) =>
    factor.kind === 'product' && !isDecimal(factor) ? factor.factors : [factor],
  );
  const number = flat.reduce((value, factor) => (factor.kind === 'number' ? value * factor.value : value), 1);
  const rest = flat.filter((factor) => factor.kind !== 'number');
  const all = number === 1 && rest.length > 0 ? rest : [numberOf(number), ...rest];
  const [only] = all;
  return all.length === 1 && only !== undefined ? only : { kind: 'product', factors: all };
}

function startsNegative(term: Expression): boolean {
  if (term.kind === 'number') return term.value < 0;
  const first = term.kind === 'product' ? term.factors[0] : undefined;
  return first?.kind === 'number' && first.value < 0;
}
