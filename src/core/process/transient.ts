/** Transient enhanced diffusion by implant damage, as the "+1" estimate: an extra Dt for dopants that travel on interstitials. */

import { BOLTZMANN_EV, ZERO_CELSIUS } from '../material/constants';
import { diffusivity } from '../material/diffusivity';
import type { Dopant } from '../material/dopants';
import { gaussLegendre, integratePanels } from '../numeric/gaussLegendre';
import type { Contribution } from '../profile/doping';
import { evaluator, type Shape } from '../profile/shape';
import type { DiffusivitySet } from '../study/names';

/** Those that diffuse by interstitials alone, f_I = 1 (from memory); antimony and arsenic are left where they are. */
const ON_INTERSTITIALS: readonly Dopant[] = ['boron', 'phosphorus'];

/** Below this, K, damage speeds diffusion up for as long as a furnace anneal lasts. From memory. */
export const TRANSIENT_BELOW = 950 + ZERO_CELSIUS;

const SITES_CM3 = 5e22;
const RULE = gaussLegendre(6);
const PANELS = 40;

/**
 * D_I C_I*, the equilibrium transport of self-interstitials, cm^-1 s^-1, at a temperature in K.
 * Source: U. Goesele's tracer equivalent 914 exp(-4.84 eV/kT) cm^2/s, from memory; H. Bracht's of 1995, 2980 exp(-4.95 eV/kT), agrees
 * within 30 % from 700 to 1050 C.
 */
export function interstitialTransport(temperature: number): number {
  return SITES_CM3 * 914 * Math.exp(-4.84 / (BOLTZMANN_EV * temperature));
}

/** Integral of x N dx of an implant, cm^-1: each ion leaves one interstitial behind, where it stopped. */
export function damageOf(implanted: Shape): number {
  const at = evaluator(implanted);
  const deepest = implanted.marks.at(-1) ?? 0;
  const edges = Array.from({ length: PANELS + 1 }, (_, i) => (2 * deepest * i) / PANELS);
  return integratePanels((x) => x * at(x), edges, RULE);
}

/**
 * Extra Dt, cm^2, that the interstitials of an implant give before they are gone at the surface: with a sink there, each left at a depth x
 * raises the integral of C_I/C_I* over time, from there down, by x/(D_I C_I*), so Dt = D damage/(D_I C_I*). All are taken to leave within the step.
 * Source: the "+1" of implant damage (M. D. Giles, J. Electrochem. Soc. 138, 1160, 1991, from memory); the integral is derived.
 * Range: doses that do not amorphise; within a factor of about three (from memory).
 * @param damage cm^-1, see `damageOf`. @param temperature K.
 */
export function transientDt(
  set: DiffusivitySet,
  dopant: Dopant,
  damage: number,
  temperature: number,
): number {
  return (diffusivity(set, dopant, temperature) * damage) / interstitialTransport(temperature);
}

/**
 * Extra Dt, cm^2, of each dopant of the recipe that the damage of implants moves; empty where nothing is damaged or nothing moves.
 * @param damaging the steps of the implants, as the contributions name them.
 */
export function transientIn(
  contributions: readonly Contribution[],
  damaging: ReadonlySet<number>,
  set: DiffusivitySet,
  temperature: number,
): Map<Dopant, number> {
  const damage = contributions
    .filter(({ stepIndex }) => damaging.has(stepIndex))
    .reduce((sum, { shape }) => sum + damageOf(shape), 0);
  const moving = ON_INTERSTITIALS.filter((dopant) =>
    contributions.some((part) => part.dopant === dopant && part.stepIndex > 0),
  );
  return new Map(
    damage > 0 ? moving.map((dopant) => [dopant, transientDt(set, dopant, damage, temperature)]) : [],
  );
}
