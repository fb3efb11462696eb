/** Where implanted ions come to rest: the moments of the depth distribution by ion, energy, target and set of data. */

import { DOPANT_FACTS, type Dopant, dopantOf, type ImplantSpecies } from '../material/dopants';
import { LSS_MOMENTS, LSS_TABLES, OXIDE_DENSITY_RATIO } from '../material/ranges/lss1975';
import { FIT_ENERGIES, type RangeFit, type RangeTarget, UNIVERSAL_FITS } from '../material/ranges/universal';
import type { RangeSet } from '../study/names';
import type { Warning } from '../study/problem';
import { evaluateFit, type FittedMoments } from './rangeFit';

/** Boron's share of the energy of a BF2 ion, by mass numbers. */
const BORON_IN_BF2 = 11 / 49;
const CM_PER_UM = 1e-4;

export interface RangeQuestion {
  readonly species: ImplantSpecies;
  readonly energy_keV: number;
  readonly target: RangeTarget;
  readonly set: RangeSet;
}

/** Lengths in cm; kurtosis is the fourth central moment over straggle^4 (3 for a normal distribution). */
export interface RangeStatistics {
  readonly projectedRange: number;
  readonly straggle: number;
  readonly lateralStraggle: number;
  readonly skewness: number;
  readonly kurtosis: number;
  readonly warnings: readonly Warning[];
}

interface Answer {
  readonly moments: FittedMoments;
  readonly warnings: Warning[];
}

/**
 * Moments for amorphous targets (oxide 2.20, nitride 3.10 g/cm^3). BF2 counts as boron at 11/49 of the energy.
 *
 * `universal`: the fits of material/ranges/universal.ts. `lss1975`: the printed tables, interpolated in the logarithms;
 * what they lack comes from elsewhere and is said: the shape in silicon from Thomas-Fermi moments computed with the same
 * theory, other targets and ions from the universal ratio to silicon. Outside the data's energies the value is given
 * with a warning.
 */
export function rangeStatistics({ species, energy_keV, target, set }: RangeQuestion): RangeStatistics {
  const ion = dopantOf(species);
  const energy = species === 'BF2' ? energy_keV * BORON_IN_BF2 : energy_keV;
  const { moments, warnings } =
    set === 'universal' ? universal(ion, energy, target) : lss(ion, energy, target);
  return {
    projectedRange: moments.projectedRange * CM_PER_UM,
    straggle: moments.straggle * CM_PER_UM,
    lateralStraggle: moments.lateralStraggle * CM_PER_UM,
    skewness: moments.skewness,
    kurtosis: moments.kurtosis,
    warnings,
  };
}

function universal(ion: Dopant, energy: number, target: RangeTarget): Answer {
  return {
    moments: evaluateFit(UNIVERSAL_FITS[target][ion], energy),
    warnings: energyWarnings('universal', ion, energy, FIT_ENERGIES),
  };
}

function lss(ion: Dopant, energy: number, target: RangeTarget): Answer {
  if (target === 'silicon') return lssSilicon(ion, energy);
  const known = evaluateFit(UNIVERSAL_FITS[target][ion], energy);
  const rows = target === 'oxide' ? LSS_TABLES.oxide[ion] : undefined;
  if (rows) {
    const [projectedRange, straggle] = fromRows(rows, energy, UNIVERSAL_FITS[target][ion]).map(
      (um) => um * OXIDE_DENSITY_RATIO,
    );
    const lateralStraggle = known.lateralStraggle * (straggle / known.straggle);
    return {
      moments: { ...known, projectedRange, straggle, lateralStraggle },
      warnings: energyWarnings('1975', ion, energy, spanOf(rows)),
    };
  }
  const inSilicon = evaluateFit(UNIVERSAL_FITS.silicon[ion], energy);
  const { moments, warnings } = lssSilicon(ion, energy);
  const scaled = (key: 'projectedRange' | 'straggle' | 'lateralStraggle'): number =>
    moments[key] * (known[key] / inSilicon[key]);
  return {
    moments: {
      ...known,
      projectedRange: scaled('projectedRange'),
      straggle: scaled('straggle'),
      lateralStraggle: scaled('lateralStraggle'),
    },
    warnings: [
      ...warnings,
      {
        code: 'range-substitute',
        message: `the 1975 tables have no ${ion} in ${target}: its ranges in silicon are scaled by the ratio of the universal set`,
      },
    ],
  };
}

/** Tables with the shape computed from the same theory; ions that the tables lack come from that computation entirely. */
function lssSilicon(ion: Dopant, energy: number): Answer {
  const computed = evaluateFit(LSS_MOMENTS[ion], energy);
  const rows = LSS_TABLES.silicon[ion];
  if (!rows)
    return {
      moments: computed,
      warnings: [
        ...energyWarnings('1975', ion, energy, FIT_ENERGIES),
        {
          code: 'range-substitute',
          message: `the 1975 tables have no ${ion} in silicon: moments computed from the same theory are used`,
        },
      ],
    };
  const [projectedRange, straggle] = fromRows(rows, energy, LSS_MOMENTS[ion]);
  return {
    moments: { ...computed, projectedRange, straggle },
    warnings: energyWarnings('1975', ion, energy, spanOf(rows)),
  };
}

type Rows = readonly (readonly [energy: number, projectedRange: number, straggle: number])[];

const spanOf = (rows: Rows): readonly [number, number] => [rows[0][0], rows[rows.length - 1][0]];

/** Range and straggle, um: log-log interpolation; beyond either end the last row grows as the fitted moments do. */
function fromRows(rows: Rows, energy: number, fit: RangeFit): [number, number] {
  const [low, high] = spanOf(rows);
  const inside = Math.min(high, Math.max(low, energy));
  const i = Math.max(0, rows.findIndex(([next]) => next >= inside) - 1);
  const [before, after] = [rows[i], rows[i + 1]];
  const part = Math.log(inside / before[0]) / Math.log(after[0] / before[0]);
  const [there, here] = [evaluateFit(fit, inside), evaluateFit(fit, energy)];
  return [
    before[1] * (after[1] / before[1]) ** part * (here.projectedRange / there.projectedRange),
    before[2] * (after[2] / before[2]) ** part * (here.straggle / there.straggle),
  ];
}

function energyWarnings(
  set: string,
  ion: Dopant,
  energy: number,
  [low, high]: readonly [number, number],
): Warning[] {
  if (energy >= low && energy <= high) return [];
  return [
    {
      code: 'range-energy',
      message: `${DOPANT_FACTS[ion].symbol} at ${Number(energy.toPrecision(4))} keV is outside the ${low} to ${high} keV of the ${set} ranges: the values are extrapolated`,
    },
  ];
}
