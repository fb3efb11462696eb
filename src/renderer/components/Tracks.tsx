/**
 * The tracks: one figure on one depth axis, the tools above it, a crosshair moved by pointer or arrow keys and the line of
 * values at its depth. Drawing waits for the next frame, and a newer solution replaces one that is not drawn yet.
 */

import type { PlotElement } from 'plotly.js-cartesian-dist-min';
import { useEffect, useMemo, useRef } from 'preact/hooks';
import { outdated, type Shown, shown, solveProblem } from '../state/solver';
import {
  chosenWindow,
  concentrationScale,
  crosshair_um,
  depthUnit,
  depthWindow,
  theme,
} from '../state/viewState';
import { type DepthWindow, zoomed } from '../tracks/depthWindow';
import { buildFigure } from '../tracks/figure';
import { frameOf, type Size } from '../tracks/frame';
import { plotly } from '../tracks/plotly';
import { PER_UM, type TrackView, WINDOW_FONT } from '../tracks/view';
import { DepthReading } from './DepthReading';
import { TrackTools } from './TrackTools';
import { onTrackKey } from './trackKeys';
import { useSize } from './useSize';

const FONT_SIZE = 12;
const CONFIG = { displayModeBar: false, scrollZoom: true, doubleClick: false, responsive: false };

interface Drawing {
  shown: Shown;
  view: TrackView;
  window: DepthWindow;
  size: Size;
}

export function Tracks() {
  const plot = useRef<HTMLDivElement>(null);
  const size = useSize(plot);
  const current = shown.value;
  const window = depthWindow.value;
  const view = useMemo<TrackView>(
    () => ({
      theme: theme.value,
      depthUnit: depthUnit.value,
      scale: concentrationScale.value,
      font: WINDOW_FONT,
      fontSize: FONT_SIZE,
    }),
    [theme.value, depthUnit.value, concentrationScale.value],
  );
  useDrawing(plot, current && window && size && { shown: current, view, window, size });

  return (
    <section class={`tracks ${outdated.value ? 'outdated' : ''}`} aria-label="Tracks against depth">
      <TrackTools />
      <DepthReading />
      <div
        class="plot-box"
        role="application"
        aria-label="Tracks: left and right arrow read values, plus and minus zoom, 0 resets, T shows a table, C copies"
        // biome-ignore lint/a11y/noNoninteractiveTabindex: the tracks are read with the arrow keys.
        tabIndex={0}
        onKeyDown={onTrackKey}
        onPointerMove={(event) => {
          if (!size || !window || event.buttons !== 0) return;
          crosshair_um.value = depthUnder(event, size, window);
        }}
        onPointerLeave={() => {
          crosshair_um.value = null;
        }}
      >
        <div class="plot" ref={plot} aria-hidden="true" />
        {size && window && <Crosshair size={size} window={window} />}
        {!current && <p class="plot-wait">Solving …</p>}
        {solveProblem.value && current && <p class="plot-flag">Tracks of the last valid recipe</p>}
      </div>
    </section>
  );
}

function depthUnder(event: PointerEvent, size: Size, window: DepthWindow): number | null {
  const { margin } = frameOf(size, FONT_SIZE);
  const box = (event.currentTarget as HTMLElement).getBoundingClientRect();
  const fraction = (event.clientX - box.left - margin.l) / (size.width - margin.l - margin.r);
  return fraction < 0 || fraction > 1 ? null : window.from_um + fraction * (window.to_um - window.from_um);
}

function Crosshair({ size, window }: { size: Size; window: DepthWindow }) {
  const at = crosshair_um.value;
  if (at === null || at < window.from_um || at > window.to_um) return null;
  const { margin, domains } = frameOf(size, FONT_SIZE);
  const fraction = (at - window.from_um) / (window.to_um - window.from_um);
  const inside = size.height - margin.t - margin.b;
  return (
    <div
      class="crosshair"
      style={{
        left: `${margin.l + fraction * (size.width - margin.l - margin.r)}px`,
        top: `${margin.t + (1 - domains.doping[1]) * inside}px`,
        height: `${domains.doping[1] * inside}px`,
      }}
    />
  );
}

/** Draws the newest request after the frame in which the readings appeared; requests meanwhile replace it. */
function useDrawing(
  plot: { current: HTMLDivElement | null },
  wanted: Drawing | null | false | undefined,
): void {
  const state = useRef({ next: null as Drawing | null, isBusy: false, isListening: false });

  async function drawNewest(): Promise<void> {
    const { current } = state;
    if (current.isBusy) return;
    current.isBusy = true;
    const library = await plotly();
    while (current.next) {
      await afterPaint();
      const { shown: solved, view, window, size } = current.next;
      current.next = null;
      const { data, layout } = buildFigure(solved.solution, view, window, size);
      const element = await library.react(plot.current as HTMLElement, data, layout, CONFIG);
      if (!current.isListening) listen(element);
      current.isListening = true;
      performance.mark('ohmstrata:tracks', { detail: solved.runId });
      document.body.dataset.tracks = String(solved.runId);
    }
    current.isBusy = false;
  }

  useEffect(
    () => {
      if (!wanted) return;
      state.current.next = wanted;
      void drawNewest();
    },
    wanted ? [wanted.shown, wanted.view, wanted.window, wanted.size] : [null],
  );
}

/** Resolves once the frame being prepared is on the screen. */
const afterPaint = (): Promise<void> =>
  new Promise((resolve) => requestAnimationFrame(() => setTimeout(resolve, 0)));

/** Dragging and the wheel change the depths that all tracks show; a double click gives them back. */
function listen(element: PlotElement): void {
  element.on('plotly_relayout', (change) => {
    const range = (change['xaxis.range'] as number[] | undefined) ?? [
      change['xaxis.range[0]'] as number,
      change['xaxis.range[1]'] as number,
    ];
    const end = shown.value?.solution.columns.depth_um.at(-1);
    if (!Number.isFinite(range[0]) || !Number.isFinite(range[1]) || end === undefined) return;
    const [from, to] = range.map((value) => value / PER_UM[depthUnit.value]);
    chosenWindow.value = zoomed({ from_um: from, to_um: to }, from, 1, end);
  });
  element.on('plotly_doubleclick', () => {
    chosenWindow.value = null;
    return undefined;
  });
}
