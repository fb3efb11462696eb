/** Light or dark: follows the system or the person's choice, and gives the window's ground colour before the page paints. */

import { app, type BrowserWindow, nativeTheme } from 'electron';
import type { ThemeChoice } from './bridge';
import { readSettings, writeSettings } from './settings';

/** The grounds of the page's own style sheet, so that opening does not flash. */
const GROUND = { light: '#f6f7f9', dark: '#14171b' };

export const groundColour = (): string => (nativeTheme.shouldUseDarkColors ? GROUND.dark : GROUND.light);

export function useRememberedTheme(): void {
  nativeTheme.themeSource = readSettings(app.getPath('userData')).theme;
}

export function followTheme(window: BrowserWindow): void {
  const paint = () => window.setBackgroundColor(groundColour());
  nativeTheme.on('updated', paint);
  window.on('closed', () => nativeTheme.off('updated', paint));
}

export async function chooseTheme(theme: ThemeChoice): Promise<void> {
  nativeTheme.themeSource = theme;
  await writeSettings(app.getPath('userData'), { theme });
}
