/** How the command line is built: one self-contained file for Node, so that a start looks nothing up in node_modules. */

import { builtinModules } from 'node:module';
import { defineConfig, type UserConfig } from 'vite';

/** Bundled CommonJS asks for its own file name, which an ES module has only as an address. */
const BANNER = `#!/usr/bin/env node
import { fileURLToPath as pathOfUrl } from 'node:url';
const __filename = pathOfUrl(import.meta.url);`;

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
      output: { entryFileNames: fileName, banner: BANNER },
    },
  },
  ssr: { noExternal: true },
});

export default defineConfig(nodeBundle('src/cli/index.ts', 'out/cli', 'ohmstrata.mjs'));
