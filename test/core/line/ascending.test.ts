import { expect, test } from '@jest/globals';
import { ascendingDistinct, isAscending } from '../../../core/line/ascending.ts';
import { rangeOf } from '../../../core/line/rangeOf.ts';

const of = (...values: number[]): Float64Array => Float64Array.from(values);

test('distinct values stand ascending, in the column itself', () => {
  const column = of(3, 1, 3, 2, 1);
  const distinct = ascendingDistinct(column);
  expect(Array.from(distinct)).toEqual([1, 2, 3]);
  expect(distinct.buffer).toBe(column.buffer);
  expect(Array.from(ascendingDistinct(of(1, 1, 2)))).toEqual([1, 2]);
  expect(Array.from(ascendingDistinct(of(7)))).toEqual([7]);
  expect(ascendingDistinct(of())).toHaveLength(0);
});

test('a column that repeats a value is ascending, one that falls is not', () => {
  expect([of(), of(5), of(1, 1, 2), of(1, 3, 2), of(2, 1)].map(isAscending)).toEqual([
    true,
    true,
    true,
    false,
    false,
  ]);
});

test('the range of a column', () => {
  expect(rangeOf(of(2, -1, 5, 0))).toEqual([-1, 5]);
  expect(rangeOf(of())).toEqual([Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY]);
});
