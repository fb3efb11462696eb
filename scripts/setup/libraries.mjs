/** The shared libraries Electron wants of a Linux system, and a virtual display for tests: installed when we may, named when not. */

import { spawnSync } from 'node:child_process';
import { fail, stage } from './say.mjs';

/** Debian's package for each library; the names with `t64` (Debian 13, Ubuntu 24.04) are preferred where they exist. */
const PACKAGES = {
  'libgtk-3.so.0': 'libgtk-3-0',
  'libgdk-3.so.0': 'libgtk-3-0',
  'libnss3.so': 'libnss3',
  'libnssutil3.so': 'libnss3',
  'libsmime3.so': 'libnss3',
  'libnspr4.so': 'libnspr4',
  'libatk-1.0.so.0': 'libatk1.0-0',
  'libatk-bridge-2.0.so.0': 'libatk-bridge2.0-0',
  'libatspi.so.0': 'libatspi2.0-0',
  'libcups.so.2': 'libcups2',
  'libdbus-1.so.3': 'libdbus-1-3',
  'libdrm.so.2': 'libdrm2',
  'libgbm.so.1': 'libgbm1',
  'libasound.so.2': 'libasound2',
  'libpango-1.0.so.0': 'libpango-1.0-0',
  'libcairo.so.2': 'libcairo2',
  'libX11.so.6': 'libx11-6',
  'libXcomposite.so.1': 'libxcomposite1',
  'libXdamage.so.1': 'libxdamage1',
  'libXext.so.6': 'libxext6',
  'libXfixes.so.3': 'libxfixes3',
  'libXrandr.so.2': 'libxrandr2',
  'libxcb.so.1': 'libxcb1',
  'libxkbcommon.so.0': 'libxkbcommon0',
  'libexpat.so.1': 'libexpat1',
  'libglib-2.0.so.0': 'libglib2.0-0',
  'libgobject-2.0.so.0': 'libglib2.0-0',
  'libgio-2.0.so.0': 'libglib2.0-0',
  'libudev.so.1': 'libudev1',
};

const succeeds = (command, ...args) => spawnSync(command, args, { stdio: 'ignore' }).status === 0;
const hasCommand = (name) => succeeds('sh', '-c', `command -v ${name}`);

const runShell = (command) =>
  spawnSync('sh', ['-c', command], {
    stdio: ['ignore', 'ignore', 2],
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  }).status === 0;

/** Installs Debian packages when root; else says which one command to run, and stops. */
async function install(packages, why) {
  if (!hasCommand('apt-get')) fail(`${why}: install what your system has for ${packages.join(', ')}`);
  const names = packages.map((name) =>
    succeeds('apt-cache', 'show', '--no-all-versions', `${name}t64`) ? `${name}t64` : name,
  );
  const command = `apt-get install -y --no-install-recommends ${names.join(' ')}`;
  if (process.getuid() !== 0) fail(`${why}. Run this and try again:\n  sudo ${command}`);
  await stage(`${why}: ${command}`, () => {
    const quiet = `${command} -qq`;
    if (!runShell(quiet) && !(runShell('apt-get update -qq') && runShell(quiet))) fail(`${command} failed`);
  });
}

function missingLibraries(executable) {
  const listed = spawnSync('ldd', [executable], { encoding: 'utf8' }).stdout ?? '';
  return [...listed.matchAll(/^\s*(\S+) => not found/gm)].map((match) => match[1]);
}

export async function ensureLibraries(executable) {
  if (process.platform !== 'linux') return;
  const missing = missingLibraries(executable);
  if (missing.length === 0) return;
  const unknown = missing.filter((library) => !(library in PACKAGES));
  if (unknown.length > 0) fail(`Electron needs ${unknown.join(', ')}: install the packages that hold them`);
  await install(
    [...new Set(missing.map((library) => PACKAGES[library]))],
    `Electron lacks ${missing.join(', ')}`,
  );
  const still = missingLibraries(executable);
  if (still.length > 0) fail(`Electron still lacks ${still.join(', ')}`);
}

export async function ensureVirtualDisplay() {
  if (process.platform === 'linux' && !hasCommand('xvfb-run'))
    await install(['xvfb', 'xauth'], 'there is no display, and no Xvfb to make one');
}
