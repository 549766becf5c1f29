import { Problem } from '../problem.ts';
import { lawWords } from '../words/lawWords.ts';

export type TokenKind = 'number' | 'name' | 'superscript' | 'operator' | 'end';

export interface Token {
  readonly kind: TokenKind;
  /** As typed, with operators in their plain spelling (`−` as `-`, `×` as `*`). */
  readonly text: string;
  /** 1-based position of the first character. */
  readonly position: number;
  /** True when blank space stands before the token. */
  readonly spaced: boolean;
}

const PATTERNS: readonly (readonly [TokenKind, RegExp])[] = [
  ['number', /(?:\d+\.?\d*|\.\d+)(?:[eE][+\-−]?\d+)?/uy],
  ['name', /π|[\p{L}_](?:(?!π)[\p{L}\p{Nd}\p{Mn}_₀-₉])*/uy],
  ['superscript', /⁻?[⁰¹²³⁴-⁹]+/uy],
  ['operator', /\*\*|[-+*/^()[\]{}=:|√−–·⋅×∙÷∕]/uy],
];

const PLAIN: ReadonlyMap<string, string> = new Map([
  ['**', '^'],
  ['−', '-'],
  ['–', '-'],
  ['·', '*'],
  ['⋅', '*'],
  ['∙', '*'],
  ['×', '*'],
  ['÷', '/'],
  ['∕', '/'],
  ['[', '('],
  [']', ')'],
  ['{', '('],
  ['}', ')'],
]);

/**
 * Splits a law's text into names, numbers and marks.
 * @throws Problem `argument` at the first character that belongs to none
 */
export function tokens(text: string): readonly Token[] {
  const found: Token[] = [];
  let at = 0;
  let spaced = false;
  while (at < text.length) {
    const space = /\s+/uy;
    space.lastIndex = at;
    if (space.test(text)) {
      at = space.lastIndex;
      spaced = true;
      continue;
    }
    const token = tokenAt(text, at, spaced);
    found.push(token.token);
    at = token.end;
    spaced = false;
  }
  found.push({ kind: 'end', text: '', position: text.length + 1, spaced });
  return found;
}

function tokenAt(text: string, at: number, spaced: boolean): { token: Token; end: number } {
  for (const [kind, pattern] of PATTERNS) {
    pattern.lastIndex = at;
    const match = pattern.exec(text)?.[0];
    if (match === undefined) continue;
    const plain = kind === 'operator' ? (PLAIN.get(match) ?? match) : match;
    return { token: { kind, text: plain, position: at + 1, spaced }, end: pattern.lastIndex };
  }
  const character = String.fromCodePoint(text.codePointAt(at) ?? 0);
  throw new Problem('argument', 'law', lawWords.character(character, at + 1), { position: at + 1 });
}
