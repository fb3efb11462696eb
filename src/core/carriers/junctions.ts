/** Junctions as the carriers see them: where n = p, how far the depletion reaches, and which sign change of doping they belong to. */

import { ELEMENTARY_CHARGE } from '../material/constants';
import { debyeLength, PERMITTIVITY, thermalVoltage } from '../material/silicon';
import { intervalOf } from '../numeric/interval';
import type { SampledDoping } from '../profile/doping';
import type { ChargeModel } from './charge';
import type { PoissonSystem } from './poisson';
import { type CarrierState, type Depletion, type ElectricalJunction, majorityBetween } from './state';

type Carriers = Pick<CarrierState, 'electrons' | 'holes' | 'temperature'>;

interface Found extends Carriers {
  readonly doping: SampledDoping;
  readonly depth: Float64Array;
  /** kT/q */
  readonly potential: Float64Array;
  /** Evaluated at the potential. */
  readonly charges: ChargeModel;
}

/** With what is needed to ask how it answers a small change. */
interface Solved extends Found {
  readonly system: PoissonSystem;
}

/** Charge over majority carriers up to which silicon is taken for neutral in looking for the built-in voltage. */
const NEARLY_NEUTRAL = 0.1;
/** Debye lengths over which it must be so. */
const NEUTRAL_LENGTHS = 3;
/** To this part the charges of the two sides must be equal, and their distance permittivity over capacitance. */
const BALANCE = 1e-3;
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

/** Those of `cuts` (positions) that part different layers: a reverse bias can leave places of nothing where n = p, too. */
export function parting(cuts: readonly number[], carriers: Carriers): number[] {
  const last = carriers.electrons.length - 1;
  const types = [0, ...cuts].map((from, k) => majorityBetween(carriers, from, cuts[k] ?? last));
  return cuts.filter((_, k) => types[k] !== types[k + 1]);
}

/** What is to be said of the junctions at `cuts` (positions); `volt` is kT/q. Uses the system's workspace. */
export function electricalJunctions(
  found: Solved,
  cuts: readonly number[],
  volt: number,
): ElectricalJunction[] {
  const { depth, doping } = found;
  const bounds = [0, ...cuts, depth.length - 1];
  const free = new Set(doping.junctions.map((_, k) => k));
  return cuts.map((cut, k): ElectricalJunction => {
    const [top, bottom] = [bounds[k], bounds[k + 2]];
    const [above, below] = [majorityBetween(found, top, cut), majorityBetween(found, cut, bottom)];
    const isN = above === 'n' || (above === null && below === 'p');
    const metallurgical = match(doping, depth[cut], !isN, free);
    if (metallurgical !== null) free.delete(metallurgical);
    const place = { depth: depth[cut], metallurgical };
    if (above === null || below === null) return { ...place, depletion: null, builtIn: null };
    const depletion = smallSignal(found, cut, top, bottom, isN, volt);
    const [upper, lower] = (depletion?.edges ?? [depth[cut], depth[cut]]).map((x) => nodeAt(depth, x));
    const bending = bandBending(found, upper, top, isN) + bandBending(found, lower, bottom, !isN);
    return { ...place, depletion, builtIn: volt * bending };
  });
}

/**
 * How far the bands of neutral silicon bend towards n, or towards p, against its Fermi level, kT/q: of the first that is found from
 * position `from` to `to`. Where none is, as in layers thinner than their depletion, how far they bend at most.
 */
function bandBending(found: Found, from: number, to: number, isN: boolean): number {
  const { depth, potential, charges, temperature } = found;
  const { charge, response, electrons, holes, electronLevel, holeLevel } = charges;
  const [carriers, level, sign] = isN ? [electrons, electronLevel, 1] : [holes, holeLevel, -1];
  const step = from < to ? 1 : -1;
  const bent = (i: number): number => sign * (potential[i] - level[i]);
  const lacking = (i: number): number => (sign * charge[i]) / carriers[i];
  // By the logarithm of doping over carriers the bands bend further; less quickly do carriers answer that are degenerate.
  const neutral = (i: number): number => bent(i) + (Math.log1p(lacking(i)) * carriers[i]) / response[i];
  let most = Number.NEGATIVE_INFINITY;
  let first = -1;
  for (let i = from; i !== to + step; i += step) {
    most = Math.max(most, bent(i));
    if (Math.abs(lacking(i)) >= NEARLY_NEUTRAL) first = -1;
    else if (first < 0) first = i;
    // Charge that only changes its sign is gone within a Debye length.
    if (first >= 0) {
      const reach = NEUTRAL_LENGTHS * debyeLength(carriers[first], temperature);
      if (Math.abs(depth[i] - depth[first]) >= reach) return neutral(first);
    }
  }
  return first >= 0 ? neutral(first) : most;
}

const nodeAt = (depth: Float64Array, x: number): number =>
  Math.min(depth.length - 1, Math.max(0, intervalOf(depth, x)));

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
): Depletion | null {
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
  const capacitance = (ELEMENTARY_CHARGE * Math.abs(upper.charge)) / volt;
  const isWhole =
    Math.abs(((lower.centre - upper.centre) * capacitance) / PERMITTIVITY - 1) < BALANCE &&
    Math.abs(upper.charge + lower.charge) < BALANCE * Math.abs(upper.charge);
  return isWhole ? { edges: [upper.centre, lower.centre], capacitance } : null;
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
