import { existsSync, readFileSync, renameSync, rmSync, statSync } from 'node:fs';
import { createServer, type Server } from 'node:http';
import { extname, join, normalize } from 'node:path';
import { build } from 'esbuild';
import { cacheFolder } from './bundle.ts';
import { root } from './root.ts';

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.png': 'image/png',
  '.svg': 'image/svg+xml',
  '.xml': 'application/xml; charset=utf-8',
  '.txt': 'text/plain; charset=utf-8',
};

const POLICY =
  "default-src 'none'; script-src 'self'; style-src 'self' 'unsafe-inline'; img-src 'self' data: blob:; font-src 'self' data:; connect-src 'self'; frame-src 'self'";

/** Builds the stand-in's page once for the present sources and returns the folder that holds it. */
export async function pageBundle(): Promise<string> {
  const folder = join(cacheFolder(), 'page');
  if (existsSync(folder)) return folder;
  const own = `${folder}.${process.pid}`;
  const page = join(root, 'test', 'sheet', 'page');
  const shared = {
    bundle: true,
    minify: true,
    platform: 'browser',
    target: 'es2022',
    define: { 'process.env.NODE_ENV': '"production"' },
    logLevel: 'error',
  } as const;
  await build({
    ...shared,
    entryPoints: [join(page, 'main.ts')],
    outdir: own,
    format: 'esm',
    // The hyphenation dictionaries are loaded when needed: without splitting they would all be inlined.
    splitting: true,
  });
  await build({
    ...shared,
    entryPoints: { 'office-standin': join(page, 'officeStandIn.ts') },
    outdir: own,
    format: 'iife',
  });
  try {
    renameSync(own, folder);
  } catch {
    // Another process was first with the same sources.
    rmSync(own, { recursive: true, force: true });
  }
  return folder;
}

/** The add-in's panel page with the vendor's script replaced by the stand-in's own. */
export function panelPage(dist: string): string {
  const path = join(dist, 'taskpane.html');
  if (!existsSync(path)) {
    return '<!doctype html><html lang="en"><meta charset="utf-8"><title>No panel</title><script src="/stand-in/office-standin.js"></script><script src="functions.js"></script><p style="font:14px system-ui;padding:1em">The panel is not built: run npm run build.</p></html>';
  }
  const page = readFileSync(path, 'utf8');
  const vendor = /<script[^>]*src="https:\/\/appsforoffice\.microsoft\.com\/[^"]*"[^>]*>\s*<\/script>/;
  if (!vendor.test(page)) throw new Error('dist/taskpane.html does not load the host’s script');
  return page.replace(vendor, '<script src="/stand-in/office-standin.js"></script>');
}

export interface StandInServer {
  readonly address: string;
  close(): Promise<void>;
}

/** Serves the stand-in sheet and the built add-in on 127.0.0.1: on the port given, else the next free one. */
export async function startStandIn(options: { port?: number; dist?: string } = {}): Promise<StandInServer> {
  const dist = options.dist ?? join(root, 'dist');
  const page = await pageBundle();
  const server = createServer((request, response) => {
    const path = decodeURIComponent(new URL(request.url ?? '/', 'http://stand-in').pathname);
    const send = (body: string | Buffer, type: string, policy = false) => {
      const headers: Record<string, string> = { 'Content-Type': type, 'Cache-Control': 'no-store' };
      if (policy) headers['Content-Security-Policy'] = POLICY;
      response.writeHead(200, headers).end(body);
    };
    try {
      if (path === '/') {
        send(readFileSync(join(root, 'test', 'sheet', 'page', 'index.html')), TYPES['.html'] ?? '', true);
      } else if (path === '/add-in/taskpane.html') {
        send(panelPage(dist), TYPES['.html'] ?? '');
      } else {
        const file = fileFor(path, { '/stand-in/': page, '/add-in/': dist });
        if (!file) {
          response.writeHead(404).end('not found');
          return;
        }
        send(readFileSync(file), TYPES[extname(file)] ?? 'application/octet-stream');
      }
    } catch (error) {
      response.writeHead(500, { 'Content-Type': 'text/plain' }).end(String(error));
    }
  });
  const port = await listen(server, options.port ?? Number(process.env['PORT'] ?? 3000));
  return {
    address: `http://127.0.0.1:${port}/`,
    close: () =>
      new Promise((resolve) => {
        server.close(() => resolve());
        server.closeAllConnections();
      }),
  };
}

function fileFor(path: string, folders: Readonly<Record<string, string>>): string | null {
  for (const [prefix, folder] of Object.entries(folders)) {
    if (!path.startsWith(prefix)) continue;
    const file = normalize(join(folder, path.slice(prefix.length)));
    if (file.startsWith(folder) && existsSync(file) && statSync(file).isFile()) return file;
  }
  return null;
}

function listen(server: Server, from: number): Promise<number> {
  return new Promise((resolve, reject) => {
    const attempt = (port: number) => {
      server.once('error', (error: NodeJS.ErrnoException) => {
        if (error.code === 'EADDRINUSE' && port > 0 && port < from + 50) attempt(port + 1);
        else reject(error);
      });
      server.listen(port, '127.0.0.1', () => {
        const address = server.address();
        resolve(typeof address === 'object' && address ? address.port : port);
      });
    };
    attempt(from);
  });
}
