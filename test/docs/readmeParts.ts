import { readFileSync } from 'node:fs';
import { listLaws } from '../../core/law/catalogue.ts';
import { functionTable } from '../../functions/table.ts';

/** The README's generated parts, by the name of the marker that they stand under. */
export function readmeParts(): ReadonlyMap<string, string> {
  return new Map([
    ['functions', functionTable()],
    ['laws', lawTable()],
    ['hits', readFileSync('test/core/judge/hitRates.md', 'utf8').trim()],
  ]);
}

/** The catalogue in Markdown: what each law is for, and the axes that make it straight. */
function lawTable(): string {
  const cell = (text: string): string => text.replaceAll('|', '\\|');
  const rows = listLaws().map(
    ({ name, equation, plot, against, slope, intercept, use }) =>
      `| ${name} | \`${equation}\` | ${cell(plot)} against ${cell(against)} | ${cell(slope)} | ${cell(intercept)} | ${use} |`,
  );
  return [
    '| law | equation | straight form 1 | slope | intercept | use |',
    '| --- | --- | --- | --- | --- | --- |',
    ...rows,
  ].join('\n');
}

/** Puts every generated part between its markers. @throws when a marker is missing */
export function fillReadme(text: string): string {
  let filled = text;
  for (const [name, part] of readmeParts()) {
    const [start, end] = [`<!-- ${name} -->`, `<!-- /${name} -->`];
    const from = filled.indexOf(start);
    const to = filled.indexOf(end);
    if (from < 0 || to < from) throw new Error(`README.md lacks the markers ${start} … ${end}`);
    filled = `${filled.slice(0, from + start.length)}\n\n${part}\n\n${filled.slice(to)}`;
  }
  return filled;
}

/** One formula of the README's worked example, and the first value that it must show. */
export interface DocumentedFormula {
  readonly formula: string;
  readonly shows: string;
}

/** Readings and formulas of the blocks marked `readings` and `formulas`. */
export function workedExample(text: string): {
  readonly readings: readonly (readonly string[])[];
  readonly formulas: readonly DocumentedFormula[];
} {
  const block = (kind: string): string[] => {
    const found = text.match(new RegExp(`\`\`\`${kind}\\n([\\s\\S]*?)\`\`\``));
    if (found?.[1] === undefined) throw new Error(`README.md lacks its block of ${kind}`);
    return found[1].split('\n').filter((line) => line.trim() !== '');
  };
  return {
    readings: block('readings').map((line) => line.split('|').map((cell) => cell.trim())),
    formulas: block('formulas').map((line) => {
      const [formula = '', shows = ''] = line.split('→').map((part) => part.trim());
      return { formula, shows };
    }),
  };
}
