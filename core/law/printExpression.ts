import type { Expression } from './expression.ts';

/** `text` for people (`−k·t`, `T²`, `ln C`), `formula` as it is typed (`-k*t`, `T^2`, `ln(C)`). */
export type PrintStyle = 'text' | 'formula';

const SUM = 1;
const PRODUCT = 2;
const POWER = 3;
const ATOM = 4;

interface Printed {
  readonly text: string;
  readonly binds: number;
}

/** Prints an expression so that reading it back gives the same expression. */
export function printExpression(expression: Expression, style: PrintStyle): string {
  return print(expression, style).text;
}

function print(expression: Expression, style: PrintStyle): Printed {
  switch (expression.kind) {
    case 'number':
      return printNumber(expression.value, style);
    case 'symbol':
      return { text: symbolText(expression, style), binds: ATOM };
    case 'sum':
      return printSum(expression.terms, style);
    case 'product':
      return printProduct(expression.factors, style);
    case 'power':
      return printPower(expression.base, expression.exponent, style);
    case 'function':
      return printCall(expression.name, expression.argument, style);
  }
}

function symbolText(symbol: { readonly name: string; readonly value?: number }, style: PrintStyle): string {
  if (symbol.value === undefined) return symbol.name;
  if (symbol.value === Math.E) return 'e';
  return style === 'text' ? 'π' : 'pi';
}

function inParentheses({ text, binds }: Printed, floor: number): string {
  return binds < floor ? `(${text})` : text;
}

/** A number, as a fraction of small whole numbers where it is one. */
function printNumber(value: number, style: PrintStyle): Printed {
  const minus = value < 0 ? (style === 'text' ? '−' : '-') : '';
  const [above, below] = fraction(Math.abs(value));
  const text = `${minus}${decimal(above, style)}${below === 1 ? '' : `/${below}`}`;
  return { text, binds: minus !== '' || below !== 1 ? PRODUCT : ATOM };
}

function decimal(value: number, style: PrintStyle): string {
  const plain = value !== 0 && Math.abs(value) < 1e-3 ? value.toExponential() : String(value);
  const text = plain.replace('e+', 'e');
  return style === 'text' ? text.replace('-', '−') : text;
}

/** Numerator and denominator; the value itself over 1 where no small denominator fits exactly. */
function fraction(value: number): [number, number] {
  if (String(value).length <= 6) return value === 0.5 || value === 0.25 ? [1, 1 / value] : [value, 1];
  const below = Number((1 / value).toPrecision(12));
  const inverts = 1 / below === value;
  if (inverts && String(below).length <= 4) return [1, below];
  for (let under = 2; under <= 64; under++) {
    const above = Math.round(value * under);
    if (above > 0 && above < 1000 && above / under === value) return [above, under];
  }
  return inverts && String(below).length < String(value).length - 1 ? [1, below] : [value, 1];
}

function printSum(terms: readonly Expression[], style: PrintStyle): Printed {
  const minus = style === 'text' ? '−' : '-';
  let text = '';
  for (const term of terms) {
    const printed = print(term, style);
    const piece = printed.binds <= SUM ? `(${printed.text})` : printed.text;
    if (text === '') text = piece;
    else if (piece.startsWith(minus)) text += ` ${minus} ${piece.slice(1)}`;
    else text += ` + ${piece}`;
  }
  return terms.length === 0 ? { text: '0', binds: ATOM } : { text, binds: SUM };
}

function printProduct(factors: readonly Expression[], style: PrintStyle): Printed {
  const logarithm = decimalLogarithm(factors);
  if (logarithm !== undefined) return printCall(logarithm.name, logarithm.argument, style);
  let minus = '';
  const above: Expression[] = [];
  const below: Expression[] = [];
  for (const [i, factor] of factors.entries()) {
    if (factor.kind === 'number' && i === 0) {
      if (factor.value < 0) minus = style === 'text' ? '−' : '-';
      const [top, bottom] = fraction(Math.abs(factor.value));
      if (top !== 1) above.push({ kind: 'number', value: top });
      if (bottom !== 1) below.push({ kind: 'number', value: bottom });
    } else if (factor.kind === 'power' && factor.exponent.kind === 'number' && factor.exponent.value < 0) {
      const exponent = -factor.exponent.value;
      below.push(exponent === 1 ? factor.base : { ...factor, exponent: { kind: 'number', value: exponent } });
    } else above.push(factor);
  }
  const bare = below.length === 0;
  const top = above.length === 0 ? '1' : joined(above, style, bare);
  if (bare) return { text: minus + top, binds: minus === '' && above.length === 1 ? POWER : PRODUCT };
  const [only] = below;
  const bottom =
    below.length === 1 && only !== undefined
      ? inParentheses(print(only, style), POWER)
      : `(${joined(below, style, true)})`;
  return { text: `${minus}${top}/${bottom}`, binds: PRODUCT };
}

