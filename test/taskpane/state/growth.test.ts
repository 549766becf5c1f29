import { describe, expect, test } from '@jest/globals';
import { besides, growthAfter, withPlaces } from '../../../taskpane/state/growth.ts';
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

test('uncertainties beside the readings grow along, others stay', () => {
  const range = (address: string) => ({ kind: 'range' as const, place: { sheet: 'S', address } });
  const uncertain = { ...choice, spreadY: range('C6:C19'), spreadX: range('E2:E15') };
  const growth = growthAfter(uncertain, edit('B20'));
  expect(growth && withPlaces(uncertain, growth)).toMatchObject({
    y: { address: 'B6:B20' },
    spreadY: range('C6:C20'),
    spreadX: range('E2:E15'),
  });
});

test('a column is taken in the rows of another', () => {
  const at = (address: string) => ({ sheet: 'S', address });
  expect(besides(at('C6:C19'), at('B7:B21'))).toEqual(at('C7:C21'));
  expect(besides(at('C6:D19'), at('B7:B21'))).toEqual(at('C6:D19'));
});
