import { expect, test } from 'vitest';
import { fileRefusal, Refusal } from '../../src/main/refusal';

const systemError = (code: string) =>
  Object.assign(new Error(`${code}: words, open '/secret/place'`), { code });

test('a full disk is told as such, with the file and what to do, and without its path', () => {
  const refusal = fileRefusal('saved', 'a.json', systemError('ENOSPC'));
  expect(refusal).toBeInstanceOf(Refusal);
  expect(refusal.message).toBe(
    '"a.json" could not be saved: the disk is full. The file is as it was; try Save as.',
  );
});

test('an unlisted code of the system is named', () => {
  expect(fileRefusal('read', 'a.json', systemError('EWHAT')).message).toBe(
    '"a.json" could not be read: the system reports EWHAT.',
  );
});

test('a refusal stays what it is, and a defect stays a defect', () => {
  const refusal = new Refusal('words');
  const defect = new TypeError('x is undefined');
  expect(fileRefusal('read', 'a.json', refusal)).toBe(refusal);
  expect(fileRefusal('read', 'a.json', defect)).toBe(defect);
});
