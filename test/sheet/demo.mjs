/** The headless demo: types the demo workbook's readings one by one and prints how constants and ranking settle. */
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { runDemo } = await loadTypeScript('test/sheet/demo/run.ts');
await runDemo((line) => console.log(line));
process.exit(0);
