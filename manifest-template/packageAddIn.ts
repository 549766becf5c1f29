import { createHash } from 'node:crypto';
import { mkdirSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { zipSync } from 'fflate';
import { buildAll, packageVersion } from './buildAll.ts';
import { HOST_SCRIPT, headerPolicy } from './contentSecurityPolicy.ts';

export interface PackageRequest {
  readonly root: string;
  /** Folder to make the package in. */
  readonly out: string;
  /** Address of the built files: https, no trailing slash. */
  readonly origin: string;
  /** Writes further files into the built folder before it is sealed. */
  readonly finish?: (folder: string) => Promise<void>;
}

export interface DeployablePackage {
  readonly folder: string;
  readonly zip: string;
  readonly files: readonly string[];
}

/** The earliest time that a zip can hold: the same files give the same zip, whenever it is made. */
const TIMELESS = new Date(1980, 0, 1);

/**
 * Makes `tautline-VERSION/` and `tautline-VERSION.zip`: all that a static host and an administrator need.
 *
 * @throws Error when the build is not fit to ship; nothing is left behind then
 */
export async function packageAddIn({
  root,
  out,
  origin,
  finish,
}: PackageRequest): Promise<DeployablePackage> {
  const version = packageVersion(root);
  const name = `tautline-${version}`;
  const folder = join(out, name);
  const zip = `${folder}.zip`;
  rmSync(folder, { recursive: true, force: true });
  rmSync(zip, { force: true });
  try {
    const { faults } = await buildAll({ root, out: folder, origin });
    if (faults.length > 0) throw new Error(`the build is not fit to ship:\n- ${faults.join('\n- ')}`);
    await finish?.(folder);
    writeFileSync(join(folder, 'INSTALL.md'), installSteps(root, origin, version));
    writeFileSync(join(folder, 'LICENSE'), readFileSync(join(root, 'LICENSE')));
    writeFileSync(join(folder, 'INTEGRITY.txt'), integrityList(folder));
  } catch (error) {
    rmSync(folder, { recursive: true, force: true });
    throw error;
  }
  const files = readdirSync(folder).sort();
  mkdirSync(out, { recursive: true });
  const entries = files.map((file) => [`${name}/${file}`, readFileSync(join(folder, file))] as const);
  writeFileSync(zip, zipSync(Object.fromEntries(entries), { level: 9, mtime: TIMELESS }));
  return { folder, zip, files };
}

/** A line for each file, in the form that `sha256sum -c` reads. */
export function integrityList(folder: string): string {
  const lines = readdirSync(folder)
    .filter((file) => file !== 'INTEGRITY.txt')
    .sort()
    .map(
      (file) =>
        `${createHash('sha256')
          .update(readFileSync(join(folder, file)))
          .digest('hex')}  ${file}\n`,
    );
  return lines.join('');
}

/** Markdown, so values stand in it as they are: an address that passed its check needs no escaping. */
function installSteps(root: string, origin: string, version: string): string {
  const values = new Map([
    ['origin', origin],
    ['version', version],
    ['policy', headerPolicy],
    ['hostScript', HOST_SCRIPT],
  ]);
  const template = readFileSync(join(root, 'manifest-template', 'INSTALL.md'), 'utf8');
  return template.replace(/\{\{(\w+)\}\}/g, (_whole, name: string) => {
    const value = values.get(name);
    if (value === undefined) throw new Error(`INSTALL.md asks for {{${name}}}, which is not given`);
    return value;
  });
}
