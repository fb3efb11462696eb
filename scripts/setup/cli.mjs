/** Runs the built command line in this process: a second Node would cost as much again as the calculation. */

import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { CLI, ensureBuild, isBuilt } from './build.mjs';
import { ensureModules, modulesAreReady } from './modules.mjs';
import { ROOT } from './say.mjs';

export async function runCli(args) {
  if (!(modulesAreReady() && isBuilt(CLI))) {
    const { alone } = await import('./lock.mjs');
    await alone(async () => {
      await ensureModules();
      await ensureBuild(CLI);
    });
  }
  process.argv = [process.argv[0], join(ROOT, CLI.output), ...args];
  await import(pathToFileURL(join(ROOT, CLI.output)).href);
}
