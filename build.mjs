/**
 * Writes dist/: everything that a spreadsheet host needs to run Tautline from one address.
 *
 *   node build.mjs [--origin https://…] [--out folder]
 *   node build.mjs --fingerprint    at a release: notes which declarations this version ships
 */
import { readFileSync, writeFileSync } from 'node:fs';
import { join, resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { loadTypeScript, root } from './manifest-template/loadTypeScript.mjs';

const { values } = parseArgs({
  options: {
    origin: { type: 'string', default: 'https://localhost:3443' },
    out: { type: 'string', default: join(root, 'dist') },
    fingerprint: { type: 'boolean', default: false },
  },
});
const tools = await loadTypeScript('manifest-template/tools.ts');

try {
  if (values.fingerprint) noteFingerprint(await tools.writeFunctionsJson(root, tools.FINGERPRINT_ORIGIN));
  else await build();
} catch (error) {
  console.error(`Build stopped: ${error.message}`);
  process.exitCode = 1;
}

async function build() {
  const origin = tools.baseAddress(values.origin);
  const { sizes, faults } = await tools.buildAll({ root, out: resolve(values.out), origin });
  console.log(`Built for ${origin}\n\n${tools.sizeTable(sizes)}`);
  if (faults.length > 0) throw new Error(`what was written is not fit to ship:\n- ${faults.join('\n- ')}`);
}

function noteFingerprint(metadata) {
  const path = join(root, tools.FINGERPRINT_FILE);
  const released = JSON.parse(readFileSync(path, 'utf8'));
  const now = tools.fingerprintOf(metadata, tools.packageVersion(root));
  if (tools.needsNewVersion(released, now)) {
    throw new Error(
      `the functions changed since ${released.version}: raise the version in package.json first`,
    );
  }
  writeFileSync(path, `${JSON.stringify(now, null, 2)}\n`);
  console.log(`functions.json of version ${now.version}: ${now.hash}`);
}
