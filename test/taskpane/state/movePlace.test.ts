import { describe, expect, test } from '@jest/globals';
import type { CellChange } from '../../../taskpane/host/workbook.ts';
import { moveChoice, movePlace, renameSheet } from '../../../taskpane/state/movePlace.ts';
import { noChoice } from '../../../taskpane/state/noChoice.ts';

const place = { sheet: 'S', address: 'B4:C9' };
const change = (kind: CellChange['kind'], address: string, sheet = 'S'): CellChange => ({
  sheet,
  address,
  kind,
});

describe('a place follows rows and columns that come and go', () => {
  test.each<[CellChange['kind'], string, string | undefined]>([
    ['rowsInserted', '1:2', 'B6:C11'],
    ['rowsInserted', '4:4', 'B5:C10'],
    ['rowsInserted', '9:9', 'B4:C10'],
    ['rowsInserted', '10:10', 'B4:C9'],
    ['rowsDeleted', '1:3', 'B1:C6'],
    ['rowsDeleted', '3:5', 'B3:C6'],
    ['rowsDeleted', '8:20', 'B4:C7'],
    ['rowsDeleted', '4:9', undefined],
    ['columnsInserted', 'A:A', 'C4:D9'],
    ['columnsInserted', 'C:C', 'B4:D9'],
    ['columnsDeleted', 'A:B', 'A4:A9'],
    ['columnsDeleted', 'A:D', undefined],
    ['cells', 'B4:C9', 'B4:C9'],
    ['other', 'B4:C9', 'B4:C9'],
  ])('%s at %s: %s', (kind, address, expected) => {
    expect(movePlace(place, change(kind, address))?.address).toBe(expected);
  });

  test('another sheet’s rows leave it alone', () => {
    expect(movePlace(place, change('rowsInserted', '1:2', 'Other'))).toBe(place);
  });
});

test('a choice moves as a whole and stays itself when nothing moves', () => {
  const choice = { ...noChoice, x: { sheet: 'S', address: 'A4:A9' }, y: { sheet: 'S', address: 'B4:B9' } };
  expect(moveChoice(choice, change('cells', 'A4'))).toBe(choice);
  expect(moveChoice(choice, change('rowsInserted', '1:1'))).toMatchObject({
    x: { address: 'A5:A10' },
    y: { address: 'B5:B10' },
  });
  expect(moveChoice(choice, change('columnsDeleted', 'B:B'))).toBeUndefined();
});

test('a sheet’s new name reaches every place on it', () => {
  const choice = {
    ...noChoice,
    x: { sheet: 'S', address: 'A4:A9' },
    y: { sheet: 'T', address: 'B4:B9' },
    spreadY: { kind: 'range' as const, place: { sheet: 'S', address: 'C4:C9' } },
  };
  expect(renameSheet(choice, 'S', 'New')).toEqual({
    ...choice,
    x: { sheet: 'New', address: 'A4:A9' },
    spreadY: { kind: 'range', place: { sheet: 'New', address: 'C4:C9' } },
  });
});
