/** What each request of the window does. */

import { basename } from 'node:path';
import { saveAtomically } from './atomicSave';
import type { Handlers } from './channels';
import type { Documents } from './documents';
import { TABLE_LIMIT_BYTES } from './limits';
import type { MainWindow } from './mainWindow';
import { readWhole } from './readFile';
import type { Recovery } from './recovery';
import { runtimeFacts } from './runtimeFacts';
import { chooseTheme } from './theme';

/** Hands over the study given to a start, once each; null when there is none. */
export type TakeGiven = () => string | null;

export function handlersFor(
  window: MainWindow,
  documents: Documents,
  recovery: Recovery,
  takeGiven: TakeGiven,
): Handlers {
  const { dialogs, closing } = window;
  return {
    async openStudy() {
      const path = await dialogs.chooseStudy(documents.folder);
      return path === null ? null : documents.open(path);
    },

    async initialStudy() {
      const path = takeGiven();
      return path === null ? null : documents.open(path);
    },

    async saveStudy(request) {
      closing.noteSaveStart();
      let done = false;
      try {
        const saved = await documents.save(request, {
          choosePlace: (suggestedName) => dialogs.chooseStudyPlace(suggestedName, documents.folder),
          changedOnDisk: (name) => dialogs.changedOnDisk(name),
        });
        done = saved !== null;
        return saved;
      } finally {
        closing.noteSave(done);
      }
    },

    async openTable() {
      const path = await dialogs.chooseTable(documents.folder);
      return path === null ? null : { name: basename(path), bytes: await readWhole(path, TABLE_LIMIT_BYTES) };
    },

    async exportFile({ kind, suggestedName, data }) {
      const path = await dialogs.chooseExportPlace(suggestedName, kind, documents.folder);
      if (path === null) return null;
      await saveAtomically(path, data);
      return basename(path);
    },

    async showDocumentState(state) {
      window.showState(state);
      return null;
    },

    async keepRecovery({ name, text }) {
      await recovery.keep(name, text);
      return null;
    },

    takeRecovery: () => recovery.take(),

    async setTheme(theme) {
      await chooseTheme(theme);
      return null;
    },

    runtimeFacts: async () => runtimeFacts(),
  };
}
