/** Bulk figures of silicon that electrostatics needs. */

import { BOLTZMANN_EV, ELEMENTARY_CHARGE } from './constants';

/** Electric constant, F/cm: CODATA 2018 (Tiesinga et al., Rev. Mod. Phys. 93, 025010, 2021). */
const ELECTRIC_CONSTANT = 8.8541878128e-14;
/** Of silicon at low frequency; textbooks give 11.7 to 11.9 (S. M. Sze, Physics of Semiconductor Devices, has 11.9; from memory). */
const RELATIVE_PERMITTIVITY = 11.7;

/** F/cm. */
export const PERMITTIVITY = RELATIVE_PERMITTIVITY * ELECTRIC_CONSTANT;

/** kT/q, V, at `temperature` in K. */
export function thermalVoltage(temperature: number): number {
  return BOLTZMANN_EV * temperature;
}

/**
 * Effective densities of states of the conduction and the valence band, cm^-3: Nc = 2.86e19 (T/300)^1.58,
 * Nv = 3.10e19 (T/300)^1.85.
 *
 * Source: M. A. Green, J. Appl. Phys. 67, 2944 (1990); coefficients read in a public library, pages and the range of 200 to
 * 500 K from memory.
 */
export function densitiesOfStates(temperature: number): { conduction: number; valence: number } {
  const t = temperature / 300;
  return { conduction: 2.86e19 * t ** 1.58, valence: 3.1e19 * t ** 1.85 };
}

/** Debye length of a density (cm^-3) of charges, cm: sqrt(permittivity kT/q / (q density)). */
export function debyeLength(density: number, temperature: number): number {
  return Math.sqrt((PERMITTIVITY * thermalVoltage(temperature)) / (ELEMENTARY_CHARGE * density));
}
