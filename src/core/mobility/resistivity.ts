/** Resistivity of uniformly doped silicon and back, by a chosen mobility model, with the standard's answer beside it. */

import { intrinsicWarnings } from '../carriers/warnings';
import type { Dopant } from '../material/dopants';
import { intrinsicDensity } from '../material/intrinsic';
import { concentrationOf, type Mf723Value, resistivityOf } from '../material/mf723';
import { brent } from '../numeric/brent';
import type { MobilityName } from '../study/names';
import { NoSolution, type Warning } from '../study/problem';
import { mobilityModel } from './list';
import { uniformInput, uniformSilicon } from './uniform';
import { mobilityWarnings } from './warnings';

export interface ResistivityQuestion {
  readonly dopant: Dopant;
  /** One of the two: cm^-3 of the dopant, or Ohm cm. */
  readonly concentration?: number;
  readonly resistivity?: number;
  /** K */
  readonly temperature: number;
  readonly mobility: MobilityName;
  readonly ionisation: 'complete' | 'levels';
}

export interface ResistivityAnswer {
  /** cm^-3, Ohm cm, cm^2/Vs (majority carriers). */
  readonly concentration: number;
  readonly resistivity: number;
  readonly mobility: number;
  readonly electrons: number;
  readonly holes: number;
  /** What SEMI MF723 gives at 23 C for the same question: Ohm cm for a concentration, cm^-3 for a resistivity. */
  readonly standard: Mf723Value;
  readonly warnings: readonly Warning[];
}

/** Doping up to which a resistivity is looked for, cm^-3. */
const HIGHEST_CONCENTRATION = 1e21;
/**
 * In units of the intrinsic density: silicon resists most where n mu_n = p mu_p, at a net doping of about 1.2 ni (p-type); from
 * here on more doping conducts better.
 */
const LOWEST_DOPING = 2;
const STEPS_PER_DECADE = 10;

/**
 * The uniform piece of silicon that has a concentration of active dopant or a resistivity.
 * @throws NoSolution when no doping between twice the intrinsic density and 1e21 cm^-3 has the resistivity.
 */
export function uniformResistivity(question: ResistivityQuestion): ResistivityAnswer {
  const { dopant, temperature, mobility, ionisation, resistivity: wanted } = question;
  const concentration = question.concentration ?? concentrationFor(question);
  const input = uniformInput({ dopant, concentration, temperature, ionisation });
  return {
    concentration,
    ...uniformSilicon(dopant, concentration, temperature, mobility, ionisation),
    standard: wanted === undefined ? resistivityOf(dopant, concentration) : concentrationOf(dopant, wanted),
    warnings: [...intrinsicWarnings(temperature), ...mobilityWarnings(mobilityModel(mobility), input)],
  };
}

/** The lightest doping that has the resistivity: the models are followed upwards until they cross it. */
function concentrationFor({
  dopant,
  resistivity = 0,
  temperature,
  mobility,
  ionisation,
}: ResistivityQuestion): number {
  const excess = (logN: number): number =>
    Math.log(
      uniformSilicon(dopant, Math.exp(logN), temperature, mobility, ionisation).resistivity / resistivity,
    );
  const low = Math.log(LOWEST_DOPING * intrinsicDensity(temperature));
  const high = Math.log(HIGHEST_CONCENTRATION);
  const steps = Math.ceil(((high - low) / Math.LN10) * STEPS_PER_DECADE);
  let before = low;
  for (let i = 1; i <= steps && excess(low) >= 0; i++) {
    const next = low + ((high - low) * i) / steps;
    if (excess(next) <= 0) return Math.exp(brent(excess, before, next, 1e-13));
    before = next;
  }
  const [most, least] = [low, high].map((logN) => resistivity * Math.exp(excess(logN)));
  throw new NoSolution(
    `no doping with ${dopant} gives ${resistivity} ohm cm by ${mobility}; from ${least.toPrecision(3)} to ${most.toPrecision(3)} ohm cm can be reached at this temperature`,
  );
}
