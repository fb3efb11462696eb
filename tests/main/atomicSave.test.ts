import fs, { mkdirSync, readdirSync, readFileSync, statSync, symlinkSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterEach, expect, vi } from 'vitest';
import { keepBackup, saveAtomically } from '../../src/main/atomicSave';
import { test } from './folder';

afterEach(() => vi.restoreAllMocks());

test('a text and bytes are written whole, and nothing else is left', async ({ folder }) => {
  const path = join(folder, 'a.json');
  await saveAtomically(path, 'first');
  await saveAtomically(path, new TextEncoder().encode('second'));
  expect(readFileSync(path, 'utf8')).toBe('second');
  expect(readdirSync(folder)).toEqual(['a.json']);
});

test('when the new file cannot take its place, the old one is untouched and nothing is left over', async ({
  folder,
}) => {
  const path = join(folder, 'a.json');
  writeFileSync(path, 'old');
  vi.spyOn(fs, 'rename').mockImplementation(((_from: string, _to: string, done: (error: Error) => void) =>
    done(Object.assign(new Error('ENOSPC'), { code: 'ENOSPC' }))) as never);
  await expect(saveAtomically(path, 'new')).rejects.toThrow('"a.json" could not be saved: the disk is full');
  expect(readFileSync(path, 'utf8')).toBe('old');
  expect(readdirSync(folder)).toEqual(['a.json']);
});

test('when writing fails half-way, the old file is untouched', async ({ folder }) => {
  const path = join(folder, 'a.json');
  writeFileSync(path, 'old');
  vi.spyOn(fs, 'fsync').mockImplementation(((_handle: number, done: (error: Error) => void) =>
    done(Object.assign(new Error('EIO'), { code: 'EIO' }))) as never);
  await expect(saveAtomically(path, 'new')).rejects.toThrow('the disk reports an error');
  expect(readFileSync(path, 'utf8')).toBe('old');
  expect(readdirSync(folder)).toEqual(['a.json']);
});

test('a folder that does not exist is told by the file’s name', async ({ folder }) => {
  await expect(saveAtomically(join(folder, 'none', 'a.json'), 'x')).rejects.toThrow(
    '"a.json" could not be saved: it, or the folder it should be in, does not exist',
  );
});

test('two saves at once leave one of the two, whole', async ({ folder }) => {
  const path = join(folder, 'a.json');
  const texts = ['a'.repeat(200_000), 'b'.repeat(200_000)];
  await Promise.all(texts.map((text) => saveAtomically(path, text)));
  expect(texts).toContain(readFileSync(path, 'utf8'));
  expect(readdirSync(folder)).toEqual(['a.json']);
});

test('a link stays a link, and the file it names is written', async ({ folder }) => {
  mkdirSync(join(folder, 'real'));
  writeFileSync(join(folder, 'real', 'a.json'), 'old', { mode: 0o640 });
  symlinkSync(join(folder, 'real', 'a.json'), join(folder, 'link.json'));
  await saveAtomically(join(folder, 'link.json'), 'new');
  expect(readFileSync(join(folder, 'real', 'a.json'), 'utf8')).toBe('new');
  expect(fs.lstatSync(join(folder, 'link.json')).isSymbolicLink()).toBe(true);
  if (process.platform !== 'win32') expect(statSync(join(folder, 'real', 'a.json')).mode & 0o777).toBe(0o640);
});

test('a backup is the file as it stood, and none is made of nothing', async ({ folder }) => {
  const path = join(folder, 'a.json');
  await keepBackup(path);
  expect(readdirSync(folder)).toEqual([]);
  writeFileSync(path, 'old');
  await keepBackup(path);
  expect(readFileSync(`${path}.bak`, 'utf8')).toBe('old');
});
