/** The first empirical fit of mobility against doping: Caughey and Thomas 1967, 300 K. */

import { setImpliedParts } from './impliedParts';
import type { MobilityInput, MobilityModel, MobilityOutput } from './model';
import { ROOM_300_K } from './roomTemperature';

/** From memory. cm^2/Vs, cm^-3. */
const ELECTRONS = { muMax: 1330, muMin: 65, nRef: 8.5e16, alpha: 0.72 };
const HOLES = { muMax: 495, muMin: 47.7, nRef: 6.3e16, alpha: 0.76 };
const LOG_ELECTRON_REF = Math.log(ELECTRONS.nRef);
const LOG_HOLE_REF = Math.log(HOLES.nRef);

/**
 * Mobility at 300 K: mu = mu_min + (mu_max - mu_min)/[1 + (N/N_ref)^alpha], N = N_D + N_A, one set for all dopants of a sign.
 *
 * Source: D. M. Caughey and R. E. Thomas, Proc. IEEE 55, 2192 (1967); coefficients and the range 1e14 to 1e20 cm^-3 from memory. The
 * hole data of its time were low: 22 to 40 % below Thurber 1980 and Masetti 1983 from 1e17 to 1e19 cm^-3.
 */
export const caugheyThomas: MobilityModel = {
  name: 'caughey-thomas',
  title: 'Caughey-Thomas 1967',
  source: 'D. M. Caughey, R. E. Thomas, Proc. IEEE 55, 2192 (1967)',
  argument: 'dopants',
  caution:
    'Hole mobility of 1967 is 22 to 40 % too low from 1e17 to 1e19 cm^-3, so p-type layers come out too resistive.',
  range: { concentration: [1e14, 1e20], temperature: ROOM_300_K },
  dependsOnTemperature: false,
  hasParts: true,
  ownDopants: ['phosphorus', 'arsenic', 'antimony', 'boron', 'indium', 'gallium', 'aluminium'],
  evaluate,
};

function evaluate(input: MobilityInput, output: MobilityOutput): void {
  const { donors, acceptors } = input;
  for (let i = 0; i < donors.length; i++) {
    const logN = Math.log(donors[i] + acceptors[i]);
    const electron =
      ELECTRONS.muMin +
      (ELECTRONS.muMax - ELECTRONS.muMin) / (1 + Math.exp(ELECTRONS.alpha * (logN - LOG_ELECTRON_REF)));
    const hole =
      HOLES.muMin + (HOLES.muMax - HOLES.muMin) / (1 + Math.exp(HOLES.alpha * (logN - LOG_HOLE_REF)));
    output.electrons[i] = electron;
    output.holes[i] = hole;
    setImpliedParts(output.electronParts, i, electron, ELECTRONS.muMax);
    setImpliedParts(output.holeParts, i, hole, HOLES.muMax);
  }
}
