/** A heat treatment of the wafer: implant damage spent, then diffusion by the model that the study names. */

import type { Contribution } from '../profile/doping';
import { diffuse } from '../profile/shape';
import type { DiffusivitySet } from '../study/names';
import type { Recipe, RecipeStep } from '../study/recipe';
import { heatSolved } from './diffusion/heatSolved';
import type { Source } from './diffusion/source';
import { type HeatTreatment, heatUp, heatWarnings, hottest } from './heat';
import { transientRemarks } from './remarks';
import { dtFigures, type StepReport } from './report';
import { TRANSIENT_BELOW, transientIn } from './transient';
import type { Wafer } from './wafer';

/**
 * Heats what is there. With closed forms, what arrives during the treatment has its share of it already; solved, it enters from a
 * surface that is held.
 * @returns what a solved treatment tells of itself.
 */
export function treat(
  step: RecipeStep,
  wafer: Wafer,
  heat: HeatTreatment,
  recipe: Recipe,
  arriving: Contribution | null,
  source: Source | null,
): StepReport['figures'] {
  const { diffusivity: set, diffusion } = recipe.models;
  const transient = spendDamage(step, wafer, hottest(heat), set);
  wafer.lastHeat = hottest(heat);
  const remarked = arriving ? [...wafer.contributions, arriving] : wafer.contributions;
  const warnings = heatWarnings(remarked, set, heat, step.index);
  if (diffusion === 'constant') {
    wafer.warnings.push(...warnings);
    wafer.contributions = [...heatUp(wafer.contributions, set, heat), ...(arriving ? [arriving] : [])];
    return transient;
  }
  wafer.warnings.push(...warnings.filter(({ code }) => code !== 'extrinsic-diffusion'));
  const { thickness, buriedOxide } = recipe.wafer;
  const filmEnd = Math.min(thickness, buriedOxide ?? Number.POSITIVE_INFINITY) + wafer.addedSilicon;
  const solved = heatSolved(wafer.contributions, set, heat, filmEnd, source, wafer.refinement);
  wafer.contributions = solved.contributions;
  return {
    ...transient,
    nodes: solved.nodes,
    timeSteps: solved.steps,
    ...(solved.doseError !== null && { doseError_ppm: solved.doseError * 1e6 }),
  };
}

/**
 * Implant damage is gone after the first heat: before it diffuses as usual, what an anneal accepts of the transient has moved.
 * @returns the Dt that was accepted, as figures.
 */
function spendDamage(
  step: RecipeStep,
  wafer: Wafer,
  temperature: number,
  set: DiffusivitySet,
): StepReport['figures'] {
  const { damaging, contributions } = wafer;
  wafer.damaging = new Set();
  const isAccepted = step.kind === 'anneal' && step.hasTransient;
  if (!isAccepted && temperature >= TRANSIENT_BELOW) return {};
  const extraDt = transientIn(contributions, damaging, set, temperature);
  wafer.warnings.push(...transientRemarks(step, isAccepted, extraDt));
  if (!isAccepted) return {};
  wafer.contributions = contributions.map((part) => {
    const Dt = extraDt.get(part.dopant);
    return Dt === undefined ? part : { ...part, shape: diffuse(part.shape, Dt) };
  });
  return dtFigures(extraDt.keys(), (dopant) => extraDt.get(dopant) ?? 0, 'transientDt');
}
