/** The address of the program's one page, and the only test of whether something comes from it. */

export const SCHEME = 'app';
export const HOST = 'bundle';
export const PAGE_URL = `${SCHEME}://${HOST}/index.html`;

/** The parts of an address, or null when it is none. */
export function parseAddress(address: string): URL | null {
  try {
    return new URL(address);
  } catch {
    return null;
  }
}

/** By the parsed address: a prefix comparison would also accept `app://bundle.elsewhere`. */
export function isOwnPage(address: string): boolean {
  const parts = parseAddress(address);
  return (
    parts?.protocol === `${SCHEME}:` && parts.host === HOST && parts.username === '' && parts.password === ''
  );
}
