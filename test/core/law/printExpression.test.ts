import { describe, expect, test } from '@jest/globals';
import * as fc from 'fast-check';
import { Algebra } from '../../../core/law/algebra.ts';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import {
  type Expression,
  euler,
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
} from '../../../core/law/expression.ts';
import { toNode } from '../../../core/law/nodes.ts';
import { parseLaw } from '../../../core/law/parseLaw.ts';
import { printExpression } from '../../../core/law/printExpression.ts';
import { tradeLaws } from './tradeLaws.ts';

const NAMES = ['x', 'y', 'a', 'B0', 'τ', 'k_2'];

const { expression } = fc.letrec<{ expression: Expression }>((tie) => ({
  expression: fc.oneof(
    { depthSize: 'small', withCrossShrink: true },
    fc.constantFrom(...NAMES).map(symbolOf),
    fc
      .oneof(fc.integer({ min: -30, max: 30 }), fc.constantFrom(0.5, 0.25, 1 / 3, 2.75, 1e-7, 6.02e23))
      .map(numberOf),
    fc.constantFrom(pi, euler),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => sumOf(a, b)),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => sumOf(a, negate(b))),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => productOf(a, b)),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => productOf(a, reciprocal(b))),
    fc.tuple(tie('expression'), tie('expression')).map(([a, b]) => powerOf(a, b)),
    tie('expression').map((a) => powerOf(a, numberOf(0.5))),
    tie('expression').map((a) => powerOf(a, numberOf(2))),
    tie('expression').map((a) => powerOf(euler, a)),
    fc.tuple(fc.constantFrom(...functionNames), tie('expression')).map(([name, a]) => functionOf(name, a)),
  ),
}));

describe('a printed expression reads back as the same', () => {
  test.each(['text', 'formula'] as const)('%s', (style) => {
    fc.assert(
      fc.property(expression, (one) => {
        const printed = printExpression(one, style);
        const back = parseLaw(`y(x): ${printed} = x + y`).left;
        const g = new Algebra();
        const indexOf = (name: string): number => NAMES.indexOf(name);
        expect({ printed, same: toNode(g, back, indexOf) === toNode(g, one, indexOf) }).toEqual({
          printed,
          same: true,
        });
      }),
      { numRuns: 400, seed: 4 },
    );
  });
});

test.each(tradeLaws.map(({ equation, known = [] }) => [equation, known] as const))(
  'the equation and the axes of %s read back',
  (equation, known) => {
    const law = compileLaw(equation, known);
    expect(compileLaw(law.equation, known).equation).toBe(law.equation);
    for (const form of law.forms) {
      for (const text of [form.plot, form.against, form.slope, form.intercept]) {
        const { left } = parseLaw(
          `${law.response}(${law.predictor}): ${text} = ${law.response} + ${law.predictor}`,
          [...law.symbols],
        );
        expect(printExpression(left, 'text')).toBe(text);
      }
    }
  },
);