/** Factors side by side; a logarithm without parentheses may only end them. */
function joined(factors: readonly Expression[], style: PrintStyle, mayEndBare: boolean): string {
  let text = '';
  let afterNumber = false;
  for (const [i, factor] of factors.entries()) {
    const printed = print(factor, style);
    const last = i === factors.length - 1;
    let piece = inParentheses(printed, last && i === 0 ? PRODUCT : POWER);
    if (i > 0 && factor.kind === 'number' && factor.value < 0) piece = `(${printed.text})`;
    if (!(last && mayEndBare)) piece = piece.replace(/^(ln|log10|log2) ([^\s(|]+)$/u, '$1($2)');
    if (i === 0) text = piece;
    else if (style === 'text' && afterNumber && /^[\p{L}√(]/u.test(piece) && !/^[eE][\d+\-−]/.test(piece)) {
      text += piece;
    } else text += (style === 'text' ? '·' : '*') + piece;
    afterNumber = /^[\d.]+$/.test(piece);
  }
  return text;
}

function printPower(base: Expression, exponent: Expression, style: PrintStyle): Printed {
  if (base.kind === 'symbol' && base.value === Math.E) {
    return { text: `exp(${print(exponent, style).text})`, binds: ATOM };
  }
  if (exponent.kind === 'number') {
    if (exponent.value === 0.5) return printRoot(base, style);
    if (exponent.value < 0) return printProduct([powerFactor(base, exponent.value)], style);
    if (style === 'text' && (exponent.value === 2 || exponent.value === 3)) {
      return {
        text: `${inParentheses(print(base, style), ATOM)}${exponent.value === 2 ? '²' : '³'}`,
        binds: POWER,
      };
    }
  }
  const raised = print(exponent, style);
  const simple = raised.binds === ATOM && !raised.text.includes(' ') && !raised.text.startsWith('√');
  return {
    text: `${inParentheses(print(base, style), ATOM)}^${simple ? raised.text : `(${raised.text})`}`,
    binds: POWER,
  };
}

function powerFactor(base: Expression, exponent: number): Expression {
  return { kind: 'power', base, exponent: { kind: 'number', value: exponent } };
}

function printRoot(base: Expression, style: PrintStyle): Printed {
  const inner = print(base, style);
  if (style === 'formula') return { text: `sqrt(${inner.text})`, binds: ATOM };
  const simple = base.kind === 'symbol' || (base.kind === 'number' && inner.binds === ATOM);
  return { text: simple ? `√${inner.text}` : `√(${inner.text})`, binds: POWER };
}

function printCall(name: string, argument: Expression, style: PrintStyle): Printed {
  const inner = print(argument, style);
  if (style === 'formula') return { text: `${name}(${inner.text})`, binds: ATOM };
  if (name === 'abs') return { text: `|${inner.text}|`, binds: ATOM };
  const bare = argument.kind === 'symbol' || (argument.kind === 'number' && inner.binds === ATOM);
  if (bare && (name === 'ln' || name.startsWith('log')))
    return { text: `${name} ${inner.text}`, binds: POWER };
  return { text: `${name}(${inner.text})`, binds: POWER };
}

/** ln u / ln 10 and ln u / ln 2, for exactly these two factors. */
function decimalLogarithm(
  factors: readonly Expression[],
): { readonly name: string; readonly argument: Expression } | undefined {
  const [first, second] = factors;
  if (factors.length !== 2 || first?.kind !== 'function' || first.name !== 'ln') return undefined;
  if (second?.kind !== 'power' || second.exponent.kind !== 'number' || second.exponent.value !== -1) {
    return undefined;
  }
  const divisor = second.base;
  if (divisor.kind !== 'function' || divisor.name !== 'ln' || divisor.argument.kind !== 'number')
    return undefined;
  const base = divisor.argument.value;
  return base === 10 || base === 2 ? { name: `log${base}`, argument: first.argument } : undefined;
}
