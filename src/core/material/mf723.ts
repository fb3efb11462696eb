/** Resistivity against dopant concentration in silicon at 23 C: SEMI MF723, formerly ASTM F723. */

import { brent } from '../numeric/brent';
import type { Dopant } from './dopants';

/** The temperature of every value here, K (23 C). */
export const MF723_TEMPERATURE = 296.15;
export const MF723_SOURCE =
  'SEMI MF723 (ASTM F723-99), Practice for Conversion Between Resistivity and Dopant Density';

/** Dopants with a relation of their own. */
type Relation = 'boron' | 'phosphorus' | 'arsenic';

/** Concentrations the measurements behind each relation span, cm^-3. */
const MEASURED: Record<Relation, readonly [number, number]> = {
  boron: [1e14, 1e20],
  phosphorus: [3e13, 1e20],
  arsenic: [1e19, 6e20],
};

/** The phosphorus formulas have poles near 2e22 cm^-3 and 2e-6 Ohm cm; from these values on, rho N stays constant. */
const PHOSPHORUS_HIGHEST_CONCENTRATION = 1e21;
const PHOSPHORUS_LOWEST_RESISTIVITY = 1e-4;
/** Below this the formulas have long reached their limit of rho N; keeps the logarithm finite in undoped silicon. */
const LOWEST_CONCENTRATION = 1;

/** A converted value with what is known about its range. */
export interface Mf723Value {
  readonly value: number;
  /** Span of the *argument* that measurements support, in the argument's unit. */
  readonly range: readonly [number, number];
  readonly inRange: boolean;
  /** Set when another dopant's relation was used. */
  readonly borrowedFrom?: Dopant;
}

/**
 * rho N for phosphorus, Ohm cm^-2: rho = (6.242e18/N) 10^Z with
 * Z = (A0 + A1 x + A2 x^2 + A3 x^3)/(1 + B1 x + B2 x^2 + B3 x^3), x = log10 N - 16.
 */
export function phosphorusProduct(concentration_cm3: number): number {
  const bounded = Math.min(
    Math.max(concentration_cm3, LOWEST_CONCENTRATION),
    PHOSPHORUS_HIGHEST_CONCENTRATION,
  );
  const x = Math.log10(bounded) - 16;
  const above = -3.0769 + x * (2.2108 + x * (-0.62272 + x * 0.057501));
  const below = 1 + x * (-0.68157 + x * (0.19833 - x * 0.018376));
  return 6.242e18 * Math.exp((Math.LN10 * above) / below);
}

/** rho N for boron, Ohm cm^-2: rho = 1.305e16/N + 1.133e17/{N [1 + (2.58e-19 N)^-0.737]}. */
export function boronProduct(concentration_cm3: number): number {
  const bounded = Math.max(concentration_cm3, LOWEST_CONCENTRATION);
  return 1.305e16 + 1.133e17 / (1 + Math.exp(-0.737 * Math.log(2.58e-19 * bounded)));
}

/** log10 rho of arsenic by powers of log10 N; the terms cancel, so every digit counts. */
const ARSENIC_POLYNOMIAL = [
  -6633.667, 768.2531, -25.77373, 0.9658177, -0.05643443, -8.008543e-4, 9.055838e-5, -1.776701e-6,
  1.953279e-7, -5.754599e-9, -1.31657e-11,
];
const [ARSENIC_LOWEST, ARSENIC_HIGHEST] = MEASURED.arsenic;

/**
 * rho N for donors of which arsenic is one, Ohm cm^-2: the arsenic polynomial from 1e19 to 6e20 cm^-3. Below it no
 * relation for arsenic is published and phosphorus's is used (4 % higher at 1e19); above it rho N stays constant.
 */
export function arsenicProduct(concentration_cm3: number): number {
  if (concentration_cm3 < ARSENIC_LOWEST) return phosphorusProduct(concentration_cm3);
  const bounded = Math.min(concentration_cm3, ARSENIC_HIGHEST);
  const x = Math.log10(bounded);
  let logarithm = 0;
  for (let power = ARSENIC_POLYNOMIAL.length - 1; power >= 0; power--)
    logarithm = logarithm * x + ARSENIC_POLYNOMIAL[power];
  return bounded * 10 ** logarithm;
}

const PRODUCT: Record<Relation, (concentration_cm3: number) => number> = {
  boron: boronProduct,
  phosphorus: phosphorusProduct,
  arsenic: arsenicProduct,
};

