/** Reads a whole file, unless it is none or larger than allowed. */

import { constants } from 'node:fs';
import { open } from 'node:fs/promises';
import { basename } from 'node:path';
import { fileRefusal, Refusal } from './refusal';

const megabytes = (bytes: number) => `${(bytes / 2 ** 20).toFixed(bytes < 100 * 2 ** 20 ? 1 : 0)} MB`;

/** Throws a `Refusal` that names the file. Pipes and devices are refused without waiting for them. */
export async function readWhole(path: string, limitBytes: number, name = basename(path)): Promise<Buffer> {
  try {
    const file = await open(path, constants.O_RDONLY | (constants.O_NONBLOCK ?? 0));
    try {
      const facts = await file.stat();
      if (!facts.isFile()) throw new Refusal(`"${name}" could not be read: it is not a file.`);
      if (facts.size > limitBytes)
        throw new Refusal(
          `"${name}" could not be read: it has ${megabytes(facts.size)}, and at most ${megabytes(limitBytes)} are allowed.`,
        );
      return await file.readFile();
    } finally {
      await file.close();
    }
  } catch (error) {
    throw fileRefusal('read', name, error);
  }
}
