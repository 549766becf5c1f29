import { type Expression, functionOf, numberOf, powerOf, productOf, sumOf } from '../law/expression.ts';

/** True for a number, of the given value if one is given. */
export function isNumber(expression: Expression, value?: number): boolean {
  return expression.kind === 'number' && (value === undefined || expression.value === value);
}

/**
 * The same expression with fewer parts: zeros and ones cleared away, numbers multiplied, equal factors and equal terms
 * collected. Nothing is expanded, and nothing that could change where the expression exists.
 */
export function plain(expression: Expression): Expression {
  switch (expression.kind) {
    case 'number':
    case 'symbol':
      return expression;
    case 'sum':
      return plainSum(expression.terms.map(plain));
    case 'product':
      return plainProduct(expression.factors.map(plain));
    case 'power':
      return plainPower(plain(expression.base), plain(expression.exponent));
    case 'function':
      return functionOf(expression.name, plain(expression.argument));
  }
}

function keyOf(expression: Expression): string {
  return JSON.stringify(expression);
}

function plainSum(parts: readonly Expression[]): Expression {
  let constant = 0;
  const collected = new Map<string, { coefficient: number; rest: Expression }>();
  for (const term of parts.flatMap((part) => (part.kind === 'sum' ? part.terms : [part]))) {
    if (term.kind === 'number') {
      constant += term.value;
      continue;
    }
    const [coefficient, rest] = splitNumber(term);
    const key = keyOf(rest);
    const known = collected.get(key);
    collected.set(key, { coefficient: coefficient + (known?.coefficient ?? 0), rest });
  }
  const terms = [...collected.values()]
    .filter(({ coefficient }) => coefficient !== 0)
    .map(({ coefficient, rest }) => (coefficient === 1 ? rest : productOf(numberOf(coefficient), rest)));
  if (constant !== 0 || terms.length === 0) terms.push(numberOf(constant));
  return sumOf(...terms);
}

/** The number in front of a term, and the rest. */
function splitNumber(term: Expression): [number, Expression] {
  const [first, ...rest] = term.kind === 'product' ? term.factors : [];
  return first?.kind === 'number' ? [first.value, productOf(...rest)] : [1, term];
}

function plainProduct(parts: readonly Expression[]): Expression {
  let number = 1;
  const exponents = new Map<string, { base: Expression; exponent: Expression[] }>();
  for (const factor of parts.flatMap((part) => (part.kind === 'product' ? part.factors : [part]))) {
    if (factor.kind === 'number') {
      number *= factor.value;
      continue;
    }
    const [base, exponent] = factor.kind === 'power' ? [factor.base, factor.exponent] : [factor, numberOf(1)];
    const key = keyOf(base);
    const known = exponents.get(key);
    exponents.set(key, { base, exponent: [...(known?.exponent ?? []), exponent] });
  }
  if (number === 0) return numberOf(0);
  const factors = [...exponents.values()]
    .map(({ base, exponent }) => plainPower(base, plainSum(exponent)))
    .filter((factor) => !isNumber(factor, 1));
  if (number === 1 && factors.length > 0) return productOf(...factors);
  return productOf(numberOf(number), ...factors);
}

function plainPower(base: Expression, exponent: Expression): Expression {
  if (isNumber(exponent, 0)) return numberOf(1);
  if (isNumber(exponent, 1) || isNumber(base, 1)) return base;
  if (base.kind === 'number' && exponent.kind === 'number' && Number.isInteger(exponent.value)) {
    const value = base.value ** exponent.value;
    if (Number.isInteger(value)) return numberOf(value);
  }
  // (uᵖ)ⁿ is uᵖⁿ for a whole n; other exponents could change the domain.
  if (base.kind === 'power' && exponent.kind === 'number' && Number.isInteger(exponent.value)) {
    return plainPower(base.base, plainProduct([base.exponent, exponent]));
  }
  return powerOf(base, exponent);
}
