/** Mobility against doping and temperature: Arora, Hauser and Roulston 1982. */

import { setImpliedParts } from './impliedParts';
import type { MobilityInput, MobilityModel, MobilityOutput } from './model';

/** mu_min at 300 K (cm^2/Vs), lattice factor (cm^2/Vs K^-exponent) and exponent, N_ref at 300 K (cm^-3). */
interface CarrierSet {
  readonly minimum: number;
  readonly lattice: number;
  readonly exponent: number;
  readonly nRef: number;
}
/** First, second and last coefficient from memory. */
const ELECTRONS: CarrierSet = { minimum: 88, lattice: 7.4e8, exponent: -2.33, nRef: 1.26e17 };
const HOLES: CarrierSet = { minimum: 54.3, lattice: 1.36e8, exponent: -2.23, nRef: 2.35e17 };

/**
 * Mobility with t = T/300 and N = N_D + N_A, one set for all dopants of a sign:
 *   mu_n = 88 t^-0.57   + 7.4e8 T^-2.33  / {1 + [N/(1.26e17 t^2.4)]^(0.88 t^-0.146)}
 *   mu_p = 54.3 t^-0.57 + 1.36e8 T^-2.23 / {1 + [N/(2.35e17 t^2.4)]^(0.88 t^-0.146)}
 *
 * Source: N. D. Arora, J. R. Hauser and D. J. Roulston, IEEE Trans. Electron Devices ED-29, 292 (1982), read in secondary copies
 * (holes, exponents) and from memory (electrons). To about 1e20 cm^-3, 250 to 500 K, within 13 % of experiment by its abstract; it lacks
 * the fall at the highest doping, so that n-type silicon at 1e20 comes out 20 to 34 % too conductive.
 */
export const arora: MobilityModel = {
  name: 'arora',
  title: 'Arora 1982',
  source: 'N. D. Arora, J. R. Hauser, D. J. Roulston, IEEE Trans. Electron Devices ED-29, 292 (1982)',
  argument: 'dopants',
  range: { concentration: [1e13, 1e20], temperature: [250, 500] },
  dependsOnTemperature: true,
  hasParts: true,
  ownDopants: ['phosphorus', 'arsenic', 'antimony', 'boron', 'indium', 'gallium', 'aluminium'],
  evaluate,
};

function evaluate(input: MobilityInput, output: MobilityOutput): void {
  const { donors, acceptors, temperature } = input;
  const t = temperature / 300;
  const power = 0.88 * t ** -0.146;
  const electron = atTemperature(ELECTRONS, temperature);
  const hole = atTemperature(HOLES, temperature);
  for (let i = 0; i < donors.length; i++) {
    const logN = Math.log(donors[i] + acceptors[i]);
    const electronMobility =
      electron.minimum + electron.span / (1 + Math.exp(power * (logN - electron.logRef)));
    const holeMobility = hole.minimum + hole.span / (1 + Math.exp(power * (logN - hole.logRef)));
    output.electrons[i] = electronMobility;
    output.holes[i] = holeMobility;
    setImpliedParts(output.electronParts, i, electronMobility, electron.minimum + electron.span);
    setImpliedParts(output.holeParts, i, holeMobility, hole.minimum + hole.span);
  }
}

function atTemperature(
  set: CarrierSet,
  temperature: number,
): { minimum: number; span: number; logRef: number } {
  const t = temperature / 300;
  return {
    minimum: set.minimum * t ** -0.57,
    span: set.lattice * temperature ** set.exponent,
    logRef: Math.log(set.nRef) + 2.4 * Math.log(t),
  };
}
