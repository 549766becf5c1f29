import { expect, test } from '@jest/globals';
import { digitsReached, digitsTable } from './digitsTable.ts';

// NIST/ITL Statistical Reference Datasets, certified values recomputed to 20 digits (test/reference/README.md).
test('the graded sets are met to the digits that are published', () => {
  const rows = digitsReached();
  process.stdout.write(`${digitsTable(rows)}\n`);
  expect(rows).toHaveLength(12);
  for (const { set, constants, uncertainties } of rows) {
    expect([set, constants >= (set === 'Norris' || set === 'NoInt1' ? 12 : 10)]).toEqual([set, true]);
    expect([set, uncertainties >= 9]).toEqual([set, true]);
  }
});
