/**
 * The depth mesh: as fine as the profile needs, and no finer.
 *
 * Nodes come in cells of three, (left, middle, right) with the middle exactly half-way, so that Simpson's rule applies
 * to every cell and every layer boundary is the end of a cell. A cell is halved until the logarithm of all doping is
 * nearly straight in it and the net doping nearly linear on its own scale; where the net doping changes sign the cell
 * is cut at the root. Three nodes see nothing of a tail that ends near the edge of a wide cell; so a cell is not much wider than
 * its neighbours.
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
/**
 * Where doping changes by less than so many times its bend, a cell holds the end of a tail (change and bend are 2 to 1) or a top:
 * what happens in a part of it has the weight of a whole node. There the bend must be smaller.
 */
const TAIL = 8;
const TAIL_BEND = 4e-4;
/** A cell is at most this many times as wide as its neighbours. */
const GROWTH = 4;

interface Cell {
  readonly left: MeshNode;
  readonly middle: MeshNode;
  readonly right: MeshNode;
  /** Width it would have without the cut at a junction, which may leave a splinter; cm. */
  readonly scale: number;
  readonly endsAtJunction: boolean;
}

/** Builds the mesh from the surface to `end`. */
export function buildMesh({ end, marks, jumps, sample, refinement }: MeshRequest): Mesh {
  const at = (depth: number): MeshNode => ({ depth, ...sample(depth) });
  const bend = refinement * refinement;
  const isStraight = (change: number, middleBend: number, largest: number): boolean => {
    const size = Math.abs(middleBend);
    return size * bend <= (Math.abs(change) < TAIL * size ? TAIL_BEND : largest);
  };
  const fits = (left: MeshNode, middle: MeshNode, right: MeshNode): boolean => {
    const change = Math.log(right.total / left.total);
    const logBend = Math.log((middle.total * middle.total) / (left.total * right.total)) / 2;
    const scale = Math.max(Math.abs(left.net), Math.abs(middle.net), Math.abs(right.net));
    const netBend = middle.net - (left.net + right.net) / 2;
    return (
      Math.abs(change) * refinement <= LOG_CHANGE &&
      isStraight(change, logBend, LOG_BEND) &&
      isStraight((right.net - left.net) / scale, netBend / scale, NET_BEND)
    );
  };

  /** Appends to `cells` what covers the depths between two nodes. */
  const cover = (
    left: MeshNode,
    right: MeshNode,
    scale: number,
    endsAtJunction: boolean,
    cells: Cell[],
  ): void => {
    const middle = at((left.depth + right.depth) / 2);
    if (changesSign(left, right) || changesSign(left, middle)) {
      const [from, to] = changesSign(left, middle) ? [left, middle] : [left, right];
      const depth = brent((x) => sample(x).net, from.depth, to.depth, JUNCTION_TOLERANCE);
      if (depth > left.depth && depth < right.depth) {
        const junction = { ...at(depth), net: 0 };
        cover(left, junction, scale, true, cells);
        cover(junction, right, scale, endsAtJunction, cells);
        return;
      }
    }
    if (right.depth - left.depth <= NARROWEST_CELL || fits(left, middle, right)) {
      cells.push({ left, middle, right, scale, endsAtJunction });
      return;
    }
    cover(left, middle, scale / 2, false, cells);
    cover(middle, right, scale / 2, endsAtJunction, cells);
  };

  /** The cells with those halved that are too wide for their neighbours; the same list when there are none. */
  const graded = (cells: readonly Cell[]): readonly Cell[] => {
    const scaleOf = (cell: Cell | undefined): number =>
      cell && cell.scale > NARROWEST_CELL ? cell.scale : Number.POSITIVE_INFINITY;
    const finer: Cell[] = [];
    let isGraded = true;
    cells.forEach((cell, i) => {
      const { left, middle, right, scale, endsAtJunction } = cell;
      const widest = GROWTH * Math.min(scaleOf(cells[i - 1]), scaleOf(cells[i + 1]));
      if (scale > widest) isGraded = false;
      if (scale <= widest) finer.push(cell);
      else if (right.depth - left.depth <= widest) finer.push({ ...cell, scale: widest });
      else {
        cover(left, middle, scale / 2, false, finer);
        cover(middle, right, scale / 2, endsAtJunction, finer);
      }
    });
    return isGraded ? cells : graded(finer);
  };

  const ends = cellEnds(end, marks, jumps).map(at);
  const covering: Cell[] = [];
  for (let i = 1; i < ends.length; i++)
    cover(ends[i - 1], ends[i], ends[i].depth - ends[i - 1].depth, false, covering);
  const cells = graded(covering);
  return {
    nodes: [...cells.flatMap(({ left, middle }) => [left, middle]), cells[cells.length - 1].right],
    junctions: cells.flatMap(({ endsAtJunction }, i) => (endsAtJunction ? [2 * i + 2] : [])),
  };
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
