/** Where the vendor's host script comes from: the only foreign script a page of ours may run. */
export const HOST_SCRIPT = 'https://appsforoffice.microsoft.com/lib/1/hosted/office.js';

const POLICY = [
  "default-src 'none'",
  `script-src 'self' ${new URL(HOST_SCRIPT).origin}`,
  "style-src 'self' 'unsafe-inline'",
  "img-src 'self' data:",
  "connect-src 'self'",
  "base-uri 'none'",
  "form-action 'none'",
];

/** Pages of the host that may hold the panel in a frame, as the vendor's documentation lists its domains. */
const FRAMED_BY = [
  "'self'",
  'https://*.officeapps.live.com',
  'https://*.live.com',
  'https://*.office.com',
  'https://*.office365.com',
  'https://*.microsoft365.com',
  'https://*.sharepoint.com',
  'https://*.cloud.microsoft',
];

/** The policy for a page's own meta tag, where `frame-ancestors` has no effect and is left out. */
export const metaPolicy = POLICY.join('; ');

/** The policy for the server's header. */
export const headerPolicy = [...POLICY, `frame-ancestors ${FRAMED_BY.join(' ')}`].join('; ');
