/** The way in: a validated study becomes a recipe in the core's own units. */

import { ZERO_CELSIUS } from '../material/constants';
import { concentrationOf } from '../material/mf723';
import { InputProblem } from './problem';
import type { Recipe, RecipeStep } from './recipe';
import type { Study, StudyStep } from './schema';

const CM_PER_UM = 1e-4;
const CM_PER_NM = 1e-7;
const SECONDS_PER_MINUTE = 60;

const kelvin = (celsius: number): number => celsius + ZERO_CELSIUS;

/**
 * Converts units, fills in what a step inherits from the study, leaves out disabled steps.
 * @throws InputProblem when a table step still names a file: its data must be embedded first.
 */
export function toRecipe(study: Study): Recipe {
  const { wafer, models } = study;
  return {
    name: study.name,
    temperature: kelvin(study.temperature_C),
    wafer: {
      dopant: wafer.dopant,
      concentration:
        wafer.concentration_cm3 ?? concentrationOf(wafer.dopant, wafer.resistivity_ohmCm as number).value,
      thickness: wafer.thickness_um * CM_PER_UM,
      orientation: wafer.orientation,
      buriedOxide: wafer.buriedOxide_um === undefined ? undefined : wafer.buriedOxide_um * CM_PER_UM,
    },
    steps: study.steps.flatMap((step, i) => (step.disabled ? [] : [toStep(step, i, study)])),
    models: {
      mobility: models.mobility,
      activation: models.activation,
      diffusivity: models.diffusivity,
      diffusion: models.diffusion,
      carriers: models.carriers,
      ionisation: models.ionisation,
      statistics: models.statistics,
      narrowing: models.narrowing,
    },
    surface:
      study.surface?.potential_V === undefined
        ? { charge: study.surface?.charge_cm2 ?? 0 }
        : { potential: study.surface.potential_V },
    reverseBias: study.reverseBias_V ?? [],
  };
}

function toStep(step: StudyStep, position: number, study: Study): RecipeStep {
  const index = position + 1;
  switch (step.step) {
    case 'gaussian':
      return {
        kind: 'gaussian',
        index,
        dopant: step.dopant,
        peak: step.peak_cm3,
        depth: step.depth_um * CM_PER_UM,
        sigma: step.sigma_um * CM_PER_UM,
      };
    case 'erfc':
      return {
        kind: 'erfc',
        index,
        dopant: step.dopant,
        surface: step.surface_cm3,
        length: step.length_um * CM_PER_UM,
      };
    case 'uniform':
      return {
        kind: 'uniform',
        index,
        dopant: step.dopant,
        concentration: step.concentration_cm3,
        from: step.from_um * CM_PER_UM,
        to: step.to_um * CM_PER_UM,
      };
    case 'table':
      return tableStep(step, position);
    case 'implant':
      return {
        kind: 'implant',
        index,
        species: step.dopant,
        dose: step.dose_cm2,
        energy_keV: step.energy_keV,
        screen: step.screen && {
          material: step.screen.material,
          thickness: step.screen.thickness_nm * CM_PER_NM,
        },
        shape: step.shape,
        hasTail: step.tail === 'exponential',
        ranges: step.ranges ?? study.models.ranges,
      };
    case 'predeposition':
      return {
        kind: 'predeposition',
        index,
        dopant: step.dopant,
        temperature: kelvin(step.temperature_C),
        time: step.time_min * SECONDS_PER_MINUTE,
        surface: step.surface_cm3,
      };
    case 'anneal':
      return {
        kind: 'anneal',
        index,
        temperature: kelvin(step.temperature_C),
        endTemperature: kelvin(step.endTemperature_C ?? step.temperature_C),
        time: step.time_min * SECONDS_PER_MINUTE,
        hasTransient: step.transient === 'plusOne',
      };
    case 'epitaxy':
      return {
        kind: 'epitaxy',
        index,
        thickness: step.thickness_um * CM_PER_UM,
        dopant: step.dopant,
        concentration: step.concentration_cm3 ?? 0,
      };
    case 'oxidation':
      return {
        kind: 'oxidation',
        index,
        ambient: step.ambient,
        temperature: kelvin(step.temperature_C),
        time: step.time_min * SECONDS_PER_MINUTE,
      };
    case 'stripOxide':
      return { kind: 'stripOxide', index };
    case 'etch':
      return { kind: 'etch', index, thickness: step.thickness_um * CM_PER_UM };
  }
}

function tableStep(step: Extract<StudyStep, { step: 'table' }>, position: number): RecipeStep {
  const { depth_um: depth, concentration_cm3: concentration } = step;
  if (!depth || !concentration)
    throw new InputProblem(`the table "${step.file}" has not been read; open the study from its own folder`, {
      key: `steps[${position}].file`,
    });
  return {
    kind: 'table',
    index: position + 1,
    dopant: step.dopant,
    depth: Float64Array.from(depth, (x) => x * CM_PER_UM),
    concentration: Float64Array.from(concentration),
  };
}
