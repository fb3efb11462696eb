/** Diffusivities of dopants in silicon, D = D0 exp(-Ea/kT): named sets, because published ones differ by a factor of two. */

import { BOLTZMANN_EV } from './constants';
import type { Dopant } from './dopants';

interface Arrhenius {
  /** cm^2/s */
  readonly D0: number;
  /** eV */
  readonly Ea: number;
}

/**
 * `fair1981`: intrinsic diffusivities, R. B. Fair in Impurity Doping Processes in Silicon, ed. F. F. Y. Wang (North-Holland
 * 1981), as S. M. Sze quotes them; from memory, indium of low confidence.
 * `plummer2000`: J. D. Plummer, M. D. Deal, P. B. Griffin, Silicon VLSI Technology (2000), intrinsic table, from memory; gallium and
 * aluminium as in `fair1981`.
 * `fuller1956`: after C. S. Fuller and J. A. Ditzenberger (J. Appl. Phys. 27, 544, 1956) as R. C. Jaeger, Introduction to
 * Microelectronic Fabrication, Table 4.1, lists them; from memory. Boron and phosphorus there are those of diffusions
 * from a source at the solid solubility and lie 1.7 to 2.1 times above the intrinsic ones.
 */
export const DIFFUSIVITIES = {
  fair1981: {
    boron: { D0: 0.76, Ea: 3.46 },
    phosphorus: { D0: 3.85, Ea: 3.66 },
    arsenic: { D0: 24, Ea: 4.08 },
    antimony: { D0: 0.214, Ea: 3.65 },
    indium: { D0: 0.785, Ea: 3.63 },
    gallium: { D0: 0.374, Ea: 3.39 },
    aluminium: { D0: 1.385, Ea: 3.41 },
  },
  plummer2000: {
    boron: { D0: 1.0, Ea: 3.5 },
    phosphorus: { D0: 4.7, Ea: 3.68 },
    arsenic: { D0: 9.17, Ea: 3.99 },
    antimony: { D0: 4.58, Ea: 3.88 },
    indium: { D0: 1.2, Ea: 3.5 },
    gallium: { D0: 0.374, Ea: 3.39 },
    aluminium: { D0: 1.385, Ea: 3.41 },
  },
  fuller1956: {
    boron: { D0: 10.5, Ea: 3.69 },
    phosphorus: { D0: 10.5, Ea: 3.69 },
    arsenic: { D0: 0.32, Ea: 3.56 },
    antimony: { D0: 5.6, Ea: 3.95 },
    indium: { D0: 16.5, Ea: 3.9 },
    gallium: { D0: 3.6, Ea: 3.51 },
    aluminium: { D0: 8, Ea: 3.47 },
  },
} as const satisfies Record<string, Record<Dopant, Arrhenius>>;

/** Temperatures the measurements behind both sets cover, K (800 to 1250 C; single papers less). */
export const DIFFUSIVITY_RANGE: readonly [number, number] = [1073.15, 1523.15];

/** Diffusivity in cm^2/s at a temperature in K. */
export function diffusivity(set: keyof typeof DIFFUSIVITIES, dopant: Dopant, temperature: number): number {
  const { D0, Ea } = DIFFUSIVITIES[set][dopant];
  return D0 * Math.exp(-Ea / (BOLTZMANN_EV * temperature));
}
