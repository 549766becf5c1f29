import { beforeAll, describe, expect, test } from '@jest/globals';
import { Problem, type ProblemCode } from '../../core/problem.ts';
import { Call } from '../../functions/call.ts';
import { invoke } from '../../functions/invoke.ts';
import { shared, x, y } from '../../functions/parameters.ts';
import type { Answer, SheetFunction } from '../../functions/sheetFunction.ts';
import { toHostTable } from '../../functions/toHost.ts';

class HostError extends Error {
  constructor(
    readonly code: string,
    message = '',
  ) {
    super(message);
  }
}

beforeAll(() => {
  Object.assign(globalThis, {
    CustomFunctions: { Error: HostError, ErrorCode: { invalidValue: '#VALUE!', notAvailable: '#N/A' } },
  });
});

function table(compute: () => readonly (readonly Answer[])[]): SheetFunction {
  return { id: 'PROBE', description: '', parameters: [x, y, ...shared], result: 'matrix', compute };
}

function refusal(thrown: unknown): { code: string; message: string } {
  try {
    invoke(
      table(() => {
        throw thrown;
      }),
      [],
    );
  } catch (error) {
    if (error instanceof HostError) return { code: error.code, message: error.message };
    throw error;
  }
  throw new Error('nothing was thrown');
}

describe('errors that cells show', () => {
  test.each<[ProblemCode, string]>([
    ['argument', '#VALUE!'],
    ['unsettled', '#VALUE!'],
    ['notStraight', '#VALUE!'],
    ['tooFew', '#N/A'],
    ['domain', '#N/A'],
    ['undefined', '#N/A'],
    ['noConvergence', '#N/A'],
  ])('%s shows as %s with its sentence', (code, shown) => {
    expect(refusal(new Problem(code, 'law', 'law must be …'))).toEqual({
      code: shown,
      message: 'law must be …',
    });
  });

  test.each([
    ['#DIV/0!', '#DIV/0!'],
    ['#NUM!', '#NUM!'],
    ['#NULL!', '#NULL!'],
    ['#N/A', '#N/A'],
    ['#VALUE!', '#VALUE!'],
    ['#REF!', '#VALUE!'],
    ['#NAME?', '#VALUE!'],
  ])('the cell error %s shows as %s, for a host takes no other from a function', (cellError, shown) => {
    expect(refusal(new Problem('cell', 'y', `y holds ${cellError}`, { cellError })).code).toBe(shown);
  });

  test.each([
    new TypeError("Cannot read properties of undefined (reading 'x')"),
    'text',
    undefined,
    new RangeError(),
  ])('a fault of our own shows as #VALUE! without its details', (thrown) => {
    const { code, message } = refusal(thrown);
    expect(code).toBe('#VALUE!');
    expect(message).toMatch(/TAUT\.PROBE could not finish/);
    expect(message).not.toMatch(/undefined|reading 'x'/);
  });
});

test('tables hold legal cells only, in rows of one length', () => {
  const cells = toHostTable([
    ['a', 1, Number.NaN, null],
    [Number.POSITIVE_INFINITY, -0, true],
    ['x'.repeat(40_000), new Problem('domain', 'at', 'too far')],
  ]);
  expect(cells.map((row) => row.length)).toEqual([4, 4, 4]);
  expect(cells[0]).toEqual(['a', 1, '', '']);
  expect(cells[1]).toEqual(['', 0, true, '']);
  expect(cells[2]?.[0]).toHaveLength(32_767);
  expect(cells[2]?.[1]).toBeInstanceOf(HostError);
  expect(toHostTable([])).toEqual([['']]);
});

describe('Call', () => {
  const callWith = (...given: unknown[]) => new Call([x, y, ...shared], given);

  test('omitted, blank and zero-for-blank arguments say nothing', () => {
    for (const nothing of [null, undefined, '', 0, [[null]], [[0, 0]], [['', 0]]]) {
      expect(callWith([[1]], [[2]], null, null, null, nothing).given('options')).toBeNull();
    }
    expect(
      callWith([[1]], [[2]], null, null, null, [
        [0, 0],
        ['fit', 'direct'],
      ]).given('options'),
    ).toEqual([['fit', 'direct']]);
  });

  test('the invocation object is no argument', () => {
    expect(callWith([[1]], [[2]], { functionName: 'LINE' }).omitted('known')).toBe(true);
  });

  test('plain ranges are not copied, host errors become cell errors', () => {
    const plain = [[1], ['a'], [null]];
    expect(callWith(plain).range('x')).toBe(plain);
    expect(callWith([[new HostError('#N/A')], [undefined]]).range('x')).toEqual([
      [{ error: '#N/A' }],
      [null],
    ]);
    expect(callWith(5).range('x')).toEqual([[5]]);
  });

  test('a required argument that is missing is named', () => {
    expect(() => callWith(null, [[1]]).range('x')).toThrow(/x must be a range of cells, but it is missing/);
  });
});
