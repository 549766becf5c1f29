import { setFlagsFromString } from 'node:v8';
import { runInNewContext } from 'node:vm';
import { sharedCache } from '../../core/cache/cache.ts';
import { hostFunction } from '../hostCalls.ts';
import { decayReadings, typeReading } from './readingsToTime.ts';
import type { Row } from './row.ts';

const MEGABYTE = 2 ** 20;

/** What the cache holds, and what the process really holds for it, after many fits of readings that were all different. */
export function memoryBench(): Row[] {
  const collect = collector();
  const line = hostFunction('CONSTANTS');
  const rows: Row[] = [];
  for (const [count, fits] of [
    [100, 6_000],
    [10_000, 500],
  ] as const) {
    sharedCache.clear();
    collect();
    const before = held();
    const { x, y } = decayReadings(count);
    for (let fit = 0; fit < fits; fit++) {
      typeReading(y);
      line(x, y, 'exponential', {});
    }
    collect();
    const { entries, bytes } = sharedCache.size;
    const real = held() - before;
    rows.push({
      what: `cache after ${fits.toLocaleString('en')} different fits`,
      size: `${count.toLocaleString('en')} readings each`,
      time: `${(real / MEGABYTE).toFixed(1)} MB held for ${entries.toLocaleString('en')} entries`,
      against: `what the cache itself counts (${(bytes / MEGABYTE).toFixed(1)} MB; at most 96 MB)`,
      ratio: real / MEGABYTE / 96,
      target: { atMost: 1.5 },
    });
  }
  sharedCache.clear();
  return rows;
}

function held(): number {
  const { heapUsed, arrayBuffers } = process.memoryUsage();
  return heapUsed + arrayBuffers;
}

function collector(): () => void {
  setFlagsFromString('--expose-gc');
  // The flag puts the collector into contexts made from now on.
  const once = runInNewContext('gc') as () => void;
  // What a finished column held outside the heap is given back only by the collections that follow.
  return () => {
    for (let times = 0; times < 4; times++) once();
  };
}
