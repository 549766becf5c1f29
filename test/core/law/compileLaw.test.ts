import { describe, expect, test } from '@jest/globals';
import { compileLaw } from '../../../core/law/compileLaw.ts';
import type { Law, StraightForm } from '../../../core/law/law.ts';
import type { Problem } from '../../../core/problem.ts';
import { problemOf } from '../../problemOf.ts';
import { tradeLaws } from './tradeLaws.ts';

function rowsOf(law: Law): string[] {
  return law.forms.map(
    ({ plot, against, slope, intercept, trials }) =>
      `[${trials.join(' ')}] ${plot} against ${against} {${slope}; ${intercept}}`,
  );
}

function firstForm(text: string, known: readonly string[] = []): StraightForm {
  const [form] = compileLaw(text, known).forms;
  if (form === undefined) throw new Error('no form');
  return form;
}

const refusal = (text: string, known: readonly string[] = []): Problem =>
  problemOf(() => compileLaw(text, known));

describe('straight forms of laws in the user’s own symbols', () => {
  test.each([
    ['θ(t) = θa + (θ0 - θa)*exp(-k*t)', ['θa'], '[] ln(θ − θa) against t {−k; ln(θ0 − θa)}'],
    ['T(L) = 2*pi*sqrt(L/g)', [], '[] T² against L {4π²/g; 0}'],
    [
      'v(x): x/(v*(1-x)) = 1/(vm*c) + (c-1)*x/(vm*c)',
      [],
      '[] x/(v·(1 − x)) against x {(c − 1)/(vm·c); 1/(vm·c)}',
    ],
    ['y = b1*(1 - exp(-b2*x))', [], '[b1] ln(1 − y/b1) against x {−b2; 0}'],
    ['y = b1*(1 - exp(-b2*x))', [], '[b2] y against 1 − exp(−b2·x) {b1; 0}'],
    ['y = (b1/b2)*exp(-0.5*((x - b3)/b2)^2)', [], '[b3] ln y against (x − b3)² {−1/(2b2²); ln(b1/b2)}'],
    ['y = b1/(1 + exp(b2 - b3*x))', [], '[b1] ln(y/(b1 − y)) against x {b3; −b2}'],
    ['C(t) = Cinf + (C0 - Cinf)*exp(-k*t)', [], '[Cinf] ln(C − Cinf) against t {−k; ln(C0 − Cinf)}'],
    ['R(T) = R0*exp(B*(1/T - 1/298.15))', [], '[] ln R against 1/T − 1/298.15 {B; ln R0}'],
    ['I(V) = Is*exp(V/(n*0.02585))', [], '[] ln I against V {1/(0.02585n); ln Is}'],
    ['y = A*sin(w*x + f)', ['w'], '[] y/sin(w·x) against cos(w·x)/sin(w·x) {A·sin(f); A·cos(f)}'],
  ])('%s, known %j: %s', (text, known, row) => {
    expect(rowsOf(compileLaw(text, known))).toContain(row);
  });

  test('a known intercept stays on the line as a check, and the line through the origin comes after', () => {
    expect(rowsOf(compileLaw('first order', ['C0']))).toEqual([
      '[] ln C against t {−k; ln C0}',
      '[] ln(C/C0) against t {−k; 0}',
    ]);
    const { inSlope, inIntercept, note } = firstForm('first order', ['C0']);
    expect({ inSlope, inIntercept, note }).toEqual({
      inSlope: ['k'],
      inIntercept: [],
      note: 'the intercept is known: a check',
    });
  });

  test('laws linear in all constants are told apart', () => {
    expect(compileLaw('y = a + b*x + c*x^2', [])).toMatchObject({ linearInConstants: true });
    expect(firstForm('y = a + b*x + c*x^2').note).toMatch(/solved directly/);
    expect(compileLaw('approach', [])).toMatchObject({ linearInConstants: false });
    expect(compileLaw('approach', ['tau'])).toMatchObject({ linearInConstants: true });
  });

  test('polynomials and their ratios of any length', () => {
    const ratio = '(b1 + b2*x + b3*x^2)/(1 + b4*x + b5*x^2)';
    expect(rowsOf(compileLaw(`y = ${ratio}`, []))).toContain(
      '[b3 b4 b5] y·(b4·x + b5·x² + 1) − b3·x² against x {b2; b1}',
    );
    expect(compileLaw('y = a + b*x + c*x^2 + d*x^3 + f*x^4', [])).toMatchObject({ linearInConstants: true });
  });

  test('as few trial constants as possible', () => {
    for (const { equation, known = [], trials } of tradeLaws) {
      for (const form of compileLaw(equation, known).forms) expect(form.trials).toHaveLength(trials);
    }
    expect(compileLaw('y = b1*(x^2 + x*b2)/(x^2 + x*b3 + b4)', []).forms[0]?.trials).toHaveLength(2);
  });

  test('renaming symbols changes nothing else', () => {
    const renamed = (text: string, names: ReadonlyMap<string, string>): string =>
      text.replace(/[\p{L}_][\p{L}\p{Nd}_]*/gu, (name) => names.get(name) ?? name);
    for (const { equation, known = [] } of tradeLaws.filter(({ equation: text }) => !text.includes('π'))) {
      const law = compileLaw(equation, known);
      // Names in reverse alphabetical order of appearance, so that nothing may depend on how they sort.
      const names = new Map(law.symbols.map((name, i) => [name, `z${String(99 - i)}`]));
      const other = compileLaw(
        renamed(law.equation, names),
        known.map((name) => names.get(name) ?? name),
      );
      expect(rowsOf(other)).toEqual(rowsOf(law).map((row) => renamed(row, names)));
    }
  });
});

