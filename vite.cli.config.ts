/** How the command line is built: one self-contained file for Node, so that a start looks nothing up in node_modules. */

import { builtinModules } from 'node:module';
import { defineConfig, type UserConfig } from 'vite';

/** A bundle of `entry` that plain Node runs as `outDir/fileName`. */
export const nodeBundle = (entry: string, outDir: string, fileName: string): UserConfig => ({
  publicDir: false,
  build: {
    ssr: entry,
    outDir,
    emptyOutDir: true,
    target: 'node20',
    minify: false,
    rolldownOptions: {
      external: [...builtinModules, /^node:/],
      output: { entryFileNames: fileName, banner: '#!/usr/bin/env node' },
    },
  },
  ssr: { noExternal: true },
});

export default defineConfig(nodeBundle('src/cli/index.ts', 'out/cli', 'ohmstrata.mjs'));
