/** Reads a study and the tables it names. A study can reach no file but those directly in its own folder. */

import { realpath } from 'node:fs/promises';
import { basename, dirname, join } from 'node:path';
import { z } from 'zod';
import type { Outcome } from './bridge';
import { isSafeName } from './fileNames';
import { STUDY_LIMIT_BYTES, TABLE_LIMIT_BYTES } from './limits';
import { readWhole } from './readFile';
import { fileRefusal, Refusal } from './refusal';

/** Only what names a file; whether the rest is a study is for the window to say, with the key that is wrong. */
const namesFiles = z.object({ steps: z.array(z.unknown()) });
const tableStep = z.object({ step: z.literal('table'), file: z.string() });

/** The files a study's steps name, each once. */
export function tablesNamedIn(text: string): string[] {
  let json: unknown;
  try {
    json = JSON.parse(text);
  } catch {
    return [];
  }
  const study = namesFiles.safeParse(json);
  if (!study.success) return [];
  const files = study.data.steps.flatMap((step) => tableStep.safeParse(step).data?.file ?? []);
  return [...new Set(files)];
}

/** A table by its bare name in `folder`; neither a path nor a link leads out. */
export async function readTableBeside(folder: string, name: string, limitBytes: number): Promise<Buffer> {
  if (!isSafeName(name))
    throw new Refusal(
      `The table "${name}" was not read: a study may name only files in its own folder, by bare names.`,
    );
  const [home, file] = await Promise.all([realpath(folder), realpath(join(folder, name))]).catch((error) => {
    throw fileRefusal('read', name, error);
  });
  if (dirname(file) !== home)
    throw new Refusal(`The table "${name}" was not read: it is a link that leads out of the study's folder.`);
  return readWhole(file, limitBytes, name);
}

async function readTables(folder: string, names: string[]): Promise<Record<string, Outcome<Uint8Array>>> {
  // No prototype: the names come from outside.
  const tables: Record<string, Outcome<Uint8Array>> = Object.create(null);
  let left = TABLE_LIMIT_BYTES;
  for (const name of names) {
    try {
      const value = await readTableBeside(folder, name, left);
      left -= value.length;
      tables[name] = { ok: true, value };
    } catch (error) {
      if (!(error instanceof Refusal)) throw error;
      tables[name] = { ok: false, message: error.message };
    }
  }
  return tables;
}

export interface StudyFile {
  text: string;
  bytes: Buffer;
  tables: Record<string, Outcome<Uint8Array>>;
}

/** Throws a `Refusal` when the study cannot be read; a table that cannot be read is told in its place. */
export async function readStudyFile(path: string): Promise<StudyFile> {
  const bytes = await readWhole(path, STUDY_LIMIT_BYTES);
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new Refusal(`"${basename(path)}" could not be read: it is not text in UTF-8, so it is no study.`);
  }
  return { text, bytes, tables: await readTables(dirname(path), tablesNamedIn(text)) };
}
