/** How the person looks at the study: kept apart from the document, and never part of undo. */

import { batch, computed, effect, signal } from '@preact/signals';
import type { ThemeChoice } from '../../main/bridge';
import { type DepthWindow, defaultWindow } from '../tracks/depthWindow';
import type { Theme } from '../tracks/palette';
import type { ConcentrationScale, DepthUnit } from '../tracks/view';
import { bridge } from './bridge';
import { shown } from './solver';

/** What the middle of the window shows. */
export type View = 'tracks' | 'history' | 'temperature' | 'bias';
export const VIEW_NAMES: Record<View, string> = {
  tracks: 'Predict',
  history: 'Steps',
  temperature: 'Temperature',
  bias: 'Bias',
};
export const view = signal<View>('tracks');

export type Panel = 'commands' | 'table' | 'about' | 'picture';

export const themeChoice = signal<ThemeChoice>('system');
const systemDark = signal(false);
export const theme = computed<Theme>(() =>
  themeChoice.value === 'system' ? (systemDark.value ? 'dark' : 'light') : themeChoice.value,
);

export const depthUnit = signal<DepthUnit>('um');
export const concentrationScale = signal<ConcentrationScale>('log');
/** The depths a person has zoomed to; null follows the study. */
export const chosenWindow = signal<DepthWindow | null>(null);
export const depthWindow = computed<DepthWindow | null>(() => {
  const { value } = shown;
  return value && (chosenWindow.value ?? defaultWindow(value.solution.result, value.solution.columns));
});
/** Depth under the pointer or the arrow keys. */
export const crosshair_um = signal<number | null>(null);

/** The dialog that is open; one at a time. */
export const panel = signal<Panel | null>(null);
/** What the picture dialog begins with. */
export const pictureFormat = signal<'svg' | 'png'>('svg');
/** Steps whose fields are shown, by step id. */
export const openSteps = signal<ReadonlySet<number>>(new Set());
/** A key path that should receive the focus as soon as its field is there. */
export const focusRequest = signal<string | null>(null);
/** One line for the status bar and for screen readers: what has just been done. */
export const notice = signal<{ text: string; isError: boolean } | null>(null);

export function say(text: string): void {
  notice.value = { text, isError: false };
}

export function sayError(text: string): void {
  notice.value = { text, isError: true };
}

export function setOpen(stepId: number, open: boolean): void {
  const next = new Set(openSteps.value);
  if (open) next.add(stepId);
  else next.delete(stepId);
  openSteps.value = next;
}

/** Opens a step and puts the focus on one of its fields, or on the card itself. */
export function focusStep(stepId: number, path: string): void {
  batch(() => {
    setOpen(stepId, true);
    focusRequest.value = path;
  });
}

const THEME_KEY = 'ohmstrata.theme';
const asTheme = (text: string | null): ThemeChoice => (text === 'light' || text === 'dark' ? text : 'system');

/** Follows the system's light or dark and the person's choice, from the first moment on. */
export function followTheme(): void {
  const dark = matchMedia('(prefers-color-scheme: dark)');
  systemDark.value = dark.matches;
  dark.addEventListener('change', () => {
    systemDark.value = dark.matches;
  });
  themeChoice.value = asTheme(localStorage.getItem(THEME_KEY));
  effect(() => {
    document.documentElement.dataset.theme = theme.value;
  });
}

export function chooseTheme(choice: ThemeChoice): void {
  themeChoice.value = choice;
  localStorage.setItem(THEME_KEY, choice);
  void bridge.setTheme(choice);
}
