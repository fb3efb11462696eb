/** Everything the window can do by name: the command search, the keys and the menu all use this list. */

import type { MenuCommand } from '../../main/bridge';
import { DEMOS } from './demos';
import { exportColumns, exportReadings } from './exports';
import { importTable, newStudy, openDemo, openGiven, openStudy, save } from './files';
import { add } from './stepActions';
import { STEP_KINDS, STEP_ORDER } from './stepKinds';
import { redoEdit, redoName, undoEdit, undoName } from './studySession';
import {
  chooseTheme,
  chosenWindow,
  concentrationScale,
  depthUnit,
  panel,
  pictureFormat,
  VIEW_NAMES,
  type View,
  view,
} from './viewState';

export interface Command {
  readonly id: string;
  readonly name: string;
  /** As shown, with Ctrl standing for Cmd on a Mac. */
  readonly keys?: string;
  readonly isOff?: () => boolean;
  readonly run: () => unknown;
}

const picture = (format: 'svg' | 'png') => (): void => {
  pictureFormat.value = format;
  panel.value = 'picture';
};

/** What the desktop menu can send. */
export const MENU_COMMANDS: Record<MenuCommand, Command> = {
  newStudy: { id: 'newStudy', name: 'New study', keys: 'Ctrl+N', run: newStudy },
  open: { id: 'open', name: 'Open a study', keys: 'Ctrl+O', run: openStudy },
  openGiven: { id: 'openGiven', name: 'Open the study given at a later start', run: openGiven },
  save: { id: 'save', name: 'Save', keys: 'Ctrl+S', run: () => save() },
  saveAs: { id: 'saveAs', name: 'Save as', keys: 'Ctrl+Shift+S', run: () => save(true) },
  importTable: { id: 'importTable', name: 'Import a table', keys: 'Ctrl+I', run: importTable },
  exportReadings: {
    id: 'exportReadings',
    name: 'Export readings (CSV)',
    keys: 'Ctrl+E',
    run: exportReadings,
  },
  exportColumns: {
    id: 'exportColumns',
    name: 'Export columns against depth (CSV)',
    keys: 'Ctrl+Shift+E',
    run: exportColumns,
  },
  exportSvg: { id: 'exportSvg', name: 'Export tracks as SVG', run: picture('svg') },
  exportPng: { id: 'exportPng', name: 'Export tracks as PNG', run: picture('png') },
  undo: { id: 'undo', name: 'Undo', keys: 'Ctrl+Z', isOff: () => undoName.value === null, run: undoEdit },
  redo: { id: 'redo', name: 'Redo', keys: 'Ctrl+Y', isOff: () => redoName.value === null, run: redoEdit },
  commands: {
    id: 'commands',
    name: 'Find a command',
    keys: 'Ctrl+K',
    run: () => {
      panel.value = 'commands';
    },
  },
  about: {
    id: 'about',
    name: 'About Ohmstrata',
    run: () => {
      panel.value = 'about';
    },
  },
};

const VIEW_COMMANDS: readonly Command[] = [
  ...(Object.keys(VIEW_NAMES) as View[]).map((name) => ({
    id: `view-${name}`,
    name: `View: ${VIEW_NAMES[name].toLowerCase()}`,
    run: () => {
      view.value = name;
    },
  })),
  {
    id: 'table',
    name: 'Show the tracks as a table',
    run: () => {
      panel.value = 'table';
    },
  },
  {
    id: 'resetDepth',
    name: 'Reset the depth axis',
    run: () => {
      chosenWindow.value = null;
    },
  },
  {
    id: 'depthUnit',
    name: 'Depth in nm or µm',
    run: () => {
      depthUnit.value = depthUnit.value === 'um' ? 'nm' : 'um';
    },
  },
  {
    id: 'scale',
    name: 'Concentrations linear or logarithmic',
    run: () => {
      concentrationScale.value = concentrationScale.value === 'log' ? 'linear' : 'log';
    },
  },
  { id: 'themeSystem', name: 'Theme: as the system', run: () => chooseTheme('system') },
  { id: 'themeLight', name: 'Theme: light', run: () => chooseTheme('light') },
  { id: 'themeDark', name: 'Theme: dark', run: () => chooseTheme('dark') },
];

/** What the command search offers. */
export function allCommands(): Command[] {
  const { commands: _search, openGiven: _given, ...menu } = MENU_COMMANDS;
  return [
    ...Object.values(menu),
    ...STEP_ORDER.flatMap((kind): Command[] => {
      const { title, fresh } = STEP_KINDS[kind];
      return fresh
        ? [{ id: `add-${kind}`, name: `Add step: ${title.toLowerCase()}`, run: () => add(fresh) }]
        : [];
    }),
    ...VIEW_COMMANDS,
    ...DEMOS.map((demo) => ({
      id: `demo-${demo.fileName}`,
      name: `Open demo: ${demo.name}`,
      run: () => openDemo(demo.text),
    })),
  ];
}

const IS_MAC = /Mac/.test(navigator.userAgent);

/** The key combination of an event as the list writes it; empty without Ctrl or Cmd. */
function keysOf(event: KeyboardEvent): string {
  if (!(IS_MAC ? event.metaKey : event.ctrlKey) || event.altKey) return '';
  return `Ctrl+${event.shiftKey ? 'Shift+' : ''}${event.key.toUpperCase()}`;
}

/** Runs the command a key combination stands for. The desktop menu does not see keys that are taken here. */
export function runKeys(event: KeyboardEvent): void {
  const keys = keysOf(event) === 'Ctrl+Shift+Z' ? 'Ctrl+Y' : keysOf(event);
  const command = Object.values(MENU_COMMANDS).find((each) => each.keys && each.keys === keys);
  if (!command) return;
  event.preventDefault();
  if (!command.isOff?.()) command.run();
}
