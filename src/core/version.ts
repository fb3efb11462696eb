/** The program's version, from the package that is built. */

import { version } from '../../package.json';

export const PROGRAM_VERSION: string = version;
