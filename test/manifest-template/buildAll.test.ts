import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { createContext, runInContext } from 'node:vm';
import { afterAll, describe, expect, test } from '@jest/globals';
import { buildAll } from '../../manifest-template/buildAll.ts';
import { HOST_SCRIPT } from '../../manifest-template/contentSecurityPolicy.ts';
import { fixtureProject, PARTS, removeAfter } from './fixtureProject.ts';

const ORIGIN = 'https://tools.example.org/lab';
const folders: string[] = [];
afterAll(() => removeAfter(folders)());

async function buildWith(changes: Readonly<Record<string, string | null>> = {}) {
  const root = fixtureProject(changes);
  folders.push(root);
  const out = join(root, 'dist');
  const report = await buildAll({ root, out, origin: ORIGIN });
  return { root, out, ...report, read: (file: string) => readFileSync(join(out, file), 'utf8') };
}

const metadata = PARTS['functions/metadata.ts'] ?? '';

describe('buildAll', () => {
  test('writes every file that a host needs', async () => {
    const { out, faults } = await buildWith();
    expect(faults).toEqual([]);
    expect(readdirSync(out).sort()).toEqual(
      [
        'THIRD-PARTY-LICENCES.txt',
        'functions.html',
        'functions.js',
        'functions.json',
        'help.css',
        'icon-16.png',
        'icon-32.png',
        'icon-64.png',
        'icon-80.png',
        'manifest.xml',
        'taskpane.css',
        'taskpane.html',
        'taskpane.js',
      ].sort(),
    );
  });

  test('the page loads the host script, then the functions, then the panel, all as classic scripts', async () => {
    const { read } = await buildWith();
    const page = read('taskpane.html');
    const scripts = [...page.matchAll(/<script([^>]*)src="([^"?]+)/g)];
    expect(scripts.map(([, , source]) => source)).toEqual([HOST_SCRIPT, 'functions.js', 'taskpane.js']);
    expect(page).not.toMatch(/<script[^>]*(type=|async|defer)/);
    expect(page).toContain(
      'http-equiv="Content-Security-Policy" content="default-src &#39;none&#39;; script-src',
    );
    expect(page).not.toContain('frame-ancestors');
  });

  test('the page asks for a script by its contents, so that an update is never half old', async () => {
    const one = await buildWith();
    const two = await buildWith({ 'taskpane/main.tsx': "document.title = 'changed';" });
    const marks = (page: string) => [...page.matchAll(/(\w+\.\w+)\?v=(\w{10})/g)].map(([whole]) => whole);
    const [before, after] = [marks(one.read('taskpane.html')), marks(two.read('taskpane.html'))];
    expect(before).toHaveLength(3);
    expect(before.filter((mark) => !after.includes(mark)).map((mark) => mark.split('?')[0])).toEqual([
      'taskpane.js',
    ]);
  });

  test('scripts are bundled without globals of their own, styles start with the colours', async () => {
    const { read } = await buildWith();
    const page = createContext({ CustomFunctions: { associate: () => undefined } });
    const names = Object.keys(page);
    // Twice: a second declaration of a global `const` or `class` would throw.
    runInContext(read('functions.js'), page);
    runInContext(read('functions.js'), page);
    expect(Object.keys(page)).toEqual(names);
    expect(read('functions.js')).not.toContain('import');
    expect(read('taskpane.css')).toMatch(/^:root\{color-scheme:light dark;--paper/);
  });

  test('help has a section for each function, its text escaped', async () => {
    const { read } = await buildWith();
    const help = read('functions.html');
    expect(help).toContain('<section id="SLOPE.OF"');
    expect(help).toContain('=TAUT.SLOPE.OF(rise)');
    expect(help).toContain('Any cells &lt;up&gt;.');
    expect(help).not.toContain('<up>');
  });

  test('the licences of what is bundled are listed, of nothing else', async () => {
    const { read } = await buildWith();
    expect(read('THIRD-PARTY-LICENCES.txt')).toContain('plumb 2.0.1 (MIT)');
    expect(read('THIRD-PARTY-LICENCES.txt')).toContain('Plumb permission notice');
    const alone = await buildWith({ 'functions/main.ts': "CustomFunctions.associate('SLOPE.OF', () => 1);" });
    expect(alone.read('THIRD-PARTY-LICENCES.txt')).not.toContain('plumb');
    const unused = await buildWith({
      'functions/main.ts': "import 'plumb'; CustomFunctions.associate('SLOPE.OF', () => 1);",
      'node_modules/plumb/package.json':
        '{ "name": "plumb", "version": "2.0.1", "license": "MIT", "main": "index.js", "sideEffects": false }',
    });
    expect(unused.read('THIRD-PARTY-LICENCES.txt')).not.toContain('plumb');
  });

  test('building twice gives the same bytes', async () => {
    const [one, two] = [await buildWith(), await buildWith()];
    for (const file of readdirSync(one.out)) {
      expect(readFileSync(join(one.out, file)).equals(readFileSync(join(two.out, file)))).toBe(true);
    }
  });

  test.each(['functions/main.ts', 'functions/metadata.ts', 'taskpane/main.tsx', 'taskpane/style.css'])(
    'says that %s is missing',
    async (part) => {
      const { faults } = await buildWith({ [part]: null });
      expect(faults).toEqual([`${part} is missing`]);
    },
  );

  test('a part that can no longer be built leaves no old file behind', async () => {
    const { root, out } = await buildWith();
    expect(existsSync(join(out, 'functions.js'))).toBe(true);
    writeFileSync(join(root, 'functions', 'main.ts'), "import './gone.ts';");
    const { faults } = await buildAll({ root, out, origin: ORIGIN });
    expect(faults.join()).toContain('./gone.ts');
    expect(existsSync(join(out, 'functions.js'))).toBe(false);
  });

  test('declared and registered functions must be the same', async () => {
    const other = { 'functions/main.ts': "CustomFunctions.associate('OTHER', () => 1);" };
    expect((await buildWith(other)).faults).toEqual([
      'functions.js does not register SLOPE.OF',
      'functions.json does not declare OTHER',
    ]);
  });

  test('the functions may lean on nothing but CustomFunctions while they load', async () => {
    const early = {
      'functions/main.ts': "Office.onReady(); CustomFunctions.associate('SLOPE.OF', () => 1);",
    };
    await expect(buildWith(early)).rejects.toThrow('Office is not defined');
    const early2 = {
      'functions/main.ts': 'new CustomFunctions.Error(CustomFunctions.ErrorCode.notAvailable);',
    };
    await expect(buildWith(early2)).rejects.toThrow();
  });

  test.each<[string, string, string, string]>([
    [
      'a helpUrl elsewhere',
      "origin + '/functions.html#",
      "'http://elsewhere/functions.html#",
      'has the helpUrl',
    ],
    [
      'a type that the host checks itself',
      "type: 'any', dimensionality: 'matrix'",
      "type: 'number', dimensionality: 'matrix'",
      'has the type number',
    ],
    ['no dimensionality', ", dimensionality: 'matrix'", '', 'has no dimensionality'],
    [
      'data types',
      'allowErrorForDataTypeAny: true',
      'allowCustomDataForDataTypeAny: true',
      'allowErrorForDataTypeAny is not set',
    ],
    ['an id in small letters', "id: 'SLOPE.OF'", "id: 'slope.of'", 'id and name must be'],
    [
      'addresses for a scalar',
      'result:',
      'options: { requiresParameterAddresses: true }, result:',
      'result must be a matrix',
    ],
    ['no description', "'Rise over run.'", "''", 'has no description'],
  ])('functions.json with %s is unfit', async (_what, find, put, fault) => {
    const declared = metadata.replace(find, put);
    expect(declared).not.toBe(metadata);
    expect((await buildWith({ 'functions/metadata.ts': declared })).faults.join('\n')).toContain(fault);
  });

  test('a package without a licence text, or under a licence that asks for more, stops the build', async () => {
    await expect(buildWith({ 'node_modules/plumb/LICENSE': null })).rejects.toThrow(
      'plumb carries no licence',
    );
    const copyleft = (PARTS['node_modules/plumb/package.json'] ?? '').replace('MIT', 'GPL-3.0');
    await expect(buildWith({ 'node_modules/plumb/package.json': copyleft })).rejects.toThrow('"GPL-3.0"');
  });

  test('a script that outgrows its budget is a fault', async () => {
    // Digits of a chaotic sequence hardly compress: about 200 KB of text, 90 KB after gzip.
    let state = 0.3;
    let digits = '';
    while (digits.length < 200_000) {
      state = 3.999 * state * (1 - state);
      digits += String(state).slice(2);
    }
    const large = { 'functions/main.ts': `CustomFunctions.associate('SLOPE.OF', () => '${digits}');` };
    expect((await buildWith(large)).faults.join()).toMatch(
      /functions\.js has \d+\.\d KB after gzip, more than its \d+\.\d KB/,
    );
  });
});
