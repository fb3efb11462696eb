/** Carriers and ionised dopants on the nodes they were found on: what mobility and conduction start from. */

import type { Dopant } from '../material/dopants';
import { intrinsicDensity } from '../material/intrinsic';
import type { SampledDoping } from '../profile/doping';

export interface CarrierState {
  /** The doping on the same nodes. */
  readonly doping: SampledDoping;
  /** K */
  readonly temperature: number;
  /** cm^-3 */
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  /** Ionised concentration of each dopant, in the order of the doping, cm^-3. */
  readonly ionised: readonly { readonly dopant: Dopant; readonly ionised: Float64Array }[];
  /** Positions (cell ends) where one layer ends and the next begins. */
  readonly cuts: readonly number[];
  /** Null where neutrality was assumed. */
  readonly electrostatics: Electrostatics | null;
}

export interface Electrostatics {
  /** V, from where n = p in undoped silicon. */
  readonly potential: Float64Array;
  /** One for each of `cuts`. */
  readonly junctions: readonly ElectricalJunction[];
}

/** A junction as the carriers see it; cm and V. */
export interface ElectricalJunction {
  /** Where n = p. */
  readonly depth: number;
  /** Position in `doping.junctions` of the sign change of net doping that it belongs to; null without one. */
  readonly metallurgical: number | null;
  /** Null where a surface of fixed potential or a layer without carriers takes part of the charge. */
  readonly depletion: Depletion | null;
  /**
   * Potential between the nearest neutral silicon above and below, without the bias, V: with even doping (kT/q) ln(Na Nd/ni^2). A
   * layer that is nowhere neutral counts where it is nearest to it. Null beside a layer without carriers.
   */
  readonly builtIn: number | null;
}

export interface Depletion {
  /**
   * Edges of the depleted silicon, cm: where, on average, the charge sits that a small change of the voltage across the junction
   * brings on either side. The distance of the two is exactly permittivity over capacitance.
   */
  readonly edges: readonly [number, number];
  /** F/cm^2 */
  readonly capacitance: number;
}

/** Without bias the majority always reaches the intrinsic density; a layer where it nowhere reaches this part of it is empty. */
const EMPTIED = 0.1;

/** Which carriers there are more of between two positions; null where a reverse bias has left hardly any. */
export function majorityBetween(
  { electrons, holes, temperature }: Pick<CarrierState, 'electrons' | 'holes' | 'temperature'>,
  from: number,
  to: number,
): 'n' | 'p' | null {
  let [n, p] = [0, 0];
  for (let i = from; i <= to; i++) {
    n = Math.max(n, electrons[i]);
    p = Math.max(p, holes[i]);
  }
  if (Math.max(n, p) < EMPTIED * intrinsicDensity(temperature)) return null;
  return n > p ? 'n' : 'p';
}
