import { createHash } from 'node:crypto';
import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { type FileSize, measure, overBudget } from './budgets.ts';
import { type Bundle, bundleScript, bundleStyle, writeFunctionsJson } from './bundleScripts.ts';
import { faultsOfFunctions, readFunctions, registeredIds } from './checkFunctions.ts';
import { HOST_SCRIPT, metaPolicy } from './contentSecurityPolicy.ts';
import { fillTemplate } from './fillTemplate.ts';
import { helpPage } from './helpPage.ts';
import { bundledPackages, licenceNotice } from './licences.ts';
import { renderIcons } from './renderIcons.ts';
import { writeManifest } from './writeManifest.ts';

export interface BuildRequest {
  /** The repository's top folder. */
  readonly root: string;
  /** Folder to write to; made when it is not there. */
  readonly out: string;
  /** Address of the built files: https, no trailing slash. */
  readonly origin: string;
}

export interface BuildReport {
  readonly sizes: readonly FileSize[];
  /** What keeps the build from being fit to ship; empty when all is well. */
  readonly faults: readonly string[];
}

const FROM_SOURCES = ['functions.js', 'functions.json', 'functions.html', 'taskpane.js', 'taskpane.css'];

/**
 * Writes every file that a host needs. A part that is missing or cannot be bundled does not keep the others from
 * being written, but stands in the report's faults, and its file from an earlier build is removed.
 *
 * @throws Error when the manifest or the help page is unfit, or a bundled package has no licence
 */
export async function buildAll({ root, out, origin }: BuildRequest): Promise<BuildReport> {
  const templates = join(root, 'manifest-template');
  const files = new Map<string, Uint8Array>(renderIcons(templates));
  const faults: string[] = [];
  const write = (path: string, text: string) => files.set(path, Buffer.from(text, 'utf8'));

  const metadata = await attempt(writeFunctionsJson(root, origin), faults);
  const functions = await attempt(bundleScript(root, 'functions/main.ts'), faults);
  const panel = await attempt(bundleScript(root, 'taskpane/main.tsx'), faults);
  const style = await attempt(bundleStyle(root, 'taskpane/style.css'), faults);

  write('help.css', (await bundleStyle(root, 'manifest-template/help.css')).text);
  write('manifest.xml', writeManifest(templates, origin, packageVersion(root)));
  if (metadata !== null) {
    write('functions.json', metadata);
    faults.push(...faultsOfFunctions(metadata, origin));
    const shell = readFileSync(join(templates, 'functions.html'), 'utf8');
    write('functions.html', helpPage(shell, readFunctions(metadata)));
  }
  if (functions !== null) write('functions.js', functions.text);
  if (functions !== null && metadata !== null) faults.push(...faultsOfRegistration(functions.text, metadata));
  if (panel !== null) write('taskpane.js', panel.text);
  if (style !== null) write('taskpane.css', style.text);
  const shell = readFileSync(join(templates, 'taskpane.html'), 'utf8');
  write(
    'taskpane.html',
    fillTemplate(shell, {
      policy: metaPolicy,
      hostScript: HOST_SCRIPT,
      functionsHash: shortHash(functions),
      panelHash: shortHash(panel),
      styleHash: shortHash(style),
    }),
  );
  const sources = [functions, panel, style].flatMap((bundle) => bundle?.sources ?? []);
  write('THIRD-PARTY-LICENCES.txt', licenceNotice(bundledPackages(root, sources)));

  mkdirSync(out, { recursive: true });
  for (const path of FROM_SOURCES) rmSync(join(out, path), { force: true });
  for (const [path, contents] of files) writeFileSync(join(out, path), contents);
  const sizes = [...files].map(([path, contents]) => measure(path, contents));
  return { sizes, faults: [...faults, ...overBudget(sizes)] };
}

/** The version of package.json. */
export function packageVersion(root: string): string {
  const about: unknown = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));
  if (typeof about === 'object' && about !== null && 'version' in about) return String(about.version);
  throw new Error('package.json has no version');
}

async function attempt<Part>(part: Promise<Part>, faults: string[]): Promise<Part | null> {
  try {
    return await part;
  } catch (error) {
    faults.push(error instanceof Error ? error.message : String(error));
    return null;
  }
}

/** A mark that changes with the contents, so that no browser shows an old script beside a new page. */
function shortHash(bundle: Bundle | null): string {
  return createHash('sha256')
    .update(bundle?.text ?? '')
    .digest('hex')
    .slice(0, 10);
}

function faultsOfRegistration(script: string, metadata: string): string[] {
  const registered = registeredIds(script);
  const declared = readFunctions(metadata).map(({ id }) => id);
  return [
    ...declared.filter((id) => !registered.includes(id)).map((id) => `functions.js does not register ${id}`),
    ...registered.filter((id) => !declared.includes(id)).map((id) => `functions.json does not declare ${id}`),
  ];
}
