/** Two kinds of tests: `unit` needs Node alone, `desktop` drives the built program in a real window. */

import { defineConfig } from 'vitest/config';

export default defineConfig({
  test: {
    projects: [
      {
        oxc: { jsx: { runtime: 'automatic', importSource: 'preact' } },
        test: {
          name: 'unit',
          include: ['tests/**/*.test.{ts,tsx}'],
          exclude: ['tests/desktop/**'],
          environment: 'node',
        },
      },
      {
        test: {
          name: 'desktop',
          include: ['tests/desktop/**/*.test.ts'],
          environment: 'node',
          testTimeout: 60_000,
          hookTimeout: 90_000,
          // One window at a time: windows side by side would share two cores and steal each other's focus.
          fileParallelism: false,
        },
      },
    ],
  },
});
