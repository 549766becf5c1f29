import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { columnFunction } from '../../../core/law/columnFunction.ts';
import {
  type Expression,
  euler,
  functionNames,
  functionOf,
  numberOf,
  pi,
  powerOf,
  productOf,
  sumOf,
  symbolOf,
} from '../../../core/law/expression.ts';
import { expressionFormula } from '../../../core/workings/expressionFormula.ts';
import { numberLiteral, textLiteral } from '../../../core/workings/literals.ts';
import { expectDigits } from '../../expectDigits.ts';
import { type HeadlessSheet, openSheet } from '../../sheet/headless.ts';

const x = symbolOf('x');
const k = symbolOf('k');
const cellOf = (symbol: string): string => (symbol === 'x' ? '$A$1' : '$B$1');
const values = { x: 1.7, k: -0.6 };

const formulas: readonly (readonly [string, Expression, string])[] = [
  ['a sign before a power', productOf(numberOf(-1), powerOf(x, numberOf(2))), '-($A$1^2)'],
  ['a sign before a power and more', productOf(numberOf(-3), powerOf(x, numberOf(2)), k), '-3*$A$1^2*$B$1'],
  ['a power of a negative number', powerOf(numberOf(-2), numberOf(3)), '(-2)^3'],
  ['a power of a power', powerOf(powerOf(x, numberOf(3)), k), '($A$1^3)^$B$1'],
  ['a power as exponent', powerOf(x, powerOf(k, numberOf(2))), '$A$1^($B$1^2)'],
  ['a negative exponent', powerOf(x, numberOf(-2)), '1/$A$1^2'],
  ['a third root', powerOf(x, numberOf(1 / 3)), '$A$1^(1/3)'],
  ['a square root', powerOf(sumOf(x, numberOf(1)), numberOf(0.5)), 'SQRT($A$1+1)'],
  ['a reciprocal square root', powerOf(x, numberOf(-0.5)), '1/SQRT($A$1)'],
  ['an exponential', powerOf(euler, productOf(numberOf(-1), k, x)), 'EXP(-$B$1*$A$1)'],
  [
    'an exponential of a square',
    powerOf(euler, productOf(numberOf(-1), powerOf(x, numberOf(2)))),
    'EXP(-($A$1^2))',
  ],
  ['e and π alone', sumOf(euler, pi), 'EXP(1)+PI()'],
  ['a difference in a product', productOf(sumOf(x, productOf(numberOf(-1), k)), x), '($A$1-$B$1)*$A$1'],
  ['a difference as divisor', productOf(numberOf(2), powerOf(sumOf(x, k), numberOf(-1))), '2/($A$1+$B$1)'],
  ['two divisors', productOf(powerOf(x, numberOf(-1)), powerOf(k, numberOf(-1))), '1/$A$1/$B$1'],
  ['a product as divisor', powerOf(productOf(x, k), numberOf(-1)), '1/($A$1*$B$1)'],
  ['a term with a negative number', sumOf(x, productOf(numberOf(-2), k)), '$A$1-2*$B$1'],
  [
    'a term that begins with a power after minus',
    sumOf(k, productOf(numberOf(-1), powerOf(x, numberOf(2)))),
    '$B$1-($A$1^2)',
  ],
  [
    'a decimal logarithm',
    productOf(functionOf('ln', x), powerOf(functionOf('ln', numberOf(10)), numberOf(-1))),
    'LOG10($A$1)',
  ],
  ['a logarithm of an absolute value', functionOf('ln', functionOf('abs', k)), 'LN(ABS($B$1))'],
  ['a large and a small number', sumOf(numberOf(6.02e23), numberOf(1.6e-19)), '6.02E23+1.6E-19'],
];

/** Random numbers that are the same in every run. @see Park & Miller (1988), Communications of the ACM 31, 1192 */
function randomNumbers(seed: number): () => number {
  let state = seed;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}

function randomExpression(random: () => number, depth: number): Expression {
  const inner = () => randomExpression(random, depth - 1);
  const kind = Math.floor(random() * (depth <= 0 ? 3 : 8));
  if (kind === 0) return x;
  if (kind === 1) return k;
  if (kind === 2) return numberOf([-3, -1, -0.5, 0.25, 1 / 3, 2, 7][Math.floor(random() * 7)] ?? 1);
  if (kind === 3) return sumOf(inner(), inner());
  if (kind === 4) return { kind: 'sum', terms: [inner(), inner(), inner()] };
  if (kind === 5) return { kind: 'product', factors: [inner(), inner(), inner()] };
  if (kind === 6) return powerOf(inner(), numberOf([-2, -1, -0.5, 0.5, 2, 3][Math.floor(random() * 6)] ?? 1));
  return functionOf(functionNames[Math.floor(random() * functionNames.length)] ?? 'ln', inner());
}

describe('an expression as a spreadsheet formula', () => {
  let sheet: HeadlessSheet;
  const random = randomNumbers(20);
  const drawn = Array.from({ length: 300 }, () => randomExpression(random, 3));
  beforeAll(async () => {
    sheet = await openSheet({ functions: null });
    sheet.set('A1', [[values.x, values.k]]);
    formulas.forEach(([, expression], i) => {
      sheet.set(`C${i + 1}`, `=${expressionFormula(expression, cellOf)}`);
    });
    drawn.forEach((expression, i) => {
      sheet.set(`D${i + 1}`, `=${expressionFormula(expression, cellOf)}`);
    });
    await sheet.settle();
  });
  afterAll(() => sheet?.close());

  const exact = (expression: Expression): number =>
    columnFunction(expression, ['x', 'k']).at([values.x, values.k]);

  test.each(formulas)('%s', (_, expression, formula) => {
    expect(expressionFormula(expression, cellOf)).toBe(formula);
    const row = formulas.findIndex(([, one]) => one === expression) + 1;
    expectDigits(Number(sheet.get(`C${row}`)), exact(expression), 14);
  });

  test('has the value of the expression, for 300 random ones', () => {
    let compared = 0;
    drawn.forEach((expression, i) => {
      const expected = exact(expression);
      const found = sheet.get(`D${i + 1}`);
      if (!Number.isFinite(expected) || Math.abs(expected) > 1e6) return;
      compared++;
      if (typeof found !== 'number') throw new Error(`${expressionFormula(expression, cellOf)} is ${found}`);
      expect(Math.abs(found - expected)).toBeLessThanOrEqual(1e-11 * Math.max(1, Math.abs(expected)));
    });
    expect(compared).toBeGreaterThan(120);
  });
});

describe('literals', () => {
  test('keep every digit that a spreadsheet would cut', () => {
    expect(numberLiteral(1 / 3)).toBe('1/3');
    expect(numberLiteral(-2 / 3)).toBe('-2/3');
    expect(numberLiteral(8.314462618)).toBe('8.314462618');
    expect(numberLiteral(1e21)).toBe('1E21');
  });

  test('double quotation marks, and join what is longer than 255 characters', () => {
    expect(textLiteral('say "x"')).toBe('"say ""x"""');
    expect(textLiteral('')).toBe('""');
    expect(textLiteral('a'.repeat(300))).toBe(`"${'a'.repeat(255)}"&"${'a'.repeat(45)}"`);
  });
});
