import { gzipSync } from 'node:zlib';

export interface FileSize {
  readonly path: string;
  /** Bytes as they are. */
  readonly raw: number;
  /** Bytes after gzip at its best level. */
  readonly gzip: number;
}

const KILOBYTE = 1024;

/** Bytes after gzip that a file may have. */
export const BUDGETS: Readonly<Record<string, number>> = {
  'functions.js': 70 * KILOBYTE,
  'taskpane.js': 200 * KILOBYTE,
};

export function measure(path: string, contents: Uint8Array): FileSize {
  return { path, raw: contents.length, gzip: gzipSync(contents, { level: 9 }).length };
}

/** One sentence for each file that has outgrown its budget. */
export function overBudget(sizes: readonly FileSize[]): string[] {
  return sizes.flatMap(({ path, gzip }) => {
    const budget = BUDGETS[path];
    if (budget === undefined || gzip <= budget) return [];
    return [`${path} has ${kilobytes(gzip)} after gzip, more than its ${kilobytes(budget)}`];
  });
}

/** The sizes as lines of a table. */
export function sizeTable(sizes: readonly FileSize[]): string {
  const width = Math.max(...sizes.map(({ path }) => path.length));
  const line = ({ path, raw, gzip }: FileSize) =>
    `${path.padEnd(width)}  ${kilobytes(raw).padStart(9)}  ${kilobytes(gzip).padStart(9)} gzip`;
  return sizes.map(line).join('\n');
}

function kilobytes(bytes: number): string {
  return `${(bytes / KILOBYTE).toFixed(1)} KB`;
}
