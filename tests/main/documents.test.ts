import { existsSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect, vi } from 'vitest';
import { type ChangedAnswer, Documents, type SaveQuestions } from '../../src/main/documents';
import { test } from './folder';

const STUDY = '{"format":"ohmstrata-study/1"}';
const EDITED = '{"format":"ohmstrata-study/1","name":"edited"}';

/** Dialogs that answer as told; asked unexpectedly, they cancel. */
const answering = (place: string | null = null, changed: ChangedAnswer = 'cancel') => ({
  choosePlace: vi.fn<SaveQuestions['choosePlace']>().mockResolvedValue(place),
  changedOnDisk: vi.fn<SaveQuestions['changedOnDisk']>().mockResolvedValue(changed),
});
const request = (id: string | null, text = EDITED, as = false) => ({
  id,
  suggestedName: 'my study',
  text,
  as,
});

async function opened(folder: string) {
  const path = join(folder, 's.json');
  writeFileSync(path, STUDY);
  const documents = new Documents();
  return { path, documents, document: await documents.open(path) };
}

test('an opened study is known by an id that tells nothing of its place', async ({ folder }) => {
  const { document } = await opened(folder);
  expect(document).toMatchObject({ name: 's.json', text: STUDY });
  expect(document.id).toMatch(/^[0-9a-f-]{36}$/);
  expect(JSON.stringify(document)).not.toContain(folder);
});

test('saving writes the study’s own file without asking, and keeps what was there before', async ({
  folder,
}) => {
  const { path, documents, document } = await opened(folder);
  const ask = answering();
  expect(await documents.save(request(document.id), ask)).toEqual({ id: document.id, name: 's.json' });
  expect(readFileSync(path, 'utf8')).toBe(EDITED);
  expect(readFileSync(`${path}.bak`, 'utf8')).toBe(STUDY);
  expect(ask.choosePlace).not.toHaveBeenCalled();
});

test('the backup is of the session’s beginning, not of the last save', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  await documents.save(request(document.id, EDITED), answering());
  await documents.save(request(document.id, `${EDITED} `), answering());
  expect(readFileSync(`${path}.bak`, 'utf8')).toBe(STUDY);
});

test('a study never saved is asked a place, and from then on has it', async ({ folder }) => {
  const documents = new Documents();
  const path = join(folder, 'new.json');
  const saved = await documents.save(request(null), answering(path));
  expect(saved?.name).toBe('new.json');
  expect(existsSync(`${path}.bak`)).toBe(false);
  const ask = answering();
  await documents.save(request(saved?.id ?? null, STUDY), ask);
  expect(readFileSync(path, 'utf8')).toBe(STUDY);
  expect(ask.choosePlace).not.toHaveBeenCalled();
  expect(documents.folder).toBe(folder);
});

test('an id of no document is asked a place rather than trusted', async ({ folder }) => {
  const ask = answering();
  const id = '00000000-0000-4000-8000-000000000000';
  expect(await new Documents().save(request(id), ask)).toBeNull();
  expect(ask.choosePlace).toHaveBeenCalledWith('my study');
  expect(existsSync(join(folder, 'my study.json'))).toBe(false);
});

test('Save as asks for a place and leaves the first file alone', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  const other = join(folder, 'other.json');
  const saved = await documents.save(request(document.id, EDITED, true), answering(other));
  expect(saved?.id).not.toBe(document.id);
  expect(readFileSync(other, 'utf8')).toBe(EDITED);
  expect(readFileSync(path, 'utf8')).toBe(STUDY);
});

test('cancelling the place saves nothing', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  expect(await documents.save(request(document.id, EDITED, true), answering(null))).toBeNull();
  expect(readFileSync(path, 'utf8')).toBe(STUDY);
});

test.for([
  ['cancel', 'changed elsewhere'],
  ['overwrite', EDITED],
] as const)('a file changed by another program is asked about: %s', async ([answer, content], { folder }) => {
  const { path, documents, document } = await opened(folder);
  writeFileSync(path, 'changed elsewhere');
  const ask = answering(null, answer);
  await documents.save(request(document.id), ask);
  expect(ask.changedOnDisk).toHaveBeenCalledWith('s.json');
  expect(readFileSync(path, 'utf8')).toBe(content);
});

test('a file changed by another program can be left and the study saved elsewhere', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  writeFileSync(path, 'changed elsewhere');
  const other = join(folder, 'other.json');
  await documents.save(request(document.id), answering(other, 'saveAs'));
  expect(readFileSync(path, 'utf8')).toBe('changed elsewhere');
  expect(readFileSync(other, 'utf8')).toBe(EDITED);
});

test('a file that has gone is written again without a question', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  rmSync(path);
  const ask = answering();
  await documents.save(request(document.id), ask);
  expect(ask.changedOnDisk).not.toHaveBeenCalled();
  expect(readFileSync(path, 'utf8')).toBe(EDITED);
});

test('a study too large to be opened again is not saved', async ({ folder }) => {
  const { path, documents, document } = await opened(folder);
  // Two bytes a character: under the limit in characters, above it in bytes.
  const huge = 'é'.repeat(5 * 2 ** 20);
  await expect(documents.save(request(document.id, huge), answering())).rejects.toThrow('more than 8 MB');
  expect(readFileSync(path, 'utf8')).toBe(STUDY);
});
