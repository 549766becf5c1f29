import { mkdirSync, mkdtempSync, rmSync, statSync, symlinkSync, writeFileSync } from 'node:fs';
import type { IncomingHttpHeaders } from 'node:http';
import { request, type Server } from 'node:https';
import type { AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { connect } from 'node:tls';
import { afterAll, beforeAll, describe, expect, test } from '@jest/globals';
import { type Certificate, localCertificate } from '../../manifest-template/certificate.ts';
import { serveHttps } from '../../manifest-template/serveHttps.ts';
import { trustSteps } from '../../manifest-template/trustSteps.ts';

/** The server checks only the present against the certificate: the tests give both. */
const NOW = new Date();
const DAY = 24 * 60 * 60 * 1000;

let work: string;
let certificate: Certificate;
let server: Server;

interface Answer {
  readonly status: number | undefined;
  readonly headers: IncomingHttpHeaders;
  readonly body: string;
}

/** Asks for a path exactly as given; no library tidies it up on the way. */
function ask(path: string, method = 'GET', headers: Record<string, string> = {}): Promise<Answer> {
  // A listening TCP server has an address with a port.
  const { port } = server.address() as AddressInfo;
  return new Promise((resolve, reject) => {
    const asked = request(
      {
        host: 'localhost',
        port,
        path,
        method,
        headers,
        ca: certificate.certificate,
        servername: 'localhost',
        agent: false,
      },
      (response) => {
        let body = '';
        response.on('data', (chunk) => {
          body += String(chunk);
        });
        response.on('end', () => resolve({ status: response.statusCode, headers: response.headers, body }));
      },
    );
    asked.on('error', reject);
    asked.end();
  });
}

beforeAll(async () => {
  work = mkdtempSync(join(tmpdir(), 'tautline-serve-'));
  const dist = join(work, 'dist');
  mkdirSync(join(dist, 'folder'), { recursive: true });
  for (const file of ['taskpane.html', 'functions.js', 'functions.json', 'taskpane.css', 'manifest.xml']) {
    writeFileSync(join(dist, file), `contents of ${file}`);
  }
  writeFileSync(join(dist, 'folder', 'inner.txt'), 'inner');
  writeFileSync(join(dist, 'icon-16.png'), Buffer.from([0x89, 0x50, 0x4e, 0x47]));
  writeFileSync(join(dist, '.hidden.txt'), 'hidden');
  writeFileSync(join(dist, 'private.key'), 'no type of ours');
  writeFileSync(join(work, 'secret.txt'), 'secret');
  symlinkSync(join(work, 'secret.txt'), join(dist, 'link.txt'));
  certificate = await localCertificate(join(work, 'certificate'), NOW);
  server = await serveHttps(dist, certificate, 0);
});

afterAll(async () => {
  await new Promise((resolve) => server.close(resolve));
  rmSync(work, { recursive: true, force: true });
});

describe('serving to a host on this machine', () => {
  test.each([
    ['/taskpane.html', 'text/html; charset=utf-8'],
    ['/functions.js', 'text/javascript; charset=utf-8'],
    ['/functions.json', 'application/json; charset=utf-8'],
    ['/taskpane.css', 'text/css; charset=utf-8'],
    ['/icon-16.png', 'image/png'],
    ['/manifest.xml', 'application/xml; charset=utf-8'],
    ['/functions.js?v=1', 'text/javascript; charset=utf-8'],
    ['/folder/inner.txt', 'text/plain; charset=utf-8'],
  ])('%s comes as %s', async (path, type) => {
    const { status, headers } = await ask(path);
    expect([status, headers['content-type']]).toEqual([200, type]);
  });

  test('every answer carries the security headers, a refusal too', async () => {
    for (const path of ['/taskpane.html', '/gone.html']) {
      const { headers } = await ask(path);
      expect(headers['content-security-policy']).toMatch(
        /^default-src 'none'; script-src 'self' https:\/\/[^ ]+;/,
      );
      expect(headers['content-security-policy']).toContain('frame-ancestors');
      expect(headers['content-security-policy']).not.toContain('unsafe-eval');
      expect(headers['x-content-type-options']).toBe('nosniff');
      expect(headers['referrer-policy']).toBe('no-referrer');
      expect(headers['x-frame-options']).toBeUndefined();
    }
  });

  test('only functions.json may be read by other origins', async () => {
    expect((await ask('/functions.json')).headers['access-control-allow-origin']).toBe('*');
    expect((await ask('/functions.js')).headers['access-control-allow-origin']).toBeUndefined();
  });

  test('HEAD has the headers and no body', async () => {
    const { status, headers, body } = await ask('/functions.js', 'HEAD');
    expect([status, headers['content-length'], body]).toEqual([200, '24', '']);
  });

  test('an unchanged file is not sent twice', async () => {
    const { headers } = await ask('/functions.js');
    const again = await ask('/functions.js', 'GET', { 'If-None-Match': String(headers.etag) });
    expect([again.status, again.body]).toEqual([304, '']);
    expect((await ask('/functions.js', 'GET', { 'If-None-Match': '"other"' })).status).toBe(200);
  });

  test.each(['POST', 'PUT', 'DELETE', 'OPTIONS', 'PATCH'])('%s is refused', async (method) => {
    const { status, headers } = await ask('/functions.js', method);
    expect([status, headers.allow]).toEqual([405, 'GET, HEAD']);
  });

  test.each([
    ['the top folder', '/'],
    ['a folder', '/folder'],
    ['a folder with a slash', '/folder/'],
    ['a missing file', '/gone.html'],
    ['a file as a folder', '/functions.js/inner.txt'],
    ['a file with no type of ours', '/private.key'],
    ['a hidden file', '/.hidden.txt'],
    ['a way up', '/../secret.txt'],
    ['a way up from a folder', '/folder/../../secret.txt'],
    ['an encoded way up', '/%2e%2e/secret.txt'],
    ['an encoded slash', '/..%2fsecret.txt'],
    ['an encoded backslash', '/..%5csecret.txt'],
    ['a backslash', '/..\\secret.txt'],
    ['a way up encoded twice', '/%252e%252e/secret.txt'],
    ['an overlong encoding', '/%c0%ae%c0%ae/secret.txt'],
    ['a broken encoding', '/%zz.txt'],
    ['a zero byte', '/secret.txt%00.txt'],
    ['a link that leads out', '/link.txt'],
    ['a full address', 'https://localhost/functions.js'],
    ['a double slash', '//functions.js'],
    ['a very long name', `/${'a'.repeat(5000)}.txt`],
  ])('%s is not found', async (_what, path) => {
    const { status, body } = await ask(path);
    expect([status, body]).toEqual([404, '']);
  });

  test('a foreign name pointed at this machine is refused', async () => {
    expect((await ask('/functions.js', 'GET', { Host: 'evil.example' })).status).toBe(421);
    expect((await ask('/functions.js', 'GET', { Host: 'localhost.evil.example' })).status).toBe(421);
    expect((await ask('/functions.js', 'GET', { Host: '127.0.0.1:3443' })).status).toBe(200);
  });

  test('listens to this machine only', () => {
    expect(server.address()).toMatchObject({ address: '127.0.0.1' });
  });

  test('old versions of TLS are refused', async () => {
    // A listening TCP server has an address with a port.
    const { port } = server.address() as AddressInfo;
    const attempt = new Promise((resolve, reject) => {
      const ca = certificate.certificate;
      const socket = connect({ port, ca, minVersion: 'TLSv1', maxVersion: 'TLSv1.1' }, () => {
        socket.destroy();
        resolve('connected');
      });
      socket.on('error', reject);
    });
    await expect(attempt).rejects.toThrow();
  });
});

describe('the certificate', () => {
  test('is kept, until it has run out', async () => {
    const folder = join(work, 'certificate');
    expect((await localCertificate(folder, NOW)).thumbprint).toBe(certificate.thumbprint);
    const later = new Date(certificate.validTo.getTime() + DAY);
    const renewed = await localCertificate(join(work, 'certificate'), later);
    expect(renewed.thumbprint).not.toBe(certificate.thumbprint);
    expect(renewed.validTo.getTime()).toBeGreaterThan(later.getTime());
  });

  test('is good for about a year', () => {
    const days = (certificate.validTo.getTime() - NOW.getTime()) / DAY;
    expect(days).toBeGreaterThan(360);
    expect(days).toBeLessThan(370);
  });

  test('its key can be read by its owner only', () => {
    if (process.platform === 'win32') return;
    expect(statSync(join(work, 'certificate', 'localhost.key')).mode & 0o077).toBe(0);
  });

  test('the steps name the file and the thumbprint for trusting and removing', () => {
    const steps = trustSteps(certificate, 'https://localhost:3443');
    expect(steps).toContain(`-addstore Root "${certificate.file}"`);
    expect(steps).toContain(`-delstore Root ${certificate.thumbprint}`);
    expect(steps).toContain(`delete-certificate -Z ${certificate.thumbprint}`);
    expect(certificate.thumbprint).toMatch(/^[0-9A-F]{40}$/);
  });
});
