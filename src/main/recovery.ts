/**
 * Copies of unsaved work in the program's own folder, for a session that ends without saving.
 *
 * A copy is offered again until its work is saved or discarded. One whose recovery has itself failed twice is no longer
 * offered, so that it cannot keep the program from starting; its file stays.
 */

import { mkdir, readdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { z } from 'zod';
import { saveAtomically } from './atomicSave';

const snapshotSchema = z.object({
  name: z.string(),
  text: z.string(),
  savedAt: z.string(),
  /** How many sessions took this copy without coming as far as saving or dropping it. */
  taken: z.int().min(0),
});
type Snapshot = z.output<typeof snapshotSchema>;

const MOST_ATTEMPTS = 2;

export class Recovery {
  readonly #folder: string;
  readonly #own: string;
  #taken: string | undefined;
  /** Changes follow one another: a late write must not bring back what was dropped. */
  #last: Promise<unknown> = Promise.resolve();

  /** @param session a name no other session has */
  constructor(folder: string, session: string) {
    this.#folder = folder;
    this.#own = join(folder, `${session}.json`);
  }

  /** Keeps `text` as this session's unsaved work, in place of what it kept or took before; null drops both. */
  keep(name: string, text: string | null): Promise<void> {
    return this.#inTurn(async () => {
      if (text === null) await rm(this.#own, { force: true });
      else await this.#write(this.#own, { name, text, savedAt: new Date().toISOString(), taken: 0 });
      if (this.#taken !== undefined && this.#taken !== this.#own) await rm(this.#taken, { force: true });
      this.#taken = undefined;
    });
  }

  /** The latest unsaved work there is, if any. It stays on disk until `keep` replaces or drops it. */
  take(): Promise<{ name: string; text: string; savedAt: string } | null> {
    return this.#inTurn(async () => {
      const found = (await this.#all())
        .filter(({ snapshot }) => snapshot.taken < MOST_ATTEMPTS)
        .sort((a, b) => b.snapshot.savedAt.localeCompare(a.snapshot.savedAt))[0];
      if (found === undefined) return null;
      const { name, text, savedAt, taken } = found.snapshot;
      await this.#write(found.path, { name, text, savedAt, taken: taken + 1 });
      this.#taken = found.path;
      return { name, text, savedAt };
    });
  }

  #inTurn<T>(work: () => Promise<T>): Promise<T> {
    const result = this.#last.then(work);
    this.#last = result.catch(() => undefined);
    return result;
  }

  async #write(path: string, snapshot: Snapshot): Promise<void> {
    await mkdir(this.#folder, { recursive: true });
    await saveAtomically(path, JSON.stringify(snapshot));
  }

  /** Every readable copy; a damaged file is passed over and left where it is. */
  async #all(): Promise<{ path: string; snapshot: Snapshot }[]> {
    const names = await readdir(this.#folder).catch(() => []);
    const read = names
      .filter((name) => name.endsWith('.json'))
      .map(async (name) => {
        const path = join(this.#folder, name);
        try {
          return [{ path, snapshot: snapshotSchema.parse(JSON.parse(await readFile(path, 'utf8'))) }];
        } catch {
          return [];
        }
      });
    return (await Promise.all(read)).flat();
  }
}
