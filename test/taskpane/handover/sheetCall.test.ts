import { describe, expect, test } from '@jest/globals';
import { numberFormatFor } from '../../../taskpane/handover/numberFormats.ts';
import { fixedPlace, sheetCall, spreadArgument } from '../../../taskpane/handover/sheetCall.ts';
import { asTyped } from '../../../taskpane/handover/writeBlock.ts';

const given = {
  x: '$A$6:$A$40',
  y: '$B$6:$B$40',
  law: '"first order"',
  known: '',
  uY: '',
  uX: '',
  options: '',
};

describe('a call of a sheet function', () => {
  test('leaves out what is not given at its end, and keeps the places between', () => {
    expect(sheetCall('LINE', given)).toBe('TAUT.LINE($A$6:$A$40,$B$6:$B$40,"first order")');
    expect(sheetCall('CONSTANT', { ...given, options: '"coverage=0.9"' }, ['"k"', '"u"'])).toBe(
      'TAUT.CONSTANT($A$6:$A$40,$B$6:$B$40,"first order","k","u",,,,"coverage=0.9")',
    );
  });

  test('names the sheet of a range unless it is the same, with quotes where the name needs them', () => {
    const place = { sheet: "Dr. O'Hara's", address: 'B4:C60' };
    expect(fixedPlace(place, "Dr. O'Hara's")).toBe('$B$4:$C$60');
    expect(fixedPlace(place, 'Weir')).toBe("'Dr. O''Hara''s'!$B$4:$C$60");
    expect(fixedPlace({ sheet: 'Weir', address: 'A:A' }, 'Weir')).toBe('$A:$A');
  });

  test('writes an uncertainty as number, text or range', () => {
    expect(spreadArgument({ kind: 'text', text: ' 0.05 ' }, 'S')).toBe('0.05');
    expect(spreadArgument({ kind: 'text', text: '2%' }, 'S')).toBe('"2%"');
    expect(spreadArgument({ kind: 'text', text: '' }, 'S')).toBe('');
    expect(spreadArgument({ kind: 'range', place: { sheet: 'S', address: 'D4:D9' } }, 'S')).toBe('$D$4:$D$9');
  });
});

describe('what is typed into a cell', () => {
  test.each(['=1+1', '+1', '-1', '@SUM(A1)', "'quoted", '2%', '1/2', 'TRUE', '=cmd|"/c calc"!A1', '\t=1'])(
    'text %j stays text',
    (content) => {
      expect(asTyped({ kind: 'text', content })).toBe(`'${content}`);
    },
  );

  test('formulas and numbers go as they are', () => {
    expect(asTyped({ kind: 'formula', content: '=A1' })).toBe('=A1');
    expect(asTyped({ kind: 'number', content: -1 })).toBe(-1);
  });
});

describe('a number format', () => {
  test('shows numbers as they were given, and at most six significant digits of the largest', () => {
    expect(numberFormatFor([0.0941234567])).toBe('0.0000000');
    expect(numberFormatFor([1.86, 0.094])).toBe('0.000');
    expect(numberFormatFor([1.8612345678, 0.094])).toBe('0.00000');
    expect(numberFormatFor([0.95])).toBe('0.00');
    expect(numberFormatFor([101325.25])).toBe('0');
    expect(numberFormatFor([3, 12, 0])).toBe('0');
    expect(numberFormatFor([6.02e23])).toBe('0.00000E+00');
    expect(numberFormatFor([1.6e-19])).toBe('0.00000E+00');
    expect(numberFormatFor([])).toBe('0');
  });
});
