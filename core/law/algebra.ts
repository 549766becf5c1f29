import type { FunctionName } from './expression.ts';

/** A node of the straightener's algebra; equal expressions are the same object. */
export interface Node {
  readonly id: number;
  readonly kind: 'number' | 'symbol' | 'sum' | 'product' | 'power' | 'function';
  /** Value of a number or of e and π, index of any other symbol; 0 otherwise. */
  readonly value: number;
  readonly name: string;
  /** Terms, factors, [base, exponent] or [argument]. */
  readonly parts: readonly Node[];
  /** Bit i is set when symbol i occurs; see `bitOf`. */
  readonly mask: number;
  /** Number of nodes in the tree. */
  readonly size: number;
}

/** Symbols that a law may have, so that every one has a bit of its own. */
export const MOST_SYMBOLS = 30;

export function bitOf(index: number): number {
  return 1 << index;
}

const isWhole = (node: Node): boolean => node.kind === 'number' && Number.isInteger(node.value);

/**
 * Sums, products and powers in one canonical shape. The logarithm is that of the absolute value and opens products
 * and powers, and (uᵖ)ᵠ is uᵖᵠ: true on one branch, which the certificate of a straight form checks.
 */
export class Algebra {
  private readonly nodes = new Map<string, Node>();
  private readonly oriented = new Set<Node>();
  readonly zero = this.number(0);
  readonly one = this.number(1);
  readonly minusOne = this.number(-1);
  readonly euler = this.make('symbol', Math.E, 'E', [], 0);
  readonly pi = this.make('symbol', Math.PI, 'π', [], 0);

  private make(kind: Node['kind'], value: number, name: string, parts: readonly Node[], mask: number): Node {
    let key = `${kind[0]}${kind[1]}${value}${name}`;
    let size = 1;
    for (const part of parts) {
      key += `,${part.id}`;
      size += part.size;
      mask |= part.mask;
    }
    const known = this.nodes.get(key);
    if (known !== undefined) return known;
    const node: Node = { id: this.nodes.size, kind, value, name, parts, mask, size };
    this.nodes.set(key, node);
    return node;
  }

  number(value: number): Node {
    return this.make('number', value === 0 ? 0 : value, '', [], 0);
  }

  /** The symbol with an index below MOST_SYMBOLS. */
  symbol(index: number): Node {
    return this.make('symbol', index, '', [], bitOf(index));
  }

  sum(...terms: readonly Node[]): Node {
    const collected = new Map<Node, number>();
    let constant = 0;
    const add = (term: Node, times: number): void => {
      if (term.kind === 'number') {
        constant = cancelled(constant, times * term.value);
      } else if (term.kind === 'sum') {
        for (const part of term.parts) add(part, times);
      } else {
        const [coefficient, rest] = this.splitNumber(term);
        collected.set(rest, cancelled(collected.get(rest) ?? 0, times * coefficient));
      }
    };
    for (const term of terms) add(term, 1);
    // In the order of what follows the numbers, so that a − b and b − a have the same leading term.
    const parts = [...collected]
      .filter(([, coefficient]) => coefficient !== 0)
      .sort(([a], [b]) => byId(a, b))
      .map(([rest, coefficient]) =>
        coefficient === 1 ? rest : this.product(this.number(coefficient), rest),
      );
    if (constant !== 0) parts.push(this.number(constant));
    const [first] = parts;
    if (first === undefined) return this.zero;
    return parts.length === 1 ? first : this.make('sum', 0, '', parts, 0);
  }

  /** The numeric factor in front of a term, and the rest. */
  splitNumber(term: Node): [number, Node] {
    if (term.kind === 'number') return [term.value, this.one];
    const [first, ...rest] = term.parts;
    if (term.kind !== 'product' || first?.kind !== 'number') return [1, term];
    const [only] = rest;
    return [
      first.value,
      rest.length === 1 && only !== undefined ? only : this.make('product', 0, '', rest, 0),
    ];
  }

  product(...factors: readonly Node[]): Node {
    let number = 1;
    const exponents = new Map<Node, Node>();
    const multiply = (factor: Node): void => {
      if (factor.kind === 'number') number *= factor.value;
      else if (factor.kind === 'product') for (const part of factor.parts) multiply(part);
      else if (factor.kind === 'sum') {
        const [sign, sum] = this.signed(factor);
        number *= sign;
        collect(sum, this.one);
      } else {
        const [base, exponent] = this.splitPower(factor);
        collect(base, exponent);
      }
    };
    const collect = (base: Node, exponent: Node): void => {
      const old = exponents.get(base);
      exponents.set(base, old === undefined ? exponent : this.sum(old, exponent));
    };
    for (const factor of factors) multiply(factor);
    if (number === 0) return this.zero;
    const parts: Node[] = [];
    let opened = false;
    for (const [base, exponent] of exponents) {
      const power = this.power(base, exponent);
      if (power.kind === 'number') number *= power.value;
      else if (power.kind === 'product') {
        opened = true;
        parts.push(power);
      } else parts.push(power);
    }
    if (opened) return this.product(this.number(number), ...parts);
    parts.sort(byId);
    const [first] = parts;
    if (first === undefined) return this.number(number);
    if (parts.length === 1) {
      if (number === 1) return first;
      if (first.kind === 'sum') {
        return this.sum(...first.parts.map((part) => this.product(this.number(number), part)));
      }
    }
    if (number !== 1) parts.unshift(this.number(number));
    return this.make('product', 0, '', parts, 0);
  }

