/** The studies of this session by opaque id. Paths stay on this side of the border. */

import { createHash, randomUUID } from 'node:crypto';
import { basename, dirname } from 'node:path';
import { keepBackup, saveAtomically } from './atomicSave';
import type { OpenedDocument, SavedDocument } from './bridge';
import { STUDY_LIMIT_BYTES } from './limits';
import { readWhole } from './readFile';
import { Refusal } from './refusal';
import { readStudyFile } from './studyFile';

interface Held {
  path: string;
  /** Of the file as this session last read or wrote it. */
  hash: string;
  backedUp: boolean;
}

export type ChangedAnswer = 'overwrite' | 'saveAs' | 'cancel';

/** What saving may have to ask; the window's dialogs in use, plain functions in tests. */
export interface SaveQuestions {
  /** A place for the study, or null when cancelled. */
  choosePlace(suggestedName: string): Promise<string | null>;
  /** The file is not as it was read: what now? */
  changedOnDisk(name: string): Promise<ChangedAnswer>;
}

const hashOf = (data: string | Uint8Array) => createHash('sha256').update(data).digest('hex');

/** Whether another program changed the file since. A file that has gone is not in the way of saving. */
async function wasChanged(held: Held): Promise<boolean> {
  try {
    return hashOf(await readWhole(held.path, Number.POSITIVE_INFINITY)) !== held.hash;
  } catch {
    return false;
  }
}

export class Documents {
  readonly #held = new Map<string, Held>();
  /** Where the last study was opened or saved: the place dialogs begin at. */
  folder: string | undefined;

  async open(path: string): Promise<OpenedDocument> {
    const { text, bytes, tables } = await readStudyFile(path);
    const id = this.#hold({ path, hash: hashOf(bytes), backedUp: false });
    return { id, name: basename(path), text, tables };
  }

  /** Saves to the study's own file, or to a place asked for; null when the person cancels. */
  async save(
    request: { id: string | null; suggestedName: string; text: string; as: boolean },
    ask: SaveQuestions,
  ): Promise<SavedDocument | null> {
    if (Buffer.byteLength(request.text) > STUDY_LIMIT_BYTES)
      throw new Refusal('The study was not saved: it has more than 8 MB and could not be opened again.');
    const held = request.id === null ? undefined : this.#held.get(request.id);
    if (held && !request.as) {
      const answer = (await wasChanged(held)) ? await ask.changedOnDisk(basename(held.path)) : 'overwrite';
      if (answer === 'cancel') return null;
      if (answer === 'overwrite') return this.#write(request.id as string, held, request.text);
    }
    const path = await ask.choosePlace(request.suggestedName);
    if (path === null) return null;
    const place = { path, hash: '', backedUp: false };
    return this.#write(this.#hold(place), place, request.text);
  }

  #hold(held: Held): string {
    const id = randomUUID();
    this.#held.set(id, held);
    this.folder = dirname(held.path);
    return id;
  }

  async #write(id: string, held: Held, text: string): Promise<SavedDocument> {
    if (!held.backedUp) await keepBackup(held.path);
    held.backedUp = true;
    await saveAtomically(held.path, text);
    held.hash = hashOf(text);
    return { id, name: basename(held.path) };
  }
}
