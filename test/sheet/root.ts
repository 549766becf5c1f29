import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';

/** The repository's top folder, found upwards from where the command runs. */
export const root = findRoot(process.cwd());

function findRoot(from: string): string {
  if (existsSync(join(from, 'test', 'sheet', 'root.ts'))) return from;
  const parent = dirname(from);
  if (parent === from) throw new Error('run this from inside the repository');
  return findRoot(parent);
}
