import { Bench } from 'tinybench';

/** Milliseconds that one call takes. */
export type Times<Name extends string> = Readonly<Record<Name, number>>;

/** How often the tasks take turns, so that a busy moment of the machine does not fall on one of them alone. */
const ROUNDS = 5;

/** Times tasks against each other within one run; what is compared is the median of each in its quietest round. */
export async function time<Name extends string>(
  tasks: Readonly<Record<Name, () => unknown>>,
  milliseconds = 120,
): Promise<Times<Name>> {
  // The keys of a record are its names.
  const names = Object.keys(tasks) as Name[];
  const rounds = new Map<Name, number[]>(names.map((name) => [name, []]));
  for (let round = 0; round < ROUNDS; round++) {
    const bench = new Bench({
      time: milliseconds,
      iterations: 3,
      warmup: round === 0,
      warmupTime: milliseconds,
      warmupIterations: 3,
    });
    for (const name of names) bench.add(name, () => void tasks[name]());
    await bench.run();
    for (const name of names) {
      const result = bench.getTask(name)?.result;
      if (result === undefined || !('latency' in result))
        throw new Error(`${name} did not run: ${String(result?.state)}`);
      rounds.get(name)?.push(result.latency.p50);
    }
  }
  // Every name has its rounds.
  return Object.fromEntries(
    names.map((name) => [name, Math.min(...(rounds.get(name) ?? []))]),
  ) as Times<Name>;
}

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = sorted.length >> 1;
  const high = sorted[middle] ?? Number.NaN;
  return sorted.length % 2 === 1 ? high : ((sorted[middle - 1] ?? Number.NaN) + high) / 2;
}