/** Antimony takes phosphorus's relation, the other acceptors boron's: common practice, no source. */
const RELATION_OF: Record<Dopant, Relation> = {
  boron: 'boron',
  phosphorus: 'phosphorus',
  arsenic: 'arsenic',
  antimony: 'phosphorus',
  indium: 'boron',
  gallium: 'boron',
  aluminium: 'boron',
};

/**
 * Resistivity (Ohm cm, 23 C) of silicon uniformly doped with `concentration_cm3` of one dopant.
 *
 * The concentration is that of dopant atoms; the standard warns against reading it as a density of carriers.
 * Source: SEMI MF723 (ASTM F723-99); coefficients read in a transcription. Measured for B 1e14 to 1e20, P 3e13 to
 * 1e20, As 1e19 to 6e20 cm^-3; beyond, the formula is extrapolated. As below 1e19 and Sb use phosphorus, Ga, In and
 * Al use boron.
 */
export function resistivityOf(dopant: Dopant, concentration_cm3: number): Mf723Value {
  const own = RELATION_OF[dopant];
  const used = own === 'arsenic' && concentration_cm3 < ARSENIC_LOWEST ? 'phosphorus' : own;
  const value = PRODUCT[used](concentration_cm3) / concentration_cm3;
  return answer(value, concentration_cm3, MEASURED[used], dopant, used);
}

/**
 * Dopant concentration (cm^-3) of silicon with a given resistivity (Ohm cm) at 23 C.
 *
 * The standard fits this direction by itself, so that going there and back is exact only to 3 % (B) and 5 % (P) of the
 * resistivity:
 *   B:  N = 1.330e16/rho + 1.082e17/{rho [1 + (54.56 rho)^1.105]}
 *   P:  N = (6.242e18/rho) 10^Z, Z = (A0 + A1 x + A2 x^2 + A3 x^3)/(1 + B1 x + B2 x^2 + B3 x^3), x = log10 rho
 *   As: the root of the relation of {@link resistivityOf}; above the resistivity of 1e19 cm^-3 phosphorus is used.
 * Source and ranges as for {@link resistivityOf}.
 */
export function concentrationOf(dopant: Dopant, resistivity: number): Mf723Value {
  const own = RELATION_OF[dopant];
  const used = own === 'arsenic' && resistivity > measuredResistivities('arsenic')[1] ? 'phosphorus' : own;
  return answer(INVERSE[used](resistivity), resistivity, measuredResistivities(used), dopant, used);
}

function boronConcentration(resistivity: number): number {
  return 1.33e16 / resistivity + 1.082e17 / (resistivity * (1 + (54.56 * resistivity) ** 1.105));
}

function phosphorusConcentration(resistivity: number): number {
  const x = Math.log10(Math.max(resistivity, PHOSPHORUS_LOWEST_RESISTIVITY));
  const above = -3.1083 + x * (-3.2626 + x * (-1.2196 - x * 0.13923));
  const below = 1 + x * (1.0265 + x * (0.38755 + x * 0.041833));
  return (6.242e18 / resistivity) * 10 ** (above / below);
}

function arsenicConcentration(resistivity: number): number {
  const lowest = arsenicProduct(ARSENIC_HIGHEST) / ARSENIC_HIGHEST;
  if (resistivity <= lowest) return (ARSENIC_HIGHEST * lowest) / resistivity;
  const tooResistive = (logN: number) => Math.log(arsenicProduct(Math.exp(logN)) / resistivity) - logN;
  // A bracket slightly wider than the range keeps the ends themselves inside it whatever the rounding.
  return Math.exp(
    brent(tooResistive, Math.log(0.99 * ARSENIC_LOWEST), Math.log(1.01 * ARSENIC_HIGHEST), 1e-14),
  );
}

const INVERSE: Record<Relation, (resistivity: number) => number> = {
  boron: boronConcentration,
  phosphorus: phosphorusConcentration,
  arsenic: arsenicConcentration,
};

/** Resistivities of the measured concentrations, lowest first. */
function measuredResistivities(relation: Relation): readonly [number, number] {
  const [lightest, heaviest] = MEASURED[relation];
  return [PRODUCT[relation](heaviest) / heaviest, PRODUCT[relation](lightest) / lightest];
}

function answer(
  value: number,
  argument: number,
  range: readonly [number, number],
  dopant: Dopant,
  used: Relation,
): Mf723Value {
  const inRange = argument >= range[0] && argument <= range[1];
  return used === dopant ? { value, range, inRange } : { value, range, inRange, borrowedFrom: used };
}
