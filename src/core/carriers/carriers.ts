/** The carriers of a doping profile, by the assumption the study names: neutral everywhere, or in electrostatic equilibrium. */

import { intrinsicDensity } from '../material/intrinsic';
import type { SampledDoping } from '../profile/doping';
import { ChargeModel } from './charge';
import { type EquilibriumChoice, equilibrium, equilibriumNear } from './equilibrium';
import { neutralCarriers } from './neutral';
import type { CarrierState } from './state';

export interface CarrierChoice extends EquilibriumChoice {
  readonly carriers: 'neutral' | 'poisson';
}

export function carriersOf(doping: SampledDoping, choice: CarrierChoice): CarrierState {
  return choice.carriers === 'poisson' ? equilibrium(doping, choice) : neutral(doping, choice);
}

/** The same stack a little warmer, colder or otherwise biased, on the nodes of `state`. */
export function carriersNear(state: CarrierState, choice: CarrierChoice): CarrierState {
  return choice.carriers === 'poisson' ? equilibriumNear(state, choice) : neutral(state.doping, choice);
}

function neutral(doping: SampledDoping, choice: CarrierChoice): CarrierState {
  const { temperature } = choice;
  const rest = { doping, temperature, cuts: doping.junctions, electrostatics: null };
  const isPlain =
    choice.ionisation === 'complete' && choice.statistics === 'boltzmann' && choice.narrowing === 'none';
  if (isPlain) {
    const electrons = new Float64Array(doping.depth.length);
    const holes = new Float64Array(doping.depth.length);
    neutralCarriers(doping.net, intrinsicDensity(temperature), electrons, holes);
    const ionised = doping.dopants.map(({ dopant, active }) => ({ dopant, ionised: active }));
    return { ...rest, electrons, holes, ionised };
  }
  const charges = new ChargeModel(doping, choice);
  charges.neutralPotential(new Float64Array(doping.depth.length), 1e-12);
  const parts = charges.ionised();
  const ionised = doping.dopants.map(({ dopant }, k) => ({ dopant, ionised: parts[k] }));
  return { ...rest, electrons: charges.electrons, holes: charges.holes, ionised };
}
