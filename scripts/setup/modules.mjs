/** node_modules as the lock file wants them: `npm ci` when they are not. */

import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT } from './say.mjs';

export const CACHE = join(ROOT, 'node_modules', '.cache', 'ohmstrata');
const STAMP = join(CACHE, 'modules');
const LOCK_FILE = join(ROOT, 'package-lock.json');

const fingerprint = () =>
  createHash('sha256')
    .update(readFileSync(LOCK_FILE))
    .update(`${process.platform}-${process.arch}`)
    .digest('hex');

/** Whether a set-up has already made node_modules fit this lock file. */
export const modulesAreReady = () => existsSync(STAMP) && readFileSync(STAMP, 'utf8') === fingerprint();

/** Whether npm's own record of what it installed agrees with the lock file, as after an `npm ci` by hand. */
function installedMatchesLock() {
  const record = join(ROOT, 'node_modules', '.package-lock.json');
  if (!existsSync(record)) return false;
  const installed = JSON.parse(readFileSync(record, 'utf8')).packages;
  const wanted = Object.entries(JSON.parse(readFileSync(LOCK_FILE, 'utf8')).packages);
  return wanted.every(
    ([path, entry]) =>
      path === '' ||
      (path in installed ? installed[path].integrity === entry.integrity : entry.optional === true),
  );
}

/** Installs what the lock file names unless it is there; throws when npm fails. */
export async function ensureModules() {
  if (modulesAreReady()) return;
  if (!installedMatchesLock()) {
    const { stage, fail } = await import('./say.mjs');
    const { npm } = await import('./npm.mjs');
    await stage('npm ci', () => {
      if (npm(['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error']).status !== 0)
        fail('npm ci failed: see the lines above; it needs a package registry');
    });
  }
  mkdirSync(CACHE, { recursive: true });
  writeFileSync(STAMP, fingerprint());
}
