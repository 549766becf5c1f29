import { type Algebra, bitOf, type Node } from './algebra.ts';
import { inverseValues } from './isolate.ts';
import { expand, factored, powerParts } from './nodes.ts';

/** Bits of the predictor (symbol 0) and the response (symbol 1). */
export const PREDICTOR_BIT = bitOf(0);
export const RESPONSE_BIT = bitOf(1);
export const READING_BITS = PREDICTOR_BIT | RESPONSE_BIT;

const DEEPEST = 8;
const MOST_STATES = 120;
const LARGEST = 400;
const MOST_RELATIONS = 8;

/** One term of a relation Σ coefficient·basis = 0: the coefficient is free of readings, the basis of unknowns. */
export interface Part {
  readonly coefficient: Node;
  readonly basis: Node;
}
export type Relation = readonly Part[];

interface Split extends Part {
  /** What holds readings and unknowns both; 1 when nothing does. */
  readonly entangled: Node;
}

/** Splits a term into coefficient · basis · entangled. Sums free of unknowns stay whole. */
function splitTerm(g: Algebra, term: Node, unknowns: number): Split {
  const coefficient: Node[] = [];
  const basis: Node[] = [];
  const entangled: Node[] = [];
  for (const factor of g.factors(term)) {
    if ((factor.mask & READING_BITS) === 0) coefficient.push(factor);
    else if ((factor.mask & unknowns) === 0) basis.push(factor);
    else {
      const [base, exponent] = powerParts(factor) ?? [factor, g.one];
      if (exponent.kind !== 'sum') entangled.push(factor);
      else {
        // aᵘ⁺ᵛ = aᵘ·aᵛ, each where it belongs.
        for (const part of exponent.parts) {
          const power = g.power(base, part);
          if ((power.mask & READING_BITS) === 0) coefficient.push(power);
          else if ((power.mask & unknowns) === 0) basis.push(power);
          else entangled.push(power);
        }
      }
    }
  }
  return {
    coefficient: g.product(...coefficient),
    basis: g.product(...basis),
    entangled: g.product(...entangled),
  };
}

/**
 * Searches, depth first and within bounds, for ways of writing F = 0 as a sum of coefficient·basis.
 * @param unknowns mask of the symbols that may stand in coefficients only
 */
export function findRelations(g: Algebra, equation: Node, unknowns: number): Relation[] {
  const seen = new Set<Node>();
  const found: Relation[] = [];
  const mixed = (node: Node): boolean => (node.mask & unknowns) !== 0 && (node.mask & READING_BITS) !== 0;

  const visit = (start: Node, depth: number): void => {
    const f = withoutCommonFactor(g, start);
    if (depth > DEEPEST || seen.size >= MOST_STATES || f.size > LARGEST || found.length >= MOST_RELATIONS)
      return;
    if (seen.has(f)) return;
    seen.add(f);
    const splits = g.terms(f).map((term) => splitTerm(g, term, unknowns));
    const groups = new Map<Node, Split[]>();
    for (const split of splits) groups.set(split.entangled, [...(groups.get(split.entangled) ?? []), split]);
    const free = groups.get(g.one);
    const tied = [...groups.keys()].filter((key) => key !== g.one);
    const [only] = tied;
    if (only === undefined) {
      found.push(collected(g, splits));
      return;
    }
    if (free === undefined) {
      for (const key of tied) visit(divided(g, f, key), depth + 1);
    } else if (tied.length === 1) {
      const total = (parts: readonly Split[]): Node =>
        factored(g, g.sum(...parts.map((part) => g.product(part.coefficient, part.basis))));
      const value = g.negate(g.divide(total(free), total(groups.get(only) ?? [])));
      for (const next of undone(only, value)) visit(next, depth + 1);
    }
    const cleared = clearDenominator(g, f, mixed);
    if (cleared !== f) visit(cleared, depth + 1);
    const opened = expand(g, f, mixed);
    if (opened !== f) visit(opened, depth + 1);
    if (tied.length > 1 && splits.length === 2) {
      const [a, b] = g.terms(f);
      if (a !== undefined && b !== undefined) visit(g.subtract(g.ln(a), g.ln(b)), depth + 1);
    }
  };

  /** Equations that follow from entangled = value. */
  const undone = (entangled: Node, value: Node): Node[] => {
    const logarithms = (): Node => g.subtract(g.ln(entangled), g.ln(value));
    if (entangled.kind === 'sum') return [g.subtract(entangled, value)];
    if (entangled.kind === 'product') return [logarithms()];
    const power = powerParts(entangled);
    if (power !== undefined) {
      const [base, exponent] = power;
      if (exponent.mask === 0 || (exponent.mask & (unknowns | READING_BITS)) === 0) {
        return [g.subtract(base, g.power(value, g.power(exponent, g.minusOne)))];
      }
      return [logarithms()];
    }
    const [argument] = entangled.parts;
    if (argument === undefined) return [];
    const next = inverseValues(g, entangled.name, value)
      .slice(0, 1)
      .map((inner) => g.subtract(argument, inner));
    const added = addedAngles(g, entangled.name, argument, unknowns);
    return added === undefined ? next : [...next, g.subtract(added, value)];
  };

  visit(equation, 0);
  return found;
}

