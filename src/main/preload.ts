/** Puts the bridge, and nothing else, into the window: one function for each request, the event kept on this side. */

import { contextBridge, ipcRenderer } from 'electron';
import type { Bridge, MenuCommand } from './bridge';
import { type Channel, MENU_COMMAND } from './channels';

const ask =
  <C extends Channel>(channel: C) =>
  (...request: Parameters<Bridge[C]>) =>
    ipcRenderer.invoke(channel, ...request) as ReturnType<Bridge[C]>;

const bridge: Bridge = {
  openStudy: ask('openStudy'),
  initialStudy: ask('initialStudy'),
  saveStudy: ask('saveStudy'),
  openTable: ask('openTable'),
  exportFile: ask('exportFile'),
  showDocumentState: ask('showDocumentState'),
  keepRecovery: ask('keepRecovery'),
  takeRecovery: ask('takeRecovery'),
  setTheme: ask('setTheme'),
  runtimeFacts: ask('runtimeFacts'),
  onMenuCommand(listener) {
    const hear = (_event: unknown, command: MenuCommand) => listener(command);
    ipcRenderer.on(MENU_COMMAND, hear);
    return () => ipcRenderer.off(MENU_COMMAND, hear);
  },
};

contextBridge.exposeInMainWorld('ohmstrata', bridge);
