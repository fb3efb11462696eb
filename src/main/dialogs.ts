/** Every question the main process asks the person. */

import { existsSync } from 'node:fs';
import { extname, join } from 'node:path';
import { app, type BrowserWindow, dialog, type FileFilter } from 'electron';
import type { ExportKind } from './bridge';
import type { CloseAnswer } from './closing';
import type { ChangedAnswer } from './documents';
import { fileNameFrom } from './fileNames';

const STUDY: FileFilter = { name: 'Ohmstrata study', extensions: ['json'] };
const ANY: FileFilter = { name: 'All files', extensions: ['*'] };
const TABLE: FileFilter = { name: 'Table', extensions: ['csv', 'tsv', 'txt', 'dat', 'asc'] };
const EXPORTS: Record<ExportKind, FileFilter> = {
  csv: { name: 'Comma-separated table', extensions: ['csv'] },
  json: { name: 'JSON', extensions: ['json'] },
  svg: { name: 'SVG picture', extensions: ['svg'] },
  png: { name: 'PNG picture', extensions: ['png'] },
};

export class Dialogs {
  readonly #window: BrowserWindow;

  constructor(window: BrowserWindow) {
    this.#window = window;
  }

  chooseStudy(folder: string | undefined): Promise<string | null> {
    return this.#chooseFile('Open a study', [STUDY, ANY], folder);
  }

  chooseTable(folder: string | undefined): Promise<string | null> {
    return this.#chooseFile('Import a table', [TABLE, ANY], folder);
  }

  chooseStudyPlace(suggestedName: string, folder: string | undefined): Promise<string | null> {
    return this.#choosePlace('Save the study', suggestedName, STUDY, folder);
  }

  chooseExportPlace(
    suggestedName: string,
    kind: ExportKind,
    folder: string | undefined,
  ): Promise<string | null> {
    return this.#choosePlace('Export', suggestedName, EXPORTS[kind], folder);
  }

  async changedOnDisk(name: string): Promise<ChangedAnswer> {
    const answers: ChangedAnswer[] = ['saveAs', 'overwrite', 'cancel'];
    const chosen = await this.#ask(
      `"${name}" has been changed by another program since it was opened here.`,
      'Saving over it would lose those changes.',
      ['Save as another file', 'Overwrite it', 'Cancel'],
    );
    return answers[chosen];
  }

  async unsaved(name: string): Promise<CloseAnswer> {
    const answers: CloseAnswer[] = ['save', 'discard', 'cancel'];
    const chosen = await this.#ask(`"${name}" has unsaved changes.`, 'Closing without saving loses them.', [
      'Save',
      'Discard changes',
      'Cancel',
    ]);
    return answers[chosen];
  }

  /** Whether to load the page again after it has gone. */
  async pageGone(): Promise<boolean> {
    const chosen = await this.#ask(
      'The window’s page has stopped working.',
      'Unsaved work was kept and is offered again after reloading.',
      ['Reload', 'Close'],
    );
    return chosen === 0;
  }

  async #chooseFile(
    title: string,
    filters: FileFilter[],
    folder: string | undefined,
  ): Promise<string | null> {
    const defaultPath = folder ?? app.getPath('documents');
    const chosen = await dialog.showOpenDialog(this.#window, {
      title,
      filters,
      defaultPath,
      properties: ['openFile'],
    });
    return chosen.canceled ? null : (chosen.filePaths[0] ?? null);
  }

  async #choosePlace(
    title: string,
    suggestedName: string,
    filter: FileFilter,
    folder: string | undefined,
  ): Promise<string | null> {
    const ending = `.${filter.extensions[0]}`;
    const defaultPath = join(folder ?? app.getPath('documents'), fileNameFrom(suggestedName, ending));
    const chosen = await dialog.showSaveDialog(this.#window, {
      title,
      defaultPath,
      filters: [filter],
      properties: ['createDirectory', 'showOverwriteConfirmation'],
    });
    if (chosen.canceled || !chosen.filePath) return null;
    if (extname(chosen.filePath) !== '') return chosen.filePath;
    // Some systems leave the ending off, and then the dialog asked about overwriting another name than this one.
    const path = chosen.filePath + ending;
    return !existsSync(path) || (await this.#overwrite(path)) ? path : null;
  }

  async #overwrite(path: string): Promise<boolean> {
    return (await this.#ask(`"${path}" exists already.`, 'Overwrite it?', ['Overwrite', 'Cancel'])) === 0;
  }

  /** The number of the answer; the last one is also what Escape means. */
  async #ask(message: string, detail: string, buttons: string[]): Promise<number> {
    const { response } = await dialog.showMessageBox(this.#window, {
      type: 'question',
      message,
      detail,
      buttons,
      defaultId: 0,
      cancelId: buttons.length - 1,
      noLink: true,
    });
    return response;
  }
}
