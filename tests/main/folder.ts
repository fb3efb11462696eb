/** A folder of its own for each test that writes files. */

import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { test as base } from 'vitest';

export const test = base.extend<{ folder: string }>({
  // biome-ignore lint/correctness/noEmptyPattern: Vitest reads from the pattern which other fixtures this one needs.
  folder: async ({}, use) => {
    const folder = mkdtempSync(join(tmpdir(), 'ohmstrata-test-'));
    await use(folder);
    rmSync(folder, { recursive: true, force: true });
  },
});
