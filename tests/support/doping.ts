/** Doping columns for tests of what stands behind the profile: no recipe, no shapes. */

import type { SampledDoping } from '../../src/core/profile/doping';
import { buildMesh } from '../../src/core/profile/mesh';

/** Phosphorus and boron given as functions of depth (cm), sampled from the surface to `end`; `jumps` are where
 * they are discontinuous. */
export function dopingOf(
  phosphorus: (depth: number) => number,
  boron: (depth: number) => number,
  end: number,
  marks: number[] = [],
  refinement = 1,
  jumps: number[] = [],
): SampledDoping {
  const mesh = buildMesh({
    end,
    marks,
    jumps,
    refinement,
    sample: (depth) => {
      const [donors, acceptors] = [phosphorus(depth), boron(depth)];
      return {
        net: donors - acceptors,
        total: donors + acceptors,
        doping: Float64Array.of(donors, acceptors),
      };
    },
  });
  const column = (k: number) => Float64Array.from(mesh.nodes, (node) => node.doping[k]);
  const [donors, acceptors] = [column(0), column(1)];
  return {
    depth: Float64Array.from(mesh.nodes, (node) => node.depth),
    dopants: [
      { dopant: 'phosphorus', chemical: donors, active: donors },
      { dopant: 'boron', chemical: acceptors, active: acceptors },
    ],
    donors,
    acceptors,
    net: Float64Array.from(mesh.nodes, (node) => node.net),
    junctions: mesh.junctions,
  };
}
