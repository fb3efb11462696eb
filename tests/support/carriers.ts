/** Ways of finding carriers, for tests that state what they assume. */

import { type CarrierChoice, carriersOf } from '../../src/core/carriers/carriers';
import type { CarrierState } from '../../src/core/carriers/state';
import type { SampledDoping } from '../../src/core/profile/doping';

/** Electrostatic equilibrium with complete ionisation and Boltzmann statistics at 25 C unless stated. */
export function choice(parts: Partial<CarrierChoice> = {}): CarrierChoice {
  return {
    carriers: 'poisson',
    temperature: 298.15,
    ionisation: 'complete',
    statistics: 'boltzmann',
    narrowing: 'none',
    surface: { charge: 0 },
    reverseBias: [],
    refinement: 1,
    ...parts,
  };
}

/** Neutral everywhere, all dopants ionised. */
export const neutralChoice = (temperature = 298.15): CarrierChoice =>
  choice({ carriers: 'neutral', temperature });

export const neutralState = (doping: SampledDoping, temperature?: number): CarrierState =>
  carriersOf(doping, neutralChoice(temperature));
