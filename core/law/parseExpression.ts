import { Problem } from '../problem.ts';
import { lawWords } from '../words/lawWords.ts';
import {
  type Expression,
  euler,
  type FunctionName,
  functionNames,
  functionOf,
  negate,
  numberOf,
  pi,
  powerOf,
  productOf,
  reciprocal,
  sumOf,
  symbolOf,
} from './expression.ts';
import { nearNames } from './nearNames.ts';
import type { Token } from './tokens.ts';

const MOST_NESTED = 100;
/** How tightly operators bind; a minus in front binds like a product, so −x² is −(x²). */
const SUM = 10;
const PRODUCT = 20;
const POWER = 30;

const written = new Map<string, (argument: Expression) => Expression>([
  ...functionNames.map(
    (name: FunctionName) => [name, (argument: Expression) => functionOf(name, argument)] as const,
  ),
  ['exp', (argument) => powerOf(euler, argument)],
  ['sqrt', (argument) => powerOf(argument, numberOf(0.5))],
  ['log10', (argument) => productOf(functionOf('ln', argument), reciprocal(functionOf('ln', numberOf(10))))],
  ['log2', (argument) => productOf(functionOf('ln', argument), reciprocal(functionOf('ln', numberOf(2))))],
]);

/** True for a name that a law may call. */
export function isFunctionName(name: string): boolean {
  return written.has(name);
}

/** Spellings of other trades and languages. */
const OTHER_SPELLINGS: ReadonlyMap<string, readonly string[]> = new Map([
  ['log', ['ln', 'log10']],
  ['lg', ['log10']],
  ['ld', ['log2']],
  ['lb', ['log2']],
  ['loge', ['ln']],
  ['sqr', ['sqrt']],
  ['root', ['sqrt']],
  ['arcsin', ['asin']],
  ['arccos', ['acos']],
  ['arctan', ['atan']],
  ['tg', ['tan']],
  ['arctg', ['atan']],
  ['sh', ['sinh']],
  ['ch', ['cosh']],
  ['th', ['tanh']],
]);

/**
 * Reads one side of a law by operator precedence (the method of V. R. Pratt, "Top down operator precedence", 1973).
 * @param list tokens, an `end` among them
 * @param start index of the first token to read
 * @param isOwnName whether `e`, `pi` or `π` is a name of the user's own here
 * @returns the tree and the index of the first token not read
 * @throws Problem `argument` with the 1-based position of what cannot be read
 */
export function parseExpression(
  list: readonly Token[],
  start: number,
  isOwnName: (name: string) => boolean,
): { expression: Expression; next: number } {
  let at = start;
  let depth = 0;
  const end: Token = { kind: 'end', text: '', position: 1, spaced: false };
  const peek = (): Token => list[at] ?? list[list.length - 1] ?? end;
  const take = (): Token => {
    const token = peek();
    at++;
    return token;
  };
  const fail = (message: string, position: number): never => {
    throw new Problem('argument', 'law', message, { position });
  };
  const startsOperand = (token: Token): boolean =>
    token.kind === 'number' || token.kind === 'name' || token.text === '(' || token.text === '√';

  const symbol = (name: string): Expression => {
    if (!isOwnName(name)) {
      if (name === 'e') return euler;
      if (name === 'pi' || name === 'π') return pi;
    }
    return symbolOf(name);
  };

  const closed = (open: Token, mark: ')' | '|'): Expression => {
    const inner = parse(0);
    if (peek().text !== mark) {
      if (peek().kind === 'end' || peek().text === '=' || peek().text === ':') {
        fail(lawWords.unclosed(open.position, open.text), open.position);
      }
      fail(lawWords.operator(peek().text, peek().position), peek().position);
    }
    take();
    return inner;
  };

  const call = (token: Token): Expression => {
    const make = written.get(token.text);
    const following = peek();
    if (make === undefined) {
      const near = OTHER_SPELLINGS.get(token.text) ?? nearNames(token.text, [...written.keys()]);
      return fail(lawWords.unknownFunction(token.text, token.position, near), token.position);
    }
    if (following.text === '(') return make(closed(take(), ')'));
    if (following.text === '|') {
      take();
      return make(functionOf('abs', closed(following, '|')));
    }
    if (following.kind !== 'name' && following.kind !== 'number' && following.text !== '√') {
      return fail(lawWords.functionAlone(token.text, token.position), token.position);
    }
    // `ln C`, `ln T²`: the argument is one name or number with its own exponent.
    const argument = parse(POWER - 1);
    if (startsOperand(peek())) fail(lawWords.functionOperand(token.text, peek().position), peek().position);
    return make(argument);
  };

  const operand = (): Expression => {
    const token = take();
    switch (token.kind) {
      case 'number': {
        const value = Number(token.text.replace('−', '-'));
        if (!Number.isFinite(value)) fail(lawWords.badNumber(token.text, token.position), token.position);
        return numberOf(value);
      }
      case 'name':
        if (written.has(token.text) || peek().text === '(') return call(token);
        return symbol(token.text);
      case 'operator':
        if (token.text === '(') return closed(token, ')');
        if (token.text === '|') return functionOf('abs', closed(token, '|'));
        if (token.text === '-') return negate(parse(PRODUCT));
        if (token.text === '+') return parse(PRODUCT);
        if (token.text === '√') return powerOf(parse(POWER), numberOf(0.5));
        break;
      default:
        break;
    }
    return fail(lawWords.operand(token.text, token.position), token.position);
  };

  const parse = (floor: number): Expression => {
    if (++depth > MOST_NESTED) fail(lawWords.tooDeep(peek().position), peek().position);
    let left = operand();
    let last = '';
    for (;;) {
      const token = peek();
      if (token.kind === 'superscript') {
        if (floor >= POWER) break;
        take();
        left = powerOf(left, numberOf(superscriptValue(token.text)));
        continue;
      }
      if (startsOperand(token)) {
        if (floor >= PRODUCT) break;
        if (!mayPrecedeFactor(list[at - 1])) {
          fail(lawWords.operator(token.text, token.position), token.position);
        }
        if (last === '/' || last === '^') fail(lawWords.ambiguous(token.position), token.position);
        left = productOf(left, parse(PRODUCT));
        last = '*';
        continue;
      }
      if (token.text === '+' || token.text === '-') {
        if (floor >= SUM) break;
        take();
        const right = parse(SUM);
        left = sumOf(left, token.text === '-' ? negate(right) : right);
      } else if (token.text === '*' || token.text === '/') {
        if (floor >= PRODUCT) break;
        take();
        const right = parse(PRODUCT);
        left = productOf(left, token.text === '/' ? reciprocal(right) : right);
      } else if (token.text === '^') {
        if (floor > POWER - 1) break;
        take();
        left = powerOf(left, parse(POWER - 1));
      } else break;
      last = token.text;
    }
    depth--;
    return left;
  };

  const expression = parse(0);
  return { expression, next: at };
}

/** A number, π, a closing parenthesis or a superscript may be followed by a factor without a sign: `4π²/g`. */
function mayPrecedeFactor(token: Token | undefined): boolean {
  return (
    token !== undefined &&
    (token.kind === 'number' || token.kind === 'superscript' || token.text === ')' || token.text === 'π')
  );
}

const RAISED = '⁰¹²³⁴⁵⁶⁷⁸⁹';

function superscriptValue(text: string): number {
  const digits = [...text].map((mark) => (mark === '⁻' ? '-' : String(RAISED.indexOf(mark)))).join('');
  return Number(digits);
}
