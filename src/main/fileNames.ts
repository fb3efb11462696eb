/** Which names may be joined to a folder, and how a study's name becomes a file name. */

import { posix, win32 } from 'node:path';

const RESERVED_ON_WINDOWS = /^(con|prn|aux|nul|com\d|lpt\d)(\..*)?$/i;
// biome-ignore lint/suspicious/noControlCharactersInRegex: control characters in names are what this keeps out.
const FORBIDDEN = /[\u0000-\u001f\u007f<>:"/\\|?*]/g;
const LONGEST = 255;

/** Whether a name from outside can stand only for a file directly in the folder it is joined to, on any system. */
export function isSafeName(name: string): boolean {
  return (
    name !== '' &&
    name !== '.' &&
    name !== '..' &&
    name.length <= LONGEST &&
    name.search(FORBIDDEN) < 0 &&
    posix.basename(name) === name &&
    win32.basename(name) === name &&
    !/[. ]$/.test(name) &&
    !RESERVED_ON_WINDOWS.test(name)
  );
}

/** A file name made of a name to show, with the ending its kind has. */
export function fileNameFrom(shown: string, ending: string): string {
  const bare = shown.toLowerCase().endsWith(ending) ? shown.slice(0, -ending.length) : shown;
  const cleaned = bare
    .replace(FORBIDDEN, '-')
    .trim()
    .replace(/[. ]+$/, '')
    .slice(0, 100);
  const name = `${cleaned || 'untitled'}${ending}`;
  return isSafeName(name) ? name : `untitled${ending}`;
}
