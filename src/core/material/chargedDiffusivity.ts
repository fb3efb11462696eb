/**
 * Diffusivities by the charge of the point defect that carries the dopant:
 * D = D0 + D+ (p/ni) + D- (n/ni) + D= (n/ni)^2, each D0 exp(-Ea/kT); at n = p = ni the sum is the intrinsic diffusivity.
 */

import { BOLTZMANN_EV } from './constants';
import { DIFFUSIVITIES } from './diffusivity';
import type { Dopant } from './dopants';

interface Arrhenius {
  /** cm^2/s */
  readonly D0: number;
  /** eV */
  readonly Ea: number;
}

interface ChargeStates {
  readonly neutral: Arrhenius;
  readonly positive?: Arrhenius;
  readonly negative?: Arrhenius;
  readonly doubleNegative?: Arrhenius;
}

/** R. B. Fair in Impurity Doping Processes in Silicon, ed. F. F. Y. Wang (North-Holland 1981); from memory. */
const FAIR_1981: Partial<Record<Dopant, ChargeStates>> = {
  boron: { neutral: { D0: 0.037, Ea: 3.46 }, positive: { D0: 0.76, Ea: 3.46 } },
  phosphorus: {
    neutral: { D0: 3.85, Ea: 3.66 },
    negative: { D0: 4.44, Ea: 4.0 },
    doubleNegative: { D0: 44.2, Ea: 4.37 },
  },
  arsenic: { neutral: { D0: 0.066, Ea: 3.44 }, negative: { D0: 12, Ea: 4.05 } },
  antimony: { neutral: { D0: 0.214, Ea: 3.65 }, negative: { D0: 15, Ea: 4.08 } },
  aluminium: { neutral: { D0: 1.385, Ea: 3.41 }, positive: { D0: 2480, Ea: 4.2 } },
  gallium: { neutral: { D0: 0.374, Ea: 3.39 }, positive: { D0: 28.5, Ea: 3.92 } },
};

/** J. D. Plummer, M. D. Deal, P. B. Griffin, Silicon VLSI Technology (2000), concentration-dependent table; from memory. */
const PLUMMER_2000: Partial<Record<Dopant, ChargeStates>> = {
  boron: { neutral: { D0: 0.05, Ea: 3.5 }, positive: { D0: 0.95, Ea: 3.5 } },
  indium: { neutral: { D0: 0.6, Ea: 3.5 }, positive: { D0: 0.6, Ea: 3.5 } },
  arsenic: { neutral: { D0: 0.011, Ea: 3.44 }, negative: { D0: 31, Ea: 4.15 } },
  antimony: { neutral: { D0: 0.214, Ea: 3.65 }, negative: { D0: 15, Ea: 4.08 } },
  phosphorus: {
    neutral: { D0: 3.85, Ea: 3.66 },
    negative: { D0: 4.44, Ea: 4.0 },
    doubleNegative: { D0: 44.2, Ea: 4.37 },
  },
};

/** Names of the sets, those of the single diffusivities. */
type SetName = keyof typeof DIFFUSIVITIES;

const SETS: Record<SetName, Partial<Record<Dopant, ChargeStates>>> = {
  fair1981: FAIR_1981,
  plummer2000: PLUMMER_2000,
  fuller1956: {},
};

/** cm^2/s at one temperature; multiply by p/ni, n/ni and its square. */
export interface ChargedDiffusivity {
  readonly neutral: number;
  readonly positive: number;
  readonly negative: number;
  readonly doubleNegative: number;
}

/**
 * The terms of a dopant at `temperature` (K). A dopant without charge states in the set keeps its single diffusivity; the set of 1956
 * has none at all, because its values are those of heavily doped diffusions already.
 */
export function chargedDiffusivity(set: SetName, dopant: Dopant, temperature: number): ChargedDiffusivity {
  const at = (term: Arrhenius | undefined): number =>
    term ? term.D0 * Math.exp(-term.Ea / (BOLTZMANN_EV * temperature)) : 0;
  const states = SETS[set][dopant] ?? { neutral: DIFFUSIVITIES[set][dopant] };
  return {
    neutral: at(states.neutral),
    positive: at(states.positive),
    negative: at(states.negative),
    doubleNegative: at(states.doubleNegative),
  };
}
