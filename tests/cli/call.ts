/** Calls the built command line as a person does, in a process of its own. */

import { type SpawnSyncReturns, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { build } from 'vite';
import { nodeBundle } from '../../vite.cli.config';

const ROOT = join(import.meta.dirname, '../..');

export interface CommandLine {
  (args: string[], options?: { input?: string | Buffer; cwd?: string }): SpawnSyncReturns<string>;
  readonly entry: string;
}

/** Builds the command line into a folder of its own; `end` removes it. */
export async function builtCommandLine(): Promise<{ call: CommandLine; end: () => void }> {
  const folder = mkdtempSync(join(tmpdir(), 'ohmstrata-cli-'));
  await build({
    root: ROOT,
    configFile: false,
    logLevel: 'error',
    ...nodeBundle('src/cli/index.ts', folder, 'ohmstrata.mjs'),
  });
  const entry = join(folder, 'ohmstrata.mjs');
  const call = (args: string[], options: { input?: string | Buffer; cwd?: string } = {}) =>
    spawnSync(process.execPath, [entry, ...args], {
      encoding: 'utf8',
      cwd: ROOT,
      timeout: 20_000,
      ...options,
    });
  return {
    call: Object.assign(call, { entry }),
    end: () => rmSync(folder, { recursive: true, force: true }),
  };
}
