/** The chain from a study to its readings: recipe, profile on a mesh, carriers, mobility, sheet. */

import { type BuiltParts, buildColumns, buildResult } from './buildResult';
import { intrinsicWarnings } from './carriers/warnings';
import { mobilityModel } from './mobility/list';
import { mobilityWarnings } from './mobility/warnings';
import { runRecipe } from './process/runRecipe';
import { sampleDoping } from './profile/doping';
import type { Solution } from './result';
import { conduction } from './sheet/conduction';
import { layerReadings, layerSpans } from './sheet/layers';
import { temperatureCoefficients } from './sheet/temperatureCoefficient';
import type { Recipe } from './study/recipe';
import type { Study } from './study/schema';
import { toRecipe } from './study/toRecipe';

export interface SolveOptions {
  /** 1 for the normal depth mesh, 2 for half its cell widths: for showing that readings do not hang on it. */
  refinement?: number;
}

/**
 * Solves a study whose tables are embedded.
 * @throws InputProblem when a table step still names a file.
 */
export function solve(study: Study, options: SolveOptions = {}): Solution {
  const recipe = toRecipe(study);
  const process = runRecipe(recipe);
  const doping = sampleDoping(
    process.contributions,
    { fraction: process.activeFractions, limit: process.activeLimits },
    filmEnd(recipe),
    options.refinement ?? 1,
  );
  const model = mobilityModel(recipe.models.mobility);
  const flow = conduction(doping, model, recipe.temperature);
  const spans = layerSpans(doping, doping.junctions);
  const parts: BuiltParts = {
    study,
    recipe,
    process,
    doping,
    model,
    flow,
    spans,
    readings: spans.map((span) => layerReadings(doping, flow, span)),
    coefficients: temperatureCoefficients(doping, model, recipe.temperature, spans),
    warnings: [
      ...process.warnings,
      ...intrinsicWarnings(recipe.temperature),
      ...mobilityWarnings(model, flow.input),
    ],
  };
  return { result: buildResult(parts), columns: buildColumns(parts) };
}

/** Depth at which the conducting film ends, cm. */
function filmEnd({ wafer }: Recipe): number {
  return Math.min(wafer.thickness, wafer.buriedOxide ?? Number.POSITIVE_INFINITY);
}
