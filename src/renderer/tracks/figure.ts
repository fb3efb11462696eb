/**
 * The tracks as one figure for the plotting library: doping, carriers, mobility and share of sheet conductance above each
 * other on one depth axis, the p and n band over them, junctions through all of them.
 */

import type { Solution } from '../../core/index';
import { type Curve, type TrackName, trackCurves } from './curves';
import type { DepthWindow } from './depthWindow';
import { type Frame, frameOf, type Size } from './frame';
import { labelPlaces } from './labels';
import { bandTraces, junctionLabels, junctionLines } from './layerMarks';
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
/** Mean width of a letter, in units of the type size. */
const LETTER_WIDTH = 0.5;

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
      ...valueAxes(axes, frame, size, view, palette),
      shapes: junctionLines(solution, window, view, palette, frame),
      annotations: [
        ...junctionLabels(solution, window, view, palette, frame, size),
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

/** The whole title where the track is high enough for it, its unit alone where it is not. */
function axisTitle(name: string, unit: string, height: number, fontSize: number): string {
  const whole = `${name} (${unit})`;
  const letters = whole.replace(/<[^>]*>/g, '').length;
  return letters * LETTER_WIDTH * fontSize <= height ? whole : unit;
}

function valueAxes(axes: Axes, frame: Frame, size: Size, view: TrackView, palette: Palette): object {
  const inside = size.height - frame.margin.t - frame.margin.b;
  const titled = (name: string, unit: string, [low, high]: readonly [number, number]): object => ({
    text: axisTitle(name, unit, (high - low) * inside, view.fontSize),
    standoff: 4,
  });
  const common = { ...axisLook(palette), fixedrange: true, titlefont: { size: view.fontSize } };
  const concentration = (axis: Axis, domain: readonly [number, number], name: string): object => ({
    ...common,
    type: axis.log ? 'log' : 'linear',
    range: axis.range,
    domain,
    title: titled(name, 'cm<sup>−3</sup>', domain),
    exponentformat: 'power',
    ...(axis.log ? { dtick: wholeDecades(axis.range) } : { nticks: 5 }),
  });
  const linear = (axis: Axis, domain: readonly [number, number], name: string, unit: string): object => ({
    ...common,
    range: axis.range,
    domain,
    title: titled(name, unit, domain),
    nticks: 4,
    separatethousands: false,
  });
  const perDepth = DEPTH_UNIT_NAMES[view.depthUnit];
  return {
    yaxis: concentration(axes.doping, frame.domains.doping, 'doping'),
    yaxis2: concentration(axes.carriers, frame.domains.carriers, 'carriers'),
    yaxis3: linear(axes.mobility, frame.domains.mobility, 'mobility', 'cm²/Vs'),
    yaxis4: linear(axes.share, frame.domains.share, 'share', `%/${perDepth}`),
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
