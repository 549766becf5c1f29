import { beforeAll, describe, expect, jest, test } from '@jest/globals';
import fc from 'fast-check';
import { sharedCache } from '../../core/cache/cache.ts';
import { sheetFunctions } from '../../functions/sheetFunctions.ts';
import { supplyHost } from '../hostCalls.ts';
import { expectLegal } from './expectLegal.ts';
import { callsOf } from './hostileCalls.ts';

jest.setTimeout(120_000);

beforeAll(supplyHost);

/** The same calls in every run; `npm run fuzz` takes others. */
const SEED = 20_261;
const RUNS = 150;

describe('hostile calls get legal cells or an error with a sentence', () => {
  test.each(sheetFunctions.map(({ id }) => id))('%s', (id) => {
    fc.assert(
      fc.property(callsOf(id), (call) => void expectLegal(call)),
      { seed: SEED, numRuns: RUNS },
    );
  });
});

test('an answer does not depend on what was asked before', () => {
  const calls = fc.constantFrom('CONSTANTS', 'CHECKS', 'COMPARE', 'AXES', 'EACH').chain(callsOf);
  fc.assert(
    fc.property(calls, calls, (call, other) => {
      sharedCache.clear();
      const first = expectLegal(call).text;
      expectLegal(other);
      const again = expectLegal(call).text;
      sharedCache.clear();
      const alone = expectLegal(call).text;
      expect([again, alone]).toEqual([first, first]);
    }),
    { seed: SEED, numRuns: RUNS },
  );
});
