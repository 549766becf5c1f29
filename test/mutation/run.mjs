/**
 * Changes the numeric modules one operator at a time and counts the changes that their own tests notice:
 * node test/mutation/run.mjs [GROUP …]
 *
 * The mutator is no dependency of the project: npm i --no-save @stryker-mutator/core@9 @stryker-mutator/jest-runner@9
 */
import { basename } from 'node:path';
import jestConfig from '../../jest.config.mjs';
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { groups, tableOf } = await loadTypeScript('test/mutation/groups.ts');

let Stryker;
try {
  ({ Stryker } = await import('@stryker-mutator/core'));
} catch {
  console.error(
    'First: npm i --no-save @stryker-mutator/core@9 @stryker-mutator/jest-runner@9 (not a dependency of the project).',
  );
  process.exit(1);
}

const asked = process.argv.slice(2);
const results = [];
for (const [name, { modules, tests }] of Object.entries(groups)) {
  if (asked.length > 0 && !asked.includes(name)) continue;
  console.error(`… ${name}`);
  const { reporters, ...config } = jestConfig;
  const stryker = new Stryker({
    testRunner: 'jest',
    mutate: modules,
    coverageAnalysis: 'perTest',
    concurrency: 2,
    timeoutMS: 15_000,
    reporters: [],
    logLevel: 'error',
    allowEmpty: false,
    jest: {
      projectType: 'custom',
      enableFindRelatedTests: false,
      config: { ...config, testMatch: tests.map((test) => `<rootDir>/${test}`) },
    },
  });
  for (const { fileName, status, location, replacement } of await stryker.runMutationTest()) {
    results.push({ file: basename(fileName), status, line: location.start.line, replacement });
  }
}
for (const { file, line, replacement } of results.filter(({ status }) => status === 'Survived')) {
  console.error(`${file}:${line} survives as ${String(replacement).replace(/\s+/g, ' ').slice(0, 100)}`);
}
console.log(tableOf(results));
