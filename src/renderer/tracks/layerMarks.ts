/** What marks the layers in the figure: the band of p and n over the tracks, and the junctions through all of them. */

import type { Solution } from '../../core/index';
import type { DepthWindow } from './depthWindow';
import type { Frame, Size } from './frame';
import type { Palette } from './palette';
import { DEPTH_UNIT_NAMES, PER_UM, type TrackView } from './view';

const BAND_AXIS = 'y6';
/** Width of a depth with its unit, in units of the type size. */
const LABEL_EMS = 5.6;

/** One block a layer: a tint and its letter; p hatched, n plain. */
export function bandTraces(
  solution: Solution,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
): object[] {
  const factor = PER_UM[view.depthUnit];
  return (['p', 'n'] as const).map((type) => {
    const spans = solution.result.layers
      .filter((layer) => layer.type === type)
      .map(({ top_um, bottom_um }) => [Math.max(top_um, window.from_um), Math.min(bottom_um, window.to_um)])
      .filter(([from, to]) => to > from);
    const isWide = ([from, to]: number[]): boolean => (to - from) / (window.to_um - window.from_um) > 0.02;
    return {
      type: 'bar',
      name: `${type}-type layers`,
      x: spans.map(([from, to]) => ((from + to) / 2) * factor),
      width: spans.map(([from, to]) => (to - from) * factor),
      y: spans.map(() => 1),
      yaxis: BAND_AXIS,
      text: spans.map((span) => (isWide(span) ? type : '')),
      textposition: 'inside',
      insidetextanchor: 'middle',
      textangle: 0,
      textfont: { color: palette.ink, size: view.fontSize },
      marker: {
        color: type === 'p' ? palette.bandP : palette.bandN,
        line: { color: palette.axis, width: 1 },
        pattern: {
          shape: type === 'p' ? '/' : '',
          fgcolor: palette.holes,
          fgopacity: 0.3,
          size: 7,
          solidity: 0.15,
        },
      },
      hoverinfo: 'skip',
    };
  });
}

interface Mark {
  readonly um: number;
  readonly kind: 'electrical' | 'metallurgical';
}

/** Where n = p, and where the net doping changes sign when that is elsewhere. */
function junctionsIn(solution: Solution, window: DepthWindow): Mark[] {
  return solution.result.junctions
    .flatMap(({ electrical_um, metallurgical_um }): Mark[] => [
      ...(electrical_um === null ? [] : [{ um: electrical_um, kind: 'electrical' as const }]),
      ...(metallurgical_um === null || metallurgical_um === electrical_um
        ? []
        : [{ um: metallurgical_um, kind: 'metallurgical' as const }]),
    ])
    .filter(({ um }) => um >= window.from_um && um <= window.to_um);
}

export function junctionLines(
  solution: Solution,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
  frame: Frame,
): object[] {
  return junctionsIn(solution, window).map(({ um, kind }) => ({
    type: 'line',
    xref: 'x',
    yref: 'paper',
    x0: um * PER_UM[view.depthUnit],
    x1: um * PER_UM[view.depthUnit],
    y0: 0,
    y1: frame.domains.band[0],
    line: { color: palette.junction, width: 1, dash: kind === 'electrical' ? '5px,3px' : '1px,4px' },
  }));
}

/** Depths over the junction lines; where two would run into each other, the deeper one is left to the readings. */
export function junctionLabels(
  solution: Solution,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
  frame: Frame,
  size: Size,
): object[] {
  const width = window.to_um - window.from_um;
  const labelWidth = (LABEL_EMS * view.fontSize * width) / (size.width - frame.margin.l - frame.margin.r);
  const unit = DEPTH_UNIT_NAMES[view.depthUnit];
  let last = Number.NEGATIVE_INFINITY;
  return junctionsIn(solution, window)
    .filter(isLeading)
    .flatMap(({ um }) => {
      if (um - last < labelWidth) return [];
      last = um;
      const atEnd = um > window.to_um - labelWidth / 2;
      const atStart = um < window.from_um + labelWidth / 2;
      return [
        {
          xref: 'x',
          yref: 'paper',
          x: um * PER_UM[view.depthUnit],
          y: (frame.domains.band[0] + frame.domains.doping[1]) / 2,
          yanchor: 'middle',
          xanchor: atEnd ? 'right' : atStart ? 'left' : 'center',
          text: `${(um * PER_UM[view.depthUnit]).toPrecision(4)} ${unit}`,
          showarrow: false,
          bgcolor: palette.ground,
          font: { color: palette.ink, size: view.fontSize },
        },
      ];
    });
}

/** The depth that is labelled: the electrical junction, or the metallurgical one where there is no other. */
const isLeading = ({ kind }: Mark, _i: number, all: readonly Mark[]): boolean =>
  kind === 'electrical' || all.every((other) => other.kind === 'metallurgical');
