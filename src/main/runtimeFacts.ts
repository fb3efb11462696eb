/** Which program on which runtime this is, for the About box. */

import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { app } from 'electron';
import type { RuntimeFacts } from './bridge';

/** Left beside the executable by the set-up (scripts/setup/carriedRuntime.mjs). */
const CARRIED_MARK = 'carried-runtime';

export const runtimeFacts = (): RuntimeFacts => ({
  program: app.getVersion(),
  electron: process.versions.electron,
  chrome: process.versions.chrome,
  node: process.versions.node,
  carriedRuntime: existsSync(join(dirname(process.execPath), CARRIED_MARK)),
});
