/**
 * A table of points as a shape: between points the logarithm of the concentration follows a shape-preserving cubic.
 *
 * Above a first depth > 0 the first value is held flat to the surface; below the last depth there is nothing. A zero
 * means nothing found there: next to it the concentration runs linearly, because a logarithm cannot.
 */

import { intervalOf } from '../numeric/interval';
import { monotoneCubic } from '../numeric/monotone';
import { type Anatomy, edgesWithin, marksAt } from './anatomy';
import type { ConcentrationAt, TableShape } from './kinds';

/** At most this many points become mesh marks, evenly chosen; the mesh refines by itself between them. */
const MARKS = 60;
/** Largest change of the logarithm across one quadrature panel, for which six points are accurate to 1e-12. */
const LOG_PER_PANEL = 2;
const PANEL_POINTS = 6;

/**
 * @param depth ascending without repetition, >= 0, at least two.
 * @param concentration >= 0, one for each depth.
 */
export function table(depth: Float64Array, concentration: Float64Array, shift = 0, from = 0): TableShape {
  const n = depth.length;
  const every = Math.ceil(n / MARKS);
  const end = depth[n - 1] + shift;
  const chosen = Array.from(
    depth.filter((_, i) => i % every === 0 || i === n - 1),
    (x) => x + shift,
  );
  return {
    kind: 'table',
    depth,
    concentration,
    shift,
    from,
    marks: marksAt(from, ...chosen.filter((x) => x > from)),
    jumps: [
      ...(from > 0 && from < end ? [from] : []),
      ...(concentration[n - 1] > 0 && end > from ? [end] : []),
    ],
  };
}

export function tableEvaluator(shape: TableShape): ConcentrationAt {
  const { depth, concentration, shift, from } = shape;
  const end = depth[depth.length - 1];
  const at = logInterpolation(depth, concentration);
  return (x) => (x < from || x - shift > end ? 0 : at(x - shift));
}

/** Holds the end values outside the table. */
function logInterpolation(depth: Float64Array, concentration: Float64Array): (x: number) => number {
  const n = depth.length;
  const log = concentration.map(Math.log);
  if (concentration.every((c) => c > 0)) {
    const curve = monotoneCubic(depth, log);
    return (x) => Math.exp(curve(x));
  }
  const curves: ((x: number) => number)[] = new Array(n);
  for (let start = 0; start < n; start++) {
    let stop = start;
    while (stop < n && concentration[stop] > 0) stop++;
    if (stop - start < 2) continue;
    const curve = monotoneCubic(depth.slice(start, stop), log.slice(start, stop));
    for (let i = start; i < stop - 1; i++) curves[i] = curve;
    start = stop;
  }
  return (x) => {
    const i = intervalOf(depth, x);
    if (i < 0) return concentration[0];
    if (i >= n - 1) return concentration[n - 1];
    const curve = curves[i];
    if (curve) return Math.exp(curve(x));
    const part = (x - depth[i]) / (depth[i + 1] - depth[i]);
    return concentration[i] * (1 - part) + concentration[i + 1] * part;
  };
}

export function tableAnatomy(shape: TableShape): Anatomy {
  const { depth, concentration, shift, from } = shape;
  const points = Array.from(depth, (x) => x + shift);
  const edges: number[] = [];
  for (let i = 0; i + 1 < points.length; i++) {
    const ratio = Math.abs(Math.log(concentration[i + 1] / concentration[i]));
    const panels = Number.isFinite(ratio) ? Math.max(1, Math.ceil(ratio / LOG_PER_PANEL)) : 1;
    for (let k = 0; k < panels; k++) edges.push(points[i] + ((points[i + 1] - points[i]) * k) / panels);
  }
  return {
    edges: edgesWithin(edges, from, points[points.length - 1]),
    kinks: marksAt(from, ...points.filter((x) => x > from)),
    points: PANEL_POINTS,
    beyond: 0,
  };
}
