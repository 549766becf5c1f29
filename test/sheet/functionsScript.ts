import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { FunctionsMetadata } from './grid/customFunctions.ts';
import { root } from './root.ts';

/** A built script of sheet functions and the declarations that a host reads with it. */
export interface FunctionsScript {
  readonly text: string;
  readonly metadata: FunctionsMetadata;
}

/** The built sheet functions from dist/. @throws when nothing is built yet. */
export function builtFunctions(): FunctionsScript {
  const script = join(root, 'dist', 'functions.js');
  const declarations = join(root, 'dist', 'functions.json');
  for (const path of [script, declarations]) {
    if (!existsSync(path)) throw new Error(`${path} is missing: run npm run build first`);
  }
  // functions.json is written by the build and checked by its own tests.
  const metadata = JSON.parse(readFileSync(declarations, 'utf8')) as FunctionsMetadata;
  return { text: readFileSync(script, 'utf8'), metadata };
}
