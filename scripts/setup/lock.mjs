/** One set-up at a time: two commands started together in a fresh clone must not install or build over each other. */

import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { ROOT, say } from './say.mjs';

const LOCK = join(ROOT, 'out', '.setup-lock');

const isAlive = (pid) => {
  try {
    process.kill(pid, 0);
    return true;
  } catch (error) {
    return error.code === 'EPERM';
  }
};

function tryToTake() {
  try {
    writeFileSync(LOCK, String(process.pid), { flag: 'wx' });
    return true;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  }
  const owner = existsSync(LOCK) ? Number(readFileSync(LOCK, 'utf8')) : 0;
  if (owner > 0 && !isAlive(owner)) rmSync(LOCK, { force: true });
  return false;
}

/** Runs `work` while holding the lock, waiting for another set-up first. */
export async function alone(work) {
  mkdirSync(join(ROOT, 'out'), { recursive: true });
  for (let tries = 0; !tryToTake(); tries++) {
    if (tries === 10) say('waiting for another set-up of this folder');
    await sleep(100);
  }
  try {
    return await work();
  } finally {
    rmSync(LOCK, { force: true });
  }
}
