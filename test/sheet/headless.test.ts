import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import type { FunctionsScript } from './functionsScript.ts';
import { type HeadlessSheet, openSheet } from './headless.ts';

/** A few functions that show how arguments arrive and results leave. */
const probes: FunctionsScript = {
  text: `(function () {
    CustomFunctions.associate('kinds', function (cells) {
      return cells.map(function (row) {
        return row.map(function (cell) { return cell === null ? 'null' : typeof cell + ' ' + (cell.code || cell); });
      });
    });
    CustomFunctions.associate('OMITTED', function (a, b) { return String(a) + ' ' + String(b); });
    CustomFunctions.associate('FAIL', function (code, text) {
      throw new CustomFunctions.Error(CustomFunctions.ErrorCode[code], text);
    });
    CustomFunctions.associate('NUMBERS', function () { return [[NaN, Infinity, null, undefined, 1.5]]; });
    CustomFunctions.associate('LATER', function (a) { return Promise.resolve(a * 2); });
    CustomFunctions.associate('COUNT.DOWN', function (n) {
      return Array.from({ length: n }, function (_, i) { return [n - i]; });
    });
    CustomFunctions.associate('BROKEN', function () { return undefined.x; });
    CustomFunctions.associate('WHERE', function (cells, invocation) {
      return [[invocation.address, invocation.parameterAddresses[0]]];
    });
    CustomFunctions.associate('FOREVER', function () { for (;;); });
  })();`,
  metadata: {
    functions: [
      { id: 'KINDS', parameters: [{ name: 'cells', dimensionality: 'matrix' }] },
      {
        id: 'OMITTED',
        parameters: [
          { name: 'a', optional: true },
          { name: 'b', optional: true },
        ],
      },
      { id: 'FAIL', parameters: [{ name: 'code' }, { name: 'text' }] },
      { id: 'NUMBERS', parameters: [] },
      { id: 'LATER', parameters: [{ name: 'a' }] },
      { id: 'COUNT.DOWN', parameters: [{ name: 'n' }] },
      { id: 'BROKEN', parameters: [] },
      {
        id: 'WHERE',
        parameters: [{ name: 'cells', dimensionality: 'matrix' }],
        options: { requiresAddress: true, requiresParameterAddresses: true },
      },
      { id: 'FOREVER', parameters: [] },
    ],
  },
};

describe.each(['zero', 'null'] as const)('the sheet without a screen, blank → %s', (blank) => {
  let sheet: HeadlessSheet;
  beforeAll(async () => {
    sheet = await openSheet({ blank, functions: probes });
    sheet.set('A1', [
      [1, 'text', true],
      [null, '=1/0', '#N/A'],
    ]);
    sheet.set('A10', '=TAUT.KINDS(A1:C2)');
    sheet.set('A14', '=taut.omitted(,7)');
    sheet.set('A15', '=TAUT.OMITTED(A2)');
    sheet.set('A16', '=TAUT.FAIL("invalidValue","x must be a range")');
    sheet.set('A17', '=TAUT.FAIL("notAvailable","2 readings, 3 are needed")');
    sheet.set('A18', '=TAUT.FAIL("invalidNumber","said in vain")');
    sheet.set('A19', '=TAUT.NUMBERS()');
    sheet.set('A20', '=TAUT.LATER(A1)+1');
    sheet.set('A21', '=TAUT.BROKEN()');
    sheet.set('A22', '=TAUT.WHERE(A1:C2)');
    sheet.set('A23', '=1/3');
    sheet.set('A24', '=TAUT.KINDS(E2)');
    sheet.set('E5', '=""');
    sheet.set('A25', '=TAUT.KINDS(E5)');
    sheet.set('A26', '=TAUT.KINDS("2%")');
    sheet.set('A27', '=TAUT.KINDS("2026-03-01")');
    await sheet.settle();
  });
  afterAll(() => sheet?.close());

  test('blanks, errors, texts and booleans arrive as a host hands them over', () => {
    expect(sheet.spilled('A10')).toEqual([
      ['number 1', 'string text', 'boolean true'],
      [blank === 'zero' ? 'number 0' : 'null', 'object #DIV/0!', 'object #N/A'],
    ]);
    expect(sheet.get('A24')).toBe(blank === 'zero' ? 'number 0' : 'null');
    expect(sheet.get('A25')).toBe('string ');
  });

  test('a text written in a formula stays a text, whatever number it looks like', () => {
    expect([sheet.get('A26'), sheet.get('A27')]).toEqual(['string 2%', 'string 2026-03-01']);
  });

  test('an omitted argument is null in both modes, a blank cell is not', () => {
    expect(sheet.get('A14')).toBe('null 7');
    expect(sheet.get('A15')).toBe(blank === 'zero' ? '0 null' : 'null null');
  });

  test('errors keep their sentence only where a host shows one', () => {
    expect([sheet.get('A16'), sheet.message('A16')]).toEqual(['#VALUE!', 'x must be a range']);
    expect([sheet.get('A17'), sheet.message('A17')]).toEqual(['#N/A', '2 readings, 3 are needed']);
    expect([sheet.get('A18'), sheet.message('A18')]).toEqual(['#NUM!', null]);
    expect(sheet.get('A21')).toBe('#VALUE!');
  });

  test('null and numbers that are none show as 0', () => {
    expect(sheet.spilled('A19')).toEqual([[0, 0, 0, 0, 1.5]]);
  });

  test('a promise is awaited before dependents are calculated', () => {
    expect(sheet.get('A20')).toBe(3);
  });

  test('a function that asks for addresses gets them', () => {
    expect(sheet.spilled('A22')).toEqual([['Sheet1!A22', 'Sheet1!A1:C2']]);
  });

  test('values are read at full precision', () => {
    expect(sheet.get('A23')).toBe(1 / 3);
  });
});

