/** Intrinsic carrier density at process temperatures. */

import { BOLTZMANN_EV } from './constants';

/**
 * ni = 3.87e16 T^1.5 exp(-0.605/kT), cm^-3, T in K, for heat treatments (700 to 1250 C).
 * Source: F. J. Morin and J. P. Maita, Phys. Rev. 96, 28 (1954), as process texts write it (from memory).
 */
export function processIntrinsicDensity(temperature: number): number {
  return 3.87e16 * temperature ** 1.5 * Math.exp(-0.605 / (BOLTZMANN_EV * temperature));
}
