import { existsSync, readFileSync } from 'node:fs';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { type HeadlessSheet, openSheet } from '../sheet/headless.ts';
import { fillReadme, workedExample } from './readmeParts.ts';

const readme = readFileSync('README.md', 'utf8');

describe('the README', () => {
  test('has its tables as the declarations and the catalogue make them (node test/docs/writeReadme.mjs)', () => {
    expect(fillReadme(readme)).toBe(readme);
  });

  test.each(['README.md', 'DEVELOPERS.md', 'SECURITY.md'])('%s links to files that exist', (file) => {
    const text = readFileSync(file, 'utf8');
    const links = [...text.matchAll(/\]\(([^)#][^)]*)\)/g)].map(([, target = '']) => target);
    const local = links.filter((link) => !/^[a-z]+:/.test(link)).map((link) => link.split('#')[0] ?? '');
    for (const link of local) expect({ link, exists: existsSync(link) }).toEqual({ link, exists: true });
  });

  test('names only commands that there are', () => {
    const { scripts } = JSON.parse(readFileSync('package.json', 'utf8')) as {
      scripts: Record<string, string>;
    };
    const named = [...readme.matchAll(/npm run ([a-z]+)/g)].map(([, name = '']) => name);
    for (const name of named) expect(Object.keys(scripts)).toContain(name);
  });
});

describe('the worked example of the README, in the stand-in sheet', () => {
  const { readings, formulas } = workedExample(readme);
  let sheet: HeadlessSheet;
  beforeAll(async () => {
    sheet = await openSheet();
    const cells = readings.map((row) =>
      row.map((text) => (text === '' ? null : Number.isNaN(Number(text)) ? text : Number(text))),
    );
    sheet.set('A1', cells);
    formulas.forEach(({ formula }, i) => {
      sheet.set(`${columnName(4 + 14 * i)}1`, formula);
    });
    await sheet.settle();
  });
  afterAll(() => sheet?.close());

  test('there are enough formulas', () => {
    expect(formulas.length).toBeGreaterThanOrEqual(10);
  });

  test.each(formulas.map((one, i) => [one.formula, one.shows, i] as const))('%s', (_, shows, i) => {
    const shown = sheet.spilled(`${columnName(4 + 14 * i)}1`).flat();
    const texts = shown.map((value) =>
      typeof value === 'number' ? String(Number(value.toPrecision(4))) : String(value),
    );
    expect(texts.join(' | ')).toContain(shows);
  });
});

/** The name of a column by its 0-based index. */
function columnName(index: number): string {
  const letter = String.fromCharCode(65 + (index % 26));
  return index < 26 ? letter : columnName(Math.floor(index / 26) - 1) + letter;
}
