/** What the keys do while the tracks have the focus. */

import { shown } from '../state/solver';
import {
  chosenWindow,
  crosshair_um,
  depthUnit,
  depthWindow,
  panel,
  say,
  sayError,
  theme,
} from '../state/viewState';
import { trackCurves } from '../tracks/curves';
import { zoomed } from '../tracks/depthWindow';
import { PALETTES } from '../tracks/palette';
import { readAt, readingText } from '../tracks/reading';

/** A press moves the crosshair by this part of the window; with Shift by ten times as much. */
const STEP = 1 / 200;

/** The values under the crosshair in one line; null when there is none. */
export function crosshairText(): string | null {
  const at = crosshair_um.value;
  const columns = shown.value?.solution.columns;
  if (at === null || !columns) return null;
  const curves = trackCurves(columns, PALETTES[theme.value], depthUnit.value);
  return readingText(at, depthUnit.value, readAt(columns, curves, at));
}

async function copyReading(): Promise<void> {
  const text = crosshairText();
  if (text === null) return;
  try {
    await navigator.clipboard.writeText(text);
    say('Values at this depth copied');
  } catch {
    sayError('The clipboard could not be written');
  }
}

function moveCrosshair(by: number): void {
  const window = depthWindow.value;
  if (!window) return;
  const width = window.to_um - window.from_um;
  const at = crosshair_um.value ?? window.from_um;
  crosshair_um.value = Math.min(window.to_um, Math.max(window.from_um, at + by * width));
}

/** Zooms about the crosshair, or about the left edge without one. */
export function zoom(factor: number): void {
  const window = depthWindow.value;
  const end = shown.value?.solution.columns.depth_um.at(-1);
  if (window && end !== undefined)
    chosenWindow.value = zoomed(window, crosshair_um.value ?? window.from_um, factor, end);
}

const ACTIONS: Record<string, (isShift: boolean) => unknown> = {
  ArrowLeft: (isShift) => moveCrosshair(isShift ? -10 * STEP : -STEP),
  ArrowRight: (isShift) => moveCrosshair(isShift ? 10 * STEP : STEP),
  Home: () => moveCrosshair(Number.NEGATIVE_INFINITY),
  End: () => moveCrosshair(Number.POSITIVE_INFINITY),
  '+': () => zoom(0.5),
  '=': () => zoom(0.5),
  '-': () => zoom(2),
  0: () => {
    chosenWindow.value = null;
  },
  t: () => {
    panel.value = 'table';
  },
  c: () => copyReading(),
  Escape: () => {
    crosshair_um.value = null;
  },
};

export function onTrackKey(event: KeyboardEvent): void {
  if (event.ctrlKey || event.metaKey || event.altKey) return;
  const action = ACTIONS[event.key];
  if (!action) return;
  event.preventDefault();
  action(event.shiftKey);
}
