/** The nodes of a diffusion: where the dopants are now, and where a plain estimate says they will be. */

import type { Dopant } from '../../material/dopants';
import { DOPANT_FACTS } from '../../material/dopants';
import type { Contribution } from '../../profile/doping';
import { buildMesh } from '../../profile/mesh';
import { diffuse, erfcShape, evaluator } from '../../profile/shape';
import type { Source } from './source';

/** Estimates with these multiples of the constant-diffusivity Dt: as it is, and enhanced. */
const ENHANCEMENTS = [1, 8];
/** Cells may be no wider than this times their neighbour. */
const GROWTH = 2.2;
/** Nodes are no closer than this, cm (0.05 nm). */
const CLOSEST = 5e-9;

/**
 * Ascending nodes from the surface to `end` (cm).
 * @param dtOf product of the constant diffusivity and the time, cm^2.
 */
export function diffusionNodes(
  contributions: readonly Contribution[],
  end: number,
  dtOf: (dopant: Dopant) => number,
  source: Source | null,
  refinement: number,
): Float64Array {
  const stages = [
    contributions,
    ...ENHANCEMENTS.map((factor) => [
      ...contributions.map((part) => ({ ...part, shape: diffuse(part.shape, factor * dtOf(part.dopant)) })),
      ...(source ? [arriving(source, factor * dtOf(source.dopant))] : []),
    ]),
  ];
  const all = stages.flatMap((stage) => cellEnds(stage, end, refinement)).sort((a, b) => a - b);
  const apart = [0];
  for (const x of all) if (x - apart[apart.length - 1] > CLOSEST && x < end - CLOSEST) apart.push(x);
  return Float64Array.from(graded([...apart, end]));
}

const arriving = ({ dopant, surface, stepIndex }: Source, Dt: number): Contribution => ({
  dopant,
  shape: erfcShape(surface, 2 * Math.sqrt(Dt)),
  stepIndex,
});

function cellEnds(contributions: readonly Contribution[], end: number, refinement: number): number[] {
  const parts = contributions.map(({ dopant, shape }) => ({
    at: evaluator(shape),
    sign: DOPANT_FACTS[dopant].role === 'donor' ? 1 : -1,
  }));
  const mesh = buildMesh({
    end,
    marks: contributions.flatMap(({ shape }) => shape.marks),
    jumps: [...new Set(contributions.flatMap(({ shape }) => shape.jumps))],
    refinement,
    sample: (depth) => {
      let net = 0;
      let total = 0;
      for (const { at, sign } of parts) {
        const value = at(depth);
        net += sign * value;
        total += value;
      }
      return { net, total, doping: NONE };
    },
  });
  return mesh.nodes.filter((_, i) => i % 2 === 0).map(({ depth }) => depth);
}

const NONE = new Float64Array(0);

/** Nodes put in so that no cell is much wider than its neighbours. */
function graded(nodes: readonly number[]): number[] {
  let current = [...nodes];
  for (;;) {
    const widths = current.slice(1).map((x, i) => x - current[i]);
    const next = [current[0]];
    widths.forEach((width, i) => {
      const neighbour = Math.min(widths[i - 1] ?? width, widths[i + 1] ?? width);
      if (width > GROWTH * Math.max(neighbour, CLOSEST)) next.push((current[i] + current[i + 1]) / 2);
      next.push(current[i + 1]);
    });
    if (next.length === current.length) return current;
    current = next;
  }
}
