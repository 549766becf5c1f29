/** Makes what a team deploys: node manifest-template/package.mjs --origin https://… */
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { loadTypeScript, root } from './loadTypeScript.mjs';

const { values } = parseArgs({ options: { origin: { type: 'string' } } });
const { baseAddress, packageAddIn, writeAcceptanceSheet } = await loadTypeScript(
  'manifest-template/packaging.ts',
);

try {
  if (values.origin === undefined) throw new Error('say where the files will stand: --origin https://…');
  const origin = baseAddress(values.origin);
  const made = await packageAddIn({ root, out: join(root, 'package'), origin, finish: writeAcceptanceSheet });
  console.log(
    `${made.zip}\n${made.folder}\n  ${made.files.join('\n  ')}\n\nNext: INSTALL.md in that folder.`,
  );
} catch (error) {
  console.error(`No package made: ${error.message}`);
  process.exitCode = 1;
}
