import { Problem } from '../problem.ts';
import { lawWords } from '../words/lawWords.ts';
import { type Expression, symbolsIn } from './expression.ts';
import { isFunctionName, parseExpression } from './parseExpression.ts';
import { type Token, tokens } from './tokens.ts';

export const MOST_CHARACTERS = 2000;

/** An equation as written: both sides, and which symbols are the readings. */
export interface ParsedLaw {
  readonly left: Expression;
  readonly right: Expression;
  readonly response: string;
  readonly predictor: string;
  /** True when the left side is the response alone. */
  readonly explicit: boolean;
  /** All other symbols, in order of first appearance. */
  readonly constants: readonly string[];
}

interface Declaration {
  readonly response: string;
  readonly predictor: string;
  /** Index of the first token after the declaration. */
  readonly next: number;
  readonly implicit: boolean;
}

/**
 * Reads an equation: `V(t) = …`, `y = …`, `v(x): … = …` or an equation of x and y.
 * @param known names of known constants, which take precedence over the numbers e and π
 * @throws Problem `argument`, with the 1-based position of what cannot be read where there is one
 */
export function parseLaw(text: string, known: Iterable<string> = []): ParsedLaw {
  if (text.length > MOST_CHARACTERS) {
    throw new Problem('argument', 'law', lawWords.tooLong(text.length, MOST_CHARACTERS));
  }
  const list = tokens(text);
  const declared = declaration(list);
  const own = new Set(known);
  const leading = list[0];
  if (declared !== undefined) {
    own.add(declared.response);
    own.add(declared.predictor);
  } else if (leading?.kind === 'name' && list[1]?.text === '=') own.add(leading.text);

  let start = 0;
  let left: Expression;
  if (declared !== undefined && !declared.implicit) {
    left = { kind: 'symbol', name: declared.response };
    start = declared.next - 1;
  } else {
    const side = parseExpression(list, declared?.next ?? 0, (name) => own.has(name));
    left = side.expression;
    start = side.next;
  }
  expectMark(list[start], '=');
  const side = parseExpression(list, start + 1, (name) => own.has(name));
  expectMark(list[side.next], 'end');
  const right = side.expression;

  const used = symbolsIn(right, symbolsIn(left));
  const { response, predictor } = declared ?? undeclared(left, right, used);
  if (!used.has(response)) throw new Problem('argument', 'law', lawWords.responseMissing(response));
  if (!used.has(predictor)) throw new Problem('argument', 'law', lawWords.predictorMissing(predictor));
  return {
    left,
    right,
    response,
    predictor,
    explicit: left.kind === 'symbol' && left.name === response && !symbolsIn(right).has(response),
    constants: [...used].filter((name) => name !== response && name !== predictor),
  };
}

/** `y(x) =` or `y(x):` at the start of the text. */
function declaration(list: readonly Token[]): Declaration | undefined {
  const [name, open, argument, close, mark] = list;
  if (name?.kind !== 'name' || open?.text !== '(' || argument?.kind !== 'name' || close?.text !== ')') {
    return undefined;
  }
  if (mark?.text !== '=' && mark?.text !== ':') return undefined;
  if (isFunctionName(name.text) && mark.text === '=') return undefined;
  if (name.text === argument.text || isFunctionName(name.text) || isFunctionName(argument.text)) {
    throw new Problem('argument', 'law', lawWords.declaration(`${name.text}(${argument.text})`), {
      position: 1,
    });
  }
  return { response: name.text, predictor: argument.text, next: 5, implicit: mark.text === ':' };
}

function undeclared(
  left: Expression,
  right: Expression,
  used: ReadonlySet<string>,
): { response: string; predictor: string } {
  if (left.kind === 'symbol' && left.value === undefined && !(left.name === 'x' && used.has('y'))) {
    const inRight = symbolsIn(right);
    const predictor = ['x', 't'].find((name) => name !== left.name && inRight.has(name));
    if (predictor === undefined) throw new Problem('argument', 'law', lawWords.noPredictor(left.name));
    return { response: left.name, predictor };
  }
  if (used.has('x') && used.has('y')) return { response: 'y', predictor: 'x' };
  throw new Problem('argument', 'law', lawWords.noResponse());
}

/** @throws Problem `argument` unless the token is the mark wanted */
function expectMark(token: Token | undefined, wanted: '=' | 'end'): void {
  if (token === undefined || (wanted === 'end' ? token.kind === 'end' : token.text === wanted)) return;
  const { text, position } = token;
  const fail = (message: string): never => {
    throw new Problem('argument', 'law', message, { position });
  };
  if (text === '') throw new Problem('argument', 'law', lawWords.noEquals());
  if (text === '=') fail(lawWords.twoEquals(position));
  if (text === ':') fail(lawWords.colon(position));
  if (text === ')') fail(lawWords.unopened(text, position));
  fail(lawWords.operator(text, position));
}
