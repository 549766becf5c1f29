import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { Fit } from '../../core/fit/fit.ts';
import { fitLaw } from '../../core/fit/fitLaw.ts';
import { readingsFrom, settingsFrom } from '../core/fit/settings.ts';
import { digitsAgreed } from '../expectDigits.ts';

/** How far one published set was met: the worst of its constants, and of their standard uncertainties. */
export interface DigitsRow {
  readonly set: string;
  /** Difficulty as the collection grades it. */
  readonly level: string;
  readonly readings: number;
  readonly law: string;
  readonly how: string;
  readonly constants: number;
  readonly uncertainties: number;
}

interface Entry {
  readonly name: string;
  readonly level: string;
  readonly columns: readonly { readonly name: string; readonly values: number[] }[];
  readonly model: { readonly expression: string; readonly parameters: readonly string[] };
  readonly highPrecision: {
    readonly parameters: readonly string[];
    readonly standardDeviations: readonly string[];
  };
}

/** Linear sets with one predictor and the law that each of them is. */
const LINEAR: Readonly<Record<string, { readonly law: string; readonly names: readonly string[] }>> = {
  Norris: { law: 'straight line', names: ['a', 'b'] },
  NoInt1: { law: 'proportional', names: ['b'] },
};

/** Nonlinear sets of one predictor whose law has a straight form; the others have more constants than a line settles. */
const NONLINEAR = [
  'Misra1a',
  'Chwirut2',
  'DanWood',
  'Misra1d',
  'Kirby2',
  'MGH09',
  'Thurber',
  'BoxBOD',
  'Rat42',
  'Eckerle4',
];

function entries(file: string): readonly Entry[] {
  // The files' shape is described in test/reference/README.md.
  return JSON.parse(readFileSync(join(process.cwd(), 'test', 'reference', file), 'utf8')) as Entry[];
}

function find(file: string, name: string): Entry {
  const found = entries(file).find((entry) => entry.name === name);
  if (!found) throw new Error(`there is no set ${name}`);
  return found;
}

function rowOf(
  entry: Entry,
  law: string,
  shownLaw: string,
  names: readonly string[],
  options: string,
): DigitsRow {
  const column = (name: string): number[] => entry.columns.find((one) => one.name === name)?.values ?? [];
  const fit = fitLaw(readingsFrom(column('x'), column('y')), law, settingsFrom({ options }));
  return {
    set: entry.name,
    level: entry.level,
    readings: column('x').length,
    law: shownLaw,
    how: fit.direct === null ? 'line' : 'least squares in y, started from the line',
    constants: worst(fit, names, 'value', entry.highPrecision.parameters),
    uncertainties: worst(fit, names, 'standardUncertainty', entry.highPrecision.standardDeviations),
  };
}

function worst(
  fit: Fit,
  names: readonly string[],
  which: 'value' | 'standardUncertainty',
  certified: readonly string[],
): number {
  const digits = names.map((name, k) => {
    const found = fit.constants.find((one) => one.name === name);
    return digitsAgreed(found?.[which] ?? Number.NaN, Number(certified[k]));
  });
  return Math.min(...digits);
}

/**
 * Digits reached on the graded sets that these laws cover, each from its readings and its law's text alone.
 * @see NIST/ITL Statistical Reference Datasets, https://www.itl.nist.gov/div898/strd/; certified values recomputed to 20
 * digits, as test/reference/README.md says
 */
export function digitsReached(): readonly DigitsRow[] {
  const linear = Object.entries(LINEAR).map(([name, { law, names }]) => {
    const entry = find('A-nist-linear.json', name);
    return rowOf(entry, law, `${law}`, names, '');
  });
  const nonlinear = NONLINEAR.map((name) => {
    const entry = find('A-nist-nonlinear.json', name);
    const right = entry.model.expression.replace(/^.*?=\s*/, '').replaceAll('**', '^');
    return rowOf(entry, `y(x) = ${right}`, `\`${right}\``, entry.model.parameters, 'fit=direct');
  });
  return [...linear, ...nonlinear];
}

/** The same as a Markdown table. */
export function digitsTable(rows: readonly DigitsRow[]): string {
  const header = [
    'set',
    'graded',
    'readings',
    'law',
    'by',
    'digits of the constants',
    'of their uncertainties',
  ];
  const lines = rows.map((row) => [
    row.set,
    row.level.toLowerCase(),
    String(row.readings),
    row.law,
    row.how,
    row.constants.toFixed(1),
    row.uncertainties.toFixed(1),
  ]);
  return [header, header.map(() => '---'), ...lines].map((cells) => `| ${cells.join(' | ')} |`).join('\n');
}
