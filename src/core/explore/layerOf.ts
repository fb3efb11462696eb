/** Follows one layer of a stack through changes of temperature and bias. */

import type { CarrierState } from '../carriers/state';
import { type LayerSpan, layerSpans } from '../sheet/layers';
import { NoSolution } from '../study/problem';

/** A layer by where it is at first; cm. */
export interface FollowedLayer {
  /** Counted from 1 at the surface. */
  readonly index: number;
  readonly type: 'n' | 'p';
  /** Junctions of net doping above and below, by position in the doping; null at the surface and at the film's end. */
  readonly upper: number | null;
  readonly lower: number | null;
  readonly top: number;
  readonly bottom: number;
}

/** @throws NoSolution when there is no such layer. */
export function followedLayer(state: CarrierState, index: number): FollowedLayer {
  const spans = layerSpans(state);
  const span = spans[index - 1];
  if (!span)
    throw new NoSolution(
      `there is no layer ${index}; the study has ${spans.length === 1 ? 'one layer' : `${spans.length} layers`}`,
    );
  const metallurgical = (end: number): number | null => {
    const cut = state.cuts.indexOf(end);
    if (cut < 0) return null;
    return state.electrostatics ? state.electrostatics.junctions[cut].metallurgical : cut;
  };
  return {
    index,
    type: span.type,
    upper: metallurgical(span.from),
    lower: metallurgical(span.to),
    top: state.doping.depth[span.from],
    bottom: state.doping.depth[span.to],
  };
}

/** The layer of the same type that overlaps most with where the layer was at first; null when it is gone. */
export function findLayer(state: CarrierState, { type, top, bottom }: FollowedLayer): LayerSpan | null {
  const { depth } = state.doping;
  let best: LayerSpan | null = null;
  let most = 0;
  for (const span of layerSpans(state)) {
    const overlap = Math.min(bottom, depth[span.to]) - Math.max(top, depth[span.from]);
    if (span.type === type && overlap > most) [best, most] = [span, overlap];
  }
  return best;
}
