import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';

const root = process.cwd();

const METADATA = `export const functionsMetadata = (origin: string) => ({
  allowErrorForDataTypeAny: true,
  functions: [{
    id: 'SLOPE.OF', name: 'SLOPE.OF', description: 'Rise over run.', helpUrl: origin + '/functions.html#SLOPE.OF',
    parameters: [{ name: 'rise', description: 'Any cells <up>.', type: 'any', dimensionality: 'matrix' }],
    result: { type: 'any', dimensionality: 'scalar' },
  }],
});
`;

/** A whole project in small, with every part that the build asks for and one package that its script uses. */
export const PARTS: Readonly<Record<string, string>> = {
  'package.json': '{ "name": "small", "version": "1.2.3" }',
  'functions/main.ts':
    "import { halve } from 'plumb';\nCustomFunctions.associate('SLOPE.OF', (x: number) => halve(x));",
  'functions/metadata.ts': METADATA,
  'taskpane/main.tsx': "document.title = 'panel';",
  'taskpane/style.css': 'body { color: var(--ink); }',
  'node_modules/plumb/package.json':
    '{ "name": "plumb", "version": "2.0.1", "license": "MIT", "main": "index.js" }',
  'node_modules/plumb/index.js': 'export const halve = (x) => x / 2;',
  'node_modules/plumb/LICENSE': 'Plumb permission notice',
};

/**
 * Writes the small project, some parts changed, into a fresh folder.
 *
 * @param changes text by path; null leaves the part out
 */
export function fixtureProject(changes: Readonly<Record<string, string | null>> = {}): string {
  const folder = mkdtempSync(join(tmpdir(), 'tautline-build-'));
  cpSync(join(root, 'manifest-template'), join(folder, 'manifest-template'), { recursive: true });
  cpSync(join(root, 'LICENSE'), join(folder, 'LICENSE'));
  for (const [path, text] of Object.entries({ ...PARTS, ...changes })) {
    if (text === null) continue;
    mkdirSync(dirname(join(folder, path)), { recursive: true });
    writeFileSync(join(folder, path), text);
  }
  return folder;
}

/** A place to make and forget folders in: call the returned function after all tests. */
export function removeAfter(folders: readonly string[]): () => void {
  return () => {
    for (const folder of folders) rmSync(folder, { recursive: true, force: true });
  };
}