test('dependents follow when a spill shrinks, and when it grows again', async () => {
  const sheet = await openSheet({ functions: probes });
  sheet.set('A1', 4);
  sheet.set('B1', '=TAUT.COUNT.DOWN(A1)');
  sheet.set('D1', '=SUM(B1:B10)');
  sheet.set('D4', '=B4');
  await sheet.settle();
  expect([sheet.get('D1'), sheet.get('D4'), sheet.get('B4')]).toEqual([10, 1, 1]);
  sheet.set('A1', 2);
  await sheet.settle();
  expect([sheet.get('D1'), sheet.get('D4'), sheet.get('B4')]).toEqual([3, 0, null]);
  sheet.set('A1', 5);
  await sheet.settle();
  expect([sheet.get('D1'), sheet.get('D4')]).toEqual([15, 2]);
  sheet.set('B3', 'in the way');
  await sheet.settle();
  expect([sheet.get('B1'), sheet.get('D4')]).toEqual(['#SPILL!', 0]);
  sheet.set('B3', null);
  await sheet.settle();
  expect([sheet.get('B1'), sheet.get('D4'), sheet.get('D1')]).toEqual([5, 2, 15]);
  sheet.close();
});

test('plain formulas need no functions', async () => {
  const sheet = await openSheet({ functions: null });
  sheet.set('A1', [
    [1, 2.1],
    [2, 3.9],
    [3, 6.2],
    [4, 7.8],
  ]);
  sheet.set('D1', [
    ['=SLOPE(B1:B4,A1:A4)'],
    ['=SUMPRODUCT(A1:A4,B1:B4)'],
    ['=T.INV.2T(0.05,2)'],
    ['=IF(AND(ISNUMBER(A1),A1>0),LN(A1),"")'],
    ['=SQRT(SUMPRODUCT((A1:A4-AVERAGE(A1:A4))^2))'],
  ]);
  await sheet.settle();
  expect(sheet.get('D1')).toBeCloseTo(1.94, 12);
  expect(sheet.get('D2')).toBeCloseTo(59.7, 12);
  // t for 95 % and 2 degrees of freedom as printed tables give it: 4.303
  expect(sheet.get('D3')).toBeCloseTo(4.303, 3);
  expect(sheet.get('D4')).toBe(0);
  expect(sheet.get('D5')).toBeCloseTo(Math.sqrt(5), 12);
  sheet.close();
});