describe('what the readings cannot settle', () => {
  test.each([
    ['V(t) = V0*exp(-t/(R*C))', 'only R·C is settled by these readings: give R or C'],
    ['y = a*x/b', 'only a/b is settled'],
    ['y = (a + b)*x', 'only a + b is settled'],
    ['y = a*exp(b + c*x)', 'only a·exp(b) is settled'],
    ['y = a^2*b*x', 'only a²·b is settled'],
    ['y = (a - b)*x + c', 'only a − b is settled'],
    ['y = a*b*c*x', 'only combinations of a, b and c: give 2 of them'],
  ])('%s: %s', (text, message) => {
    const problem = refusal(text);
    expect(problem).toMatchObject({ code: 'unsettled', argument: 'law' });
    expect(problem.message).toContain(message);
  });

  test('giving one of them helps', () => {
    expect(rowsOf(compileLaw('V(t) = V0*exp(-t/(R*C))', ['R']))[0]).toBe(
      '[] ln V against t {−1/(R·C); ln V0}',
    );
  });

  test('a constant that makes no difference', () => {
    expect(refusal('y = a + b*x + c*0').message).toMatch(/say nothing about c/);
  });
});

describe('laws that no line can draw', () => {
  test.each([
    'y = b1*exp(-b2*x) + b3*exp(-b4*x) + b5',
    'y = b1*exp(-b2*x) + b3*exp(-b4*x) + b5*exp(-b6*x)',
    'y = a*sin(b*x + c) + d*sin(f*x + g)',
  ])('%s', (text) => {
    const problem = refusal(text);
    expect(problem).toMatchObject({ code: 'notStraight', argument: 'law' });
    expect(problem.message).toMatch(/give some of them in known/);
  });
});

