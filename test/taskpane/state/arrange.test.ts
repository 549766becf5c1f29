import { describe, expect, test } from '@jest/globals';
import type { Cell } from '../../../core/readings/readings.ts';
import { parseBlock } from '../../../taskpane/host/address.ts';
import { type AreaCells, arrange } from '../../../taskpane/state/arrange.ts';

function area(address: string, cells: Cell[][], above: Cell[][] = []): AreaCells {
  const block = parseBlock(address);
  if (block === undefined) throw new Error(address);
  const { top, left, bottom, right } = block;
  return {
    area: { sheet: 'S', address, row: top, column: left, rows: bottom - top + 1, columns: right - left + 1 },
    cells,
    above,
  };
}

const at = (address: string) => ({ sheet: 'S', address });

describe('what is selected becomes x and y', () => {
  test('two columns, the headers right above them', () => {
    const found = arrange([
      area(
        'A6:B8',
        [
          [0, 1.86],
          [1, 1.7],
          [2, null],
        ],
        [
          [null, null],
          ['time / h', 'C / (mg/L)'],
        ],
      ),
    ]);
    expect(found).toMatchObject({
      x: at('A6:A8'),
      y: at('B6:B8'),
      xHeading: { name: 'time', unit: 'h' },
      yHeading: { name: 'C', unit: 'mg/L' },
    });
  });

  test('headers inside the selection, a title above them, a first reading that is a text', () => {
    const found = arrange([
      area('A1:B5', [
        ['Bottle test 1', null],
        ['t', 'C'],
        [0, 'spilt'],
        [1, 2],
        [2, 1],
      ]),
    ]);
    expect([found.x, found.y]).toEqual([at('A3:A5'), at('B3:B5')]);
    expect([found.xHeading.name, found.yHeading.name]).toEqual(['t', 'C']);
  });

  test('two areas, y left of x: the area selected first is x', () => {
    const found = arrange([area('C2:C4', [[1], [2], [3]], [['T']]), area('A2:A4', [[5], [6], [7]], [['R']])]);
    expect([found.x, found.y]).toEqual([at('C2:C4'), at('A2:A4')]);
    expect([found.xHeading.name, found.yHeading.name]).toEqual(['T', 'R']);
  });

  test('a table with a column of names: the first two columns with numbers', () => {
    const found = arrange([
      area('A1:D3', [
        ['bottle', 't', 'C', 'u(C) / (mg/L)'],
        ['a', 1, 2, 0.1],
        ['b', 2, 1, 'late'],
      ]),
    ]);
    expect([found.x, found.y]).toEqual([at('B2:B3'), at('C2:C3')]);
    // The others are there to be taken instead, or as uncertainties.
    expect(found.columns.map(({ place }) => place.address)).toEqual(['B2:B3', 'C2:C3', 'D2:D3']);
    expect(found.columns[2]?.heading).toEqual({ name: 'u(C)', unit: 'mg/L' });
  });

  test('two rows with their names in front', () => {
    const found = arrange([
      area('A1:D2', [
        ['t', 1, 2, 3],
        ['C', 5, 4, 3],
      ]),
    ]);
    expect([found.x, found.y]).toEqual([at('B1:D1'), at('B2:D2')]);
    expect(found.yHeading.name).toBe('C');
  });

  test('two blocks of the same shape are read as wholes', () => {
    const block: Cell[][] = [
      [1, 2],
      [3, 4],
    ];
    const found = arrange([area('A1:B2', block), area('D1:E2', block)]);
    expect([found.x, found.y]).toEqual([at('A1:B2'), at('D1:E2')]);
  });

  test('headers are found past readings that were not selected, not far off', () => {
    const cells: Cell[][] = [
      [1, 2],
      [3, 4],
    ];
    const above: Cell[][] = [
      ['T / K', null],
      [null, null],
      [null, null],
      [null, null],
      [8, 'R'],
      [0, 9],
    ];
    const found = arrange([area('A7:B8', cells, above)]);
    expect([found.xHeading, found.yHeading]).toEqual([
      { name: 'x', unit: '' },
      { name: 'R', unit: '' },
    ]);
  });
});

describe('what cannot be used is refused', () => {
  test.each<[string, AreaCells[], RegExp]>([
    ['one column', [area('A1:A2', [[1], [2]])], /only one of the selected columns/],
    [
      'no numbers',
      [
        area('A1:B2', [
          ['a', 'b'],
          ['c', 'd'],
        ]),
      ],
      /no numbers/,
    ],
    [
      'areas of two lengths',
      [area('A1:A2', [[1], [2]]), area('C1:C3', [[1], [2], [3]])],
      /2 for x and 3 for y/,
    ],
  ])('%s', (_, areas, message) => {
    expect(() => arrange(areas)).toThrow(message);
  });
});
