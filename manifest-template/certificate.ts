import { X509Certificate } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { generate } from 'selfsigned';

export interface Certificate {
  readonly key: string;
  readonly certificate: string;
  /** The file to show to the system's list of trusted certificates. */
  readonly file: string;
  /** SHA-1 of the certificate, by which systems list it: hexadecimal without separators. */
  readonly thumbprint: string;
  readonly validTo: Date;
}

const DAY = 24 * 60 * 60 * 1000;
const LIFETIME = 365 * DAY;
/** Clocks may differ a little between this machine and a guest system on it. */
const HEAD_START = DAY;

/**
 * The certificate of the local server, made when the folder holds none or its own has run out.
 * It names this machine only, and it cannot sign other certificates.
 *
 * @param folder where `localhost.key` (readable by its owner only) and `localhost.crt` are kept
 * @param now the present time
 */
export async function localCertificate(folder: string, now: Date): Promise<Certificate> {
  const keyFile = join(folder, 'localhost.key');
  const file = join(folder, 'localhost.crt');
  if (existsSync(keyFile) && existsSync(file)) {
    const kept = describe(readFileSync(keyFile, 'utf8'), readFileSync(file, 'utf8'), file);
    if (kept.validTo > now) return kept;
  }
  const made = await generate([{ name: 'commonName', value: 'Tautline on this machine' }], {
    keyType: 'ec',
    curve: 'P-256',
    algorithm: 'sha256',
    notBeforeDate: new Date(now.getTime() - HEAD_START),
    notAfterDate: new Date(now.getTime() + LIFETIME),
    extensions: [
      { name: 'basicConstraints', cA: false, critical: true },
      { name: 'keyUsage', digitalSignature: true, critical: true },
      { name: 'extKeyUsage', serverAuth: true },
      {
        name: 'subjectAltName',
        altNames: [
          { type: 2, value: 'localhost' },
          { type: 7, ip: '127.0.0.1' },
          { type: 7, ip: '::1' },
        ],
      },
    ],
  });
  mkdirSync(folder, { recursive: true });
  writeFileSync(keyFile, made.private, { mode: 0o600 });
  writeFileSync(file, made.cert);
  return describe(made.private, made.cert, file);
}

function describe(key: string, certificate: string, file: string): Certificate {
  const parsed = new X509Certificate(certificate);
  const thumbprint = parsed.fingerprint.replaceAll(':', '');
  return { key, certificate, file, thumbprint, validTo: new Date(parsed.validTo) };
}
