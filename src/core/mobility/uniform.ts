/** Mobility and resistivity of a uniformly doped piece of silicon, by any of the models. */

import { ChargeModel } from '../carriers/charge';
import { ELEMENTARY_CHARGE } from '../material/constants';
import { DOPANT_FACTS, type Dopant } from '../material/dopants';
import type { MobilityName } from '../study/names';
import { mobilityModel } from './list';
import { ionisationFor, type MobilityInput, type MobilityModel } from './model';

export interface UniformDoping {
  readonly dopant: Dopant;
  /** cm^-3 of active dopant */
  readonly concentration: number;
  /** K */
  readonly temperature: number;
  /** `complete` unless stated. */
  readonly ionisation?: 'complete' | 'levels';
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
export function uniformInput({
  dopant,
  concentration,
  temperature,
  ionisation = 'complete',
}: UniformDoping): MobilityInput {
  const isDonor = DOPANT_FACTS[dopant].role === 'donor';
  const active = Float64Array.of(concentration);
  const none = Float64Array.of(0);
  const charges = new ChargeModel(
    { dopants: [{ dopant, active }], donors: isDonor ? active : none, acceptors: isDonor ? none : active },
    { temperature, ionisation, statistics: 'boltzmann', narrowing: 'none' },
  );
  charges.neutralPotential(new Float64Array(1), 1e-12);
  const { electrons, holes } = charges;
  const [ionised] = charges.ionised();
  const part = [{ dopant, ionised }];
  return {
    temperature,
    donors: isDonor ? ionised : none,
    acceptors: isDonor ? none : ionised,
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
 * one dopant; `ionisation` is what a model of carriers is given, a model of dopants takes them all as ionised.
 */
export function uniformSilicon(
  dopant: Dopant,
  concentration_cm3: number,
  temperature_K: number,
  modelName: MobilityName,
  ionisation: 'complete' | 'levels' = 'complete',
): { resistivity: number; mobility: number; electrons: number; holes: number } {
  const at = mobilityAt(mobilityModel(modelName), {
    dopant,
    concentration: concentration_cm3,
    temperature: temperature_K,
    ionisation: ionisationFor(mobilityModel(modelName), ionisation),
  });
  const { electrons, holes } = at;
  return {
    resistivity: 1 / (ELEMENTARY_CHARGE * (electrons * at.electronMobility + holes * at.holeMobility)),
    mobility: at.majority === 'electrons' ? at.electronMobility : at.holeMobility,
    electrons,
    holes,
  };
}
