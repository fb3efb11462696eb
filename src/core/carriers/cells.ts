/**
 * The mesh of the electrostatics: the cells of the doping, cut further where potential changes quickly. A mesh is the ascending
 * list of its cell ends; nodes are those and the exact middles, as everywhere.
 */

import { debyeLength } from '../material/silicon';
import type { SampledDoping } from '../profile/doping';

/** A cell is no wider than this part of its distance to the nearest junction, step or charged surface. */
const GROWTH = 0.5;
/** Width of the cells at such a place, in Debye lengths of the doping beside it. */
const FINEST = 1;
/** Largest change of the potential from a cell's end to its middle where carriers matter, kT/q. */
const POTENTIAL_CHANGE = 0.5;
/** Width of a cell that is not neutral, in Debye lengths of its carriers. */
const WIDEST = 2;
/**
 * Debye length, cm, beyond which cells get smaller by its fourth root: a junction so soft moves far for a small error of the
 * potential, and that falls with the fourth power of the width. In nearly intrinsic silicon the potential itself is small.
 */
const SOFT = 5e-6;
/** Carriers below this part of the net doping beside them conduct nothing worth resolving, except where n = p is to be found. */
const NEGLIGIBLE = 1e-6;
/** Charge below this part of the net doping counts as neutral. */
const NEUTRAL = 1e-3;
/** A cell is cut into at most so many at once: the first potential on coarse cells is only a guide. */
const MOST_PIECES = 6;
/** No cell of the doping is cut below this at first, cm; a cell across a jump is narrower. */
const NARROWEST = 1e-9;
/** Where carriers pile up to many times the doping, they fall as 1/x^2: cells are smaller by this factor. */
const PILED_UP = 2;

export function cellEndsOf(doping: SampledDoping): number[] {
  return Array.from({ length: (doping.depth.length + 1) / 2 }, (_, i) => doping.depth[2 * i]);
}

export function nodesOf(ends: readonly number[]): Float64Array {
  const depth = new Float64Array(2 * ends.length - 1);
  for (let i = 0; i < ends.length; i++) {
    depth[2 * i] = ends[i];
    if (i > 0) depth[2 * i - 1] = (ends[i - 1] + ends[i]) / 2;
  }
  return depth;
}

/**
 * Cuts the cells so that they grow away from every junction, step and charged surface, where the silicon is depleted or piled up.
 * @param refinement 2 halves all widths.
 */
export function graded(
  doping: SampledDoping,
  temperature: number,
  isSurfaceCharged: boolean,
  refinement: number,
): number[] {
  const places = placesOf(doping, temperature, isSurfaceCharged);
  const ends = cellEndsOf(doping);
  if (places.length === 0) return ends;
  const out = [ends[0]];
  const cover = (from: number, to: number): void => {
    const width = to - from;
    if (width > NARROWEST && width * refinement > widestAt(places, from, to)) {
      const middle = from + width / 2;
      cover(from, middle);
      cover(middle, to);
    } else out.push(to);
  };
  for (let i = 1; i < ends.length; i++) cover(ends[i - 1], ends[i]);
  return out;
}

interface Place {
  readonly depth: number;
  readonly finest: number;
}

function placesOf(doping: SampledDoping, temperature: number, isSurfaceCharged: boolean): Place[] {
  const { depth, donors, acceptors, junctions } = doping;
  const place = (i: number, j: number): Place => {
    const total = Math.max(donors[i] + acceptors[i], donors[j] + acceptors[j]);
    return { depth: depth[i], finest: FINEST * debyeLength(Math.max(total, 1), temperature) };
  };
  const places = junctions
    .map((i) => place(Math.max(0, i - 2), Math.min(depth.length - 1, i + 2)))
    .map((each, k) => ({ ...each, depth: depth[junctions[k]] }));
  for (let i = 0; i + 2 < depth.length; i += 2)
    if (depth[i + 2] - depth[i] < NARROWEST) places.push(place(i, i + 2));
  if (isSurfaceCharged) places.push(place(0, 0));
  return places;
}

function widestAt(places: readonly Place[], from: number, to: number): number {
  let widest = Number.POSITIVE_INFINITY;
  for (const { depth, finest } of places) {
    const distance = Math.max(0, from - depth, depth - to);
    widest = Math.min(widest, finest + GROWTH * distance);
  }
  return widest;
}

/** What is known of a solution on the nodes of a mesh. */
export interface Resolved {
  /** K */
  readonly temperature: number;
  readonly depth: Float64Array;
  /** kT/q */
  readonly potential: Float64Array;
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  readonly intrinsic: Float64Array;
  readonly charge: Float64Array;
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
}

/** The cells cut where the potential changes too much from node to node; the same list when it nowhere does. */
export function refined(ends: readonly number[], found: Resolved, refinement: number): readonly number[] {
  const out = [ends[0]];
  for (let cell = 0; cell + 1 < ends.length; cell++) {
    const pieces = piecesOf(found, 2 * cell, refinement);
    const [from, to] = [ends[cell], ends[cell + 1]];
    for (let k = 1; k < pieces; k++) out.push(from + ((to - from) * k) / pieces);
    out.push(to);
  }
  return out.length === ends.length ? ends : out;
}

function piecesOf(found: Resolved, i: number, refinement: number): number {
  const { depth, potential, electrons, holes, temperature } = found;
  const width = depth[i + 2] - depth[i];
  let carriers = 0;
  let charge = 0;
  let net = 0;
  for (let k = i; k <= i + 2; k++) {
    carriers = Math.max(carriers, electrons[k], holes[k]);
    charge = Math.max(charge, Math.abs(found.charge[k]));
    net = Math.max(net, Math.abs(found.donors[k] - found.acceptors[k]));
  }
  const holdsJunction = electrons[i] > holes[i] !== electrons[i + 2] > holes[i + 2];
  const matters = carriers >= NEGLIGIBLE * net && charge >= NEUTRAL * net;
  if (!holdsJunction && !matters) return 1;
  const change = Math.max(
    Math.abs(potential[i + 1] - potential[i]),
    Math.abs(potential[i + 2] - potential[i + 1]),
  );
  const widths = matters ? width / (WIDEST * debyeLength(carriers, temperature)) : 0;
  const reach = debyeLength(Math.max(net, carriers), temperature) * Math.max(1, found.intrinsic[i + 1] / net);
  const softness = Math.max(1, Math.sqrt(Math.sqrt(reach / SOFT)));
  const piledUp = charge > 2 * net ? PILED_UP : 1;
  const wanted = refinement * softness * piledUp * Math.max(change / POTENTIAL_CHANGE, widths);
  return Math.max(1, Math.min(MOST_PIECES, Math.ceil(wanted - 1e-9)));
}
