/**
 * The depth mesh: as fine as the profile needs, and no finer.
 *
 * Nodes come in cells of three, (left, middle, right) with the middle exactly half-way, so that Simpson's rule applies
 * to every cell and every layer boundary is the end of a cell. A cell is halved until the logarithm of all doping is
 * nearly straight in it and the net doping nearly linear on its own scale; where the net doping changes sign the cell
 * is cut at the root.
 */

import { brent } from '../numeric/brent';

/** What the mesh needs to know at one depth. `doping` is whatever the caller wants back at the nodes. */
export interface DepthSample {
  /** Active donors - active acceptors, cm^-3. */
  net: number;
  /** All active dopants, cm^-3. */
  total: number;
  /** One concentration per dopant, cm^-3, in the caller's order. */
  doping: Float64Array;
}

export interface MeshNode extends DepthSample {
  /** cm */
  depth: number;
}

export interface Mesh {
  /** Ascending; an odd number of them, every second one a cell's middle. */
  nodes: MeshNode[];
  /** Positions in `nodes` at which the net doping changes sign; always cell ends. */
  junctions: number[];
}

export interface MeshRequest {
  /** Depth of the last node, cm. */
  end: number;
  /** Depths that must be cell ends, in any order; those outside are ignored. */
  marks: readonly number[];
  /** Depths at which the doping jumps: a node stands on either side. */
  jumps: readonly number[];
  sample: (depth: number) => DepthSample;
  /** 1 for the normal mesh, 2 for half the cell widths. */
  refinement: number;
}

/** Distance of the two nodes at a jump from it, and the closest that two marks may come, cm (0.001 nm). */
const JUMP_HALF_WIDTH = 1e-10;
/** Cells are not halved below this, cm (0.01 nm): a hundredth of the accuracy promised for a junction. */
const NARROWEST_CELL = 1e-9;
/** Depth accuracy of a junction, cm (1e-6 nm). */
const JUNCTION_TOLERANCE = 1e-13;
/** Largest change of ln(total) from end to end of a cell, and largest bend of it at the middle. */
const LOG_CHANGE = 0.3;
const LOG_BEND = 4e-3;
/** Largest bend of the net doping at the middle, relative to the largest net doping of the cell. */
const NET_BEND = 0.02;

/** Builds the mesh from the surface to `end`. */
export function buildMesh({ end, marks, jumps, sample, refinement }: MeshRequest): Mesh {
  const at = (depth: number): MeshNode => ({ depth, ...sample(depth) });
  const mesh: Mesh = { nodes: [], junctions: [] };
  const bend = refinement * refinement;
  const fits = (left: MeshNode, middle: MeshNode, right: MeshNode): boolean => {
    const change = Math.log(right.total / left.total);
    const logBend = Math.log((middle.total * middle.total) / (left.total * right.total)) / 2;
    const scale = Math.max(Math.abs(left.net), Math.abs(middle.net), Math.abs(right.net));
    return (
      Math.abs(change) * refinement <= LOG_CHANGE &&
      Math.abs(logBend) * bend <= LOG_BEND &&
      Math.abs(middle.net - (left.net + right.net) / 2) * bend <= NET_BEND * scale
    );
  };

  const cover = (left: MeshNode, right: MeshNode): void => {
    const middle = at((left.depth + right.depth) / 2);
    if (changesSign(left, right) || changesSign(left, middle)) {
      const [from, to] = changesSign(left, middle) ? [left, middle] : [left, right];
      const depth = brent((x) => sample(x).net, from.depth, to.depth, JUNCTION_TOLERANCE);
      if (depth > left.depth && depth < right.depth) {
        const junction = { ...at(depth), net: 0 };
        cover(left, junction);
        mesh.junctions.push(mesh.nodes.length);
        cover(junction, right);
        return;
      }
    }
    if (right.depth - left.depth <= NARROWEST_CELL || fits(left, middle, right)) {
      mesh.nodes.push(left, middle);
      return;
    }
    cover(left, middle);
    cover(middle, right);
  };

  const ends = cellEnds(end, marks, jumps).map(at);
  for (let i = 1; i < ends.length; i++) cover(ends[i - 1], ends[i]);
  mesh.nodes.push(ends[ends.length - 1]);
  return mesh;
}

function changesSign(a: MeshNode, b: MeshNode): boolean {
  return (a.net < 0 && b.net > 0) || (a.net > 0 && b.net < 0);
}

/** Surface, marks, both sides of every jump, and the end: ascending, none closer than the distance across a jump. */
function cellEnds(end: number, marks: readonly number[], jumps: readonly number[]): number[] {
  const sides = jumps.flatMap((x) => [x - JUMP_HALF_WIDTH, x + JUMP_HALF_WIDTH]);
  const clear = marks.filter((x) => jumps.every((jump) => Math.abs(x - jump) > 2 * JUMP_HALF_WIDTH));
  const inside = [...sides, ...clear]
    .filter((x) => x > JUMP_HALF_WIDTH && x < end - JUMP_HALF_WIDTH)
    .sort((a, b) => a - b);
  const apart: number[] = [0];
  for (const x of inside) if (x - apart[apart.length - 1] > JUMP_HALF_WIDTH) apart.push(x);
  return [...apart, end];
}
