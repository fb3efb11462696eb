/** Runs the npm that runs us, its output on standard error. */

import { spawnSync } from 'node:child_process';
import { ROOT } from './say.mjs';

export function npm(args, options = {}) {
  const script = process.env.npm_execpath;
  const [command, before] = script?.endsWith('.js') ? [process.execPath, [script]] : ['npm', []];
  return spawnSync(command, [...before, ...args], {
    cwd: ROOT,
    stdio: ['ignore', 2, 2],
    shell: command === 'npm' && process.platform === 'win32',
    ...options,
  });
}
