import { arch, cpus, platform } from 'node:os';
import { supplyHost } from '../hostCalls.ts';
import {
  compareBenches,
  eachBench,
  fifteenBench,
  lineBenches,
  straightenBench,
  stretchBench,
} from './functionBenches.ts';
import { keystrokeBench } from './keystrokeBench.ts';
import { memoryBench } from './memoryBench.ts';
import { type Row, table } from './row.ts';

/** Runs every benchmark and gives the results as Markdown, with when and where they were taken. */
export async function runBenches(progress: (name: string) => void): Promise<string> {
  supplyHost();
  const benches: Readonly<Record<string, () => Row[] | Promise<Row[]>>> = {
    LINE: lineBenches,
    COMPARE: compareBenches,
    EACH: eachBench,
    'many functions': fifteenBench,
    STRAIGHTEN: straightenBench,
    'long work': stretchBench,
    'a keystroke': keystrokeBench,
    memory: memoryBench,
  };
  const rows: Row[] = [];
  for (const [name, bench] of Object.entries(benches)) {
    progress(name);
    rows.push(...(await bench()));
  }
  return `${where()}\n\n${table(rows)}`;
}

function where(): string {
  const [first] = cpus();
  const date = new Date().toISOString().slice(0, 10);
  const machine = `${first?.model.trim() ?? 'unknown processor'}, ${cpus().length} cores, ${platform()} ${arch()}`;
  return `Taken ${date} with Node ${process.versions.node} on ${machine}. Ratios are of medians within one run, each the best of five rounds.`;
}
