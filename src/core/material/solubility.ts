/** How much of a dopant silicon takes up (solid solubility) and how much of it conducts (electrically active limit). */

import { BOLTZMANN_EV } from './constants';
import type { Dopant } from './dopants';

interface Limit {
  /** C0 exp(-Ea/kT), never above `cap`; cm^-3 and eV. */
  readonly C0: number;
  readonly Ea: number;
  readonly cap: number;
}

const constant = (cap: number): Limit => ({ C0: cap, Ea: 0, cap });

/**
 * Chemical concentration at the surface of a predeposition that is not starved.
 *
 * Boron: equilibrium with the boride phase, 9.25e22 exp(-0.73/kT), Armigliato 1977, Solmi 1990.
 * Phosphorus: total solubility, 2.45e23 exp(-0.62/kT), Solmi 1996; medium confidence.
 * Arsenic: 1.3e23 exp(-0.42/kT), Nobili 1994.
 * Antimony: 3.81e22 exp(-0.56/kT), Nobili 1989, low confidence: above 800 C it exceeds Trumbore's maximum, which caps it.
 * Indium, gallium, aluminium: the maximum for every temperature, low confidence (indium least).
 * Caps: F. A. Trumbore, Bell Syst. Tech. J. 39, 205 (1960), maxima near 1150 to 1325 C. All from memory.
 */
const SOLID_SOLUBILITY: Record<Dopant, Limit> = {
  boron: { C0: 9.25e22, Ea: 0.73, cap: 6e20 },
  phosphorus: { C0: 2.45e23, Ea: 0.62, cap: 1.3e21 },
  arsenic: { C0: 1.3e23, Ea: 0.42, cap: 1.8e21 },
  antimony: { C0: 3.81e22, Ea: 0.56, cap: 7e19 },
  indium: constant(4e17),
  gallium: constant(4e19),
  aluminium: constant(2e19),
};

/**
 * Concentration of carriers that a long heat treatment leaves, however much dopant is there.
 *
 * Boron: all that is dissolved conducts, so its solubility. Phosphorus: 1.3e22 exp(-0.37/kT), Nobili 1982, Solmi 1996.
 * Arsenic: 2.2e22 exp(-0.47/kT), Derdour, Nobili, Solmi 1991; a short anneal leaves more.
 * Antimony: 4e19, the lower end of what is quoted; its published fit exceeds every maximum (low confidence).
 * Indium, gallium, aluminium: as their solubility, low confidence. All from memory.
 */
const ACTIVE_LIMIT: Record<Dopant, Limit> = {
  ...SOLID_SOLUBILITY,
  phosphorus: { C0: 1.3e22, Ea: 0.37, cap: 1.3e21 },
  arsenic: { C0: 2.2e22, Ea: 0.47, cap: 1.8e21 },
  antimony: { C0: 3.81e22, Ea: 0.56, cap: 4e19 },
};

const at = ({ C0, Ea, cap }: Limit, temperature: number): number =>
  Math.min(cap, C0 * Math.exp(-Ea / (BOLTZMANN_EV * temperature)));

/** Solid solubility in cm^-3 at a temperature in K; sources and confidence above. */
export function solidSolubility(dopant: Dopant, temperature: number): number {
  return at(SOLID_SOLUBILITY[dopant], temperature);
}

/** Electrically active limit in cm^-3 at a temperature in K; sources and confidence above. */
export function activeLimit(dopant: Dopant, temperature: number): number {
  return at(ACTIVE_LIMIT[dopant], temperature);
}
