import { mkdir, rm, writeFile } from 'node:fs/promises';
import { dirname, join } from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { build } from 'esbuild';

/** The repository's top folder. */
export const root = dirname(dirname(fileURLToPath(import.meta.url)));

/**
 * Imports a TypeScript module of this repository in plain Node: translated on the fly, packages left as they are.
 * @param {string} path relative to the top folder
 */
export async function loadTypeScript(path) {
  const folder = join(root, 'node_modules', '.cache', 'tautline');
  const file = join(folder, `${path.replaceAll(/[^a-zA-Z0-9]/g, '-')}-${process.pid}.mjs`);
  const { outputFiles } = await build({
    entryPoints: [join(root, path)],
    bundle: true,
    write: false,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    logLevel: 'error',
  });
  await mkdir(folder, { recursive: true });
  await writeFile(file, outputFiles[0].text);
  try {
    return await import(pathToFileURL(file).href);
  } finally {
    await rm(file, { force: true });
  }
}
