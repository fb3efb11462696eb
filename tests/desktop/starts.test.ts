/** How the program begins and ends: a study given to a start, a second start, a crash, the question before closing. */

import { spawn } from 'node:child_process';
import { existsSync, mkdtempSync, readdirSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, afterEach, beforeAll, expect, test } from 'vitest';
import { commandLine, type Desktop, type LaunchOptions, launch } from './launch';
import { Person } from './person';

const STUDY = JSON.stringify({
  format: 'ohmstrata-study/1',
  name: 'given',
  wafer: { dopant: 'boron', concentration_cm3: 1e16 },
});
let userData: string;
let desktop: Desktop | undefined;

beforeAll(() => {
  userData = mkdtempSync(join(tmpdir(), 'ohmstrata-starts-'));
});
afterEach(async () => {
  await desktop?.end();
  rmSync(join(userData, 'recovery'), { recursive: true, force: true });
});
afterAll(() => rmSync(userData, { recursive: true, force: true }));

async function start(options: LaunchOptions = {}): Promise<Desktop> {
  desktop = await launch({ userData, ...options });
  return desktop;
}

const exitOf = (running: Desktop) =>
  new Promise<number | null>((done) => {
    const { exitCode } = running.program;
    if (exitCode === null) running.program.once('exit', done);
    else done(exitCode);
  });

test('a second start hands its study to the first and ends', async () => {
  const running = await start();
  const study = join(running.folder, 'given.json');
  writeFileSync(study, STUDY);
  const heard = running.page.evaluate(
    () =>
      new Promise((done) => {
        window.ohmstrata!.onMenuCommand(done);
      }),
  );
  await running.page.waitForTimeout(100);
  const { executablePath, args, cwd, env } = commandLine(userData, ['given.json']);
  const second = spawn(
    executablePath,
    args.map((word) => (word === 'given.json' ? study : word)),
    {
      cwd,
      env,
      stdio: 'ignore',
    },
  );
  expect(await new Promise((done) => second.once('exit', done))).toBe(0);
  expect(await heard).toBe('openGiven');
});

test('an error in the main process ends a test run at once instead of waiting for an answer', async () => {
  const running = await start();
  const ended = exitOf(running);
  await running.app.evaluate(() => {
    setTimeout(() => {
      throw new Error('thrown on purpose by a test');
    }, 50);
  });
  expect(await ended).toBe(1);
});

test('unsaved work outlives a program that is killed', async () => {
  const first = await start();
  await first.page.evaluate(() => window.ohmstrata!.keepRecovery({ name: 'my study', text: '{"work":1}' }));
  expect(readdirSync(join(userData, 'recovery'))).toHaveLength(1);
  const killed = exitOf(first);
  first.program.kill('SIGKILL');
  await killed;
  expect(readdirSync(join(userData, 'recovery'))).toHaveLength(1);
});

test('closing with unsaved work asks, and Cancel keeps the window', async () => {
  const running = await start();
  await running.answerQuestion(2);
  await running.page.evaluate(() =>
    window.ohmstrata!.showDocumentState({ name: 'my study', unsaved: true, undo: null, redo: null }),
  );
  await running.closeWindow();
  await expect.poll(() => running.questions()).toEqual(['"my study" has unsaved changes.']);
  expect(await running.app.evaluate(({ BrowserWindow }) => BrowserWindow.getAllWindows().length)).toBe(1);
});

test('closing with unsaved work and Discard drops the recovery copy and ends', async () => {
  const running = await start();
  await running.answerQuestion(1);
  await running.page.evaluate(async () => {
    await window.ohmstrata!.keepRecovery({ name: 'my study', text: '{"work":1}' });
    await window.ohmstrata!.showDocumentState({ name: 'my study', unsaved: true, undo: null, redo: null });
  });
  const ended = exitOf(running);
  await running.closeWindow();
  expect(await ended).toBe(0);
  expect(existsSync(join(userData, 'recovery')) ? readdirSync(join(userData, 'recovery')) : []).toEqual([]);
});

test('a page that has crashed can be loaded again', async () => {
  const running = await start();
  await new Person(running).settled();
  await running.answerQuestion(0);
  await running.app.evaluate(({ BrowserWindow }) => {
    const { webContents } = BrowserWindow.getAllWindows()[0];
    webContents.once('did-finish-load', () => {
      (globalThis as { loadedAgain?: string }).loadedAgain = webContents.getURL();
    });
    // After this call has been answered, so that the test never waits across the crash.
    setTimeout(() => webContents.forcefullyCrashRenderer(), 0);
  });
  await expect
    .poll(() => running.app.evaluate(() => (globalThis as { loadedAgain?: string }).loadedAgain), {
      timeout: 20_000,
    })
    .toBe('app://bundle/index.html');
  expect(await running.questions()).toHaveLength(1);
});
