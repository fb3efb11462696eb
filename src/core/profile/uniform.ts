/** A constant concentration between two depths, and its exact diffusion behind a sealed surface; also the wafer itself. */

import erf from '@stdlib/math-base-special-erf';
import erfc from '@stdlib/math-base-special-erfc';
import { type Anatomy, edgesWithin, ladder, marksAt, shoulders } from './anatomy';
import type { ConcentrationAt, UniformShape } from './kinds';

/** @param to Infinity for a wafer. A slab that ends before it begins is nothing at all. */
export function uniform(concentration: number, from: number, to: number, Dt = 0): UniformShape {
  const ends = [from, to].filter((x) => x > 0 && x < Number.POSITIVE_INFINITY);
  const empty = !(to > from);
  return {
    kind: 'uniform',
    concentration: empty ? 0 : concentration,
    from,
    to,
    Dt,
    marks: empty ? [] : marksAt(...ends.flatMap((x) => (Dt > 0 ? shoulders(x, Math.sqrt(2 * Dt)) : [x]))),
    jumps: empty || Dt > 0 ? [] : ends,
  };
}

/**
 * C = concentration/2 times the slab seen through the kernel of variance 2Dt, plus its mirror image:
 * erfc((from-x)/r) - erfc((to-x)/r) + erfc((from+x)/r) - erfc((to+x)/r), r = 2 sqrt(Dt).
 * Source: J. Crank, The Mathematics of Diffusion, 2nd ed. 1975, section 2.2.3 with reflection (from memory).
 * Each difference is written so that it keeps its relative precision.
 */
export function uniformEvaluator(shape: UniformShape): ConcentrationAt {
  const { concentration, from, to, Dt } = shape;
  if (concentration === 0) return () => 0;
  if (Dt === 0) return (x) => (x >= from && x < to ? concentration : 0);
  const r = 2 * Math.sqrt(Dt);
  const seenFrom = (x: number): number => {
    if (x < from) return erfc((from - x) / r) - erfc((to - x) / r);
    if (x > to) return erfc((x - to) / r) - erfc((x - from) / r);
    return erf((x - from) / r) + erf((to - x) / r);
  };
  return (x) => (concentration / 2) * (seenFrom(x) + seenFrom(-x));
}

export function uniformAnatomy(shape: UniformShape): Anatomy {
  const { concentration, from, to, Dt } = shape;
  if (concentration === 0) return { edges: new Float64Array(0), kinks: [], beyond: 0 };
  const spread = Math.sqrt(2 * Dt);
  const wafer = to === Number.POSITIVE_INFINITY;
  const high = (wafer ? from : to) + 12 * spread;
  const low = Dt > 0 ? 0 : from;
  const rungs = Dt > 0 ? [...ladder(from, spread), ...(wafer ? [] : ladder(to, spread))] : [];
  return {
    // A wafer that has not diffused has one edge only: nothing above, `beyond` below.
    edges: wafer && Dt === 0 ? Float64Array.of(from) : edgesWithin(rungs, low, high),
    kinks: Dt > 0 ? [] : wafer ? [from] : [from, to],
    beyond: wafer ? concentration : 0,
  };
}
