/** What package.mjs uses. */
export { writeAcceptanceSheet } from '../test/acceptance/writeAcceptanceSheet.ts';
export { baseAddress } from './baseAddress.ts';
export { packageAddIn } from './packageAddIn.ts';
