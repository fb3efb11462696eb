/** A shape diffused behind a sealed surface, by numerical convolution with the reflecting kernel. */

import erfc from '@stdlib/math-base-special-erfc';
import { gaussHermite } from '../numeric/gaussHermite';
import { gaussLegendre } from '../numeric/gaussLegendre';
import { gaussRuleOfMasses, type Rule } from '../numeric/golubWelsch';
import { intervalOf } from '../numeric/interval';
import { type Anatomy, edgesWithin, ladder, marksAt, PANEL_POINTS, shoulders } from './anatomy';
import type { ConcentrationAt, ConvolvedShape, Shape } from './kinds';

const PANEL = gaussLegendre(PANEL_POINTS);
/** In a panel this much narrower than the kernel only the source counts. */
const NARROW = 0.25;
/** For a kernel much narrower than anything in the source. */
const AVERAGE = gaussHermite(14);
const AVERAGE_BELOW = 1 / 20;
/** In kernel standard deviations: exp(-10^2/2) = 2e-22. */
const REACH = 10;
const CELL = 2;

/** Diffuses `source` by Dt. The marks of a source span about eight of its standard deviations. */
export function convolved(source: Shape, Dt: number): ConvolvedShape {
  const spread = Math.sqrt(2 * Dt);
  const first = source.marks[0] ?? 0;
  const last = source.marks[source.marks.length - 1] ?? 0;
  return {
    kind: 'convolved',
    source,
    Dt,
    marks: marksAt(
      0,
      ...source.marks,
      ...shoulders((first + last) / 2, Math.hypot((last - first) / 8, spread)),
      ...[0, ...source.jumps].flatMap((x) => shoulders(x, spread)),
    ),
    jumps: [],
  };
}

/** A stretch of the source two kernel widths long, as the few point masses the kernel cannot tell it from. */
interface Cell {
  readonly depths: Float64Array;
  readonly masses: Float64Array;
}

/**
 * C(x) = Int_0^inf source(u) [G(x-u) + G(x+u)] du, G normal with variance 2Dt.
 *
 * The source is cut into cells 2 sqrt(2Dt) wide, prepared when first needed: a cell that is smooth becomes one ten-point
 * Gauss-Legendre panel; a cell with structure is integrated panel by panel between the source's edges and then replaced
 * by the ten-point Gauss rule of what was found, so positive masses with the same twenty moments. A depth costs the
 * cells within ten kernel widths. Where the kernel is much narrower than the source's panel and meets no kink, a
 * fourteen-point Gauss-Hermite average of the source does the same for less.
 */
export function convolvedEvaluator(Dt: number, source: ConcentrationAt, anatomy: Anatomy): ConcentrationAt {
  const { edges, beyond } = anatomy;
  if (edges.length === 0) return () => 0;
  const spread = Math.sqrt(2 * Dt);
  const width = CELL * spread;
  const reach = REACH * spread;
  const inverse = 1 / (2 * spread * spread);
  const norm = 1 / (Math.sqrt(2 * Math.PI) * spread);
  const end = edges[edges.length - 1];
  const firstCell = Math.floor(edges[0] / width);
  const lastCell = Math.floor(end / width);
  const kinks = marksAt(0, ...anatomy.kinks);
  const narrowPanel = anatomy.points ? gaussLegendre(anatomy.points) : PANEL;
  const cells = new Map<number, Cell>();

  const cellAt = (k: number): Cell => {
    let cell = cells.get(k);
    if (!cell) {
      cell = prepareCell(
        Math.max(edges[0], k * width),
        Math.min(end, (k + 1) * width),
        edges,
        NARROW * spread,
        narrowPanel,
        source,
      );
      cells.set(k, cell);
    }
    return cell;
  };
  const seen = (x: number): number => {
    const last = Math.min(lastCell, Math.floor((x + reach) / width));
    let sum = 0;
    for (let k = Math.max(firstCell, Math.floor((x - reach) / width)); k <= last; k++) {
      const { depths, masses } = cellAt(k);
      for (let i = 0; i < depths.length; i++) {
        const d = x - depths[i];
        sum += masses[i] * Math.exp(-d * d * inverse);
      }
    }
    return norm * sum;
  };
  const averaged = (x: number): number => {
    let sum = 0;
    for (let i = 0; i < AVERAGE.nodes.length; i++)
      sum += AVERAGE.weights[i] * source(Math.max(0, x + spread * AVERAGE.nodes[i]));
    return sum;
  };
  const isSmoothAround = (x: number): boolean => {
    const low = intervalOf(edges, x - reach);
    const high = intervalOf(edges, x + reach);
    if (low < 0 || high + 1 >= edges.length) return false;
    for (let i = low; i <= high; i++) if (spread > AVERAGE_BELOW * (edges[i + 1] - edges[i])) return false;
    return intervalOf(kinks, x - reach) === intervalOf(kinks, x + reach);
  };
  const fromBeyond =
    beyond > 0
      ? (x: number) =>
          (beyond / 2) * (erfc((end - x) / (Math.SQRT2 * spread)) + erfc((end + x) / (Math.SQRT2 * spread)))
      : () => 0;
  return (x) => (isSmoothAround(x) ? averaged(x) : seen(x) + (x < reach ? seen(-x) : 0) + fromBeyond(x));
}

function prepareCell(
  low: number,
  high: number,
  edges: Float64Array,
  narrow: number,
  narrowPanel: Rule,
  source: ConcentrationAt,
): Cell {
  const depths: number[] = [];
  const masses: number[] = [];
  let left = low;
  for (let i = intervalOf(edges, low) + 1; left < high; i++) {
    const right = i < edges.length ? Math.min(high, edges[i]) : high;
    const half = (right - left) / 2;
    const rule = right - left < narrow ? narrowPanel : PANEL;
    for (let k = 0; k < rule.nodes.length; k++) {
      const depth = left + half * (1 + rule.nodes[k]);
      depths.push(depth);
      masses.push(half * rule.weights[k] * source(depth));
    }
    left = right;
  }
  if (depths.length <= PANEL_POINTS)
    return { depths: Float64Array.from(depths), masses: Float64Array.from(masses) };
  const rule = gaussRuleOfMasses(depths, masses, low, high, PANEL_POINTS);
  return { depths: rule.nodes, masses: rule.weights };
}

export function convolvedAnatomy(shape: ConvolvedShape, source: Anatomy): Anatomy {
  if (source.edges.length === 0) return source;
  const spread = Math.sqrt(2 * shape.Dt);
  const high = source.edges[source.edges.length - 1] + 12 * spread;
  const rungs = [0, source.edges[0], high, ...source.kinks].flatMap((x) => ladder(x, spread));
  return {
    edges: edgesWithin([...source.edges, ...rungs], 0, high, spread / 2),
    kinks: [0],
    beyond: source.beyond,
  };
}
