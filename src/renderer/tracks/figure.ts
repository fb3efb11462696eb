/**
 * The tracks as one figure for the plotting library: doping, carriers, mobility and share of sheet conductance above each
 * other on one depth axis, the p and n band over them, junctions through all of them.
 */

import type { Solution } from '../../core/index';
import { type Curve, type TrackName, trackCurves } from './curves';
import type { DepthWindow } from './depthWindow';
import { type Frame, frameOf, type Size } from './frame';
import { labelPlaces } from './labels';
import { PALETTES, type Palette } from './palette';
import { linearRange, logRange, positiveSpan } from './ranges';
import { DEPTH_UNIT_NAMES, PER_UM, type TrackView } from './view';

export interface Figure {
  data: object[];
  layout: { annotations: object[] } & Record<string, unknown>;
}

interface Axis {
  readonly id: string;
  readonly range: readonly [number, number];
  readonly log: boolean;
}

const AXES: Record<TrackName, string> = { doping: 'y', carriers: 'y2', mobility: 'y3', share: 'y4' };
const CUMULATIVE_AXIS = 'y5';
const BAND_AXIS = 'y6';

export function buildFigure(solution: Solution, view: TrackView, window: DepthWindow, size: Size): Figure {
  const palette = PALETTES[view.theme];
  const curves = trackCurves(solution.columns, palette, view.depthUnit);
  const axes = trackAxes(solution, curves, window, view);
  const frame = frameOf(size, view.fontSize);
  const depth = solution.columns.depth_um.map((um) => um * PER_UM[view.depthUnit]);
  return {
    data: [
      ...curves.map((curve) => curveTrace(curve, depth, axisOf(curve, axes))),
      ...bandTraces(solution, window, view, palette),
    ],
    layout: {
      width: size.width,
      height: size.height,
      margin: { ...frame.margin, pad: 0 },
      paper_bgcolor: palette.ground,
      plot_bgcolor: palette.ground,
      font: { family: view.font, size: view.fontSize, color: palette.ink },
      showlegend: false,
      hovermode: false,
      dragmode: 'zoom',
      bargap: 0,
      xaxis: depthAxis(window, view, palette),
      ...valueAxes(axes, frame, view, palette),
      shapes: junctionLines(solution, window, view, palette, frame),
      annotations: [
        ...junctionLabels(solution, window, view, palette, frame),
        ...curveLabels(solution, curves, axes, frame, size, window, view, palette),
      ],
    },
  };
}

type Axes = Record<TrackName | 'cumulative', Axis>;

const axisOf = (curve: Curve, axes: Axes): Axis => (curve.rightAxis ? axes.cumulative : axes[curve.track]);

function trackAxes(solution: Solution, curves: Curve[], window: DepthWindow, view: TrackView): Axes {
  const { depth_um: depth } = solution.columns;
  const of = (track: TrackName): Curve[] => curves.filter((curve) => curve.track === track);
  const span = (list: Curve[]) => positiveSpan(depth, list, window);
  const log = view.scale === 'log';
  const doping = of('doping');
  const floor = Math.min(...doping.flatMap((curve) => span([curve])?.high ?? []), Number.MAX_VALUE);
  const concentrations = span([...doping, ...of('carriers')]);
  const range = log ? logRange(concentrations, floor) : linearRange(concentrations);
  const mobility = of('mobility').filter((curve) => curve.key !== 'impurity');
  return {
    doping: { id: AXES.doping, range, log },
    carriers: { id: AXES.carriers, range, log },
    mobility: { id: AXES.mobility, range: linearRange(span(mobility)), log: false },
    share: {
      id: AXES.share,
      range: linearRange(span([...of('share').filter((c) => !c.rightAxis)])),
      log: false,
    },
    cumulative: { id: CUMULATIVE_AXIS, range: [0, 112], log: false },
  };
}

function curveTrace(curve: Curve, depth: Float64Array, axis: Axis): object {
  return {
    type: 'scatter',
    mode: 'lines',
    name: curve.longName,
    x: depth,
    y: axis.log ? abovePower(curve.values, axis.range[0] - 1) : curve.values,
    yaxis: axis.id,
    line: { color: curve.colour, dash: curve.dash, width: curve.width },
    ...(curve.fill && { fill: 'tozeroy', fillcolor: curve.fill }),
    hoverinfo: 'skip',
  };
}

/** Keeps a logarithmic curve running out of the picture where it falls to nothing, instead of breaking off above. */
function abovePower(values: Float64Array, power: number): Float64Array {
  const least = 10 ** power;
  return values.map((value) => Math.max(value, least));
}

function depthAxis(window: DepthWindow, view: TrackView, palette: Palette): object {
  const factor = PER_UM[view.depthUnit];
  return {
    range: [window.from_um * factor, window.to_um * factor],
    anchor: AXES.share,
    title: { text: `depth (${DEPTH_UNIT_NAMES[view.depthUnit]})`, standoff: 6 },
    ...axisLook(palette),
    ticks: 'outside',
    ticklen: 4,
    tickcolor: palette.axis,
    exponentformat: 'none',
  };
}

