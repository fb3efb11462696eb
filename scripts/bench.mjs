/** npm run bench: builds the speed measurements and runs them. */

import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { BENCH, ensureBuild } from './setup/build.mjs';
import { alone } from './setup/lock.mjs';
import { ensureModules } from './setup/modules.mjs';
import { ROOT } from './setup/say.mjs';

await alone(async () => {
  await ensureModules();
  await ensureBuild(BENCH);
});
await import(pathToFileURL(join(ROOT, BENCH.output)).href);
