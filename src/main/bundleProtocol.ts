/** Serves the built page under app://bundle/ and nothing outside its folder. */

import { readFile, realpath } from 'node:fs/promises';
import { extname, isAbsolute, join, relative, resolve, sep } from 'node:path';
import type { Protocol } from 'electron';
import { POLICY_HEADER } from './contentSecurityPolicy';
import { isOwnPage, SCHEME } from './ownPage';

const TYPES: Record<string, string> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.csv': 'text/csv; charset=utf-8',
  '.svg': 'image/svg+xml',
  '.png': 'image/png',
  '.woff2': 'font/woff2',
};

/** Whether `path` lies below `folder`. By the relative path: a prefix comparison would accept a sibling `folder-other`. */
export function isInside(folder: string, path: string): boolean {
  const way = relative(folder, path);
  return way !== '' && way !== '..' && !way.startsWith(`..${sep}`) && !isAbsolute(way);
}

/** The file an address stands for, or null when it is not one of ours. */
export function fileFor(address: string, folder: string): string | null {
  if (!isOwnPage(address)) return null;
  let path: string;
  try {
    path = decodeURIComponent(new URL(address).pathname);
  } catch {
    return null;
  }
  if (path.includes('\0') || path.includes('\\')) return null;
  // Relative to the folder: resolving the absolute path itself would discard the folder.
  const file = resolve(folder, `.${path}`);
  return isInside(folder, file) ? file : null;
}

const plain = (status: number, text: string) =>
  new Response(text, { status, headers: { 'content-type': 'text/plain; charset=utf-8' } });

export async function answer(request: { method: string; url: string }, folder: string): Promise<Response> {
  if (request.method !== 'GET') return plain(405, 'only GET');
  const named = fileFor(request.url, folder);
  if (named === null) return plain(400, 'not an address of this program');
  try {
    const file = await realpath(named);
    if (!isInside(await realpath(folder), file)) return plain(400, 'not an address of this program');
    return new Response(await readFile(file), {
      headers: {
        'content-type': TYPES[extname(file)] ?? 'application/octet-stream',
        'content-security-policy': POLICY_HEADER,
        'x-content-type-options': 'nosniff',
        'cross-origin-opener-policy': 'same-origin',
      },
    });
  } catch {
    return plain(404, 'not found');
  }
}

/** Before the program is ready: makes app:// a secure origin with relative addresses, modules and workers. */
export function declareScheme(protocol: Protocol): void {
  protocol.registerSchemesAsPrivileged([
    { scheme: SCHEME, privileges: { standard: true, secure: true, supportFetchAPI: true, codeCache: true } },
  ]);
}

export function serveBundle(protocol: Protocol): void {
  const folder = join(__dirname, '..', 'renderer');
  protocol.handle(SCHEME, (request) => answer(request, folder));
}
