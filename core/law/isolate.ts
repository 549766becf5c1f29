import { type Algebra, bitOf, type Node } from './algebra.ts';
import { expand, powerParts } from './nodes.ts';

const DEEPEST = 8;

/**
 * Solves F = 0 for one symbol: peels what surrounds a single occurrence, collects equal parts, solves quadratics,
 * multiplies through by denominators, joins logarithms. Every branch is returned, for the caller to try with numbers.
 * @returns expressions without the symbol; empty when no way was found
 */
export function isolate(g: Algebra, equation: Node, index: number): Node[] {
  const bit = bitOf(index);
  const has = (node: Node): boolean => (node.mask & bit) !== 0;

  const solve = (f: Node, depth: number): Node[] => {
    if (!has(f) || depth > DEEPEST || f.size > 400) return [];
    if (f.kind !== 'sum') return zeroOf(f, depth);
    const coefficients = new Map<Node, Node[]>();
    const free: Node[] = [];
    for (const term of f.parts) {
      const factors = g.factors(term);
      const own = g.product(...factors.filter(has));
      const rest = g.product(...factors.filter((factor) => !has(factor)));
      if (!has(term)) free.push(term);
      else coefficients.set(own, [...(coefficients.get(own) ?? []), rest]);
    }
    const without = g.sum(...free);
    const groups = [...coefficients].map(([own, list]) => [own, g.sum(...list)] as const);
    const [first, second] = groups;
    if (first !== undefined && groups.length === 1 && !isRatio(first[0])) {
      return peel(first[0], g.negate(g.divide(without, first[1])), depth);
    }
    const opened = g.sum(...openDenominators(f));
    if (opened !== f) return solve(opened, depth + 1);
    const expanded = expand(g, f, has);
    if (expanded !== f) return solve(expanded, depth + 1);
    if (first === undefined || second === undefined) return [];
    if (groups.length === 2 && without !== g.zero) {
      const roots = quadratic(first, second, without) ?? quadratic(second, first, without);
      if (roots !== undefined) return roots.flatMap(([own, value]) => peel(own, value, depth));
    }
    const joined = joinLogarithms(f).flatMap((one) => solve(one, depth + 1));
    if (joined.length > 0) return joined;
    if (without === g.zero && groups.length === 2) {
      const ratio = g.divide(first[0], second[0]);
      const found = peel(ratio, g.negate(g.divide(second[1], first[1])), depth + 1);
      if (found.length > 0) return found;
    }
    return [];
  };

  /** True for x/(a + x): the denominator must be multiplied out before x can be collected. */
  const isRatio = (own: Node): boolean =>
    own.kind === 'product' &&
    own.parts.some((factor) => {
      const [base, exponent] = g.splitPower(factor);
      return base.kind === 'sum' && exponent.kind === 'number' && exponent.value < 0;
    });

  /** Where a product or a single factor becomes zero. */
  const zeroOf = (f: Node, depth: number): Node[] =>
    g.factors(f).flatMap((factor) => {
      if (!has(factor)) return [];
      const [base, exponent] = g.splitPower(factor);
      if (exponent.kind === 'number' && exponent.value < 0) return [];
      return base === factor ? peel(factor, g.zero, depth) : solve(base, depth + 1);
    });

  /** Solves f = value, undoing the outermost operation of f. */
  const peel = (f: Node, value: Node, depth: number): Node[] => {
    if (depth > DEEPEST || value.size > 300) return [];
    if (f.kind === 'symbol') return [value];
    if (f.kind === 'sum') return solve(g.subtract(f, value), depth + 1);
    const power = powerParts(f);
    if (power !== undefined) {
      const [base, exponent] = power;
      if (!has(exponent)) {
        const root = g.power(value, g.power(exponent, g.minusOne));
        const even =
          exponent.kind === 'number' && (exponent.value % 2 === 0 || (1 / exponent.value) % 2 === 0);
        const both = even && Math.abs(exponent.value) > 1;
        return [...peel(base, root, depth + 1), ...(both ? peel(base, g.negate(root), depth + 1) : [])];
      }
      if (!has(base)) return peel(exponent, g.divide(g.ln(value), g.ln(base)), depth + 1);
    }
    const argument = f.parts[0];
    if (f.kind === 'function' && argument !== undefined) {
      return inverseValues(g, f.name, value).flatMap((inner) => peel(argument, inner, depth + 1));
    }
    if (value === g.zero) return zeroOf(f, depth + 1);
    return solve(g.subtract(g.ln(f), g.ln(value)), depth + 2);
  };

  /** own₁ = own₂²: both roots of a·own₂² + b·own₂ + c = 0. */
  const quadratic = (
    square: readonly [Node, Node],
    line: readonly [Node, Node],
    c: Node,
  ): (readonly [Node, Node])[] | undefined => {
    const [own, b] = line;
    const a = square[1];
    if (g.power(own, g.number(2)) !== square[0]) return undefined;
    const inside = g.subtract(g.power(b, g.number(2)), g.product(g.number(4), a, c));
    const root = g.power(inside, g.number(0.5));
    const twice = g.power(g.product(g.number(2), a), g.minusOne);
    return [g.subtract(root, b), g.negate(g.sum(b, root))].map(
      (top) => [own, g.product(top, twice)] as const,
    );
  };

  /** Terms multiplied by a denominator that holds the symbol. */
  const openDenominators = (f: Node): readonly Node[] => {
    const terms = g.terms(f);
    for (const term of terms) {
      for (const factor of g.factors(term)) {
        const [base, exponent] = g.splitPower(factor);
        if (!has(base) || exponent.kind !== 'number' || exponent.value >= 0) continue;
        if (base.kind !== 'sum' && terms.filter(has).length < 2) continue;
        const times = g.power(base, g.number(-exponent.value));
        return terms.map((one) => expand(g, g.product(one, times), has));
      }
    }
    return terms;
  };

  /** ln|u| − ln|v| + w = 0 as u/v ∓ exp(−w) = 0. */
  const joinLogarithms = (f: Node): Node[] => {
    const rest: Node[] = [];
    const joined: Node[] = [];
    for (const term of g.terms(f)) {
      const [number, inner] = g.splitNumber(term);
      const argument = inner.parts[0];
      if (!has(term)) rest.push(term);
      else if (inner.name === 'ln' && argument !== undefined && Number.isInteger(number)) {
        joined.push(g.power(argument, g.number(number)));
      } else return [];
    }
    const value = g.power(g.euler, g.negate(g.sum(...rest)));
    return [g.subtract(g.product(...joined), value), g.sum(g.product(...joined), value)];
  };

  return [...new Set(solve(equation, 0))].filter((node) => !has(node));
}

/** Values u with f(u) = value; the principal one first. */
export function inverseValues(g: Algebra, name: string, value: Node): Node[] {
  const area = (sign: number): Node =>
    g.ln(g.sum(value, g.power(g.sum(g.power(value, g.number(2)), g.number(sign)), g.number(0.5))));
  switch (name) {
    case 'ln': {
      const positive = g.power(g.euler, value);
      return [positive, g.negate(positive)];
    }
    case 'abs':
      return [value, g.negate(value)];
    case 'sin':
      return [g.call('asin', value), g.subtract(g.pi, g.call('asin', value))];
    case 'cos':
      return [g.call('acos', value), g.negate(g.call('acos', value))];
    case 'tan':
      return [g.call('atan', value)];
    case 'asin':
      return [g.call('sin', value)];
    case 'acos':
      return [g.call('cos', value)];
    case 'atan':
      return [g.call('tan', value)];
    case 'sinh':
      return [area(1)];
    case 'cosh':
      return [area(-1), g.negate(area(-1))];
    case 'tanh': {
      const ratio = g.divide(g.sum(g.one, value), g.subtract(g.one, value));
      return [g.product(g.number(0.5), g.ln(ratio))];
    }
    default:
      return [];
  }
}
