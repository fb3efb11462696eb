/** The recipe, step by step: what each dopant's contributions to the silicon are when all is done. */

import { ZERO_CELSIUS } from '../material/constants';
import type { Dopant } from '../material/dopants';
import { CONSUMED, oxideThickness } from '../material/oxidation';
import type { Contribution } from '../profile/doping';
import { doseOf, erfcShape, gaussian, type Shape, table, uniform } from '../profile/shape';
import type { Warning } from '../study/problem';
import { formatQuantity } from '../study/quantity';
import type {
  AnnealStep,
  EpitaxyStep,
  EtchStep,
  ImplantStep,
  OxidationStep,
  PredepositionStep,
  Recipe,
  RecipeStep,
} from '../study/recipe';
import { activation } from './activation';
import { epitaxy } from './epitaxy';
import { etch } from './etch';
import { dtOf, type HeatTreatment } from './heat';
import { implant } from './implant';
import { predeposition } from './predeposition';
import { implantRemarks, oxidationWarnings } from './remarks';
import { dtFigures, type StepReport, short, UM_PER_CM } from './report';
import { treat } from './treat';
import { doseIn, presentIn, report, type Wafer } from './wafer';

export interface ProcessResult {
  /** The wafer's own doping first (stepIndex 0), then one for each step that brought dopant. */
  contributions: Contribution[];
  /** cm^-3; absent where nothing limits. */
  activeLimits: Partial<Record<Dopant, number>>;
  /** Absent: 1. */
  activeFractions: Partial<Record<Dopant, number>>;
  reports: StepReport[];
  warnings: Warning[];
  /** Silicon added less silicon removed, cm. */
  addedSilicon: number;
}

const NM_PER_CM = 1e7;

/**
 * Runs the steps in order on a wafer of uniform doping.
 * @param refinement 2 for half the cells of solved steps.
 */
export function runRecipe(recipe: Recipe, refinement = 1): ProcessResult {
  const { dopant, concentration } = recipe.wafer;
  const background = uniform(concentration, 0, Number.POSITIVE_INFINITY);
  const wafer: Wafer = {
    contributions: [{ dopant, shape: background, stepIndex: 0 }],
    damaging: new Set(),
    addedSilicon: 0,
    oxide: 0,
    refinement,
    reports: [],
    warnings: implantRemarks(recipe.steps),
  };
  for (const step of recipe.steps) run(step, wafer, recipe);
  const active = activation(recipe.models.activation, presentIn(wafer), wafer.lastHeat);
  return {
    contributions: wafer.contributions,
    activeLimits: active.limit,
    activeFractions: active.fraction,
    reports: wafer.reports,
    warnings: [...wafer.warnings, ...active.warnings],
    addedSilicon: wafer.addedSilicon,
  };
}

function run(step: RecipeStep, wafer: Wafer, recipe: Recipe): void {
  switch (step.kind) {
    case 'gaussian':
      place(step, wafer, gaussian(step.peak, step.depth, step.sigma), 'Gaussian profile');
      break;
    case 'erfc':
      place(step, wafer, erfcShape(step.surface, step.length), 'erfc profile');
      break;
    case 'uniform':
      place(step, wafer, uniform(step.concentration, step.from, step.to), 'uniform layer');
      break;
    case 'table':
      place(step, wafer, table(step.depth, step.concentration), 'tabulated profile');
      break;
    case 'implant':
      runImplant(throughOxide(step, wafer.oxide), wafer);
      break;
    case 'predeposition':
      runPredeposition(step, wafer, recipe);
      break;
    case 'anneal':
      runAnneal(step, wafer, recipe);
      break;
    case 'epitaxy':
      runEpitaxy(step, wafer);
      break;
    case 'etch':
      runEtch(step, wafer);
      break;
    case 'oxidation':
      runOxidation(step, wafer, recipe);
      break;
    case 'stripOxide':
      report(step, wafer, 'oxide stripped', { stripped_nm: wafer.oxide * NM_PER_CM });
      wafer.oxide = 0;
      break;
  }
}

/** A profile that the recipe states: it adds to what is there. */
function place(step: RecipeStep & { dopant: Dopant }, wafer: Wafer, shape: Shape, what: string): void {
  wafer.contributions.push({ dopant: step.dopant, shape, stepIndex: step.index });
  report(step, wafer, `${step.dopant}, ${what}`, { dose_cm2: doseOf(shape, Number.POSITIVE_INFINITY) });
}

