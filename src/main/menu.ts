/** The program's menu: every action with its key. The menu names a command; the window carries it out. */

import type { MenuItemConstructorOptions } from 'electron';
import type { MenuCommand } from './bridge';

export interface UndoNames {
  /** What undo and redo would do, to be shown; null when there is nothing. */
  undo: string | null;
  redo: string | null;
}

const SEPARATOR: MenuItemConstructorOptions = { type: 'separator' };

export function menuTemplate(
  send: (command: MenuCommand) => void,
  names: UndoNames,
  isMac: boolean,
): MenuItemConstructorOptions[] {
  const item = (label: string, command: MenuCommand, accelerator?: string): MenuItemConstructorOptions => ({
    id: command,
    label,
    accelerator,
    click: () => send(command),
  });
  const change = (
    label: string,
    command: 'undo' | 'redo',
    accelerator: string,
  ): MenuItemConstructorOptions => ({
    ...item(names[command] === null ? label : `${label} ${names[command]}`, command, accelerator),
    enabled: names[command] !== null,
  });
  return [
    ...(isMac ? [{ role: 'appMenu' } as const] : []),
    {
      label: '&File',
      submenu: [
        item('&New study', 'newStudy', 'CmdOrCtrl+N'),
        item('&Open ...', 'open', 'CmdOrCtrl+O'),
        SEPARATOR,
        item('&Save', 'save', 'CmdOrCtrl+S'),
        item('Save &as ...', 'saveAs', 'CmdOrCtrl+Shift+S'),
        SEPARATOR,
        item('&Import table ...', 'importTable', 'CmdOrCtrl+I'),
        {
          label: '&Export',
          submenu: [
            item('&Readings ...', 'exportReadings', 'CmdOrCtrl+E'),
            item('&Columns against depth ...', 'exportColumns', 'CmdOrCtrl+Shift+E'),
            item('Tracks as &SVG ...', 'exportSvg'),
            item('Tracks as &PNG ...', 'exportPng'),
          ],
        },
        SEPARATOR,
        { role: isMac ? 'close' : 'quit' },
      ],
    },
    {
      label: '&Edit',
      submenu: [
        change('&Undo', 'undo', 'CmdOrCtrl+Z'),
        change('&Redo', 'redo', isMac ? 'Cmd+Shift+Z' : 'Ctrl+Y'),
        SEPARATOR,
        { role: 'cut' },
        { role: 'copy' },
        { role: 'paste' },
        { role: 'selectAll' },
      ],
    },
    {
      label: '&View',
      submenu: [
        item('&Find a command', 'commands', 'CmdOrCtrl+K'),
        SEPARATOR,
        { role: 'resetZoom' },
        { role: 'zoomIn' },
        { role: 'zoomOut' },
        { role: 'togglefullscreen' },
      ],
    },
    { label: '&Help', submenu: [item('&About Ohmstrata', 'about')] },
  ];
}
