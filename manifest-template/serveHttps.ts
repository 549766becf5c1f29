import { createServer, type Server } from 'node:https';
import type { Certificate } from './certificate.ts';
import { staticFiles } from './staticFiles.ts';

/**
 * Serves a folder over HTTPS to this machine only.
 *
 * @param folder the built files
 * @param port 0 for any free one
 * @returns the listening server; close it to stop
 */
export function serveHttps(folder: string, certificate: Certificate, port: number): Promise<Server> {
  const answer = staticFiles(folder);
  const options = { key: certificate.key, cert: certificate.certificate, minVersion: 'TLSv1.2' } as const;
  const server = createServer(options, (request, response) => {
    answer(request, response).catch((error: unknown) => {
      console.error(`${request.url}: ${error instanceof Error ? error.message : String(error)}`);
      if (!response.headersSent) response.writeHead(500);
      response.end();
    });
  });
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, '127.0.0.1', () => resolve(server));
  });
}
