import { describe, expect, test } from '@jest/globals';
import { coarseGrid, fineGrid, trialGrid } from '../../../core/direct/trialGrid.ts';

describe('trialGrid', () => {
  test('ascends without repeats', () => {
    for (const edges of [[], [0], [3, 1, 2, 2], [-5e10, 5e-10]]) {
      const grid = trialGrid(edges, fineGrid);
      expect(grid.every((value, i) => i === 0 || value > (grid[i - 1] ?? NaN))).toBe(true);
      expect(grid.every(Number.isFinite)).toBe(true);
    }
  });

  test('crowds against the outer edges and looks into every gap between them', () => {
    const grid = trialGrid([1, 2, 4], fineGrid);
    const above = grid.filter((value) => value > 4);
    expect(above[0] ?? NaN).toBeLessThan(4 + 1e-8);
    expect(grid).toContain(1.5);
    expect(grid).toContain(3);
    for (const distance of [1e-6, 1e-3, 1, 1e3]) {
      expect(above.some((value) => value - 4 > distance / 2 && value - 4 < distance * 2)).toBe(true);
    }
  });

  test('has sizes of either sign when there is no edge', () => {
    const grid = trialGrid([], fineGrid);
    for (const size of [1e-15, 1e-3, 1, 1e9]) {
      expect(grid.some((value) => value > size * 0.7 && value < size * 1.4)).toBe(true);
      expect(grid.some((value) => -value > size * 0.7 && -value < size * 1.4)).toBe(true);
    }
    expect(grid).toContain(0);
  });

  test('edges that are not numbers are left out', () => {
    expect(trialGrid([NaN, 2, Infinity], coarseGrid)).toEqual(trialGrid([2], coarseGrid));
  });

  test('stays small for many edges', () => {
    const edges = Array.from({ length: 10_000 }, (_, i) => Math.sin(i));
    expect(trialGrid(edges, fineGrid).length).toBeLessThan(300);
    expect(trialGrid(edges, coarseGrid).length).toBeLessThan(100);
  });
});
