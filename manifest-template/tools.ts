/** What the command-line scripts use. */
export { baseAddress } from './baseAddress.ts';
export { sizeTable } from './budgets.ts';
export { buildAll, packageVersion } from './buildAll.ts';
export { writeFunctionsJson } from './bundleScripts.ts';
export { FINGERPRINT_FILE, FINGERPRINT_ORIGIN, fingerprintOf, needsNewVersion } from './fingerprint.ts';
