/** A shape that was buried or stripped after it had diffused: the same curve further down or up, cut off above. */

import { type Anatomy, edgesWithin, marksAt } from './anatomy';
import type { ConcentrationAt, MovedShape, Shape } from './kinds';

/** Shifts that cancel to this (cm) are none. */
const NO_SHIFT = 1e-15;

/** `source` shifted down by `shift`, of which the part x >= from is left; the source itself when that changes nothing. */
export function moved(source: Shape, shift: number, from: number): Shape {
  if (source.kind === 'moved')
    return moved(source.source, source.shift + shift, Math.max(from, source.from + shift));
  if (Math.abs(shift) < NO_SHIFT && from < NO_SHIFT) return source;
  const below = (depths: readonly number[]): number[] => depths.map((x) => x + shift).filter((x) => x > from);
  return {
    kind: 'moved',
    source,
    shift,
    from,
    marks: marksAt(from, ...below(source.marks)),
    jumps: marksAt(...(from > 0 ? [from] : []), ...below(source.jumps)),
  };
}

export function movedEvaluator(shape: MovedShape, source: ConcentrationAt): ConcentrationAt {
  const { shift, from } = shape;
  // from may round to a hair above the source's own surface
  return (x) => (x < from ? 0 : source(Math.max(0, x - shift)));
}

export function movedAnatomy(shape: MovedShape, source: Anatomy): Anatomy {
  const { shift, from } = shape;
  const depths = Array.from(source.edges, (x) => x + shift);
  if (depths.length === 0) return source;
  const first = Math.max(from, depths[0]);
  const last = depths[depths.length - 1];
  const onlyBeyond = source.beyond > 0 && last <= first;
  return {
    edges: onlyBeyond ? Float64Array.of(first) : edgesWithin(depths, first, last),
    kinks: marksAt(from, ...source.kinks.map((x) => x + shift).filter((x) => x > from)),
    beyond: source.beyond,
  };
}
