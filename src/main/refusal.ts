/** Failures a person is to read: what happened to which file, and what to do. */

/** A failure whose message is meant for the person at the window; any other error is a defect of the program. */
export class Refusal extends Error {}

const CAUSES: Record<string, string> = {
  ENOENT: 'it, or the folder it should be in, does not exist',
  ENOTDIR: 'a part of its path is not a folder',
  EISDIR: 'it is a folder',
  EACCES: 'its permissions do not allow it',
  EPERM: 'its permissions do not allow it, or another program holds it open',
  EBUSY: 'another program holds it open',
  EROFS: 'its disk is read-only',
  ENOSPC: 'the disk is full',
  EDQUOT: 'your share of the disk is full',
  ENAMETOOLONG: 'its name is too long',
  EMFILE: 'too many files are open',
  EIO: 'the disk reports an error',
};

/** Turns an error of the file system into a `Refusal` that names the file; passes others on. */
export function fileRefusal(action: 'read' | 'saved', name: string, error: unknown): Error {
  if (error instanceof Refusal) return error;
  const code = error instanceof Error && 'code' in error ? String(error.code) : '';
  const cause = CAUSES[code] ?? (code ? `the system reports ${code}` : undefined);
  if (cause === undefined) return error instanceof Error ? error : new Error(String(error));
  const advice = action === 'saved' ? '. The file is as it was; try Save as' : '';
  return new Refusal(`"${name}" could not be ${action}: ${cause}${advice}.`);
}
