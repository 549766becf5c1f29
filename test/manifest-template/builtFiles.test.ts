import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { type BuildReport, buildAll, packageVersion } from '../../manifest-template/buildAll.ts';
import { readFunctions } from '../../manifest-template/checkFunctions.ts';
import {
  FINGERPRINT_FILE,
  FINGERPRINT_ORIGIN,
  type Fingerprint,
  fingerprintOf,
  needsNewVersion,
} from '../../manifest-template/fingerprint.ts';
import { signature } from '../../manifest-template/helpPage.ts';

const root = process.cwd();
let out: string;
let report: BuildReport;
const read = (file: string) => readFileSync(join(out, file), 'utf8');

beforeAll(async () => {
  out = mkdtempSync(join(tmpdir(), 'tautline-dist-'));
  report = await buildAll({ root, out, origin: FINGERPRINT_ORIGIN });
}, 60_000);

afterAll(() => rmSync(out, { recursive: true, force: true }));

/** Ways to run text as a program or to reach a network, as they look in a minified script. */
const FORBIDDEN: readonly [string, RegExp][] = [
  ['eval', /(?<![\w$.])eval\s*\(/],
  ['new Function', /new\s+Function\b|(?<![\w$.])Function\s*\(/],
  ['a timer that runs text', /set(?:Timeout|Interval)\s*\(\s*["'`]/],
  ['fetch', /(?<![\w$])fetch\s*\(/],
  ['XMLHttpRequest', /XMLHttpRequest/],
  ['WebSocket', /\bWebSocket\b/],
  ['EventSource', /\bEventSource\b/],
  ['sendBeacon', /sendBeacon/],
  ['importScripts', /importScripts/],
  ['dynamic import', /(?<![\w$.])import\s*\(/],
  ['document.write', /document\.write/],
  ['cookies', /\.cookie\b/],
];

describe('the built files', () => {
  test('are fit to ship: no part missing, functions declared and registered alike, sizes within budget', () => {
    expect(report.faults).toEqual([]);
  });

  test.each(['functions.js', 'taskpane.js'])(
    '%s runs no text as a program and reaches no network',
    (file) => {
      const script = read(file);
      expect(script.length).toBeGreaterThan(1000);
      expect(FORBIDDEN.filter(([, pattern]) => pattern.test(script)).map(([name]) => name)).toEqual([]);
    },
  );

  test.each<[string, string]>([
    ['eval', 'a=eval("1")'],
    ['new Function', 'new Function("a","return a")'],
    ['new Function', 'x=Function("return this")()'],
    ['a timer that runs text', 'setTimeout("alert()",1)'],
    ['fetch', 'window.fetch("/x")'],
    ['XMLHttpRequest', 'new XMLHttpRequest'],
    ['dynamic import', 'import("./x.js")'],
    ['sendBeacon', 'navigator.sendBeacon("/x")'],
  ])('the search finds %s in %s', (name, script) => {
    expect(FORBIDDEN.filter(([, pattern]) => pattern.test(script)).map(([found]) => found)).toContain(name);
  });

  test('name no address but the vendor script, the schemas of pictures and, in functions.json, their own', () => {
    const known =
      /^http:\/\/www\.w3\.org\/(1999\/xlink|1999\/xhtml|2000\/svg|2000\/xmlns\/|XML\/1998\/namespace|1998\/Math\/MathML)/;
    for (const file of ['functions.js', 'taskpane.js', 'taskpane.css']) {
      const addresses = [...read(file).matchAll(/https?:\/\/[^\s"'`)\\]+/g)].map(([address]) => address);
      expect(addresses.filter((address) => !known.test(address))).toEqual([]);
    }
  });

  test('help has a section, a signature and an entry in the index for every function', () => {
    const help = read('functions.html');
    const functions = readFunctions(read('functions.json'));
    expect(functions.length).toBeGreaterThanOrEqual(16);
    for (const one of functions) {
      const anchor = one.helpUrl.split('#')[1] ?? '';
      expect(help).toContain(`<section id="${anchor}"`);
      expect(help).toContain(`<a href="#${anchor}">`);
      expect(help).toContain(signature(one).replaceAll('&', '&amp;'));
    }
    const ids = [...help.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
    const targets = [...help.matchAll(/href="#([^"]+)"/g)].map(([, target]) => target);
    expect(targets.filter((target) => !ids.includes(target))).toEqual([]);
  });
});

describe('the version', () => {
  test('moves whenever the declarations of the functions do', () => {
    // Written by `node build.mjs --fingerprint`, which writes this shape.
    const released = JSON.parse(readFileSync(join(root, FINGERPRINT_FILE), 'utf8')) as Fingerprint;
    const now = fingerprintOf(read('functions.json'), packageVersion(root));
    expect(now.hash).toMatch(/^[0-9a-f]{64}$/);
    expect(needsNewVersion(released, now)).toBe(false);
  });

  test('must move when they change, and need not when they do not', () => {
    const released = fingerprintOf('{"functions":[1]}', '1.0.0');
    expect(needsNewVersion(released, fingerprintOf('{"functions":[2]}', '1.0.0'))).toBe(true);
    expect(needsNewVersion(released, fingerprintOf('{"functions":[2]}', '1.0.1'))).toBe(false);
    expect(needsNewVersion(released, fingerprintOf('{"functions":[1]}', '1.0.0'))).toBe(false);
    expect(needsNewVersion(released, fingerprintOf('{"functions":[1]}', '1.1.0'))).toBe(false);
  });
});
