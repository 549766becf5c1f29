import { describe, expect, test } from '@jest/globals';
import { growthAfter } from '../../../taskpane/state/growth.ts';
import { noChoice } from '../../../taskpane/state/noChoice.ts';

const choice = { ...noChoice, x: { sheet: 'S', address: 'A6:A19' }, y: { sheet: 'S', address: 'B6:B19' } };
const edit = (address: string, sheet = 'S') => ({ sheet, address, kind: 'cells' as const });

describe('a cell typed right below the readings', () => {
  test.each(['A20', 'B20', 'A18:B22'])('%s makes room for one more', (address) => {
    expect(growthAfter(choice, edit(address))).toMatchObject({
      x: { address: 'A6:A20' },
      y: { address: 'B6:B20' },
      belowX: { address: 'A20' },
      belowY: { address: 'B20' },
    });
  });

  test.each(['A19', 'A21', 'C20'])('%s does not', (address) => {
    expect(growthAfter(choice, edit(address))).toBeUndefined();
  });

  test('nor does a cell of another sheet, or below columns that end apart or below single cells', () => {
    expect(growthAfter(choice, edit('A20', 'T'))).toBeUndefined();
    expect(growthAfter({ ...choice, y: { sheet: 'S', address: 'B7:B20' } }, edit('A20'))).toBeUndefined();
    const single = { ...choice, x: { sheet: 'S', address: 'A6' }, y: { sheet: 'S', address: 'B6' } };
    expect(growthAfter(single, edit('A7'))).toBeUndefined();
  });
});
