/** What serve.mjs uses. */
export { localCertificate } from './certificate.ts';
export { serveHttps } from './serveHttps.ts';
export { trustSteps } from './trustSteps.ts';
