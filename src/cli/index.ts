/** Where the command line begins: one command, one answer, one exit code. */

import { program } from './program';
import { run } from './run';

await run(program(), process.argv);
