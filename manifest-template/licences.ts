import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** A package that is part of a shipped file. */
export interface BundledPackage {
  readonly name: string;
  readonly version: string;
  readonly licence: string;
  readonly text: string;
}

/** Licences that ask no more of a deployed copy than to carry their text. */
const ACCEPTED = ['MIT', 'ISC', 'BSD-2-Clause', 'BSD-3-Clause', 'Apache-2.0', '0BSD', 'Unlicense'];

/**
 * The packages behind a list of bundled sources, by name, each with its licence.
 *
 * @param root the top folder
 * @param sources paths from the top folder; those outside `node_modules` are our own
 * @throws Error when a package carries no licence text or one that is not accepted
 */
export function bundledPackages(root: string, sources: readonly string[]): BundledPackage[] {
  const folders = new Set<string>();
  for (const source of sources) {
    const folder = /^(.*node_modules\/(?:@[^/]+\/)?[^/]+)\//.exec(source)?.[1];
    if (folder !== undefined) folders.add(folder);
  }
  const packages = [...folders].map((folder) => readPackage(join(root, folder)));
  return packages.sort((a, b) => (a.name < b.name ? -1 : 1));
}

/** The text that goes with every deployed copy. */
export function licenceNotice(packages: readonly BundledPackage[]): string {
  const rule = '-'.repeat(78);
  const list = packages.map(({ name, version, licence }) => `  ${name} ${version} (${licence})`).join('\n');
  const texts = packages.map(
    ({ name, version, text }) => `${rule}\n${name} ${version}\n${rule}\n\n${text.trim()}\n`,
  );
  return `Tautline's scripts contain parts of these packages:\n\n${list}\n\n${texts.join('\n')}`;
}

function readPackage(folder: string): BundledPackage {
  // A package.json is an object by the package manager's own rules; its fields are checked below.
  const about = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8')) as Record<string, unknown>;
  const name = String(about['name']);
  const licence = licenceName(about);
  if (!ACCEPTED.includes(licence)) throw new Error(`the package ${name} has the licence "${licence}"`);
  const file = readdirSync(folder).find((entry) => /^(licen[cs]e|copying)(\.(md|txt))?$/i.test(entry));
  if (file === undefined || !existsSync(join(folder, file))) {
    throw new Error(`the package ${name} carries no licence text`);
  }
  return { name, version: String(about['version']), licence, text: readFileSync(join(folder, file), 'utf8') };
}

/** The licence's short name; older packages list objects with a type. */
function licenceName(about: Readonly<Record<string, unknown>>): string {
  const licence = about['license'];
  if (typeof licence === 'string') return licence;
  const list: unknown = about['licenses'];
  const first: unknown = Array.isArray(list) ? list[0] : licence;
  if (typeof first === 'object' && first !== null && 'type' in first) return String(first.type);
  return 'none';
}
