/**
 * Starts the built program for the tests of the window: one start a test file, each with its own data folder.
 *
 * `npm test` builds the program and names the runtime in OHMSTRATA_ELECTRON.
 */

import type { ChildProcess } from 'node:child_process';
import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { _electron, type ElectronApplication, type Page } from 'playwright-core';
import type { MenuCommand } from '../../src/main/bridge';

const PROGRAM = resolve('.');
const SCREENSHOTS = join(PROGRAM, 'out', 'screenshots');

export interface LaunchOptions {
  /** Words after the program's name: a study to open. */
  args?: string[];
  /** A data folder to use in place of a new one; it stays when the program has ended. */
  userData?: string;
}

export class Desktop {
  readonly app: ElectronApplication;
  /** Held from the start: once the program has ended, its connection no longer tells. */
  readonly program: ChildProcess;
  readonly page: Page;
  /** For files of the test; goes when the program is closed. */
  readonly folder: string;
  /** Every error the page has logged or thrown so far. */
  readonly errors: string[] = [];
  /** Every address the page has asked for so far. */
  readonly requests: string[] = [];

  constructor(app: ElectronApplication, page: Page, folder: string) {
    this.app = app;
    this.program = app.process();
    this.page = page;
    this.folder = folder;
    page.on('pageerror', (error) => this.errors.push(error.message));
    page.on('console', (message) => {
      if (message.type() === 'error') this.errors.push(message.text());
    });
    page.on('request', (request) => this.requests.push(request.url()));
  }

  /** Picks a command of the menu as its key or a click would. */
  async menu(command: MenuCommand): Promise<void> {
    await this.app.evaluate(({ Menu }, id) => {
      const item = Menu.getApplicationMenu()?.getMenuItemById(id);
      if (!item) throw new Error(`the menu has no ${id}`);
      item.click();
    }, command);
  }

  /** Answers every coming Open dialog with a file, or cancels it. */
  async answerOpen(path: string | null): Promise<void> {
    await this.app.evaluate(({ dialog }, file) => {
      dialog.showOpenDialog = async () => ({
        canceled: file === null,
        filePaths: file === null ? [] : [file],
      });
    }, path);
  }

  /** Answers every coming Save dialog with a place, or cancels it. */
  async answerSave(path: string | null): Promise<void> {
    await this.app.evaluate(({ dialog }, file) => {
      dialog.showSaveDialog = async () => ({ canceled: file === null, filePath: file ?? '' });
    }, path);
  }

  /** Answers every coming question with its button of that number; `questions` gives what was asked. */
  async answerQuestion(button: number): Promise<void> {
    await this.app.evaluate(({ dialog }, response) => {
      const asked: string[] = [];
      (globalThis as { asked?: string[] }).asked = asked;
      dialog.showMessageBox = (async (...args: unknown[]) => {
        asked.push((args.at(-1) as { message: string }).message);
        return { response, checkboxChecked: false };
      }) as typeof dialog.showMessageBox;
    }, button);
  }

  questions(): Promise<string[]> {
    return this.app.evaluate(() => (globalThis as { asked?: string[] }).asked ?? []);
  }

  /** Writes what the window shows to out/screenshots, for people to look at; gives the picture's bytes. */
  async screenshot(name: string): Promise<Buffer> {
    mkdirSync(SCREENSHOTS, { recursive: true });
    return this.page.screenshot({ path: join(SCREENSHOTS, `${name}.png`) });
  }

  /** Asks the window to close, as its close button does. */
  async closeWindow(): Promise<void> {
    await this.app.evaluate(({ BrowserWindow }) => BrowserWindow.getAllWindows()[0].close());
  }

  /** Ends the program without the question about unsaved work. */
  async end(): Promise<void> {
    const { program } = this;
    const hasEnded = new Promise((done) => program.once('exit', done));
    if (program.exitCode === null && program.signalCode === null) {
      await this.app.evaluate(({ app }) => app.exit(0)).catch(() => undefined);
      await hasEnded;
    }
    rmSync(this.folder, { recursive: true, force: true });
  }
}

/** What `_electron.launch` and `spawn` need to run the program with a data folder. */
export function commandLine(userData: string, args: string[] = []) {
  const executable = process.env.OHMSTRATA_ELECTRON;
  if (!executable)
    throw new Error('OHMSTRATA_ELECTRON is not set: run the tests of the window through npm test');
  const flags = (process.env.OHMSTRATA_ELECTRON_FLAGS ?? '').split(' ').filter(Boolean);
  return {
    executablePath: executable,
    args: [...flags, PROGRAM, `--user-data-dir=${userData}`, ...args],
    cwd: PROGRAM,
    env: { ...process.env, OHMSTRATA_TEST: '1' } as Record<string, string>,
  };
}

/** Starts the program and waits until its page shows something. */
export async function launch({ args, userData }: LaunchOptions = {}): Promise<Desktop> {
  const folder = mkdtempSync(join(tmpdir(), 'ohmstrata-desktop-'));
  const app = await _electron.launch({
    ...commandLine(userData ?? join(folder, 'user-data'), args),
    // Without a scheme of Playwright's own, so that the page sees the program's theme.
    colorScheme: null,
  });
  const desktop = new Desktop(app, await app.firstWindow(), folder);
  await desktop.page.waitForFunction(() => document.body.textContent?.trim() !== '');
  // Without a window manager the page has the keyboard, which copying to the clipboard needs, only once it is clicked.
  await desktop.page.mouse.click(1, 1);
  return desktop;
}
