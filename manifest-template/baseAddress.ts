const SEGMENT = /^[A-Za-z0-9][A-Za-z0-9._~-]*$/;

/**
 * The address under which the built files will stand, checked and without a trailing slash.
 *
 * @param text `https://host[:port][/folder…]`; folders of letters, digits, `.`, `_`, `~`, `-`
 * @throws Error when the address is not https, carries a user, a query or a fragment, or its path is malformed
 */
export function baseAddress(text: string): string {
  const refuse = (why: string): never => {
    throw new Error(
      `origin must be an address such as https://tools.example.org/tautline, but "${text}" ${why}`,
    );
  };
  if (/[\s\\<>"'&]/.test(text)) return refuse('has a character that has no place in an address');
  let url: URL;
  try {
    url = new URL(text);
  } catch {
    return refuse('is not an address');
  }
  if (url.protocol !== 'https:') return refuse('does not start with https:');
  if (!/^https:\/\/[^/]/i.test(text)) return refuse('has no host after https://');
  if (url.username !== '' || url.password !== '') return refuse('carries a user name or password');
  if (text.includes('?') || text.includes('#')) return refuse('carries a query or a fragment');
  // The path as typed: the URL parser would already have resolved `..` away.
  const path = text.replace(/^https:\/\/[^/]*/i, '').replace(/\/$/, '');
  for (const segment of path.split('/').slice(1)) {
    if (!SEGMENT.test(segment)) return refuse(`has the folder "${segment}" in its path`);
  }
  return `https://${url.host}${path}`;
}
