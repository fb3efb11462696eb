/** How the speed measurements are built: as the command line is, so that they time what people run. */

import { defineConfig } from 'vite';
import { nodeBundle } from './vite.cli.config';

export default defineConfig(nodeBundle('bench/index.ts', 'out/bench', 'bench.mjs'));