describe('solving back', () => {
  test('every branch, the positive one first', () => {
    const form = firstForm('y = a^2*x + b');
    expect(form.solve(9, 1, [Number.NaN, Number.NaN], 'both').map((one) => Array.from(one))).toEqual([
      [3, 1],
      [-3, 1],
    ]);
    const decay = firstForm('offset decay', ['c']);
    const both = decay.solve(-0.5, Math.log(2), [5, Number.NaN, Number.NaN], 'both');
    expect(both).toHaveLength(2);
    expect(both[0]?.[1]).toBeCloseTo(2, 14);
    expect(both[1]?.[1]).toBeCloseTo(-2, 14);
  });

  test('nothing where no real constants exist', () => {
    expect(firstForm('y = a^2*x + b').solve(-9, 1, [Number.NaN, Number.NaN], 'both')).toEqual([]);
    expect(firstForm('power').solve(1, 800, [Number.NaN, Number.NaN], 'both')).toEqual([]);
  });

  test('inputs are left as they are', () => {
    const constants = Float64Array.of(5, Number.NaN, Number.NaN);
    firstForm('offset decay', ['c']).solve(-0.5, 1, constants, 'both');
    expect(constants).toEqual(Float64Array.of(5, Number.NaN, Number.NaN));
  });
});

describe('domains', () => {
  const x = Float64Array.of(1, 2, 3, 4);

  test('a logarithm of a response takes positive ones only', () => {
    const { vertical } = firstForm('exponential');
    expect(
      Array.from(vertical.evaluate([x, Float64Array.of(1, -2, 0, 3), Number.NaN, Number.NaN], 4)),
    ).toEqual([0, Number.NaN, Number.NaN, Math.log(3)]);
  });

  test('a square takes the root that the law has', () => {
    const { vertical } = firstForm('T(L) = 2*pi*sqrt(L/g)');
    expect(Array.from(vertical.evaluate([x, Float64Array.of(1, -2, 3, -4), Number.NaN], 4))).toEqual([
      1,
      Number.NaN,
      9,
      Number.NaN,
    ]);
    expect(vertical.at([1, -3, Number.NaN])).toBe(Number.NaN);
  });

  test('a logarithm of either sign takes one side', () => {
    const { vertical } = firstForm('offset decay', ['c']);
    const y = Float64Array.of(1, 2, 3, 6);
    const finite = (a: number, k: number): boolean[] =>
      Array.from(vertical.evaluate([x, y, 5, a, k], 4), (value) => Number.isFinite(value));
    expect(finite(Number.NaN, Number.NaN)).toEqual([true, true, true, false]);
    expect(finite(-2, 0.3)).toEqual([true, true, true, false]);
    expect(finite(2, 0.3)).toEqual([false, false, false, true]);
  });
});

describe('reading off', () => {
  test.each(tradeLaws.map((one) => [one.equation, one] as const))(
    '%s: the inverse of the curve',
    (_, one) => {
      const law = compileLaw(one.equation, one.known ?? []);
      const { curve, inverse } = law;
      expect(curve).not.toBeNull();
      if (curve === null || inverse === null) return;
      for (const part of [0.1, 0.4, 0.7]) {
        const at = one.from + part * (one.to - one.from);
        const values = [at, Number.NaN, ...law.constants.map((name) => one.constants[name] ?? Number.NaN)];
        values[1] = curve.at(values);
        // A curve that turns has this response twice.
        const back = inverse.at([Number.NaN, ...values.slice(1)]);
        expect(curve.at([back, ...values.slice(1)]) / (values[1] ?? Number.NaN)).toBeCloseTo(1, 9);
      }
    },
  );

  test('few laws have no inverse', () => {
    const without = tradeLaws.filter(
      ({ equation, known = [] }) => compileLaw(equation, known).inverse === null,
    );
    expect(without.length).toBeLessThan(8);
  });
});

describe('edges of trial constants', () => {
  test.each([
    ['shifted power', [3, Number.NaN], 3],
    ['approach', [1, 7], 7],
    ['saturating rise', [1, 7], 7],
    ['y = (b1/b2)*exp(-0.5*((x - b3)/b2)^2)', [4, 1], 4],
  ])('%s', (text, [x, y], edge) => {
    const form = firstForm(text);
    const law = compileLaw(text, []);
    const inputs = [x ?? 0, y ?? 0, ...law.constants.map(() => Number.NaN)];
    expect(form.trialEdges).toHaveLength(1);
    expect(form.trialEdges[0]?.map((one) => one.at(inputs))).toContain(edge);
  });
});
