/** All contributions summed dopant by dopant, cut to what is electrically active, and sampled on a mesh of their own. */

import { DOPANT_FACTS, DOPANTS, type Dopant } from '../material/dopants';
import { buildMesh, type DepthSample } from './mesh';
import { evaluator, type Shape } from './shape';

/** One dopant's profile from one recipe step; several may share a dopant. */
export interface Contribution {
  readonly dopant: Dopant;
  readonly shape: Shape;
  /** Position of the step in the document, from 1; 0 for the wafer itself. */
  readonly stepIndex: number;
}

/** What of a dopant conducts: the fraction of the chemical concentration, never above the limit (cm^-3). */
export interface Activation {
  readonly fraction: Readonly<Partial<Record<Dopant, number>>>;
  readonly limit: Readonly<Partial<Record<Dopant, number>>>;
}

/** The doping on its mesh: cm and cm^-3, all columns of one length; node layout as in `mesh.ts`. */
export interface SampledDoping {
  readonly depth: Float64Array;
  readonly dopants: readonly {
    readonly dopant: Dopant;
    readonly chemical: Float64Array;
    readonly active: Float64Array;
  }[];
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
  /** Active donors - active acceptors; exactly 0 at a junction. */
  readonly net: Float64Array;
  /** Positions of the junctions. */
  readonly junctions: readonly number[];
}

/**
 * Samples the contributions from the surface to `end` (cm).
 * @param refinement 1 for the normal mesh, 2 for half the cell widths.
 */
export function sampleDoping(
  contributions: readonly Contribution[],
  activation: Activation,
  end: number,
  refinement: number,
): SampledDoping {
  const present = DOPANTS.filter((dopant) => contributions.some((part) => part.dopant === dopant));
  const mesh = buildMesh({
    end,
    marks: contributions.flatMap(({ shape }) => shape.marks),
    jumps: [...new Set(contributions.flatMap(({ shape }) => shape.jumps))],
    sample: sampler(present, contributions, activation),
    refinement,
  });
  const count = mesh.nodes.length;
  const depth = new Float64Array(count);
  const net = new Float64Array(count);
  const donors = new Float64Array(count);
  const acceptors = new Float64Array(count);
  const dopants = present.map((dopant) => ({
    dopant,
    chemical: new Float64Array(count),
    active: new Float64Array(count),
  }));
  const active = present.map((dopant) => activeOf(dopant, activation));
  mesh.nodes.forEach((node, i) => {
    depth[i] = node.depth;
    net[i] = node.net;
    dopants.forEach((column, k) => {
      column.chemical[i] = node.doping[k];
      column.active[i] = active[k](node.doping[k]);
      const side = DOPANT_FACTS[column.dopant].role === 'donor' ? donors : acceptors;
      side[i] += column.active[i];
    });
  });
  return { depth, dopants, donors, acceptors, net, junctions: mesh.junctions };
}

function activeOf(dopant: Dopant, { fraction, limit }: Activation): (chemical: number) => number {
  const share = fraction[dopant] ?? 1;
  const most = limit[dopant] ?? Number.POSITIVE_INFINITY;
  return (chemical) => Math.min(chemical * share, most);
}

function sampler(
  present: readonly Dopant[],
  contributions: readonly Contribution[],
  activation: Activation,
): (depth: number) => DepthSample {
  const columns = present.map((dopant) => ({
    parts: contributions.filter((part) => part.dopant === dopant).map(({ shape }) => evaluator(shape)),
    active: activeOf(dopant, activation),
    sign: DOPANT_FACTS[dopant].role === 'donor' ? 1 : -1,
  }));
  return (depth) => {
    const doping = new Float64Array(columns.length);
    let net = 0;
    let total = 0;
    for (let k = 0; k < columns.length; k++) {
      const { parts, active, sign } = columns[k];
      let chemical = 0;
      for (const part of parts) chemical += part(depth);
      doping[k] = chemical;
      const conducting = active(chemical);
      net += sign * conducting;
      total += conducting;
    }
    return { net, total, doping };
  };
}
