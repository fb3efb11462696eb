/** The desktop program: takes the lock of a single instance, sets up every guard, opens the window. */

import { randomUUID } from 'node:crypto';
import { join } from 'node:path';
import { app, ipcMain, protocol, session } from 'electron';
import { declareScheme, serveBundle } from './bundleProtocol';
import { handleCrashes } from './crash';
import { Documents } from './documents';
import { givenStudy } from './givenStudy';
import { handlersFor } from './handlers';
import { answerRequests } from './ipc';
import { MainWindow } from './mainWindow';
import { guardNavigation } from './navigation';
import { guardPermissions } from './permissions';
import { Recovery } from './recovery';
import { useRememberedTheme } from './theme';

let given = givenStudy(process.argv, process.defaultApp === true, process.cwd());

function takeGiven(): string | null {
  const path = given;
  given = null;
  return path;
}

/** A later start hands its study, if any, to this one and ends. */
function welcomeLaterStarts(window: MainWindow): void {
  app.on('second-instance', (_event, _argv, _folder, later) => {
    window.comeToFront();
    const study = (later as { study?: unknown } | null)?.study;
    if (typeof study !== 'string') return;
    given = study;
    window.send('openGiven');
  });
}

async function onReady(): Promise<void> {
  useRememberedTheme();
  serveBundle(protocol);
  guardPermissions(session.defaultSession);
  const recovery = new Recovery(join(app.getPath('userData'), 'recovery'), randomUUID());
  const window = new MainWindow(recovery);
  answerRequests(ipcMain, handlersFor(window, new Documents(), recovery, takeGiven));
  welcomeLaterStarts(window);
  await window.load();
}

handleCrashes();
if (app.requestSingleInstanceLock({ study: given })) {
  declareScheme(protocol);
  guardNavigation(app);
  app.on('window-all-closed', () => app.quit());
  void app.whenReady().then(onReady);
} else app.quit();
