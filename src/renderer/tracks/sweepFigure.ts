/** Lines against temperature or voltage as a figure for the plotting library. */

import type { Size } from './frame';
import { PALETTES, type Theme } from './palette';

export interface Line {
  readonly name: string;
  readonly x: readonly number[];
  /** Null breaks the line. */
  readonly y: readonly (number | null)[];
}

export interface SweepFigure {
  readonly lines: readonly Line[];
  readonly xTitle: string;
  readonly yTitle: string;
  /** Logarithmic upwards. */
  readonly log?: boolean;
  /** Along x there are whole numbers alone. */
  readonly counts?: boolean;
}

const DASHES = ['solid', '7px,3px', '2px,3px', '9px,3px,2px,3px', '12px,4px'];
const FONT_SIZE = 12;
/** Fewer points than this are marked. */
const FEW = 20;
/** Labels of whole numbers. */
const MOST_COUNTS = 15;

export function buildSweepFigure(
  { lines, xTitle, yTitle, log = false, counts = false }: SweepFigure,
  theme: Theme,
  font: string,
  size: Size,
) {
  const palette = PALETTES[theme];
  const colours = [palette.holes, palette.electrons, palette.lattice, palette.impurity, palette.net];
  const axis = {
    gridcolor: palette.grid,
    linecolor: palette.axis,
    showline: true,
    mirror: true,
    zerolinecolor: palette.axis,
    tickfont: { color: palette.faintInk },
    ticks: 'outside',
    ticklen: 4,
    tickcolor: palette.axis,
    fixedrange: true,
  };
  return {
    data: lines.map(({ name, x, y }, k) => ({
      type: 'scatter',
      mode: x.length < FEW ? 'lines+markers' : 'lines',
      name,
      x,
      y,
      line: { color: colours[k % colours.length], dash: DASHES[k % DASHES.length], width: 2 },
    })),
    layout: {
      ...size,
      margin: { l: 66, r: 18, t: 14, b: 46, pad: 0 },
      paper_bgcolor: palette.ground,
      plot_bgcolor: palette.ground,
      font: { family: font, size: FONT_SIZE, color: palette.ink },
      showlegend: lines.length > 1,
      legend: { x: 0.02, y: 0.98, bgcolor: `${palette.ground}cc` },
      hovermode: 'x unified',
      hoverlabel: { bgcolor: palette.ground, bordercolor: palette.axis, font: { color: palette.ink } },
      xaxis: {
        ...axis,
        ...(counts && { dtick: Math.max(1, Math.ceil((lines[0]?.x.length ?? 0) / MOST_COUNTS)) }),
        title: { text: xTitle, standoff: 6 },
      },
      yaxis: {
        ...axis,
        type: log ? 'log' : 'linear',
        title: { text: yTitle, standoff: 8 },
        exponentformat: log ? 'power' : 'none',
      },
    },
  };
}
