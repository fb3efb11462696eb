/** Writes a file so that at every moment either the old or the new one is whole, a power cut included. */

import { constants } from 'node:fs';
import { copyFile, open } from 'node:fs/promises';
import { basename, dirname } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import { fileRefusal } from './refusal';

/** The rename itself must reach the disk, which only the folder's own synchronisation ensures. Windows has none. */
async function syncFolder(folder: string): Promise<void> {
  if (process.platform === 'win32') return;
  const handle = await open(folder, constants.O_RDONLY);
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Throws a `Refusal`, the old file untouched, when the new one cannot be written. */
export async function saveAtomically(path: string, data: string | Uint8Array): Promise<void> {
  try {
    await writeFileAtomic(path, typeof data === 'string' ? data : Buffer.from(data));
    await syncFolder(dirname(path));
  } catch (error) {
    throw fileRefusal('saved', basename(path), error);
  }
}

/** Keeps the file as it stands beside itself as `name.bak`; nothing to keep is no failure. */
export async function keepBackup(path: string): Promise<void> {
  try {
    await copyFile(path, `${path}.bak`);
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'ENOENT'))
      throw fileRefusal('saved', `${basename(path)}.bak`, error);
  }
}