function runImplant(step: ImplantStep, wafer: Wafer): void {
  const { dopant, shape, statistics, retainedDose, screened, warnings } = implant(step);
  wafer.contributions.push({ dopant, shape, stepIndex: step.index });
  wafer.damaging.add(step.index);
  wafer.warnings.push(...warnings.map((warning) => ({ ...warning, step: step.index })));
  const through = step.screen
    ? ` through ${short(step.screen.thickness * 1e7)} nm of ${step.screen.material}`
    : '';
  const title = `${step.species} implant, ${formatQuantity(step.dose, 'dose')} cm^-2 at ${short(step.energy_keV)} keV${through}`;
  report(step, wafer, title, {
    ranges: step.ranges,
    projectedRange_um: statistics.projectedRange * UM_PER_CM,
    straggle_um: statistics.straggle * UM_PER_CM,
    skewness: statistics.skewness,
    kurtosis: statistics.kurtosis,
    ...(screened !== null && { screened_percent: 100 * screened }),
    retainedDose_cm2: retainedDose,
    retained_percent: (100 * retainedDose) / step.dose,
  });
}

function runPredeposition(step: PredepositionStep, wafer: Wafer, recipe: Recipe): void {
  const heat: HeatTreatment = { ...step, endTemperature: step.temperature };
  const set = recipe.models.diffusivity;
  const { surface, shape } = predeposition(step, dtOf(set, step.dopant, heat));
  const arriving = shape && { dopant: step.dopant, shape, stepIndex: step.index };
  const source = shape && { dopant: step.dopant, surface, stepIndex: step.index };
  const before = doseIn(wafer, step.dopant);
  const solved = treat(step, wafer, heat, recipe, arriving, source);
  if (!shape)
    wafer.warnings.push({
      code: 'predeposition-nothing',
      message: `a predeposition of ${step.dopant} this short and cool brings nothing in`,
      step: step.index,
    });
  const title = `${step.dopant} predeposition, ${short(step.time / 60)} min at ${short(step.temperature - ZERO_CELSIUS)} °C`;
  report(step, wafer, title, {
    surface_cm3: surface,
    dose_cm2: doseIn(wafer, step.dopant) - before,
    ...solved,
    ...dtFigures(presentIn(wafer), (dopant) => dtOf(set, dopant, heat)),
  });
}

function runAnneal(step: AnnealStep, wafer: Wafer, recipe: Recipe): void {
  const set = recipe.models.diffusivity;
  const solved = treat(step, wafer, step, recipe, null, null);
  const from = short(step.temperature - ZERO_CELSIUS);
  const to =
    step.endTemperature === step.temperature ? '' : ` to ${short(step.endTemperature - ZERO_CELSIUS)}`;
  report(step, wafer, `anneal, ${short(step.time / 60)} min at ${from}${to} °C`, {
    ...dtFigures(presentIn(wafer), (dopant) => dtOf(set, dopant, step)),
    ...solved,
  });
}

function runEpitaxy(step: EpitaxyStep, wafer: Wafer): void {
  wafer.contributions = epitaxy(wafer.contributions, step);
  wafer.addedSilicon += step.thickness;
  report(step, wafer, `epitaxy of ${short(step.thickness * UM_PER_CM)} um`, {
    added_um: step.thickness * UM_PER_CM,
    ...(step.dopant && { dose_cm2: step.concentration * step.thickness }),
  });
}

function runEtch(step: EtchStep, wafer: Wafer): void {
  const { contributions, removedDose } = etch(wafer.contributions, step);
  wafer.contributions = contributions;
  wafer.addedSilicon -= step.thickness;
  report(step, wafer, `etch of ${short(step.thickness * UM_PER_CM)} um`, {
    removed_um: step.thickness * UM_PER_CM,
    removedDose_cm2: removedDose,
  });
}

/** Oxide that lies on the wafer screens an implant together with what the step states. */
function throughOxide(step: ImplantStep, oxide: number): ImplantStep {
  if (oxide === 0) return step;
  return { ...step, screen: { material: 'oxide', thickness: oxide + (step.screen?.thickness ?? 0) } };
}

/** Oxide grows, the dopants diffuse meanwhile, and the silicon that became oxide is gone with what it holds. */
function runOxidation(step: OxidationStep, wafer: Wafer, recipe: Recipe): void {
  const heat: HeatTreatment = { ...step, endTemperature: step.temperature };
  const set = recipe.models.diffusivity;
  const solved = treat(step, wafer, heat, recipe, null, null);
  const before = wafer.oxide;
  wafer.oxide = oxideThickness(step.ambient, recipe.wafer.orientation, step.temperature, step.time, before);
  const consumed = CONSUMED * (wafer.oxide - before);
  const { contributions, removedDose } = etch(wafer.contributions, { thickness: consumed });
  wafer.contributions = contributions;
  wafer.addedSilicon -= consumed;
  wafer.warnings.push(...oxidationWarnings(step));
  const title = `${step.ambient} oxidation, ${short(step.time / 60)} min at ${short(step.temperature - ZERO_CELSIUS)} °C`;
  report(step, wafer, title, {
    oxide_nm: wafer.oxide * NM_PER_CM,
    consumed_nm: consumed * NM_PER_CM,
    removedDose_cm2: removedDose,
    ...dtFigures(presentIn(wafer), (dopant) => dtOf(set, dopant, heat)),
    ...solved,
  });
}
