import { createHash } from 'node:crypto';

/** The declarations that the last release shipped. Hosts keep them for a day unless the version changes. */
export interface Fingerprint {
  readonly version: string;
  /** SHA-256 of functions.json built for `FINGERPRINT_ORIGIN`, hexadecimal. */
  readonly hash: string;
}

export const FINGERPRINT_ORIGIN = 'https://localhost:3443';
export const FINGERPRINT_FILE = 'manifest-template/functions.fingerprint.json';

export function fingerprintOf(functionsJson: string, version: string): Fingerprint {
  return { version, hash: createHash('sha256').update(functionsJson).digest('hex') };
}

/** True when the declarations differ from those released although the version is the same. */
export function needsNewVersion(released: Fingerprint, now: Fingerprint): boolean {
  return released.hash !== now.hash && released.version === now.version;
}
