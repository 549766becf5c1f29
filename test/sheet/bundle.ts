import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { buildSync } from 'esbuild';
import { root } from './root.ts';

const CACHE = join(root, 'node_modules', '.cache', 'stand-in-sheet');

/** A name for the present state of the stand-in's sources and of the packages it is built on. */
export function sourceKey(): string {
  const hash = createHash('sha256');
  const add = (folder: string) => {
    for (const entry of readdirSync(folder, { withFileTypes: true })) {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) add(path);
      else if (/\.(ts|css|html)$/.test(entry.name)) hash.update(entry.name).update(readFileSync(path));
    }
  };
  add(join(root, 'test', 'sheet'));
  hash.update(readFileSync(join(root, 'package-lock.json')));
  return hash.digest('hex').slice(0, 16);
}

/** The folder that keeps the bundles of the present sources. */
export function cacheFolder(): string {
  const folder = join(CACHE, sourceKey());
  mkdirSync(folder, { recursive: true });
  return folder;
}

/** Bundles the sheet without a screen once and returns the path of the CommonJS file. */
export function headlessBundle(): string {
  const path = join(cacheFolder(), 'headless.cjs');
  if (existsSync(path)) return path;
  const { outputFiles } = buildSync({
    entryPoints: [join(root, 'test', 'sheet', 'engine', 'headlessGrid.ts')],
    bundle: true,
    minify: true,
    write: false,
    platform: 'node',
    format: 'cjs',
    define: { 'process.env.NODE_ENV': '"production"' },
    logLevel: 'error',
  });
  const text = outputFiles[0]?.contents;
  if (!text) throw new Error('the bundler wrote nothing');
  // Test workers may build at the same time: each writes its own file and the last rename wins.
  const own = `${path}.${process.pid}`;
  writeFileSync(own, text);
  renameSync(own, path);
  return path;
}
