/** The chain from a study to its readings: recipe, profile on a mesh, carriers, mobility, sheet. */

import { type BuiltParts, buildColumns, buildResult } from './buildResult';
import { type CarrierChoice, carriersOf } from './carriers/carriers';
import { carrierWarnings, degeneracyWarnings } from './carriers/warnings';
import { mobilityModel } from './mobility/list';
import { ionisationFor, type MobilityModel } from './mobility/model';
import { mobilityWarnings } from './mobility/warnings';
import { type ProcessResult, runRecipe } from './process/runRecipe';
import { type SampledDoping, sampleDoping } from './profile/doping';
import type { Solution } from './result';
import { conduction } from './sheet/conduction';
import { depletionWarnings } from './sheet/depletion';
import { layerReadings, layerSpans } from './sheet/layers';
import { modelSpread } from './sheet/modelSpread';
import { temperatureCoefficients } from './sheet/temperatureCoefficient';
import type { Recipe } from './study/recipe';
import type { Study } from './study/schema';
import { toRecipe } from './study/toRecipe';

export interface SolveOptions {
  /** 1 for the normal depth mesh, 2 for half its cell widths: for showing that readings do not hang on it. */
  refinement?: number;
}

/** What a study comes to before anything is read of it: the doping, and how its carriers are to be found. */
export interface Prepared {
  readonly study: Study;
  readonly recipe: Recipe;
  readonly process: ProcessResult;
  readonly doping: SampledDoping;
  readonly model: MobilityModel;
  readonly choice: CarrierChoice;
}

/** @throws InputProblem when a table step still names a file. */
export function prepare(study: Study, { refinement = 1 }: SolveOptions = {}): Prepared {
  const recipe = toRecipe(study);
  const process = runRecipe(recipe, refinement);
  const activation = { fraction: process.activeFractions, limit: process.activeLimits };
  const doping = sampleDoping(process.contributions, activation, filmEnd(recipe), refinement);
  const model = mobilityModel(recipe.models.mobility);
  const { carriers, ionisation, statistics, narrowing } = recipe.models;
  const choice: CarrierChoice = {
    carriers,
    ionisation: ionisationFor(model, ionisation),
    statistics,
    narrowing,
    temperature: recipe.temperature,
    surface: recipe.surface,
    reverseBias: recipe.reverseBias,
    refinement,
  };
  return { study, recipe, process, doping, model, choice };
}

/**
 * Solves a study whose tables are embedded.
 * @throws InputProblem when a table step still names a file.
 */
export function solve(study: Study, options: SolveOptions = {}): Solution {
  const prepared = prepare(study, options);
  const { recipe, process, doping, model, choice } = prepared;
  const state = carriersOf(doping, choice);
  const flow = conduction(state, model);
  const spans = layerSpans(state);
  const parts: BuiltParts = {
    ...prepared,
    state,
    flow,
    spans,
    readings: spans.map((span) => layerReadings(state, flow, span)),
    coefficients: temperatureCoefficients(state, choice, model, spans),
    spread: modelSpread(state, choice, recipe.models.ionisation, spans),
    warnings: [
      ...process.warnings,
      ...carrierWarnings(choice, recipe.models.ionisation, doping),
      ...degeneracyWarnings(state, choice),
      ...depletionWarnings(state),
      ...mobilityWarnings(model, flow.input),
    ],
  };
  return { result: buildResult(parts), columns: buildColumns(parts) };
}

/** Depth at which the conducting film ends, cm. */
function filmEnd({ wafer }: Recipe): number {
  return Math.min(wafer.thickness, wafer.buriedOxide ?? Number.POSITIVE_INFINITY);
}
