import { describe, expect, test } from '@jest/globals';
import { columnFunction } from '../../../core/law/columnFunction.ts';
import { closedForms, INTERCEPT, SLOPE } from '../../../core/workings/closedForm.ts';
import { expectDigits } from '../../expectDigits.ts';
import { parsed } from './parsed.ts';

/** Slope and intercept of lines as laws have them, with constants that they are solved for. */
const lines: readonly (readonly [string, string, Readonly<Record<string, number>>, readonly string[]])[] = [
  ['-k', 'ln(C0)', { k: 0.094, C0: 1.86 }, ['k', 'C0']],
  ['q/p', '1/p', { p: 3, q: 0.7 }, ['p', 'q']],
  ['-1/(R*C)', 'ln(V0)', { C: 1e-6, V0: 12, R: 1000 }, ['C', 'V0']],
  ['B', 'ln(R0)', { B: 3900, R0: 1e4 }, ['B', 'R0']],
  ['(c - 1)/(vm*c)', '1/(vm*c)', { vm: 2.3, c: 40 }, ['vm', 'c']],
  ['beta', '-beta*ln(eta)', { beta: 1.8, eta: 450 }, ['beta', 'eta']],
  ['4*pi^2/g', '0', { g: 9.81 }, ['g']],
  ['1/(qm*K)', '1/qm', { qm: 1.4, K: 0.2 }, ['qm', 'K']],
  ['-a^2/b', 'a*b', { a: 1.5, b: 2.5 }, ['a', 'b']],
];

describe('constants in closed form from the terms of a line', () => {
  test.each(lines)('slope %s, intercept %s', (slope, intercept, constants, unknown) => {
    const names = Object.keys(constants);
    const at = Object.values(constants);
    const values = new Map(Object.entries(constants));
    values.set(SLOPE, columnFunction(parsed(slope), names).at(at));
    values.set(INTERCEPT, columnFunction(parsed(intercept), names).at(at));
    const forms = closedForms({ slope: parsed(slope), intercept: parsed(intercept) }, unknown, values);
    if (forms === null) throw new Error('no closed form');
    expect(new Set(forms.map(({ name }) => name))).toEqual(new Set(unknown));
    for (const { name, expression } of forms) {
      const symbols = [...values.keys()];
      expectDigits(columnFunction(expression, symbols).at([...values.values()]), values.get(name) ?? 0, 13);
    }
  });
});
