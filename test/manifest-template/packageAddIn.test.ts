import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, describe, expect, test } from '@jest/globals';
import { unzipSync } from 'fflate';
import { packageAddIn } from '../../manifest-template/packageAddIn.ts';
import { fixtureProject, removeAfter } from './fixtureProject.ts';

const ORIGIN = 'https://tools.example.org/lab';
const folders: string[] = [];
afterAll(() => removeAfter(folders)());

async function packaged(changes: Readonly<Record<string, string | null>> = {}) {
  const root = fixtureProject(changes);
  folders.push(root);
  return packageAddIn({ root, out: join(root, 'package'), origin: ORIGIN });
}

describe('packageAddIn', () => {
  test('the folder holds the build, the steps, the licences and the list of sums', async () => {
    const { folder, files } = await packaged();
    expect(folder).toMatch(/tautline-1\.2\.3$/);
    for (const file of [
      'manifest.xml',
      'functions.js',
      'INSTALL.md',
      'LICENSE',
      'THIRD-PARTY-LICENCES.txt',
    ]) {
      expect(files).toContain(file);
    }
    expect(readFileSync(join(folder, 'manifest.xml'), 'utf8')).toContain(`"${ORIGIN}/functions.js"`);
  });

  test('the list has the sum of every other file', async () => {
    const { folder, files } = await packaged();
    const lines = readFileSync(join(folder, 'INTEGRITY.txt'), 'utf8').trimEnd().split('\n');
    expect(lines).toHaveLength(files.length - 1);
    for (const line of lines) {
      const [sum, file = ''] = line.split('  ');
      expect(
        createHash('sha256')
          .update(readFileSync(join(folder, file)))
          .digest('hex'),
      ).toBe(sum);
    }
  });

  test('the zip holds the same files, and is the same whenever it is made', async () => {
    const [one, two] = [await packaged(), await packaged()];
    const zip = readFileSync(one.zip);
    expect(zip.equals(readFileSync(two.zip))).toBe(true);
    const entries = unzipSync(zip);
    expect(Object.keys(entries).sort()).toEqual(one.files.map((file) => `tautline-1.2.3/${file}`).sort());
    for (const file of one.files) {
      const contents = Buffer.from(entries[`tautline-1.2.3/${file}`] ?? []);
      expect(contents.equals(readFileSync(join(one.folder, file)))).toBe(true);
    }
  });

  test('the steps name the address and leave nothing to fill in', async () => {
    const { folder } = await packaged();
    const steps = readFileSync(join(folder, 'INSTALL.md'), 'utf8');
    expect(steps).toContain(`built for **${ORIGIN}**`);
    expect(steps).toContain('# Installing Tautline 1.2.3');
    expect(steps).not.toContain('{{');
    for (const way of [
      'shared folder',
      'Upload My Add-in',
      'folder `wef`',
      'admin centre',
      '## Updating',
      '## Removing',
    ]) {
      expect(steps).toContain(way);
    }
  });

  test('nothing is left behind when the build is not fit to ship', async () => {
    const root = fixtureProject({ 'taskpane/style.css': null });
    folders.push(root);
    const out = join(root, 'package');
    await expect(packageAddIn({ root, out, origin: ORIGIN })).rejects.toThrow(
      'taskpane/style.css is missing',
    );
    expect(existsSync(out) ? readdirSync(out) : []).toEqual([]);
  });
});
