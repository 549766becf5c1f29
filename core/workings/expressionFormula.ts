import type { Expression } from '../law/expression.ts';
import { numberLiteral } from './literals.ts';

/** How tightly a piece of a formula binds. */
const SUM = 1;
const PRODUCT = 2;
const POWER = 3;
const ATOM = 4;

interface Piece {
  readonly text: string;
  readonly binds: number;
}

const functionCalls = {
  ln: 'LN',
  abs: 'ABS',
  sin: 'SIN',
  cos: 'COS',
  tan: 'TAN',
  asin: 'ASIN',
  acos: 'ACOS',
  atan: 'ATAN',
  sinh: 'SINH',
  cosh: 'COSH',
  tanh: 'TANH',
} as const;

/**
 * Writes an expression as a spreadsheet formula, without the leading `=`.
 * In a spreadsheet the sign binds tighter than the power (−x^2 is (−x)²) and a^b^c is (a^b)^c: powers with a sign in
 * front, in their base or in their exponent are therefore always in parentheses.
 * @param cellOf the cell, or a formula that binds as tightly as a cell, that holds a symbol's value
 * @see OASIS, Open Document Format for Office Applications 1.3, part 4 (OpenFormula), table 1 (operator precedence)
 */
export function expressionFormula(expression: Expression, cellOf: (symbol: string) => string): string {
  return write(expression, cellOf).text;
}

function write(expression: Expression, cellOf: (symbol: string) => string): Piece {
  switch (expression.kind) {
    case 'number':
      return numberPiece(expression.value);
    case 'symbol':
      if (expression.value === undefined) return { text: cellOf(expression.name), binds: ATOM };
      return { text: expression.value === Math.E ? 'EXP(1)' : 'PI()', binds: ATOM };
    case 'sum':
      return sumPiece(expression.terms, cellOf);
    case 'product':
      return productPiece(expression.factors, cellOf);
    case 'power':
      return powerPiece(expression.base, expression.exponent, cellOf);
    case 'function': {
      const argument = write(expression.argument, cellOf);
      return { text: `${functionCalls[expression.name]}(${argument.text})`, binds: ATOM };
    }
  }
}

function numberPiece(value: number): Piece {
  const text = numberLiteral(value);
  return { text, binds: value < 0 ? SUM : text.includes('/') ? PRODUCT : ATOM };
}

function within({ text, binds }: Piece, floor: number): string {
  return binds < floor ? `(${text})` : text;
}

function sumPiece(terms: readonly Expression[], cellOf: (symbol: string) => string): Piece {
  let text = '';
  for (const term of terms) {
    const piece = write(term, cellOf);
    // A nested sum may begin with a sign that belongs to its first term only.
    const nested = term.kind === 'sum' ? `(${piece.text})` : piece.text;
    text += text === '' || nested.startsWith('-') ? nested : `+${nested}`;
  }
  return text === '' ? { text: '0', binds: ATOM } : { text, binds: SUM };
}

function productPiece(factors: readonly Expression[], cellOf: (symbol: string) => string): Piece {
  const decimal = decimalLogarithm(factors, cellOf);
  if (decimal !== undefined) return decimal;
  let sign = '';
  const above: string[] = [];
  const below: string[] = [];
  for (const factor of factors) {
    if (factor.kind === 'number') {
      if (factor.value < 0) sign = sign === '' ? '-' : '';
      const size = Math.abs(factor.value);
      if (size !== 1) above.push(within(numberPiece(size), PRODUCT));
    } else if (factor.kind === 'power' && factor.exponent.kind === 'number' && factor.exponent.value < 0) {
      const exponent = -factor.exponent.value;
      const divisor = exponent === 1 ? factor.base : { ...factor, exponent: numberOf(exponent) };
      below.push(within(write(divisor, cellOf), POWER));
    } else {
      above.push(within(write(factor, cellOf), POWER));
    }
  }
  const [first = '1', ...rest] = above;
  // A sign before a power would be taken into its base.
  const top = [sign !== '' && first.includes('^') ? `(${first})` : first, ...rest].join('*');
  const text = sign + [top, ...below].join('/');
  if (sign !== '') return { text, binds: SUM };
  return { text, binds: above.length + below.length > 1 || below.length > 0 ? PRODUCT : POWER };
}

function numberOf(value: number): Expression {
  return { kind: 'number', value };
}

function powerPiece(base: Expression, exponent: Expression, cellOf: (symbol: string) => string): Piece {
  if (base.kind === 'symbol' && base.value === Math.E) {
    return { text: `EXP(${write(exponent, cellOf).text})`, binds: ATOM };
  }
  if (exponent.kind === 'number') {
    if (exponent.value === 0.5) return { text: `SQRT(${write(base, cellOf).text})`, binds: ATOM };
    if (exponent.value < 0) return productPiece([{ kind: 'power', base, exponent }], cellOf);
  }
  const raised = within(write(exponent, cellOf), ATOM);
  return { text: `${within(write(base, cellOf), ATOM)}^${raised}`, binds: POWER };
}

/** ln u / ln 10 as one call, when these are the only factors besides numbers. */
function decimalLogarithm(
  factors: readonly Expression[],
  cellOf: (symbol: string) => string,
): Piece | undefined {
  const [first, second] = factors;
  if (factors.length !== 2 || first?.kind !== 'function' || first.name !== 'ln') return undefined;
  if (second?.kind !== 'power' || second.exponent.kind !== 'number' || second.exponent.value !== -1)
    return undefined;
  const { base } = second;
  if (base.kind !== 'function' || base.name !== 'ln') return undefined;
  if (base.argument.kind !== 'number' || base.argument.value !== 10) return undefined;
  return { text: `LOG10(${write(first.argument, cellOf).text})`, binds: ATOM };
}
