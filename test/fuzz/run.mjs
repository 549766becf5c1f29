/** Calls every sheet function with hostile arguments: node test/fuzz/run.mjs [--runs 5000] [--seed 1] [FUNCTION …] */
import { parseArgs } from 'node:util';
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { values, positionals } = parseArgs({
  allowPositionals: true,
  options: {
    runs: { type: 'string', default: '5000' },
    seed: { type: 'string', default: String(Date.now() % 2 ** 31) },
  },
});
const { runFuzz } = await loadTypeScript('test/fuzz/runFuzz.ts');
const settings = { seed: Number(values.seed), runs: Number(values.runs), only: positionals };
process.exitCode = runFuzz(settings, (line) => console.log(line)) > 0 ? 1 : 0;
