import { describe, expect, test } from '@jest/globals';
import {
  formatBlock,
  LAST_COLUMN,
  LAST_ROW,
  parseBlock,
  qualified,
  splitAddress,
} from '../../../taskpane/host/address.ts';

describe('addresses', () => {
  test.each([
    ['B4', { top: 3, left: 1, bottom: 3, right: 1 }],
    ['$B$4:c60', { top: 3, left: 1, bottom: 59, right: 2 }],
    ['C60:B4', { top: 3, left: 1, bottom: 59, right: 2 }],
    ['A:B', { top: 0, left: 0, bottom: LAST_ROW, right: 1 }],
    ['2:9', { top: 1, left: 0, bottom: 8, right: LAST_COLUMN }],
    ['XFD1048576', { top: LAST_ROW, left: LAST_COLUMN, bottom: LAST_ROW, right: LAST_COLUMN }],
  ])('%s is read', (address, block) => {
    expect(parseBlock(address)).toEqual(block);
  });

  test.each(['', 'B', '4', 'B4:', 'B4:C', 'A1:B2:C3', 'B0', 'XFE1', 'A1048577', 'Total', 'B4;C5'])(
    "'%s' is none",
    (address) => {
      expect(parseBlock(address)).toBeUndefined();
    },
  );

  test('a block is written the way it is read', () => {
    for (const address of ['A1', 'Z9:AA10', 'ZZ1:AAA2', 'B4:B60']) {
      const block = parseBlock(address);
      expect(block && formatBlock(block)).toBe(address);
    }
  });

  test('a sheet is split off and put back, quotes and all', () => {
    expect(splitAddress("'Joe''s room'!A2:A9")).toEqual({ sheet: "Joe's room", cells: 'A2:A9' });
    expect(splitAddress('A2')).toEqual({ sheet: '', cells: 'A2' });
    expect(qualified("Joe's room", 'A2:A9')).toBe("'Joe''s room'!A2:A9");
    expect(qualified('Weir', 'A2')).toBe('Weir!A2');
    expect(qualified('AB12', 'A2')).toBe("'AB12'!A2");
  });
});
