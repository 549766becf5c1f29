/** Times Tautline and prints a Markdown table: node test/bench/run.mjs (after npm run build, for the keystroke). */
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { runBenches } = await loadTypeScript('test/bench/runBenches.ts');
console.log(await runBenches((name) => console.error(`… ${name}`)));
process.exit(0);
