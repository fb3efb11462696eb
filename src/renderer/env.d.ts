/** What the window finds in its surroundings: the build's imports and the bridge of the preload script. */

/// <reference types="vite/client" />

import type { Bridge } from '../main/bridge';

declare global {
  interface Window {
    /** Absent in a plain browser. */
    readonly ohmstrata?: Bridge;
  }
}
