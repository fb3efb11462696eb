/** The bar over everything: what is open, undo and redo, files, theme and the command search. */

import type { ThemeChoice } from '../../main/bridge';
import { MENU_COMMANDS } from '../state/commands';
import { DEMOS } from '../state/demos';
import { openDemo } from '../state/files';
import { place, redoName, undoName, unsaved } from '../state/studySession';
import { chooseTheme, panel, themeChoice, VIEW_NAMES, type View, view } from '../state/viewState';
import { Icon } from './Icon';
import { IconButton } from './IconButton';
import { Menu, type MenuItem } from './Menu';
import { TextField } from './TextField';

const item = (id: keyof typeof MENU_COMMANDS): MenuItem => {
  const { name, keys, run } = MENU_COMMANDS[id];
  return { name, keys, run };
};

const THEMES: readonly { choice: ThemeChoice; name: string }[] = [
  { choice: 'system', name: 'As the system' },
  { choice: 'light', name: 'Light' },
  { choice: 'dark', name: 'Dark' },
];

export function TopBar() {
  return (
    <header class="top-bar">
      <span class="mark">
        <svg viewBox="0 0 24 24" width="22" height="22" aria-hidden="true">
          <path class="mark-layers" d="M2 7h20M2 12h20M2 17h20" />
          <path class="mark-curve" d="M3 5c4 0 5 14 9 14s5-14 9-14" />
        </svg>
      </span>
      <h1 class="visually-hidden">Ohmstrata</h1>
      <div class="study-name">
        <TextField path="name" label="Study name" undoName="study name" class="bare-field" />
        <span class={`unsaved ${unsaved.value ? '' : 'unsaved-no'}`}>
          {unsaved.value ? 'unsaved' : place.value.fileName ? 'saved' : ''}
        </span>
      </div>
      <div class="bar-group">
        <IconButton
          icon="undo"
          name={undoName.value ? `Undo ${undoName.value} (Ctrl+Z)` : 'Nothing to undo'}
          disabled={undoName.value === null}
          onClick={MENU_COMMANDS.undo.run}
        />
        <IconButton
          icon="redo"
          name={redoName.value ? `Redo ${redoName.value} (Ctrl+Y)` : 'Nothing to redo'}
          disabled={redoName.value === null}
          onClick={MENU_COMMANDS.redo.run}
        />
      </div>
      <div class="bar-group">
        <Menu label="Study" items={[item('newStudy'), item('open'), item('save'), item('saveAs')]} />
        <button type="button" class="button" onClick={MENU_COMMANDS.importTable.run}>
          Import
        </button>
        <Menu
          label="Export"
          items={[item('exportReadings'), item('exportColumns'), item('exportSvg'), item('exportPng')]}
        />
        <Menu
          label="Demos"
          items={DEMOS.map((demo) => ({ name: demo.name, note: demo.note, run: () => openDemo(demo.text) }))}
        />
      </div>
      <Views />
      <div class="bar-space" />
      <button
        type="button"
        class="button search-button"
        onClick={() => {
          panel.value = 'commands';
        }}
      >
        <Icon name="search" />
        <span>Find a command</span>
        <kbd>Ctrl+K</kbd>
      </button>
      <Menu
        label="Theme"
        align="end"
        items={[
          ...THEMES.map(({ choice, name }) => ({
            name,
            checked: themeChoice.value === choice,
            run: () => chooseTheme(choice),
          })),
        ]}
      />
    </header>
  );
}

/** What the middle shows; the recipe and the readings stay beside it. */
function Views() {
  return (
    <fieldset class="toggle views" aria-label="View">
      {(Object.keys(VIEW_NAMES) as View[]).map((name) => (
        <button
          key={name}
          type="button"
          aria-pressed={view.value === name}
          onClick={() => {
            view.value = name;
          }}
        >
          {VIEW_NAMES[name]}
        </button>
      ))}
    </fieldset>
  );
}
