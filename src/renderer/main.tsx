/** Where the window begins: theme and shell first, then the study, its solution, and the plotting library last. */

import '@fontsource-variable/source-sans-3';
import './style/index.css';
import { effect } from '@preact/signals';
import { render } from 'preact';
import { App } from './components/App';
import { bridge } from './state/bridge';
import { MENU_COMMANDS, runKeys } from './state/commands';
import { DEMOS } from './state/demos';
import { openDemo, openGiven } from './state/files';
import { keepWork, lookForLeftBehind } from './state/recovery';
import { followStudy } from './state/solver';
import { redoName, study, undoName, unsaved } from './state/studySession';
import { followSweeps } from './state/sweeps';
import { followTheme } from './state/viewState';

followTheme();
await openDemo(DEMOS[0].text);
followStudy();
followSweeps();
render(<App />, document.getElementById('app') as HTMLElement);

document.addEventListener('keydown', runKeys);
bridge.onMenuCommand((command) => void MENU_COMMANDS[command].run());
effect(() => {
  void bridge.showDocumentState({
    name: study.value.name,
    unsaved: unsaved.value,
    undo: undoName.value,
    redo: redoName.value,
  });
});

await openGiven();
await lookForLeftBehind();
keepWork();
