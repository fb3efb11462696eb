import { existsSync, mkdirSync, readdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect } from 'vitest';
import { Recovery } from '../../src/main/recovery';
import { test } from './folder';

test('work of a session that ended without saving is offered to the next', async ({ folder }) => {
  await new Recovery(folder, 'first').keep('my study', 'work');
  const found = await new Recovery(folder, 'second').take();
  expect(found).toMatchObject({ name: 'my study', text: 'work' });
  expect(Math.abs(Date.now() - Date.parse(found?.savedAt ?? ''))).toBeLessThan(60_000);
});

test('nothing is offered when nothing was kept, or when it was saved or discarded', async ({ folder }) => {
  const first = new Recovery(join(folder, 'none'), 'first');
  expect(await first.take()).toBeNull();
  await first.keep('my study', 'work');
  await first.keep('my study', null);
  expect(await new Recovery(join(folder, 'none'), 'second').take()).toBeNull();
});

test('a page that reloads gets back its own session’s work', async ({ folder }) => {
  const session = new Recovery(folder, 'first');
  await session.keep('my study', 'work');
  expect((await session.take())?.text).toBe('work');
  expect(readdirSync(folder)).toEqual(['first.json']);
});

test('taken work stays on disk until the new session keeps its own', async ({ folder }) => {
  await new Recovery(folder, 'first').keep('my study', 'work');
  const second = new Recovery(folder, 'second');
  await second.take();
  expect(readdirSync(folder)).toEqual(['first.json']);
  await second.keep('my study', 'work and more');
  expect(readdirSync(folder)).toEqual(['second.json']);
});

test('taken work is dropped when the new session discards it', async ({ folder }) => {
  await new Recovery(folder, 'first').keep('my study', 'work');
  const second = new Recovery(folder, 'second');
  await second.take();
  await second.keep('my study', null);
  expect(readdirSync(folder)).toEqual([]);
});

test('a session that saves without having taken anything leaves the copies of others alone', async ({
  folder,
}) => {
  await new Recovery(folder, 'first').keep('my study', 'work');
  await new Recovery(folder, 'second').keep('other', null);
  expect(readdirSync(folder)).toEqual(['first.json']);
});

test('of several the latest is offered first', async ({ folder }) => {
  for (const [name, savedAt] of [
    ['a', '2024-01-02T00:00:00.000Z'],
    ['b', '2024-01-03T00:00:00.000Z'],
    ['c', '2024-01-01T00:00:00.000Z'],
  ])
    writeFileSync(join(folder, `${name}.json`), JSON.stringify({ name, text: 'work', savedAt, taken: 0 }));
  expect((await new Recovery(folder, 'now').take())?.name).toBe('b');
});

test('a copy whose recovery failed twice is offered no more, and is kept', async ({ folder }) => {
  await new Recovery(folder, 'first').keep('my study', 'work');
  expect(await new Recovery(folder, 'second').take()).not.toBeNull();
  expect(await new Recovery(folder, 'third').take()).not.toBeNull();
  expect(await new Recovery(folder, 'fourth').take()).toBeNull();
  expect(existsSync(join(folder, 'first.json'))).toBe(true);
});

test('damaged copies are passed over', async ({ folder }) => {
  mkdirSync(join(folder, 'folder.json'));
  writeFileSync(join(folder, 'cut.json'), '{"name":"a","te');
  writeFileSync(join(folder, 'other.json'), '{"name":3}');
  writeFileSync(join(folder, 'note.txt'), 'x');
  await new Recovery(folder, 'good').keep('my study', 'work');
  expect((await new Recovery(folder, 'now').take())?.text).toBe('work');
});

test('a copy dropped while an earlier one is still being written stays dropped', async ({ folder }) => {
  const session = new Recovery(folder, 'first');
  await Promise.all([
    session.keep('a', 'x'.repeat(1_000_000)),
    session.keep('a', 'y'),
    session.keep('a', null),
  ]);
  expect(readdirSync(folder)).toEqual([]);
});
