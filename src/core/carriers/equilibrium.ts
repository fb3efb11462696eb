/**
 * Carriers in equilibrium through the whole stack, from Poisson's equation on a mesh of its own: depleted at junctions, piled up
 * at steps, layers ending where n = p. A reverse bias is a quasi-Fermi potential of its own for each layer.
 */

import { thermalVoltage } from '../material/silicon';
import { intervalOf } from '../numeric/interval';
import type { SampledDoping } from '../profile/doping';
import { resample } from '../profile/resample';
import { setBias } from './bias';
import { graded, nodesOf, refined } from './cells';
import { ChargeModel, type Statistics } from './charge';
import { crossings, electricalJunctions, parting } from './junctions';
import { PoissonSystem, type SurfaceCondition, solvePoisson } from './poisson';
import type { CarrierState } from './state';

export interface EquilibriumChoice extends Statistics {
  /** Sheet of charge on the surface, cm^-2 of q; or the surface's potential against neutral silicon there, V. */
  readonly surface: { readonly charge: number } | { readonly potential: number };
  /** Reverse voltage of each metallurgical junction from the surface down, V; missing ones have none. */
  readonly reverseBias: readonly number[];
  /** 1 for the normal mesh, 2 for half its widths. */
  readonly refinement: number;
}

/** The first potentials only guide the cutting; after so many rounds the mesh is as fine as asked for. */
const MOST_ROUNDS = 12;
/** Steps, kT/q, that end the iteration: on the way to the mesh, and on it. */
const GUIDE_STEP = 1e-3;
const LAST_STEP = 1e-5;
/** Accuracy of the neutral potential, kT/q: as a start, and where a surface potential is measured from it. */
const START_TOLERANCE = 0.1;
const SURFACE_TOLERANCE = 1e-10;

/** A potential on some nodes, kT/q, to start from. */
interface Start {
  readonly depth: Float64Array;
  readonly potential: Float64Array;
}

export function equilibrium(doping: SampledDoping, choice: EquilibriumChoice): CarrierState {
  const isCharged = 'potential' in choice.surface || choice.surface.charge !== 0;
  let ends: readonly number[] = graded(doping, choice.temperature, isCharged, choice.refinement);
  let guide = solveOn(doping, ends, choice, null, GUIDE_STEP);
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const finer = refined(ends, guide, choice.refinement);
    if (finer === ends) break;
    ends = finer;
    guide = solveOn(doping, ends, choice, guide, GUIDE_STEP);
  }
  const cuts = crossings(guide);
  return stateOf(solveOn(doping, withEnds(ends, cuts), choice, guide, LAST_STEP), choice, cuts);
}

/** The same stack at another temperature or bias on the mesh that was found for it, starting from its potential. */
export function equilibriumNear(state: CarrierState, choice: EquilibriumChoice): CarrierState {
  const potential = state.electrostatics?.potential;
  if (!potential) throw new Error('the state has no potential to start from');
  const { depth } = state.doping;
  const scale = 1 / thermalVoltage(choice.temperature);
  const start = { depth, potential: potential.map((v) => v * scale) };
  const found = solveNodes(state.doping, choice, start, LAST_STEP);
  return stateOf(
    found,
    choice,
    state.cuts.map((i) => depth[i]),
  );
}

interface Found {
  readonly doping: SampledDoping;
  readonly charges: ChargeModel;
  readonly system: PoissonSystem;
  readonly temperature: number;
  readonly depth: Float64Array;
  readonly potential: Float64Array;
  readonly intrinsic: Float64Array;
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  readonly charge: Float64Array;
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
}

function solveOn(
  doping: SampledDoping,
  ends: readonly number[],
  choice: EquilibriumChoice,
  start: Found | null,
  shortest: number,
): Found {
  return solveNodes(resample(doping, nodesOf(ends), start?.doping), choice, start, shortest);
}

function solveNodes(
  doping: SampledDoping,
  choice: EquilibriumChoice,
  start: Start | null,
  shortest: number,
): Found {
  const { depth, donors, acceptors } = doping;
  const { temperature, surface } = choice;
  const charges = new ChargeModel(doping, choice);
  setBias(charges, doping, choice.reverseBias, thermalVoltage(temperature));
  const potential = start ? interpolated(start, depth) : new Float64Array(depth.length);
  if (start) charges.bound(potential);
  const isFixed = 'potential' in surface;
  let condition: SurfaceCondition = { charge: isFixed ? 0 : surface.charge };
  if (isFixed || !start) {
    const neutral = start ? new Float64Array(depth.length) : potential;
    charges.neutralPotential(neutral, isFixed ? SURFACE_TOLERANCE : START_TOLERANCE);
    if (isFixed) condition = { potential: neutral[0] + surface.potential / thermalVoltage(temperature) };
  }
  const system = new PoissonSystem(depth, temperature, isFixed);
  solvePoisson(system, charges, condition, potential, shortest);
  const { electrons, holes, charge, intrinsic } = charges;
  return {
    doping,
    charges,
    temperature,
    system,
    depth,
    potential,
    intrinsic,
    electrons,
    holes,
    charge,
    donors,
    acceptors,
  };
}

function interpolated(start: Start, depth: Float64Array): Float64Array {
  const last = start.depth.length - 1;
  return depth.map((x) => {
    const i = Math.min(last - 1, intervalOf(start.depth, x));
    const t = (x - start.depth[i]) / (start.depth[i + 1] - start.depth[i]);
    return start.potential[i] + t * (start.potential[i + 1] - start.potential[i]);
  });
}

/** The list with further cell ends put in; one that is there already stays single. */
function withEnds(ends: readonly number[], more: readonly number[]): number[] {
  return [...new Set([...ends, ...more])].sort((a, b) => a - b);
}

function stateOf(found: Found, choice: EquilibriumChoice, cutDepths: readonly number[]): CarrierState {
  const { doping, charges, depth, potential } = found;
  const volt = thermalVoltage(choice.temperature);
  const positions = cutDepths.map((x) => depth.indexOf(x));
  const cuts = parting(positions, found);
  const ionised = charges.ionised();
  return {
    doping,
    temperature: choice.temperature,
    electrons: found.electrons,
    holes: found.holes,
    ionised: doping.dopants.map(({ dopant }, k) => ({ dopant, ionised: ionised[k] })),
    cuts,
    electrostatics: {
      potential: potential.map((u) => u * volt),
      junctions: electricalJunctions(found, cuts, volt),
    },
  };
}
