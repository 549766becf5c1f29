import type { Expression } from '../../../core/law/expression.ts';
import { parseLaw } from '../../../core/law/parseLaw.ts';

/** The tree of an expression in x and any other symbols. */
export function parsed(text: string): Expression {
  return parseLaw(`y(x): y - x = ${text}`).right;
}
