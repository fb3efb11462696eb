/** Mobility and resistivity of a uniformly doped piece of silicon, by any of the models. */

import { neutralCarriers } from '../carriers/neutral';
import { ELEMENTARY_CHARGE } from '../material/constants';
import { DOPANT_FACTS, type Dopant } from '../material/dopants';
import { intrinsicDensity } from '../material/intrinsic';
import type { MobilityName } from '../study/names';
import { mobilityModel } from './list';
import type { MobilityInput, MobilityModel } from './model';

export interface UniformDoping {
  readonly dopant: Dopant;
  /** cm^-3, all ionised */
  readonly concentration: number;
  /** K */
  readonly temperature: number;
}

export interface UniformMobility {
  /** cm^2/Vs */
  readonly electronMobility: number;
  readonly holeMobility: number;
  /** cm^-3 */
  readonly electrons: number;
  readonly holes: number;
  readonly majority: 'electrons' | 'holes';
}

/** The model's input for one depth of uniformly doped, neutral silicon. */
export function uniformInput({ dopant, concentration, temperature }: UniformDoping): MobilityInput {
  const isDonor = DOPANT_FACTS[dopant].role === 'donor';
  const column = Float64Array.of(concentration);
  const none = Float64Array.of(0);
  const part = [{ dopant, ionised: column }];
  const electrons = new Float64Array(1);
  const holes = new Float64Array(1);
  const net = Float64Array.of(isDonor ? concentration : -concentration);
  neutralCarriers(net, intrinsicDensity(temperature), electrons, holes);
  return {
    temperature,
    donors: isDonor ? column : none,
    acceptors: isDonor ? none : column,
    electrons,
    holes,
    donorParts: isDonor ? part : [],
    acceptorParts: isDonor ? [] : part,
  };
}

/** Both mobilities and both carriers of uniformly doped silicon. */
export function mobilityAt(model: MobilityModel, doping: UniformDoping): UniformMobility {
  const input = uniformInput(doping);
  const output = { electrons: new Float64Array(1), holes: new Float64Array(1) };
  model.evaluate(input, output);
  return {
    electronMobility: output.electrons[0],
    holeMobility: output.holes[0],
    electrons: input.electrons[0],
    holes: input.holes[0],
    majority: DOPANT_FACTS[doping.dopant].role === 'donor' ? 'electrons' : 'holes',
  };
}

/**
 * Resistivity (Ohm cm, by both carriers), majority mobility (cm^2/Vs) and carriers (cm^-3) of silicon uniformly doped with
 * one completely ionised dopant.
 */
export function uniformSilicon(
  dopant: Dopant,
  concentration_cm3: number,
  temperature_K: number,
  modelName: MobilityName,
): { resistivity: number; mobility: number; electrons: number; holes: number } {
  const at = mobilityAt(mobilityModel(modelName), {
    dopant,
    concentration: concentration_cm3,
    temperature: temperature_K,
  });
  const { electrons, holes } = at;
  return {
    resistivity: 1 / (ELEMENTARY_CHARGE * (electrons * at.electronMobility + holes * at.holeMobility)),
    mobility: at.majority === 'electrons' ? at.electronMobility : at.holeMobility,
    electrons,
    holes,
  };
}
