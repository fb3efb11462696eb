import { execFileSync } from 'node:child_process';
import { mkdirSync, symlinkSync, truncateSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect } from 'vitest';
import { STUDY_LIMIT_BYTES, TABLE_LIMIT_BYTES } from '../../src/main/limits';
import { readStudyFile, readTableBeside, tablesNamedIn } from '../../src/main/studyFile';
import { test } from './folder';

const table = (file: unknown) => ({ step: 'table', dopant: 'boron', file });
const study = (...steps: unknown[]) => JSON.stringify({ format: 'ohmstrata-study/1', steps });

test('the tables of a study are named once each', () => {
  const text = study(
    table('a.csv'),
    { step: 'anneal', file: 'no.csv' },
    table('b.csv'),
    table('a.csv'),
    table(3),
  );
  expect(tablesNamedIn(text)).toEqual(['a.csv', 'b.csv']);
});

test.each(['', '{', 'null', '[]', '{"steps":3}', '{"steps":[null,1,"x",[]]}'])(
  'a text that is no study names no table: %s',
  (text) => {
    expect(tablesNamedIn(text)).toEqual([]);
  },
);

test('a study opens with the tables beside it', async ({ folder }) => {
  writeFileSync(join(folder, 's.json'), `\uFEFF${study(table('a.csv'))}`);
  writeFileSync(join(folder, 'a.csv'), '1,2\n');
  const opened = await readStudyFile(join(folder, 's.json'));
  expect(opened.text).toBe(study(table('a.csv')));
  expect(opened.tables['a.csv']).toEqual({ ok: true, value: Buffer.from('1,2\n') });
});

test('a table that cannot be read is told in its place, and the others still come', async ({ folder }) => {
  writeFileSync(join(folder, 'a.csv'), '1,2\n');
  writeFileSync(join(folder, 's.json'), study(table('none.csv'), table('a.csv'), table('../out.csv')));
  const { tables } = await readStudyFile(join(folder, 's.json'));
  expect(tables['a.csv'].ok).toBe(true);
  expect(tables['none.csv']).toEqual({
    ok: false,
    message: '"none.csv" could not be read: it, or the folder it should be in, does not exist.',
  });
  expect(tables['../out.csv']).toMatchObject({ ok: false, message: expect.stringContaining('own folder') });
});

test('a table named like a part of every object is a table like any other', async ({ folder }) => {
  writeFileSync(join(folder, '__proto__'), '1,2\n');
  writeFileSync(join(folder, 's.json'), study(table('__proto__')));
  const { tables } = await readStudyFile(join(folder, 's.json'));
  expect(Object.keys(tables)).toEqual(['__proto__']);
});

test.each(['../secret.csv', '/etc/hostname', 'sub/x.csv', '..', 'a\0b', 'C:\\x'])(
  'a study cannot name %j',
  async (name) => {
    await expect(readTableBeside('.', name, TABLE_LIMIT_BYTES)).rejects.toThrow('own folder');
  },
);

test('a link out of the folder is refused, and one within it is followed', async ({ folder }) => {
  const home = join(folder, 'home');
  mkdirSync(home);
  mkdirSync(join(folder, 'home-evil'));
  writeFileSync(join(folder, 'home-evil', 'secret.csv'), 'secret');
  writeFileSync(join(home, 'a.csv'), 'fine');
  symlinkSync(join(folder, 'home-evil', 'secret.csv'), join(home, 'out.csv'));
  symlinkSync(join(home, 'a.csv'), join(home, 'in.csv'));
  await expect(readTableBeside(home, 'out.csv', TABLE_LIMIT_BYTES)).rejects.toThrow('leads out');
  expect((await readTableBeside(home, 'in.csv', TABLE_LIMIT_BYTES)).toString()).toBe('fine');
});

test('a folder, a pipe and a table too large are refused', async ({ folder }) => {
  mkdirSync(join(folder, 'sub'));
  await expect(readTableBeside(folder, 'sub', TABLE_LIMIT_BYTES)).rejects.toThrow('not a file');
  writeFileSync(join(folder, 'big.csv'), '');
  truncateSync(join(folder, 'big.csv'), TABLE_LIMIT_BYTES + 1);
  await expect(readTableBeside(folder, 'big.csv', TABLE_LIMIT_BYTES)).rejects.toThrow(
    'it has 512 MB, and at most 512 MB are allowed',
  );
});

test.skipIf(process.platform === 'win32')(
  'a pipe is refused without waiting for a writer',
  async ({ folder }) => {
    execFileSync('mkfifo', [join(folder, 'pipe.csv')]);
    await expect(readTableBeside(folder, 'pipe.csv', TABLE_LIMIT_BYTES)).rejects.toThrow('not a file');
  },
);

test('all tables of a study together keep to the limit of one', async ({ folder }) => {
  const names = ['a.csv', 'b.csv'];
  writeFileSync(join(folder, 'a.csv'), 'x');
  writeFileSync(join(folder, 'b.csv'), '');
  truncateSync(join(folder, 'b.csv'), TABLE_LIMIT_BYTES);
  writeFileSync(join(folder, 's.json'), study(...names.map(table)));
  const { tables } = await readStudyFile(join(folder, 's.json'));
  expect([tables['a.csv'].ok, tables['b.csv'].ok]).toEqual([true, false]);
});

test('a study too large or not text is refused by name', async ({ folder }) => {
  const path = join(folder, 's.json');
  writeFileSync(path, Buffer.from([0x7b, 0xff, 0xfe, 0x00]));
  await expect(readStudyFile(path)).rejects.toThrow('"s.json" could not be read: it is not text in UTF-8');
  truncateSync(path, STUDY_LIMIT_BYTES + 2 ** 20);
  await expect(readStudyFile(path)).rejects.toThrow('it has 9.0 MB, and at most 8.0 MB are allowed');
});
