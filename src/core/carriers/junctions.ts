/** Junctions as the carriers see them: where n = p, how far the depletion reaches, and which sign change of doping they belong to. */

import { ELEMENTARY_CHARGE } from '../material/constants';
import { PERMITTIVITY, thermalVoltage } from '../material/silicon';
import { intervalOf } from '../numeric/interval';
import type { SampledDoping } from '../profile/doping';
import type { ChargeModel } from './charge';
import type { PoissonSystem } from './poisson';
import type { ElectricalJunction } from './state';

interface Found {
  readonly doping: SampledDoping;
  /** K */
  readonly temperature: number;
  readonly depth: Float64Array;
  /** kT/q */
  readonly potential: Float64Array;
  readonly intrinsic: Float64Array;
  /** Evaluated at the potential. */
  readonly charges: ChargeModel;
}

/** With what is needed to ask how it answers a small change. */
interface Solved extends Found {
  readonly system: PoissonSystem;
}

/** Two cell ends may come as close as this, cm. */
const CLOSEST = 1e-11;

/** Depths where n = p, cm. */
export function crossings({ depth, potential, charges, temperature }: Found): number[] {
  const found: number[] = [];
  const { charge } = charges;
  const perField = ELEMENTARY_CHARGE / (PERMITTIVITY * thermalVoltage(temperature));
  const ratio = (i: number) => charges.logRatio(potential[i], i);
  for (let i = 0; i + 2 < depth.length; i += 2) {
    if (i > 0 && ratio(i) === 0) found.push(depth[i]);
    for (const half of [0, 1] as const) {
      const [low, high] = [ratio(i + half), ratio(i + half + 1)];
      if (!(low * high < 0 || (high === 0 && half === 0))) continue;
      const width = depth[i + 2] - depth[i];
      const density = [charge[i], charge[i + 1], charge[i + 2]];
      const t = rootInHalf(low, high, density, 2 * perField * width * width, half / 2);
      found.push(nearestEnd(depth[i] + t * width, depth[i], depth[i + 2]));
    }
  }
  return found.filter((x) => x > 0 && x < depth[depth.length - 1]);
}

/**
 * Where ln(n/p), `low` and `high` at the ends of a half of the cell, is zero: it bends as twice the potential does by the charge,
 * a parabola through the cell's nodes. Depths in cell widths; by bisection, since it changes sign.
 */
function rootInHalf(
  low: number,
  high: number,
  [a, b, c]: readonly number[],
  bend: number,
  from: number,
): number {
  const [slope, curve] = [4 * b - 3 * a - c, 2 * (a + c - 2 * b)];
  const bent = (t: number): number => -bend * t * t * (a / 2 + t * (slope / 6 + t * (curve / 12)));
  const to = from + 0.5;
  const tilt = 2 * (high - low - bent(to) + bent(from));
  const at = (t: number): number => low + (t - from) * tilt + bent(t) - bent(from);
  let [start, end] = [from, to];
  for (let round = 0; round < 50; round++) {
    const middle = (start + end) / 2;
    if (at(middle) > 0 === high > 0) end = middle;
    else start = middle;
  }
  return (start + end) / 2;
}

const nearestEnd = (x: number, from: number, to: number): number =>
  x - from < CLOSEST ? from : to - x < CLOSEST ? to : x;

/** What is to be said of the junctions at `cuts` (positions); `volt` is kT/q. Uses the system's workspace. */
export function electricalJunctions(
  found: Solved,
  cuts: readonly number[],
  volt: number,
): ElectricalJunction[] {
  const { depth, doping, charges, potential } = found;
  const isNAt = (i: number): boolean => charges.logRatio(potential[i], i) > 0;
  const bounds = [0, ...cuts, depth.length - 1];
  const free = new Set(doping.junctions.map((_, k) => k));
  return cuts.map((cut, k) => {
    const isN = [isNAt(bounds[k] + 1), isNAt(cut + 1)];
    const { edges, capacitance } = smallSignal(found, cut, bounds[k], bounds[k + 2], isN[0], volt);
    const metallurgical = match(doping, depth[cut], isN[1], free);
    if (metallurgical !== null) free.delete(metallurgical);
    const [upper, lower] = edges.map((x) => bandBending(found, x));
    return {
      depth: depth[cut],
      metallurgical,
      depletion: edges,
      capacitance,
      builtIn: Math.abs(upper - lower) * volt,
    };
  });
}

/** Potential of neutral silicon with the doping at a depth against undoped silicon, kT/q. */
function bandBending({ depth, doping, intrinsic }: Found, x: number): number {
  const i = Math.max(0, intervalOf(depth, x));
  return Math.asinh(doping.net[i] / (2 * intrinsic[i]));
}

/**
 * The charge that follows a small change of the voltage across a junction: everything above it has its Fermi level raised by one
 * kT/q in a linearised Poisson equation; its minority
 * carriers keep the level of the layer below, which gives them, and down there the other way about.
 */
function smallSignal(
  { depth, system, charges }: Solved,
  cut: number,
  top: number,
  bottom: number,
  isN: boolean,
  volt: number,
): { edges: [number, number]; capacitance: number } {
  const { response, electronResponse } = charges;
  const raised = (i: number): number => {
    const ofElectrons = electronResponse[i];
    const ofMajority = isN ? ofElectrons : response[i] - ofElectrons;
    if (i < top) return response[i];
    return depth[i] < (depth[cut] + depth[bottom]) / 2 ? ofMajority : 0;
  };
  const { step } = system;
  step.fill(0);
  for (let i = 0; i + 2 < depth.length; i += 2) {
    const sixth = (depth[i + 2] - depth[i]) / 6;
    step[i] += sixth * raised(i);
    step[i + 1] = 4 * sixth * raised(i + 1);
    step[i + 2] = sixth * raised(i + 2);
  }
  system.solve(response);
  const change = (i: number): number => raised(i) - response[i] * step[i];
  const side = (from: number, to: number): { charge: number; centre: number } => {
    let charge = 0;
    let moment = 0;
    for (let i = from; i < to; i += 2) {
      const sixth = (depth[i + 2] - depth[i]) / 6;
      const [a, b, c] = [sixth * change(i), 4 * sixth * change(i + 1), sixth * change(i + 2)];
      charge += a + b + c;
      moment += a * depth[i] + b * depth[i + 1] + c * depth[i + 2];
    }
    return { charge, centre: moment / charge };
  };
  const upper = side(0, cut);
  const lower = side(cut, depth.length - 1);
  return {
    edges: [upper.centre, lower.centre],
    capacitance: (ELEMENTARY_CHARGE * Math.abs(upper.charge)) / volt,
  };
}

/** The nearest sign change of net doping in the same sense that no other junction has taken. */
function match(doping: SampledDoping, depth: number, toN: boolean, free: ReadonlySet<number>): number | null {
  let best: number | null = null;
  let distance = Number.POSITIVE_INFINITY;
  for (const k of free) {
    const i = doping.junctions[k];
    if (doping.net[i + 1] > 0 !== toN) continue;
    const away = Math.abs(doping.depth[i] - depth);
    if (away < distance) [best, distance] = [k, away];
  }
  return best;
}
