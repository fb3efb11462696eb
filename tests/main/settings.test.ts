import { writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { expect } from 'vitest';
import { readSettings, writeSettings } from '../../src/main/settings';
import { test } from './folder';

test('the theme is remembered', async ({ folder }) => {
  await writeSettings(folder, { theme: 'dark' });
  expect(readSettings(folder)).toEqual({ theme: 'dark' });
});

test.for(['', '{', '{"theme":"pink"}', 'null'])('damaged settings count as none: %s', (text, { folder }) => {
  writeFileSync(join(folder, 'settings.json'), text);
  expect(readSettings(folder)).toEqual({ theme: 'system' });
});

test('without settings the system decides', ({ folder }) => {
  expect(readSettings(folder)).toEqual({ theme: 'system' });
});