const axisLook = (palette: Palette): object => ({
  gridcolor: palette.grid,
  linecolor: palette.axis,
  showline: true,
  mirror: true,
  zeroline: false,
  tickfont: { color: palette.faintInk },
});

function valueAxes(axes: Axes, frame: Frame, view: TrackView, palette: Palette): object {
  const common = { ...axisLook(palette), fixedrange: true, titlefont: { size: view.fontSize } };
  const concentration = (axis: Axis, domain: readonly [number, number], title: string): object => ({
    ...common,
    type: axis.log ? 'log' : 'linear',
    range: axis.range,
    domain,
    title: { text: title, standoff: 4 },
    exponentformat: 'power',
    ...(axis.log ? { dtick: wholeDecades(axis.range) } : { nticks: 5 }),
  });
  const linear = (axis: Axis, domain: readonly [number, number], title: string): object => ({
    ...common,
    range: axis.range,
    domain,
    title: { text: title, standoff: 4 },
    nticks: 4,
    separatethousands: false,
  });
  const perDepth = DEPTH_UNIT_NAMES[view.depthUnit];
  return {
    yaxis: concentration(axes.doping, frame.domains.doping, 'doping (cm<sup>−3</sup>)'),
    yaxis2: concentration(axes.carriers, frame.domains.carriers, 'carriers (cm<sup>−3</sup>)'),
    yaxis3: linear(axes.mobility, frame.domains.mobility, 'mobility (cm²/Vs)'),
    yaxis4: linear(axes.share, frame.domains.share, `share (%/${perDepth})`),
    yaxis5: {
      ...common,
      overlaying: AXES.share,
      side: 'right',
      range: axes.cumulative.range,
      tickvals: [0, 50, 100],
      ticksuffix: ' %',
      showgrid: false,
      mirror: false,
    },
    yaxis6: { domain: frame.domains.band, range: [0, 1], visible: false, fixedrange: true },
  };
}

/** Every decade, or every second or third where there are many. */
const wholeDecades = ([low, high]: readonly [number, number]): number => Math.ceil((high - low) / 5);

/** One block a layer: a tint and its letter; p hatched, n plain. */
function bandTraces(solution: Solution, window: DepthWindow, view: TrackView, palette: Palette): object[] {
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

function junctionsIn(solution: Solution, window: DepthWindow): number[] {
  return solution.result.junctions
    .map((junction) => junction.metallurgical_um)
    .filter((depth) => depth >= window.from_um && depth <= window.to_um);
}

function junctionLines(
  solution: Solution,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
  frame: Frame,
): object[] {
  return junctionsIn(solution, window).map((um) => ({
    type: 'line',
    xref: 'x',
    yref: 'paper',
    x0: um * PER_UM[view.depthUnit],
    x1: um * PER_UM[view.depthUnit],
    y0: 0,
    y1: frame.domains.band[0],
    line: { color: palette.junction, width: 1, dash: '3px,3px' },
  }));
}

/** Depths over the junction lines; where two would run into each other, the deeper one is left to the readings. */
function junctionLabels(
  solution: Solution,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
  frame: Frame,
): object[] {
  const width = window.to_um - window.from_um;
  const unit = DEPTH_UNIT_NAMES[view.depthUnit];
  let last = Number.NEGATIVE_INFINITY;
  return junctionsIn(solution, window).flatMap((um) => {
    if (um - last < 0.12 * width) return [];
    last = um;
    const atEnd = um > window.to_um - 0.06 * width;
    const atStart = um < window.from_um + 0.06 * width;
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

function curveLabels(
  solution: Solution,
  curves: Curve[],
  axes: Axes,
  frame: Frame,
  size: Size,
  window: DepthWindow,
  view: TrackView,
  palette: Palette,
): object[] {
  const inside = size.height - frame.margin.t - frame.margin.b;
  return (Object.keys(AXES) as TrackName[]).flatMap((track) => {
    const own = curves.filter((curve) => curve.track === track);
    const [low, high] = frame.domains[track];
    const nameHeight = (1.35 * view.fontSize) / ((high - low) * inside);
    const labelled = own.map((curve) => ({ curve, heightOf: heightIn(axisOf(curve, axes)) }));
    const places = labelPlaces(solution.columns.depth_um, labelled, window, nameHeight, axes[track].log);
    return places.map((place) => ({
      xref: 'x',
      yref: 'paper',
      x: place.depth_um * PER_UM[view.depthUnit],
      y: low + place.height * (high - low),
      xanchor: 'center',
      yanchor: 'middle',
      text: own.find((curve) => curve.key === place.key)?.name,
      showarrow: false,
      bgcolor: `${palette.ground}cc`,
      borderpad: 0,
      font: { color: palette.ink, size: view.fontSize },
    }));
  });
}

const heightIn =
  ({ range: [low, high], log }: Axis) =>
  (value: number): number =>
    ((log ? Math.log10(value) : value) - low) / (high - low);
