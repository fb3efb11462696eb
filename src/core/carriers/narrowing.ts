/** Apparent band-gap narrowing: how much heavy doping raises the product of electrons and holes. */

import { BOLTZMANN_EV } from '../material/constants';
import type { NarrowingName } from '../study/names';

/** Apparent narrowing V0 {L + sqrt(L^2 + 0.5)}, L = ln(N/N0): eV and cm^-3. */
const FITS: Record<Exclude<NarrowingName, 'none'>, { readonly scale: number; readonly from: number }> = {
  /** J. W. Slotboom and H. C. de Graaff, Solid-State Electronics 19, 857 (1976), coefficients from memory. */
  slotboom1976: { scale: 9e-3, from: 1e17 },
  /** D. B. M. Klaassen, J. W. Slotboom, H. C. de Graaff, Solid-State Electronics 35, 125 (1992), coefficients from memory. */
  klaassen1992: { scale: 6.92e-3, from: 1.3e17 },
};

/**
 * Factor on the intrinsic density, exp(narrowing/2kT), for `doping` cm^-3 of all dopants. Both fits come from bipolar transistors
 * evaluated with Boltzmann statistics: they hold the degeneracy already and belong to those statistics.
 */
export function narrowingFactor(name: NarrowingName, doping: number, temperature: number): number {
  if (name === 'none' || doping <= 0) return 1;
  const { scale, from } = FITS[name];
  const log = Math.log(doping / from);
  return Math.exp((scale * (log + Math.sqrt(log * log + 0.5))) / (2 * BOLTZMANN_EV * temperature));
}
