/** Physical constants: CODATA 2018 (exact SI values of q, k, h; Tiesinga et al., Rev. Mod. Phys. 93, 025010, 2021). */

/** Elementary charge, C. */
export const ELEMENTARY_CHARGE = 1.602176634e-19;
/** Boltzmann constant, eV/K (k/q of the exact SI values). */
export const BOLTZMANN_EV = 1.380649e-23 / ELEMENTARY_CHARGE;
/** 0 degrees Celsius in K. */
export const ZERO_CELSIUS = 273.15;
