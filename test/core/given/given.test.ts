import { describe, expect, test } from '@jest/globals';
import { parseKnown } from '../../../core/given/parseKnown.ts';
import { defaultOptions, parseOptions } from '../../../core/given/parseOptions.ts';
import { parseSpread, requireKnownUncertainty } from '../../../core/given/parseSpread.ts';
import { problemOf } from '../../problemOf.ts';

describe('parseKnown', () => {
  test('text and rows say the same', () => {
    const text = parseKnown('R=1000; V0 = 12±0.05');
    expect([...text]).toEqual([
      ['R', { value: 1000, standardUncertainty: 0 }],
      ['V0', { value: 12, standardUncertainty: 0.05 }],
    ]);
    expect(
      parseKnown([
        ['R', 1000, null],
        ['', '', ''],
        ['V0', 12, 0.05],
      ]),
    ).toEqual(text);
    expect(parseKnown([['R=1000; V0=12+/-5e-2']])).toEqual(text);
  });

  test('nothing given is no constants', () => {
    expect(parseKnown(null).size).toBe(0);
    expect(parseKnown('').size).toBe(0);
    expect(parseKnown([[null]]).size).toBe(0);
  });

  test('symbols are case-sensitive and never touch a prototype', () => {
    expect([...parseKnown('r=1; R=2').keys()]).toEqual(['r', 'R']);
    const known = parseKnown('__proto__=1; constructor=2');
    expect(known.get('__proto__')?.value).toBe(1);
    expect(Object.getOwnPropertyNames(Object.prototype)).not.toContain('value');
    expect(parseKnown(null).get('constructor')).toBeUndefined();
  });

  test.each([
    ['R', /'R'/],
    ['R=1; R=2', /R stands there twice/],
    ['R=abc', /value of R/],
    ['R=', /value of R.*missing/],
    ['R=1±', /uncertainty of R/],
    ['R=1±-2', /0 or more for R/],
    ['R=1±2±3', /entries like/],
    ['R=1,5', /decimal point/],
    ['1R=5', /not a symbol/],
  ])('refuses %s', (text, message) => {
    const problem = problemOf(() => parseKnown(text));
    expect(problem).toMatchObject({ code: 'argument', argument: 'known' });
    expect(problem.message).toMatch(message);
  });

  test('a cell error is passed on', () => {
    expect(problemOf(() => parseKnown([['R', { error: '#REF!' }]]))).toMatchObject({
      code: 'cell',
      cellError: '#REF!',
    });
  });
});

describe('parseSpread', () => {
  test('every form', () => {
    expect(parseSpread('u_y', null, 3)).toEqual({ kind: 'none' });
    expect(parseSpread('u_y', 0.05, 3)).toEqual({ kind: 'absolute', value: 0.05 });
    expect(parseSpread('u_y', [['0.05']], 3)).toEqual({ kind: 'absolute', value: 0.05 });
    expect(parseSpread('u_x', ' 2 % ', 3)).toEqual({ kind: 'relative', fraction: 0.02 });
    expect(parseSpread('u_y', 'Equal', 3)).toEqual({ kind: 'equal' });
    expect(parseSpread('u_y', 'PROPORTIONAL', 3)).toEqual({ kind: 'proportional' });
    expect(parseSpread('u_y', [[0.1], [null], [0.3]], 3)).toEqual({
      kind: 'each',
      values: Float64Array.of(0.1, Number.NaN, 0.3),
    });
  });

  test('a zero in a range is refused, unless blanks may arrive as zeros', () => {
    expect(problemOf(() => parseSpread('u_y', [[0.1], [0]], 2))).toMatchObject({ position: 2 });
    expect(parseSpread('u_y', [[0.1], [0]], 2, 'maybeZero')).toEqual({
      kind: 'each',
      values: Float64Array.of(0.1, Number.NaN),
    });
    expect(problemOf(() => parseSpread('u_y', [[0.1], [0], [null]], 3, 'maybeZero')).position).toBe(2);
  });

  test.each(['equal', 'proportional', 'about 2', '-1', '0', '0%', true, '2,5'])('u_x refuses %s', (given) => {
    expect(problemOf(() => parseSpread('u_x', given, 3))).toMatchObject({
      code: 'argument',
      argument: 'u_x',
    });
  });

  test('a range must have one cell per reading', () => {
    expect(problemOf(() => parseSpread('u_y', [[1], [2]], 3)).message).toMatch(/2 cells.*have 3/);
  });

  test('u_x needs a known u_y', () => {
    const percent = parseSpread('u_x', '2%', 3);
    expect(problemOf(() => requireKnownUncertainty({ kind: 'none' }, percent)).argument).toBe('u_x');
    expect(problemOf(() => requireKnownUncertainty({ kind: 'equal' }, percent)).argument).toBe('u_x');
    expect(() => requireKnownUncertainty({ kind: 'absolute', value: 1 }, percent)).not.toThrow();
    expect(() => requireKnownUncertainty({ kind: 'none' }, { kind: 'none' })).not.toThrow();
  });
});

describe('parseOptions', () => {
  test('defaults, text and rows', () => {
    expect(parseOptions(null)).toEqual(defaultOptions);
    const expected = { ...defaultOptions, coverage: 0.99, outside: 'set aside', form: 2 };
    expect(parseOptions('Coverage = 0.99; OUTSIDE=Set  Aside;form=2;')).toEqual(expected);
    expect(
      parseOptions([
        ['coverage', 0.99],
        ['outside', 'set aside'],
        [null, null],
        ['form', 2],
      ]),
    ).toEqual(expected);
  });

  test('the defaults do not change', () => {
    parseOptions('fit=direct');
    expect(defaultOptions.fit).toBe('line');
  });

  test.each([
    ['colour=red', /coverage, intercept, form, fit, band, outside, interval, judge and style/],
    ['__proto__=1', /must be among/],
    ['fit=robust', /line or direct/],
    ['coverage=1', /above 0 and below 1/],
    ['coverage=95', /above 0 and below 1/],
    ['form=1.5', /whole number/],
    ['fit', /entries like/],
    ['fit=line; FIT=direct', /once/],
  ])('refuses %s', (text, message) => {
    const problem = problemOf(() => parseOptions(text));
    expect(problem).toMatchObject({ code: 'argument', argument: 'options' });
    expect(problem.message).toMatch(message);
  });
});
