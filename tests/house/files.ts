/** The project's own files, for the tests that read them. */

import { readdirSync, readFileSync } from 'node:fs';
import { join, relative, resolve } from 'node:path';

export const ROOT = resolve(import.meta.dirname, '../..');

/** Paths below `folder` from the project's root, with `/` on every system; empty when there is no such folder. */
export function filesIn(folder: string, pattern = /./): string[] {
  let entries: ReturnType<typeof readEntries>;
  try {
    entries = readEntries(folder);
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === 'ENOENT') return [];
    throw error;
  }
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => relative(ROOT, join(entry.parentPath, entry.name)).replaceAll('\\', '/'))
    .filter((path) => pattern.test(path))
    .sort();
}

const readEntries = (folder: string) =>
  readdirSync(join(ROOT, folder), { recursive: true, withFileTypes: true });

export const read = (path: string): string => readFileSync(join(ROOT, path), 'utf8');
