import { describe, expect, test } from '@jest/globals';
import fc from 'fast-check';
import { readCells } from '../../../core/readings/readCells.ts';
import type { Cell } from '../../../core/readings/readings.ts';
import { problemOf } from '../../problemOf.ts';

const column = (...cells: Cell[]): Cell[][] => cells.map((cell) => [cell]);

describe('readCells', () => {
  test('pairs cells row by row whatever the shapes', () => {
    const readings = readCells(
      [
        [1, 2],
        [3, 4],
      ],
      [[5, 6, 7, 8]],
    );
    expect([...readings.x]).toEqual([1, 2, 3, 4]);
    expect([...readings.y]).toEqual([5, 6, 7, 8]);
    expect([...readings.position]).toEqual([1, 2, 3, 4]);
    expect(readings.count).toBe(4);
  });

  test('blank, empty text and #N/A in either cell are not there yet, without a finding', () => {
    const readings = readCells(column(1, null, 3, '', 5, 6), column(1, 2, { error: '#N/A' }, 'text', '', 6));
    expect([...readings.position]).toEqual([1, 6]);
    expect(readings.waiting).toBe(4);
    expect(readings.setAside).toEqual([]);
  });

  test('other text and booleans are set aside, named by position and argument', () => {
    const readings = readCells(column(1, 'lost', 3, 4, 5), column(1, 2, true, '4.2', ' '));
    expect([...readings.position]).toEqual([1]);
    expect(readings.setAside.map(({ position, reason }) => [position, reason])).toEqual([
      [2, 'text'],
      [3, 'boolean'],
      [4, 'text'],
      [5, 'text'],
    ]);
    expect(readings.setAside[0]?.message).toContain("Reading 2 is set aside: its x is the text 'lost'");
    expect(readings.setAside[2]?.message).toContain('stored as text');
    expect(readings.setAside[3]?.message).toContain('only spaces');
  });

  test.each(['<0.05', ' < 0.05', '<=5', '≤ 1e-3'])('%s is below a detection limit', (text) => {
    const [finding] = readCells([[1]], [[text]]).setAside;
    expect(finding?.reason).toBe('belowDetection');
    expect(finding?.message).toContain('biases');
  });

  test('another error is passed on, with the cell named', () => {
    const problem = problemOf(() => readCells(column(1, 2), column(1, { error: '#DIV/0!' })));
    expect(problem).toMatchObject({ code: 'cell', argument: 'y', position: 2, cellError: '#DIV/0!' });
  });

  test('sizes that differ name both counts', () => {
    const problem = problemOf(() => readCells(column(1, 2, 3), column(1, 2)));
    expect(problem.code).toBe('argument');
    expect(problem.message).toMatch(/x has 3 and y has 2/);
    expect(problemOf(() => readCells([], [])).code).toBe('argument');
  });

  test('trailing zeros are readings where blanks are distinct, and not there yet where they may be zeros', () => {
    const x = column(1, 2, 3, 0, 0);
    const y = column(5, 0, 6, 0, 0);
    expect(readCells(x, y)).toMatchObject({ waiting: 0, trailingZeros: 0 });
    const guessed = readCells(x, y, { blanks: 'maybeZero' });
    expect([...guessed.position]).toEqual([1, 2, 3]);
    expect(guessed).toMatchObject({ waiting: 2, trailingZeros: 2 });
  });

  test('a null among the cells shows that zeros are zeros', () => {
    const readings = readCells(column(1, 2, 3), column(5, 0, null), { blanks: 'maybeZero' });
    expect([...readings.y]).toEqual([5, 0]);
    expect(readings.trailingZeros).toBe(0);
  });

  test('a mask from the host settles which zeros are blanks', () => {
    const readings = readCells(column(1, 2, 3), column(5, 0, 0), {
      blanks: 'maybeZero',
      blankPairs: Uint8Array.of(0, 0, 1),
    });
    expect([...readings.position]).toEqual([1, 2]);
    expect(readings).toMatchObject({ waiting: 1, trailingZeros: 0 });
  });

  test('every pair is complete, waiting or set aside, in order, and the cells are left alone', () => {
    const cell = fc.oneof(
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.string(),
      fc.boolean(),
      fc.constant(null),
      fc.constant({ error: '#N/A' }),
    );
    fc.assert(
      fc.property(fc.array(fc.tuple(cell, cell), { minLength: 1, maxLength: 40 }), (pairs) => {
        const x = pairs.map(([first]) => [first]);
        const y = pairs.map(([, second]) => [second]);
        const before = JSON.stringify([x, y]);
        const readings = readCells(x, y, { blanks: 'maybeZero' });
        expect(readings.x.length + readings.waiting + readings.setAside.length).toBe(pairs.length);
        readings.position.forEach((position, index) => {
          expect(readings.x[index]).toBe(pairs[position - 1]?.[0]);
          expect(readings.y[index]).toBe(pairs[position - 1]?.[1]);
        });
        expect(JSON.stringify([x, y])).toBe(before);
      }),
      { seed: 20260301, numRuns: 200 },
    );
  });
});
