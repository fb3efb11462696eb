/** How the desktop program is built: main process and preload as CommonJS, the window as ES modules with a worker. */

import { resolve } from 'node:path';
import { defineConfig } from 'electron-vite';

// The oldest runtime the program runs under is Electron 25. Left alone, the targets would follow the installed Electron.
const NODE_TARGET = 'node18.15';
const CHROME_TARGET = 'chrome114';

export default defineConfig({
  main: {
    build: {
      target: NODE_TARGET,
      outDir: 'out/main',
      externalizeDeps: false,
      lib: { entry: resolve('src/main/index.ts'), formats: ['cjs'] },
      rolldownOptions: { output: { entryFileNames: 'index.cjs', chunkFileNames: '[name]-[hash].cjs' } },
    },
  },
  preload: {
    build: {
      target: NODE_TARGET,
      outDir: 'out/preload',
      externalizeDeps: false,
      lib: { entry: resolve('src/main/preload.ts'), formats: ['cjs'] },
      rolldownOptions: { output: { entryFileNames: 'preload.cjs' } },
    },
  },
  renderer: {
    root: 'src/renderer',
    oxc: { jsx: { runtime: 'automatic', importSource: 'preact' } },
    build: {
      target: CHROME_TARGET,
      outDir: 'out/renderer',
      minify: true,
      rolldownOptions: { input: resolve('src/renderer/index.html') },
    },
    worker: { format: 'es' },
  },
});
