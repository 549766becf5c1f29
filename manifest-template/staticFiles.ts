import { createHash } from 'node:crypto';
import { readFile, realpath, stat } from 'node:fs/promises';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { extname, join, sep } from 'node:path';
import { headerPolicy } from './contentSecurityPolicy.ts';

/** Kinds of files that are served at all. */
const TYPES: Readonly<Record<string, string>> = {
  '.css': 'text/css; charset=utf-8',
  '.csv': 'text/csv; charset=utf-8',
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.png': 'image/png',
  '.txt': 'text/plain; charset=utf-8',
  '.xml': 'application/xml; charset=utf-8',
};

const HEADERS: Readonly<Record<string, string>> = {
  'Content-Security-Policy': headerPolicy,
  'X-Content-Type-Options': 'nosniff',
  'Referrer-Policy': 'no-referrer',
  'Permissions-Policy': 'camera=(), geolocation=(), microphone=()',
  // The host's own pages show the icons and read functions.json.
  'Cross-Origin-Resource-Policy': 'cross-origin',
  'Cache-Control': 'no-cache',
};

/** Only these names may be asked for, so that no outside name can be pointed at this server. */
const OWN_HOSTS = /^(localhost|127\.0\.0\.1|\[::1\])(:\d+)?$/i;

/**
 * Answers GET and HEAD for the files of one folder: no listing, no way out of the folder, no hidden files.
 *
 * @param folder holds the files; links out of it are not followed
 */
export function staticFiles(folder: string) {
  return async (request: IncomingMessage, response: ServerResponse): Promise<void> => {
    for (const [name, value] of Object.entries(HEADERS)) response.setHeader(name, value);
    if (request.method !== 'GET' && request.method !== 'HEAD') {
      return refuse(response, 405, { Allow: 'GET, HEAD' });
    }
    if (!OWN_HOSTS.test(request.headers.host ?? '')) return refuse(response, 421);
    const path = safePath(request.url ?? '');
    const type = TYPES[extname(path ?? '')];
    if (path === null || type === undefined) return refuse(response, 404);
    const contents = await readInside(folder, path);
    if (contents === null) return refuse(response, 404);

    const tag = `"${createHash('sha256').update(contents).digest('base64url').slice(0, 22)}"`;
    response.setHeader('ETag', tag);
    if (path === 'functions.json') response.setHeader('Access-Control-Allow-Origin', '*');
    if (request.headers['if-none-match'] === tag) return refuse(response, 304);
    response.writeHead(200, { 'Content-Type': type, 'Content-Length': contents.length });
    response.end(request.method === 'HEAD' ? undefined : contents);
  };
}

function refuse(response: ServerResponse, status: number, headers: Record<string, string> = {}): void {
  response.writeHead(status, headers);
  response.end();
}

/** The file's path below the folder, or null for a request that no page of ours would make. */
function safePath(url: string): string | null {
  let path: string;
  try {
    path = decodeURIComponent(url.split(/[?#]/, 1)[0] ?? '');
  } catch {
    return null;
  }
  const segments = path.split('/');
  if (segments.shift() !== '') return null;
  const isPlain = (segment: string) => /^[A-Za-z0-9_-][A-Za-z0-9._-]*$/.test(segment);
  return segments.every(isPlain) ? segments.join('/') : null;
}

async function readInside(folder: string, path: string): Promise<Buffer | null> {
  try {
    const top = await realpath(folder);
    const file = await realpath(join(top, path));
    if (!file.startsWith(top + sep) || !(await stat(file)).isFile()) return null;
    return await readFile(file);
  } catch (error) {
    if (isAbsence(error)) return null;
    throw error;
  }
}

function isAbsence(error: unknown): boolean {
  const code = typeof error === 'object' && error !== null && 'code' in error ? error.code : '';
  return code === 'ENOENT' || code === 'ENOTDIR' || code === 'ENAMETOOLONG';
}
