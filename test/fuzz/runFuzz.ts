import fc from 'fast-check';
import { sheetFunctions } from '../../functions/sheetFunctions.ts';
import { supplyHost } from '../hostCalls.ts';
import { expectLegal } from './expectLegal.ts';
import { callsOf } from './hostileCalls.ts';

export interface FuzzSettings {
  readonly seed: number;
  /** Calls of each function. */
  readonly runs: number;
  /** Functions to call; all when empty. */
  readonly only: readonly string[];
}

/** Calls the sheet functions with hostile arguments. @returns how many of them failed */
export function runFuzz({ seed, runs, only }: FuzzSettings, write: (line: string) => void): number {
  supplyHost();
  let failed = 0;
  write(`seed ${seed}, ${runs} calls of each function`);
  for (const { id } of sheetFunctions) {
    if (only.length > 0 && !only.includes(id)) continue;
    let [slowest, answers, refusals] = [0, 0, 0];
    const result = fc.check(
      fc.property(callsOf(id), (call) => {
        const { text, milliseconds } = expectLegal(call);
        slowest = Math.max(slowest, milliseconds);
        if (text.startsWith('#')) refusals++;
        else answers++;
      }),
      { seed, numRuns: runs },
    );
    write(`${id.padEnd(13)} ${answers} answers, ${refusals} refusals, slowest ${slowest.toFixed(0)} ms`);
    if (!result.failed) continue;
    failed++;
    write(`  failed: ${String(result.errorInstance)}\n  ${JSON.stringify(result.counterexample)}`);
  }
  return failed;
}
