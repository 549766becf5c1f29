import type { Expression } from '../law/expression.ts';
import { printExpression } from '../law/printExpression.ts';
import { INTERCEPT, SLOPE } from './closedForm.ts';
import type { Desk } from './desk.ts';
import { expressionFormula } from './expressionFormula.ts';

/** A closed form as a formula, with formulas in place of the line's terms. */
export function termFormula(desk: Desk, expression: Expression, slope: string, intercept: string): string {
  return expressionFormula(expression, (name) => {
    if (name === SLOPE) return slope;
    if (name === INTERCEPT) return intercept;
    return desk.constantCells.get(name) ?? 'NA()';
  });
}

/** A closed form for people, in words for the line's terms. */
export function termText(expression: Expression): string {
  return printExpression(renamed(expression), 'text');
}

/** The line's terms by the letters that the sheet uses for them. */
function renamed(expression: Expression): Expression {
  switch (expression.kind) {
    case 'symbol':
      if (expression.name === SLOPE) return { kind: 'symbol', name: 'slope' };
      return expression.name === INTERCEPT ? { kind: 'symbol', name: 'intercept' } : expression;
    case 'sum':
      return { kind: 'sum', terms: expression.terms.map(renamed) };
    case 'product':
      return { kind: 'product', factors: expression.factors.map(renamed) };
    case 'power':
      return { kind: 'power', base: renamed(expression.base), exponent: renamed(expression.exponent) };
    case 'function':
      return { ...expression, argument: renamed(expression.argument) };
    default:
      return expression;
  }
}
