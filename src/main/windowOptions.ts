/** How the window is made: size, ground colour and the closed set of what its page may do. */

import type { BrowserWindowConstructorOptions } from 'electron';

export function windowOptions(preload: string, backgroundColor: string): BrowserWindowConstructorOptions {
  return {
    width: 1280,
    height: 800,
    minWidth: 960,
    minHeight: 600,
    show: false,
    backgroundColor,
    webPreferences: {
      preload,
      contextIsolation: true,
      sandbox: true,
      nodeIntegration: false,
      nodeIntegrationInWorker: false,
      nodeIntegrationInSubFrames: false,
      webviewTag: false,
      webSecurity: true,
      navigateOnDragDrop: false,
      spellcheck: false,
      safeDialogs: true,
      devTools: false,
    },
  };
}
