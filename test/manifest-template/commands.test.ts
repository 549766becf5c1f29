import { spawnSync } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, test } from '@jest/globals';

const work = mkdtempSync(join(tmpdir(), 'tautline-commands-'));
afterAll(() => rmSync(work, { recursive: true, force: true }));

function run(...line: string[]) {
  const { status, stdout, stderr } = spawnSync(process.execPath, line, { encoding: 'utf8' });
  return { status, stdout, stderr };
}

describe('the commands', () => {
  test('build writes to the folder asked for, and prints the sizes', () => {
    const out = join(work, 'dist');
    const { status, stdout, stderr } = run(
      'build.mjs',
      '--out',
      out,
      '--origin',
      'https://tools.example.org/lab/',
    );
    expect(stderr).toBe('');
    expect(status).toBe(0);
    expect(stdout).toContain('Built for https://tools.example.org/lab\n');
    expect(stdout).toMatch(/functions\.js +\d+\.\d KB +\d+\.\d KB gzip/);
    expect(readdirSync(out)).toContain('manifest.xml');
  }, 60_000);

  test('build refuses an address that is not https, and writes nothing', () => {
    const out = join(work, 'refused');
    const { status, stderr } = run('build.mjs', '--out', out, '--origin', 'http://tools.example.org');
    expect([status, stderr.includes('does not start with https:')]).toEqual([1, true]);
    expect(existsSync(out)).toBe(false);
  }, 60_000);

  test('package wants an address, and an https one', () => {
    const without = run('manifest-template/package.mjs');
    expect([without.status, without.stderr.includes('--origin https://')]).toEqual([1, true]);
    const plain = run('manifest-template/package.mjs', '--origin', 'http://tools.example.org');
    expect([plain.status, plain.stderr.includes('does not start with https:')]).toEqual([1, true]);
  }, 60_000);
});
