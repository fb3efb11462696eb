/** npm run -s ohmstrata -- COMMAND ...: the command line, set up and built first when it must be. */

import { runCli } from './setup/cli.mjs';

await runCli(process.argv.slice(2));
