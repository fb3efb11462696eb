/** The built programs in out/, rebuilt when anything they are made from has changed. */

import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT } from './say.mjs';

const VITE = ['node_modules/vite/bin/vite.js', 'build'];

export const CLI = {
  key: 'cli',
  name: 'command line',
  output: 'out/cli/ohmstrata.mjs',
  sources: ['src/core', 'src/cli', 'vite.cli.config.ts', 'package.json', 'package-lock.json'],
  command: [...VITE, '--config', 'vite.cli.config.ts'],
};

export const DESKTOP = {
  key: 'desktop',
  name: 'window',
  output: 'out/renderer/index.html',
  sources: [
    'src/core',
    'src/main',
    'src/renderer',
    'demo-profiles',
    'electron.vite.config.ts',
    'package.json',
    'package-lock.json',
  ],
  command: ['node_modules/electron-vite/bin/electron-vite.js', 'build'],
};

export const BENCH = {
  key: 'bench',
  name: 'measurements',
  output: 'out/bench/bench.mjs',
  sources: ['src/core', 'bench', 'vite.bench.config.ts', 'vite.cli.config.ts', 'package-lock.json'],
  command: [...VITE, '--config', 'vite.bench.config.ts'],
};

const stampOf = (target) => join(ROOT, 'out', `.built-${target.key}`);

/** Name, size and time of every file, rather than the newest time alone: a restored older file also means a rebuild. */
function fingerprint(sources) {
  const hash = createHash('sha256');
  const add = (path) => {
    const facts = statSync(join(ROOT, path), { throwIfNoEntry: false });
    if (facts?.isDirectory())
      for (const entry of readdirSync(join(ROOT, path)).sort()) add(`${path}/${entry}`);
    else hash.update(`${path} ${facts?.size} ${facts?.mtimeMs}\n`);
  };
  for (const path of sources) add(path);
  return hash.digest('hex');
}

export function isBuilt(target) {
  const stamp = stampOf(target);
  return (
    existsSync(join(ROOT, target.output)) &&
    existsSync(stamp) &&
    readFileSync(stamp, 'utf8') === fingerprint(target.sources)
  );
}

export async function ensureBuild(target) {
  if (isBuilt(target)) return;
  const { stage, fail } = await import('./say.mjs');
  const { spawnSync } = await import('node:child_process');
  const before = fingerprint(target.sources);
  await stage(`build of the ${target.name}`, () => {
    const built = spawnSync(process.execPath, [...target.command, '--logLevel', 'warn'], {
      cwd: ROOT,
      stdio: ['ignore', 2, 2],
    });
    if (built.status !== 0) fail(`the build of the ${target.name} failed: see the lines above`);
  });
  mkdirSync(join(ROOT, 'out'), { recursive: true });
  writeFileSync(stampOf(target), before);
}