/** sin(u + v), cos(u + v) with u free of readings, opened. */
function addedAngles(g: Algebra, name: string, argument: Node, unknowns: number): Node | undefined {
  if ((name !== 'sin' && name !== 'cos') || argument.kind !== 'sum') return undefined;
  const u = g.sum(...argument.parts.filter((part) => (part.mask & READING_BITS) === 0));
  const v = g.subtract(argument, u);
  if (u === g.zero || (v.mask & unknowns) !== 0) return undefined;
  const same = g.product(g.call('sin', u), g.call(name === 'sin' ? 'cos' : 'sin', v));
  const other = g.product(g.call('cos', u), g.call(name === 'sin' ? 'sin' : 'cos', v));
  return name === 'sin' ? g.sum(same, other) : g.subtract(other, same);
}

function divided(g: Algebra, f: Node, by: Node): Node {
  return g.sum(...g.terms(f).map((term) => g.divide(term, by)));
}

/** A product is zero where one factor is: the one that holds the readings. */
function withoutCommonFactor(g: Algebra, f: Node): Node {
  const whole = factored(g, f);
  if (whole.kind !== 'product') return f;
  const sums = whole.parts.filter((factor) => factor.kind === 'sum' && (factor.mask & READING_BITS) !== 0);
  const [only] = sums;
  return sums.length === 1 && only !== undefined ? only : f;
}

/** The equation times the denominators that hold readings and unknowns both. */
function clearDenominator(g: Algebra, f: Node, mixed: (node: Node) => boolean): Node {
  for (const term of g.terms(f)) {
    for (const factor of g.factors(term)) {
      const [base, exponent] = g.splitPower(factor);
      if (base.kind !== 'sum' || !mixed(base) || exponent.kind !== 'number' || exponent.value >= 0) continue;
      const times = g.power(base, g.number(-exponent.value));
      return expand(g, g.sum(...g.terms(f).map((one) => g.product(one, times))), mixed);
    }
  }
  return f;
}

/** Parts with the same basis added up. */
function collected(g: Algebra, parts: readonly Part[]): Relation {
  const sums = new Map<Node, Node[]>();
  for (const { basis, coefficient } of parts) sums.set(basis, [...(sums.get(basis) ?? []), coefficient]);
  return [...sums]
    .map(([basis, list]) => ({ basis, coefficient: g.sum(...list) }))
    .filter(({ coefficient }) => coefficient !== g.zero);
}

/** A relation that draws a line: two or three parts. */
export interface LineRelation {
  readonly parts: Relation;
  /** True when a part with a known coefficient was merged into another, so that a term of the line is known. */
  readonly merged: boolean;
}

/**
 * The lines in a relation: bases whose coefficients are in a known ratio are drawn as one. Where that leaves two
 * bases, the line with the known term apart is a line as well, on which the known term is a check.
 */
export function linesOf(g: Algebra, relation: Relation, unknowns: number): LineRelation[] {
  const classes: { coefficient: Node; members: Part[] }[] = [];
  for (const part of relation) {
    const known = classes.find(({ coefficient }) => {
      const ratio = g.divide(part.coefficient, coefficient);
      return (ratio.mask & unknowns) === 0;
    });
    if (known === undefined) classes.push({ coefficient: part.coefficient, members: [part] });
    else known.members.push(part);
  }
  const merge = (members: readonly Part[]): Part => {
    const [only] = members;
    const weight = (node: Node): number => (node.kind === 'number' ? 0 : node.size);
    // The plainest coefficient is taken out, so that the basis holds no more than it must.
    const coefficient = members.reduce(
      (least, part) => (weight(part.coefficient) < weight(least) ? part.coefficient : least),
      only?.coefficient ?? g.one,
    );
    if (members.length === 1 && only !== undefined) return only;
    const terms = members.map((part) => g.product(g.divide(part.coefficient, coefficient), part.basis));
    const basis = factored(g, g.sum(...terms));
    const [number, rest] = g.splitNumber(basis);
    return { coefficient: g.product(g.number(number), coefficient), basis: rest };
  };
  const whole = classes.map(({ members }) => merge(members));
  if (whole.length === 3) return [{ parts: whole, merged: false }];
  if (whole.length !== 2) return [];
  const lines: LineRelation[] = [];
  for (const one of classes) {
    const other = classes.find((it) => it !== one);
    if (other === undefined || (one.coefficient.mask & unknowns) !== 0) continue;
    const withResponse = one.members.filter(({ basis }) => (basis.mask & RESPONSE_BIT) !== 0);
    const without = one.members.filter(({ basis }) => (basis.mask & RESPONSE_BIT) === 0);
    if (withResponse.length === 0 || without.length === 0) continue;
    lines.push({
      parts: [merge(withResponse), merge(without), merge(other.members)],
      merged: false,
    });
  }
  // A number in a coefficient (the 1 of 1 − kt) is no known constant that readings could check.
  const checks = classes.some(
    ({ members }) => members.length > 1 && members.some((one) => one.coefficient.mask !== 0),
  );
  lines.push({ parts: whole, merged: checks });
  return lines;
}
