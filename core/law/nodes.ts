import type { Algebra, Node } from './algebra.ts';
import type { Expression, FunctionName } from './expression.ts';

/** An expression as a node of the algebra. */
export function toNode(g: Algebra, expression: Expression, indexOf: (name: string) => number): Node {
  const convert = (part: Expression): Node => {
    switch (part.kind) {
      case 'number':
        return g.number(part.value);
      case 'symbol':
        if (part.value !== undefined) return part.value === Math.E ? g.euler : g.pi;
        return g.symbol(indexOf(part.name));
      case 'sum':
        return g.sum(...part.terms.map(convert));
      case 'product':
        return g.product(...part.factors.map(convert));
      case 'power':
        return g.power(convert(part.base), convert(part.exponent));
      case 'function':
        return g.call(part.name, convert(part.argument));
    }
  };
  return convert(expression);
}

/** A node built anew with every part passed through `change` first. */
export function rebuild(g: Algebra, node: Node, change: (part: Node) => Node): Node {
  const parts = node.parts.map(change);
  const [first, second] = parts;
  switch (node.kind) {
    case 'sum':
      return g.sum(...parts);
    case 'product':
      return g.product(...parts);
    case 'power':
      return first !== undefined && second !== undefined ? g.power(first, second) : node;
    case 'function':
      // Nodes of this kind are made from function names alone.
      return first !== undefined ? g.call(node.name as FunctionName, first) : node;
    default:
      return node;
  }
}

/** The node with every occurrence of the symbol `index` replaced. */
export function substitute(g: Algebra, node: Node, index: number, by: Node): Node {
  if ((node.mask & (1 << index)) === 0) return node;
  if (node.kind === 'symbol') return by;
  return rebuild(g, node, (part) => substitute(g, part, index, by));
}

/** The node's value for plain numbers in the order of the symbols; its logarithms are those of absolute values. */
export function nodeValue(node: Node, values: ArrayLike<number>): number {
  switch (node.kind) {
    case 'number':
      return node.value;
    case 'symbol':
      return node.name === '' ? (values[node.value] ?? Number.NaN) : node.value;
    case 'sum': {
      let sum = 0;
      for (const part of node.parts) sum += nodeValue(part, values);
      return sum;
    }
    case 'product': {
      let product = 1;
      for (const part of node.parts) product *= nodeValue(part, values);
      return product;
    }
    case 'power': {
      const [base, exponent] = node.parts;
      if (base === undefined || exponent === undefined) return Number.NaN;
      return base.value === Math.E && base.kind === 'symbol' && base.name !== ''
        ? Math.exp(nodeValue(exponent, values))
        : nodeValue(base, values) ** nodeValue(exponent, values);
    }
    case 'function': {
      const [argument] = node.parts;
      if (argument === undefined) return Number.NaN;
      const u = nodeValue(argument, values);
      // Nodes of this kind are made from function names alone.
      const name = node.name as FunctionName;
      return name === 'ln' ? Math.log(Math.abs(u)) : Math[name](u);
    }
  }
}

/** True when the node is a power, and its base and exponent. */
export function powerParts(node: Node): readonly [Node, Node] | undefined {
  const [base, exponent] = node.parts;
  return node.kind === 'power' && base !== undefined && exponent !== undefined ? [base, exponent] : undefined;
}

/** Opens products of sums, and small whole powers of sums, that `wanted` accepts. */
export function expand(g: Algebra, node: Node, wanted: (sum: Node) => boolean): Node {
  let changed = false;
  const opened = g.terms(node).map((term) => {
    for (const factor of g.factors(term)) {
      const [base, exponent] = g.splitPower(factor);
      const times = exponent.kind === 'number' ? exponent.value : 0;
      if (base.kind !== 'sum' || times < 1 || times > 4 || !Number.isInteger(times) || !wanted(base))
        continue;
      if (g.factors(term).length === 1 && times === 1) continue;
      changed = true;
      const rest = g.divide(term, base);
      return expand(g, g.sum(...base.parts.map((part) => g.product(rest, part))), wanted);
    }
    return term;
  });
  return changed ? g.sum(...opened) : node;
}

/** A sum with the factors that all its terms share taken out. */
export function factored(g: Algebra, node: Node): Node {
  if (node.kind !== 'sum') return node;
  const shares = node.parts.map((term) => {
    const exponents = new Map<Node, number>();
    for (const factor of g.factors(term)) {
      const [base, exponent] = g.splitPower(factor);
      if (base.kind !== 'number' && exponent.kind === 'number') exponents.set(base, exponent.value);
      else if (base.kind !== 'number') exponents.set(factor, 1);
    }
    return exponents;
  });
  const [first, ...others] = shares;
  const common: Node[] = [];
  for (const [base, exponent] of first ?? []) {
    const least = Math.min(exponent, ...others.map((share) => share.get(base) ?? 0));
    const most = Math.max(exponent, ...others.map((share) => share.get(base) ?? 0));
    if (least > 0) common.push(g.power(base, g.number(least)));
    else if (most < 0) common.push(g.power(base, g.number(most)));
  }
  if (common.length === 0) return node;
  const shared = g.product(...common);
  return g.product(shared, g.sum(...node.parts.map((term) => g.divide(term, shared))));
}
