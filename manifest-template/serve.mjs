/** Serves dist/ to a spreadsheet host on this machine: node manifest-template/serve.mjs [--port 3443] */
import { existsSync } from 'node:fs';
import { join } from 'node:path';
import { parseArgs } from 'node:util';
import { loadTypeScript, root } from './loadTypeScript.mjs';

const { values } = parseArgs({ options: { port: { type: 'string', default: '3443' } } });
const { localCertificate, serveHttps, trustSteps } = await loadTypeScript('manifest-template/serving.ts');

const dist = join(root, 'dist');
if (existsSync(join(dist, 'functions.json'))) {
  try {
    const certificate = await localCertificate(join(root, '.cert'), new Date());
    const server = await serveHttps(dist, certificate, Number(values.port));
    const address = `https://localhost:${server.address().port}`;
    console.log(`Tautline is at ${address}; its manifest is ${join(dist, 'manifest.xml')}\n`);
    console.log(trustSteps(certificate, address));
    console.log('\nStop it with Ctrl+C.');
  } catch (error) {
    console.error(`Not serving: ${error.message}`);
    process.exitCode = 1;
  }
} else {
  console.error('There is nothing to serve: run npm run build first.');
  process.exitCode = 1;
}
