/** Carriers and ionised dopants on the nodes they were found on: what mobility and conduction start from. */

import type { Dopant } from '../material/dopants';
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
  /**
   * Edges of the depleted silicon: where, on average, the charge sits that a small change of the voltage across the junction brings
   * on either side. The distance of the two is exactly permittivity over capacitance.
   */
  readonly depletion: readonly [number, number];
  /** F/cm^2 */
  readonly capacitance: number;
  /** Potential between neutral silicon with the doping of the two edges, without bias. */
  readonly builtIn: number;
}
