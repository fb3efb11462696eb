/** Sampled doping at further depths between its nodes: the parabola of ln N through a cell's three nodes, dopant by dopant. */

import { DOPANT_FACTS } from '../material/dopants';
import { intervalOf } from '../numeric/interval';
import type { SampledDoping } from './doping';

/** Largest ratio of concentrations in one cell for which the logarithm is followed; beyond, the concentration itself. */
const STEEPEST = 1e3;

/**
 * The doping at `depth` (cm, ascending, from the first to the last node of `doping`). At its own nodes nothing changes; the mesh
 * keeps the logarithm of the doping nearly straight within a cell, so that what lies between is good to about 1e-4.
 * `junctions` are the positions, in the new columns, of those of `doping` that are among the depths.
 * @param known an earlier resampling of the same doping: what depths have in common is copied.
 */
export function resample(doping: SampledDoping, depth: Float64Array, known = doping): SampledDoping {
  const count = depth.length;
  const cells = new Int32Array(count);
  /** Position among the known depths, or -1. */
  const same = new Int32Array(count);
  for (let i = 0, cell = 0, k = 0; i < count; i++) {
    while (cell + 2 < doping.depth.length - 1 && depth[i] >= doping.depth[cell + 2]) cell += 2;
    while (k + 1 < known.depth.length && known.depth[k] < depth[i]) k++;
    cells[i] = cell;
    same[i] = known.depth[k] === depth[i] ? k : -1;
  }
  const interpolate = (column: Float64Array, knownColumn: Float64Array): Float64Array => {
    const out = new Float64Array(count);
    for (let i = 0; i < count; i++)
      out[i] = same[i] >= 0 ? knownColumn[same[i]] : within(doping.depth, column, cells[i], depth[i]);
    return out;
  };
  const dopants = doping.dopants.map(({ dopant, chemical, active }, k) => {
    const before = known.dopants[k];
    const newChemical = interpolate(chemical, before.chemical);
    return {
      dopant,
      chemical: newChemical,
      active: active === chemical ? newChemical : interpolate(active, before.active),
    };
  });
  const donors = new Float64Array(count);
  const acceptors = new Float64Array(count);
  for (const { dopant, active } of dopants) {
    const side = DOPANT_FACTS[dopant].role === 'donor' ? donors : acceptors;
    for (let i = 0; i < count; i++) side[i] += active[i];
  }
  const net = new Float64Array(count);
  for (let i = 0; i < count; i++) net[i] = donors[i] - acceptors[i];
  const junctions: number[] = [];
  for (const position of doping.junctions) {
    const found = intervalOf(depth, doping.depth[position]);
    if (found < 0 || depth[found] !== doping.depth[position]) continue;
    net[found] = 0;
    junctions.push(found);
  }
  return { depth, dopants, donors, acceptors, net, junctions };
}

function within(depth: Float64Array, column: Float64Array, cell: number, at: number): number {
  const [left, middle, right] = [column[cell], column[cell + 1], column[cell + 2]];
  const t = (at - depth[cell]) / (depth[cell + 2] - depth[cell]);
  const least = Math.min(left, middle, right);
  if (least === right && least === left && least === middle) return left;
  if (least > 0 && Math.max(left, middle, right) < STEEPEST * least)
    return Math.exp(parabola(Math.log(left), Math.log(middle), Math.log(right), t));
  return t < 0.5 ? left + 2 * t * (middle - left) : middle + (2 * t - 1) * (right - middle);
}

/** The parabola through (0, a), (1/2, b), (1, c). */
function parabola(a: number, b: number, c: number, t: number): number {
  return a + t * (4 * b - 3 * a - c + t * 2 * (a + c - 2 * b));
}
