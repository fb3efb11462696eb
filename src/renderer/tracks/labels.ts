/** Where each curve carries its name: at the depth of the window where it stands clearest of the other curves and names. */

import type { Curve } from './curves';
import type { DepthWindow } from './depthWindow';
import { valueAtDepth } from './interpolate';

export interface LabelPlace {
  readonly key: string;
  readonly depth_um: number;
  /** Height in the track, 0 at the bottom to 1 at the top. */
  readonly height: number;
}

interface LabelledCurve {
  readonly curve: Curve;
  /** Height of a value in the track; outside 0 to 1 when not shown. */
  readonly heightOf: (value: number) => number;
}

const CANDIDATES = 28;
/** Width and height that a name takes of the track, as parts of it. */
const NAME_WIDTH = 0.13;

/** Places for the names of one track's curves, in the order given; a curve that is nowhere in view has none. */
export function labelPlaces(
  depth: Float64Array,
  curves: readonly LabelledCurve[],
  window: DepthWindow,
  nameHeight: number,
  log: boolean,
): LabelPlace[] {
  const at = (i: number): number =>
    window.from_um + ((i + 0.5) / CANDIDATES) * (window.to_um - window.from_um);
  const heights = curves.map(({ curve, heightOf }) =>
    Array.from({ length: CANDIDATES }, (_, i) => heightOf(valueAtDepth(depth, curve.values, at(i), log))),
  );
  const places: LabelPlace[] = [];
  const taken: { x: number; y: number }[] = [];
  for (const [c, own] of heights.entries()) {
    let best = -1;
    let bestScore = Number.NEGATIVE_INFINITY;
    for (let i = 1; i < CANDIDATES - 2; i++) {
      const y = own[i] + nameHeight * 0.6;
      if (!(own[i] > 0.02 && y < 1 - nameHeight * 0.4)) continue;
      const score = clearance(i, y, c) - 0.0015 * Math.abs(i - CANDIDATES * 0.4);
      if (score > bestScore) [best, bestScore] = [i, score];
    }
    if (best < 0) continue;
    const height = own[best] + nameHeight * 0.6;
    places.push({ key: curves[c].curve.key, depth_um: at(best), height });
    taken.push({ x: best / CANDIDATES, y: height });
  }
  return places;

  /** Vertical distance to the nearest other curve under the name, and to names already placed, capped at three names. */
  function clearance(i: number, y: number, own: number): number {
    let least = 3 * nameHeight;
    const reach = Math.ceil((NAME_WIDTH / 2) * CANDIDATES);
    for (const [c, other] of heights.entries())
      for (let k = Math.max(0, i - reach); k <= Math.min(CANDIDATES - 1, i + reach); k++) {
        // The curve's own slope may run through its name as well.
        const distance = Math.abs(other[k] - y) + (c === own ? nameHeight * 0.3 : 0);
        if (distance < least) least = distance;
      }
    for (const name of taken)
      if (Math.abs(name.x - i / CANDIDATES) < NAME_WIDTH && Math.abs(name.y - y) < least)
        least = Math.abs(name.y - y);
    return least;
  }
}
