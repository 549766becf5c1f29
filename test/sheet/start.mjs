/** Serves the stand-in sheet with the built add-in and the demo workbook: `node test/sheet/start.mjs` (PORT=3000). */
import { loadTypeScript } from '../../manifest-template/loadTypeScript.mjs';

const { startStandIn } = await loadTypeScript('test/sheet/serve.ts');
const { address } = await startStandIn();
console.log(`\nThe stand-in sheet with the demo workbook is open at\n\n    ${address}\n\nStop with Ctrl+C.`);