  /** A sum with its sign taken out: a − b and b − a are the same factor, in the orientation that was met first. */
  private signed(sum: Node): [number, Node] {
    if (this.oriented.has(sum)) return [1, sum];
    const opposite = this.sum(...sum.parts.map((part) => this.negate(part)));
    if (this.oriented.has(opposite)) return [-1, opposite];
    this.oriented.add(sum);
    return [1, sum];
  }

  splitPower(factor: Node): [Node, Node] {
    const [base, exponent] = factor.parts;
    return factor.kind === 'power' && base !== undefined && exponent !== undefined
      ? [base, exponent]
      : [factor, this.one];
  }

  negate(node: Node): Node {
    return this.product(this.minusOne, node);
  }

  subtract(a: Node, b: Node): Node {
    return this.sum(a, this.negate(b));
  }

  divide(a: Node, b: Node): Node {
    return this.product(a, this.power(b, this.minusOne));
  }

  power(base: Node, exponent: Node): Node {
    if (exponent === this.zero) return this.one;
    if (exponent === this.one || base === this.one) return base;
    if (base.kind === 'number' && exponent.kind === 'number') {
      const value = base.value ** exponent.value;
      const exact = isWhole(exponent) || Math.abs(value - Math.round(value)) < 1e-14 * Math.abs(value);
      if (Number.isFinite(value) && value !== 0 && exact) return this.number(value);
      if (base === this.zero && exponent.value > 0) return this.zero;
    }
    if (base.kind === 'product') {
      const [number] = this.splitNumber(base);
      if (number < 0 && !isWhole(exponent)) {
        const inner = this.make('product', 0, '', this.unitProduct(base), 0);
        const size = this.power(this.number(-number), exponent);
        const kept = this.make('power', 0, '', [inner, exponent], 0);
        return size === this.one ? kept : this.product(size, kept);
      }
      return this.product(...base.parts.map((part) => this.power(part, exponent)));
    }
    if (base.kind === 'power') {
      const [inner, first] = this.splitPower(base);
      return this.power(inner, this.product(first, exponent));
    }
    if (base === this.euler) {
      const terms = exponent.kind === 'sum' ? exponent.parts : [exponent];
      const logarithms = terms.map((term) => this.splitLogarithm(term));
      if (logarithms.some((found) => found !== undefined)) {
        const rest = this.sum(...terms.filter((_, i) => logarithms[i] === undefined));
        const opened = logarithms.flatMap((found) => (found === undefined ? [] : [this.power(...found)]));
        return this.product(this.power(base, rest), ...opened);
      }
    }
    if (base.kind === 'sum' && isWhole(exponent)) {
      const [sign, sum] = this.signed(base);
      const kept = this.make('power', 0, '', [sum, exponent], 0);
      return sign < 0 && exponent.value % 2 !== 0
        ? this.make('product', 0, '', [this.minusOne, kept], 0)
        : kept;
    }
    return this.make('power', 0, '', [base, exponent], 0);
  }

  /** −1 and the other factors of a product with a negative number. */
  private unitProduct(product: Node): Node[] {
    return [this.minusOne, ...product.parts.filter((part) => part.kind !== 'number')];
  }

  /** u and c of a term c·ln u with a single logarithm. */
  private splitLogarithm(term: Node): [Node, Node] | undefined {
    const factors = term.kind === 'product' ? term.parts : [term];
    const logarithm = factors.find((factor) => factor.kind === 'function' && factor.name === 'ln');
    const argument = logarithm?.parts[0];
    if (argument === undefined) return undefined;
    return [argument, this.product(...factors.filter((factor) => factor !== logarithm))];
  }

  /** ln|u|, opened over products and powers. */
  ln(u: Node): Node {
    if (u.kind === 'product') return this.sum(...u.parts.map((part) => this.ln(part)));
    if (u.kind === 'power') {
      const [base, exponent] = this.splitPower(u);
      return this.product(exponent, this.ln(base));
    }
    if (u === this.euler) return this.one;
    if (u.kind === 'number') {
      if (Math.abs(u.value) === 1) return this.zero;
      if (u.value < 0) return this.ln(this.number(-u.value));
    }
    if (u.kind === 'sum') return this.make('function', 0, 'ln', [this.signed(u)[1]], 0);
    return this.make('function', 0, 'ln', [u], 0);
  }

  call(name: FunctionName, u: Node): Node {
    if (name === 'ln') return this.ln(u);
    if (u === this.zero && name !== 'cos' && name !== 'cosh' && name !== 'acos') return this.zero;
    return this.make('function', 0, name, [u], 0);
  }

  /** The terms of a sum, or the node alone. */
  terms(node: Node): readonly Node[] {
    return node.kind === 'sum' ? node.parts : [node];
  }

  factors(node: Node): readonly Node[] {
    return node.kind === 'product' ? node.parts : [node];
  }
}

function byId(a: Node, b: Node): number {
  return a.id - b.id;
}

/** a + b, exactly zero where only rounding is left. */
function cancelled(a: number, b: number): number {
  const sum = a + b;
  return Math.abs(sum) <= 4e-16 * Math.abs(a) ? 0 : sum;
}
