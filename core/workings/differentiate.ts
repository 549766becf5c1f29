import {
  type Expression,
  euler,
  functionOf,
  numberOf,
  powerOf,
  productOf,
  sumOf,
} from '../law/expression.ts';
import { isNumber, plain } from './plainExpression.ts';

/**
 * The derivative of an expression with respect to one symbol, as an expression again, with zeros, ones and equal
 * factors cleared away.
 * @see Abramowitz & Stegun (1964), Handbook of Mathematical Functions, 3.3 (rules), 4.1–4.6 (elementary functions)
 */
export function differentiate(expression: Expression, symbol: string): Expression {
  return plain(derivative(expression, symbol));
}

const zero = numberOf(0);
const one = numberOf(1);

function derivative(expression: Expression, symbol: string): Expression {
  switch (expression.kind) {
    case 'number':
      return zero;
    case 'symbol':
      return expression.value === undefined && expression.name === symbol ? one : zero;
    case 'sum':
      return sumOf(...expression.terms.map((term) => derivative(term, symbol)));
    case 'product':
      return sumOf(
        ...expression.factors.map((factor, k) =>
          productOf(derivative(factor, symbol), ...expression.factors.filter((_, j) => j !== k)),
        ),
      );
    case 'power':
      return derivativeOfPower(expression.base, expression.exponent, symbol);
    case 'function':
      if (expression.name === 'ln') return derivativeOfLogarithm(expression.argument, symbol);
      return productOf(outer(expression.name, expression.argument), derivative(expression.argument, symbol));
  }
}

/** vᵘ·(u′ ln v + u v′/v), written without the parts that vanish. */
function derivativeOfPower(base: Expression, exponent: Expression, symbol: string): Expression {
  const power = powerOf(base, exponent);
  const baseBy = plain(derivative(base, symbol));
  const exponentBy = plain(derivative(exponent, symbol));
  const terms: Expression[] = [];
  if (!isNumber(exponentBy, 0)) {
    const logarithm = base === euler || isEuler(base) ? one : functionOf('ln', base);
    terms.push(productOf(power, logarithm, exponentBy));
  }
  if (!isNumber(baseBy, 0)) {
    terms.push(productOf(exponent, powerOf(base, plain(sumOf(exponent, numberOf(-1)))), baseBy));
  }
  return terms.length === 0 ? zero : sumOf(...terms);
}

function isEuler(expression: Expression): boolean {
  return expression.kind === 'symbol' && expression.value === Math.E;
}

/** ln of a product or power, term by term: (ln u·vⁿ)′ = u′/u + n v′/v + n′ ln v; ln|u| has the same derivative as ln u. */
function derivativeOfLogarithm(argument: Expression, symbol: string): Expression {
  if (argument.kind === 'function' && argument.name === 'abs') {
    return derivativeOfLogarithm(argument.argument, symbol);
  }
  if (argument.kind === 'product') {
    return sumOf(...argument.factors.map((factor) => derivativeOfLogarithm(factor, symbol)));
  }
  if (argument.kind === 'power') {
    const { base, exponent } = argument;
    const exponentBy = plain(derivative(exponent, symbol));
    const byBase = productOf(exponent, isEuler(base) ? zero : derivativeOfLogarithm(base, symbol));
    if (isNumber(exponentBy, 0)) return byBase;
    return sumOf(byBase, productOf(exponentBy, isEuler(base) ? one : functionOf('ln', base)));
  }
  return productOf(derivative(argument, symbol), powerOf(argument, numberOf(-1)));
}

function outer(name: Exclude<(Expression & { kind: 'function' })['name'], 'ln'>, u: Expression): Expression {
  const square = powerOf(u, numberOf(2));
  switch (name) {
    case 'abs':
      return productOf(u, powerOf(functionOf('abs', u), numberOf(-1)));
    case 'sin':
      return functionOf('cos', u);
    case 'cos':
      return productOf(numberOf(-1), functionOf('sin', u));
    case 'tan':
      return powerOf(functionOf('cos', u), numberOf(-2));
    case 'asin':
      return powerOf(sumOf(one, productOf(numberOf(-1), square)), numberOf(-0.5));
    case 'acos':
      return productOf(numberOf(-1), powerOf(sumOf(one, productOf(numberOf(-1), square)), numberOf(-0.5)));
    case 'atan':
      return powerOf(sumOf(one, square), numberOf(-1));
    case 'sinh':
      return functionOf('cosh', u);
    case 'cosh':
      return functionOf('sinh', u);
    case 'tanh':
      return powerOf(functionOf('cosh', u), numberOf(-2));
  }
}
