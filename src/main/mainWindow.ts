/** The one window and what belongs to it: its title, menu, dialogs and the question before closing. */

import { join } from 'node:path';
import { app, BrowserWindow, Menu } from 'electron';
import type { MenuCommand } from './bridge';
import { MENU_COMMAND } from './channels';
import { Closing } from './closing';
import { Dialogs } from './dialogs';
import { menuTemplate, type UndoNames } from './menu';
import { PAGE_URL } from './ownPage';
import type { Recovery } from './recovery';
import { followTheme, groundColour } from './theme';
import { windowOptions } from './windowOptions';

export interface DocumentState extends UndoNames {
  name: string;
  unsaved: boolean;
}

export class MainWindow {
  readonly dialogs: Dialogs;
  readonly closing: Closing;
  readonly #window: BrowserWindow;
  #name = app.name;

  constructor(recovery: Recovery) {
    const window = new BrowserWindow(
      windowOptions(join(__dirname, '..', 'preload', 'preload.cjs'), groundColour()),
    );
    this.#window = window;
    this.dialogs = new Dialogs(window);
    this.closing = new Closing({
      ask: () => this.dialogs.unsaved(this.#name),
      requestSave: () => this.send('save'),
      discard: () => recovery.keep(this.#name, null),
      close: () => window.close(),
      now: () => performance.now(),
    });
    this.#showMenu({ undo: null, redo: null });
    followTheme(window);
    window.once('ready-to-show', () => window.show());
    window.on('page-title-updated', (event) => event.preventDefault());
    window.on('close', (event) => this.closing.onClose(event));
    window.webContents.on('render-process-gone', (_event, { reason }) => {
      if (reason !== 'clean-exit') void this.#offerReload();
    });
  }

  load(): Promise<void> {
    return this.#window.loadURL(PAGE_URL);
  }

  send(command: MenuCommand): void {
    this.#window.webContents.send(MENU_COMMAND, command);
  }

  showState(state: DocumentState): void {
    this.#name = state.name;
    this.#window.setTitle(`${state.unsaved ? '* ' : ''}${state.name} - ${app.name}`);
    this.#window.setDocumentEdited(state.unsaved);
    this.#showMenu(state);
    this.closing.noteState(state.unsaved);
  }

  comeToFront(): void {
    if (this.#window.isMinimized()) this.#window.restore();
    this.#window.show();
    this.#window.focus();
  }

  #showMenu(names: UndoNames): void {
    const template = menuTemplate((command) => this.send(command), names, process.platform === 'darwin');
    Menu.setApplicationMenu(Menu.buildFromTemplate(template));
  }

  async #offerReload(): Promise<void> {
    // Without its page the window holds nothing that could be saved; the recovery copy does.
    this.closing.noteState(false);
    if (await this.dialogs.pageGone()) await this.load();
    else this.#window.close();
  }
}
