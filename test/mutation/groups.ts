/** Numeric modules with the tests that must notice when they are changed. */
export const groups: Readonly<
  Record<string, { readonly modules: readonly string[]; readonly tests: readonly string[] }>
> = {
  line: {
    modules: ['core/line/centredSums.ts', 'core/line/fitLine.ts', 'core/line/ascending.ts'],
    tests: ['test/core/line/*.test.ts'],
  },
  straightness: {
    modules: ['core/straightness/runsP.ts', 'core/straightness/studentised.ts'],
    tests: ['test/core/straightness/parts.test.ts', 'test/core/straightness/straightness.test.ts'],
  },
  crossing: {
    modules: ['core/readoff/crossing.ts'],
    tests: ['test/core/readoff/crossing.test.ts'],
  },
  series: {
    modules: ['core/series/slopes.ts'],
    tests: ['test/core/series/slopes.test.ts'],
  },
  statement: {
    modules: ['core/statement/rounding.ts'],
    tests: ['test/core/statement/rounding.test.ts'],
  },
  judge: {
    modules: ['core/judge/outliers.ts', 'core/judge/scatter.ts', 'core/judge/repeats.ts'],
    tests: ['test/core/judge/{outliers,scatter,repeats}.test.ts'],
  },
};

/** What became of one change. */
export interface Mutant {
  readonly file: string;
  readonly status: string;
}

/** A change was noticed when a test failed, or never came to an end. */
const NOTICED: ReadonlySet<string> = new Set(['Killed', 'Timeout']);
/** What could not be run says nothing of the tests. */
const COUNTED: ReadonlySet<string> = new Set([...NOTICED, 'Survived', 'NoCoverage']);

/** The share of changes noticed, module by module, as a Markdown table. */
export function tableOf(mutants: readonly Mutant[]): string {
  const counted = mutants.filter(({ status }) => COUNTED.has(status));
  const row = (name: string, own: readonly Mutant[]): string => {
    const noticed = own.filter(({ status }) => NOTICED.has(status)).length;
    return `| ${name} | ${own.length} | ${noticed} | ${((100 * noticed) / own.length).toFixed(0)} % |`;
  };
  const files = [...new Set(counted.map(({ file }) => file))];
  return [
    '| module | changes | noticed | share |',
    '| --- | --- | --- | --- |',
    ...files.map((file) =>
      row(
        file,
        counted.filter((one) => one.file === file),
      ),
    ),
    row('all', counted),
  ].join('\n');
}
