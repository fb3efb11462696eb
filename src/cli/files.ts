/** Files the command line reads and writes: capped in size, refused with the reason, written whole or not at all. */

import { closeSync, constants, fstatSync, openSync, readFileSync, realpathSync, statSync } from 'node:fs';
import { dirname, join } from 'node:path';
import writeFileAtomic from 'write-file-atomic';
import { InputProblem, parseStudy, resolveTables, type Study, safeTableName } from '../core/index';

const STUDY_LIMIT_BYTES = 8 * 2 ** 20;
const TABLE_LIMIT_BYTES = 512 * 2 ** 20;
/** The name under which standard input is read. */
const STANDARD_INPUT = '-';

const REASONS: Record<string, string> = {
  ENOENT: 'there is no such file or folder',
  ENOTDIR: 'a part of the path is not a folder',
  EISDIR: 'it is a folder',
  EACCES: 'permission is denied',
  EPERM: 'permission is denied',
  EROFS: 'the disk is read-only',
  ENOSPC: 'the disk is full',
  EDQUOT: 'your share of the disk is full',
  ENAMETOOLONG: 'the name is too long',
  ELOOP: 'its links run in a circle',
};

/** A study with its tables read in; `-` is standard input, whose tables lie in the current folder. */
export function readStudy(path: string): Study {
  const study = readStudyDocument(path);
  const folder = path === STANDARD_INPUT ? '.' : dirname(path);
  return resolveTables(study, (name) => readTableBeside(folder, name), tellTableWarning);
}

/** A study as it stands: its tables stay where they are. */
export function readStudyDocument(path: string): Study {
  const bytes = readBytes(path, STUDY_LIMIT_BYTES);
  const file = nameOf(path);
  let text: string;
  try {
    text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
  } catch {
    throw new InputProblem('not text in UTF-8; a study is a JSON file', { file });
  }
  return parseStudy(text, file);
}

/** Bytes of a table that a person names. */
export function readTableBytes(path: string): Uint8Array {
  return readBytes(path, TABLE_LIMIT_BYTES);
}

/** A table that a study names: neither a path nor a link leads out of the study's own folder. */
function readTableBeside(folder: string, name: string): Uint8Array {
  if (!safeTableName(name))
    throw new Error('a study may name only files in its own folder, without any path');
  const file = realpath(join(folder, name));
  if (dirname(file) !== realpath(folder))
    throw new Error("it is a link that leads out of the study's folder");
  return readBytes(file, TABLE_LIMIT_BYTES);
}

function realpath(path: string): string {
  try {
    return realpathSync(path);
  } catch (error) {
    throw new Error(reasonOf(error));
  }
}

function readBytes(path: string, limit: number): Uint8Array {
  try {
    return path === STANDARD_INPUT ? readCapped(process.stdin.fd, limit) : readRegular(path, limit);
  } catch (error) {
    if (error instanceof InputProblem) throw error;
    throw new InputProblem(`cannot be read: ${reasonOf(error)}`, { file: nameOf(path) });
  }
}

/** Opens without waiting, so that a pipe without a writer is refused instead of hanging. */
function readRegular(path: string, limit: number): Uint8Array {
  const file = openSync(path, constants.O_RDONLY | (constants.O_NONBLOCK ?? 0));
  try {
    const facts = fstatSync(file);
    if (facts.isDirectory()) throw new Error('it is a folder');
    if (!facts.isFile()) throw new Error('it is not a file');
    return readCapped(file, limit, facts.size);
  } finally {
    closeSync(file);
  }
}

function readCapped(file: number, limit: number, size = 0): Uint8Array {
  const tooLarge = new Error(`it is larger than the ${limit / 2 ** 20} MB that are allowed`);
  if (size > limit) throw tooLarge;
  const bytes = readFileSync(file);
  if (bytes.length > limit) throw tooLarge;
  return bytes;
}

/** Writes a file so that there is never half of it; the one that was there stays when it cannot be written. */
export function writeWhole(path: string, text: string): void {
  try {
    if (statSync(path, { throwIfNoEntry: false })?.isDirectory()) throw new Error('it is a folder');
    writeFileAtomic.sync(path, text);
  } catch (error) {
    throw new InputProblem(`cannot be written: ${reasonOf(error)}; nothing was written`, { file: path });
  }
}

export function nameOf(path: string): string {
  return path === STANDARD_INPUT ? 'standard input' : path;
}

export function tellTableWarning({ message, line }: { message: string; line?: number }, file: string): void {
  process.stderr.write(`note: ${file}: ${line === undefined ? '' : `line ${line}: `}${message}\n`);
}

function reasonOf(error: unknown): string {
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  return REASONS[code] ?? (error instanceof Error ? error.message : String(error));
}
