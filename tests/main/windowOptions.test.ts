import { expect, test } from 'vitest';
import { windowOptions } from '../../src/main/windowOptions';
import { filesIn, read } from '../house/files';

test('every setting that guards the page is written out at its strictest', () => {
  expect(windowOptions('/x/preload.cjs', '#000000').webPreferences).toEqual({
    preload: '/x/preload.cjs',
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
  });
});

test('the window waits for its first picture, on the ground of the theme', () => {
  const options = windowOptions('/x/preload.cjs', '#14171b');
  expect(options).toMatchObject({ show: false, backgroundColor: '#14171b', minWidth: 960, minHeight: 600 });
});

test('no file of the main process weakens a guard', () => {
  const weak =
    /allowRunningInsecureContent|experimentalFeatures|enableBlinkFeatures|openExternal|sendSync|webSecurity: false/;
  const files = filesIn('src/main', /\.ts$/);
  expect(files.length).toBeGreaterThan(20);
  expect(files.filter((path) => weak.test(read(path)))).toEqual([]);
});
