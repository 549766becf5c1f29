import { describe, expect, test } from '@jest/globals';
import { fitLaw } from '../../../core/fit/fitLaw.ts';
import { defaultOptions } from '../../../core/given/parseOptions.ts';
import { readCells } from '../../../core/readings/readCells.ts';
import { readingRow, readingRows } from '../../../taskpane/state/readingRows.ts';

const settings = {
  known: new Map(),
  spreadY: { kind: 'none' as const },
  spreadX: { kind: 'none' as const },
  options: defaultOptions,
};

/** A straight line with a ripple, one reading far off, one cell blank. */
function fitOf(count: number, far: number) {
  const x = Array.from({ length: count }, (_, i) => [i]);
  const y = x.map(([at = 0]) => [at === 3 ? null : 2 * at + Math.sin(7 * at) + (at === far ? 50 : 0)]);
  return fitLaw(readCells(x, y), 'straight line', settings);
}

describe('readings one by one', () => {
  test('stand in the order of the cells, those left out among them', () => {
    const rows = readingRows(fitOf(8, 5), [4]);
    expect(rows.map(({ position }) => position)).toEqual([1, 2, 3, 4, 5, 6, 7, 8]);
    expect(rows[3]).toEqual({
      position: 4,
      x: '',
      y: '',
      residual: '',
      standardised: '',
      leverage: '',
      finding: '',
      leftOut: true,
    });
    expect(rows[4]).toMatchObject({ position: 5, x: 4, leftOut: false });
  });

  test('of many, the most telling are kept', () => {
    const fit = fitOf(500, 321);
    const rows = readingRows(fit, [4], 20);
    expect(rows).toHaveLength(20);
    expect(rows.map(({ position }) => position)).toEqual(expect.arrayContaining([4, 322]));
    const least = Math.min(...rows.map(({ standardised }) => Math.abs(Number(standardised || Infinity))));
    const larger = readingRows(fit, [], 1000).filter(
      ({ standardised }) => Math.abs(Number(standardised)) > least,
    );
    expect(larger.length).toBeLessThan(20);
  });

  test('any one can be looked at on its own', () => {
    const fit = fitOf(500, 321);
    const row = readingRows(fit, [], 1000).find(({ position }) => position === 200);
    expect(readingRow(fit, 200)).toMatchObject({ x: 199, residual: row?.residual, leverage: row?.leverage });
    expect(readingRow(fit, 4)).toBeUndefined();
    expect(readingRow(fit, 501)).toBeUndefined();
  });
});
