/** Writes dist/acceptance.csv and dist/acceptance.html from the built functions: node test/acceptance/write.mjs */
import { join } from 'node:path';
import { loadTypeScript, root } from '../../manifest-template/loadTypeScript.mjs';

const { writeAcceptanceSheet } = await loadTypeScript('test/acceptance/writeAcceptanceSheet.ts');
const dist = join(root, 'dist');
try {
  await writeAcceptanceSheet(dist);
  console.log(`${join(dist, 'acceptance.html')}\n${join(dist, 'acceptance.csv')}`);
} catch (error) {
  console.error(`No acceptance sheet: ${error.message}`);
  process.exitCode = 1;
}
