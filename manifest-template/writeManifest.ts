import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { checkManifest } from './checkManifest.ts';
import { fillTemplate } from './fillTemplate.ts';

/**
 * The manifest for one address and version.
 *
 * @param folder the manifest-template folder
 * @param origin address of the built files, https, no trailing slash
 * @param version of package.json; one to four numbers
 * @throws Error that lists the faults when the result is not fit for a host
 */
export function writeManifest(folder: string, origin: string, version: string): string {
  const template = readFileSync(join(folder, 'manifest.xml'), 'utf8');
  const manifest = fillTemplate(template, { origin, version });
  const faults = checkManifest(manifest);
  if (faults.length > 0) throw new Error(`manifest.xml is not fit for a host:\n- ${faults.join('\n- ')}`);
  return manifest;
}
