/** What set-up tells: one plain line a stage on standard error, so that standard output stays the command's own. */

import { resolve } from 'node:path';
import { fileURLToPath } from 'node:url';

export const ROOT = resolve(fileURLToPath(import.meta.url), '../../..');

export const say = (text) => process.stderr.write(`[ohmstrata] ${text}\n`);

export function fail(text) {
  say(text);
  process.exit(1);
}

/** Runs a stage and says how long it took. */
export async function stage(name, work) {
  const start = performance.now();
  const value = await work();
  say(`${name}: ${((performance.now() - start) / 1000).toFixed(1)} s`);
  return value;
}
