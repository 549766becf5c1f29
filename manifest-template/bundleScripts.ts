import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { runInNewContext } from 'node:vm';
import { type BuildOptions, build } from 'esbuild';
import { minify } from 'terser';
import { withoutUnused } from './withoutUnused.ts';

/** A bundled file and the sources of which something went into it, as paths from the top folder. */
export interface Bundle {
  readonly text: string;
  readonly sources: readonly string[];
}

/** The web views that can run a shared runtime are evergreen engines; this is well below the oldest of them. */
const TARGET = 'es2020';

/** One classic, minified script that defines no globals. */
export async function bundleScript(root: string, entry: string): Promise<Bundle> {
  const { text, sources } = await bundle(root, entry, {
    entryPoints: [present(root, entry)],
    format: 'iife',
    minify: false,
    plugins: [withoutUnused],
    // Fields without a value need no line of their own.
    tsconfigRaw: {
      compilerOptions: { useDefineForClassFields: false, jsx: 'react-jsx', jsxImportSource: 'preact' },
    },
  });
  // A minifier that looks across statements: a tenth smaller than the bundler's own.
  const { code } = await minify(text, {
    ecma: 2020,
    compress: { passes: 3, ecma: 2020, keep_fargs: false, unsafe_arrows: true, inline: 2 },
    format: { ecma: 2020, comments: false },
  });
  if (code === undefined) throw new Error(`${entry} could not be minified`);
  return { text: `${code}\n`, sources };
}

/** One minified style sheet that starts with Tautline's colours. */
export async function bundleStyle(root: string, entry: string): Promise<Bundle> {
  present(root, entry);
  const contents = `@import "./manifest-template/palette.css";\n@import "./${entry}";\n`;
  return bundle(root, entry, { stdin: { contents, resolveDir: root, loader: 'css' } });
}

/**
 * What a host reads about the sheet functions, as JSON text, from their declarations in `functions/metadata.ts`.
 * The module runs in a context of its own, so that it can lean on nothing of the machine that builds.
 */
export async function writeFunctionsJson(root: string, origin: string): Promise<string> {
  const entry = 'functions/metadata.ts';
  const { text } = await bundle(root, entry, {
    entryPoints: [present(root, entry)],
    format: 'iife',
    globalName: 'metadata',
    minify: false,
  });
  const ask = `\nJSON.stringify(metadata.functionsMetadata(${JSON.stringify(origin)}), null, 2)`;
  const json: unknown = runInNewContext(text + ask, {}, { filename: entry });
  if (typeof json !== 'string') throw new Error(`${entry} must export functionsMetadata(origin)`);
  return `${json}\n`;
}

function present(root: string, entry: string): string {
  const path = join(root, entry);
  if (!existsSync(path)) throw new Error(`${entry} is missing`);
  return path;
}

async function bundle(root: string, entry: string, own: BuildOptions): Promise<Bundle> {
  const { outputFiles, metafile } = await build({
    absWorkingDir: root,
    bundle: true,
    minify: true,
    write: false,
    metafile: true,
    platform: 'browser',
    target: TARGET,
    charset: 'utf8',
    legalComments: 'none',
    define: { 'process.env.NODE_ENV': '"production"' },
    outfile: 'bundle.out',
    logLevel: 'silent',
    ...own,
  });
  const first = outputFiles?.[0];
  if (first === undefined || outputFiles?.length !== 1) {
    throw new Error(
      `${entry} must bundle into one file: import style sheets from style.css, not from a script`,
    );
  }
  const parts = Object.values(metafile?.outputs ?? {}).flatMap(({ inputs }) => Object.entries(inputs));
  const sources = parts.filter(([, { bytesInOutput }]) => bytesInOutput > 0).map(([path]) => path);
  return { text: first.text, sources };
}
