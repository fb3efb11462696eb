/** A study named on the command line of a start. */

import { resolve } from 'node:path';

/** The first argument that is no switch, as a full path; null when there is none. */
export function givenStudy(argv: string[], isDefaultApp: boolean, folder: string): string | null {
  const words = argv.slice(1).filter((word) => !word.startsWith('-'));
  // Run by Electron itself, the first word is the program's own folder.
  const study = words[isDefaultApp ? 1 : 0];
  return study === undefined ? null : resolve(folder, study);
}
