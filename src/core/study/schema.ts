/**
 * The study document, format `ohmstrata-study/1`: the one definition that validates and from which the JSON Schema comes.
 *
 * Every quantity carries its unit as a suffix. Ranges are what the program can compute at all; a model's published
 * range is narrower and only warns.
 */

import { z } from 'zod';
import { DOPANTS, IMPLANT_SPECIES } from '../material/dopants';
import {
  CARRIER_NAMES,
  DIFFUSION_NAMES,
  DIFFUSIVITY_SETS,
  IONISATION_NAMES,
  MOBILITY_NAMES,
  NARROWING_NAMES,
  RANGE_SETS,
  STATISTICS_NAMES,
  TABLE_DELIMITERS,
  TABLE_ENCODINGS,
} from './names';

export const STUDY_FORMAT = 'ohmstrata-study/1';

/** Largest number of points an embedded table may carry; larger tables are thinned on import. */
export const MAX_TABLE_POINTS = 20_000;
const MAX_STEPS = 200;

const between = (low: number, high: number) => z.number().min(low).max(high);
const concentration = between(1, 1e23);
const depth = between(0, 1e4);
const temperature = between(200, 1450);
const time = between(0, 1e5);
const name = z.string().max(200);

/** Keys every step may carry beside its own. */
const common = {
  label: name.optional(),
  /** A disabled step stays in the document and takes no part. */
  disabled: z.boolean().optional(),
};
const dopant = z.enum(DOPANTS);

const gaussian = z.strictObject({
  step: z.literal('gaussian'),
  dopant,
  peak_cm3: concentration,
  depth_um: between(-1e3, 1e4),
  sigma_um: between(1e-5, 1e3),
  ...common,
});

const erfc = z.strictObject({
  step: z.literal('erfc'),
  dopant,
  surface_cm3: concentration,
  length_um: between(1e-5, 1e4),
  ...common,
});

const uniform = z.strictObject({
  step: z.literal('uniform'),
  dopant,
  concentration_cm3: concentration,
  from_um: depth.default(0),
  to_um: between(1e-5, 1e4),
  ...common,
});

/** How a text table is to be read; whatever is absent is detected. Kept in the study so that a second reading is identical. */
export const tableChoiceSchema = z.strictObject({
  delimiter: z.enum(TABLE_DELIMITERS).optional(),
  decimal: z.enum(['.', ',']).optional(),
  /** Lines to leave out at the top. */
  skip: z.int().min(0).max(1e6).optional(),
  encoding: z.enum(TABLE_ENCODINGS).optional(),
  depthUnit: z.enum(['nm', 'um', 'A', 'cm']).optional(),
  concentrationUnit: z.enum(['cm-3', 'm-3']).optional(),
});

/** A column by its position from 1 or by its heading. */
const column = z.union([z.int().min(1).max(1000), z.string().min(1).max(200)]);

const table = z.strictObject({
  step: z.literal('table'),
  dopant,
  /** A table in the study's own folder ... */
  file: z.string().min(1).max(255).optional(),
  columns: z.strictObject({ depth: column.optional(), concentration: column.optional() }).optional(),
  reading: tableChoiceSchema.optional(),
  /** ... or the data themselves, ascending in depth, and where they came from. */
  depth_um: z.array(between(0, 1e4)).min(2).max(MAX_TABLE_POINTS).optional(),
  concentration_cm3: z.array(between(0, 1e23)).min(2).max(MAX_TABLE_POINTS).optional(),
  source: z
    .strictObject({ name: z.string().max(255), sha256: z.string().regex(/^[0-9a-f]{64}$/) })
    .optional(),
  ...common,
});

const implant = z.strictObject({
  step: z.literal('implant'),
  dopant: z.enum(IMPLANT_SPECIES),
  dose_cm2: between(1e6, 1e18),
  energy_keV: between(0.1, 10_000),
  screen: z
    .strictObject({ material: z.enum(['oxide', 'nitride']), thickness_nm: between(0, 1e4) })
    .optional(),
  shape: z.enum(['pearson', 'gaussian']).default('pearson'),
  /** Boron alone: in place of the channelling that ranges in an amorphous target leave out. */
  tail: z.enum(['exponential']).optional(),
  /** Overrides `models.ranges` for this step. */
  ranges: z.enum(RANGE_SETS).optional(),
  ...common,
});

const predeposition = z.strictObject({
  step: z.literal('predeposition'),
  dopant,
  temperature_C: temperature,
  time_min: time,
  /** Absent: the solid solubility at that temperature. */
  surface_cm3: concentration.optional(),
  ...common,
});

const anneal = z.strictObject({
  step: z.literal('anneal'),
  temperature_C: temperature,
  time_min: time,
  /** Present: a linear ramp from `temperature_C` to this over `time_min`. */
  endTemperature_C: temperature.optional(),
  ambient: z.enum(['inert']).default('inert'),
  /** Present: the extra diffusion by the damage of the implants before it, by this estimate. */
  transient: z.enum(['plusOne']).optional(),
  ...common,
});

const epitaxy = z.strictObject({
  step: z.literal('epitaxy'),
  thickness_um: between(1e-4, 1e3),
  dopant: dopant.optional(),
  concentration_cm3: concentration.optional(),
  ...common,
});

const etch = z.strictObject({ step: z.literal('etch'), thickness_um: between(1e-5, 1e3), ...common });

const oxidation = z.strictObject({
  step: z.literal('oxidation'),
  ambient: z.enum(['dry', 'wet']),
  temperature_C: between(600, 1300),
  time_min: time,
  ...common,
});

/** Takes away all oxide that the recipe has grown. */
const stripOxide = z.strictObject({ step: z.literal('stripOxide'), ...common });

export const stepSchema = z.discriminatedUnion('step', [
  gaussian,
  erfc,
  uniform,
  table,
  implant,
  predeposition,
  anneal,
  epitaxy,
  etch,
  oxidation,
  stripOxide,
]);

const wafer = z.strictObject({
  material: z.literal('silicon').default('silicon'),
  dopant: z.enum(DOPANTS),
  concentration_cm3: between(1e10, 1e21).optional(),
  resistivity_ohmCm: between(1e-5, 1e6).optional(),
  thickness_um: between(0.01, 1e4).default(525),
  orientation: z.enum(['100', '111']).default('100'),
  /** An insulator at this depth ends the conducting film. */
  buriedOxide_um: between(0.001, 1e4).optional(),
});

const fraction = between(0, 1);
const models = z.strictObject({
  mobility: z.enum(MOBILITY_NAMES).default('klaassen'),
  carriers: z.enum(CARRIER_NAMES).default('poisson'),
  ionisation: z.enum(IONISATION_NAMES).default('complete'),
  statistics: z.enum(STATISTICS_NAMES).default('boltzmann'),
  narrowing: z.enum(NARROWING_NAMES).default('none'),
  activation: z.union([z.enum(['full', 'solubility']), z.partialRecord(dopant, fraction)]).default('full'),
  ranges: z.enum(RANGE_SETS).default('universal'),
  diffusivity: z.enum(DIFFUSIVITY_SETS).default('fair1981'),
  diffusion: z.enum(DIFFUSION_NAMES).default('constant'),
});

/** What the surface does to the carriers below; without it there is no field. One of the two keys. */
const surface = z.strictObject({
  /** Fixed charges of an oxide on the surface, in elementary charges. */
  charge_cm2: between(-1e14, 1e14).optional(),
  /** The surface's potential against neutral silicon there. */
  potential_V: between(-2, 2).optional(),
});

const measurement = z.strictObject({
  kind: z.literal('fourPoint'),
  layer: z.int().min(1).max(100),
  sheetResistance_ohmSq: between(1e-6, 1e15),
  sigma_ohmSq: between(0, 1e15).optional(),
});

export const studySchema = z.strictObject({
  format: z.literal(STUDY_FORMAT),
  name: name.default('untitled study'),
  /** Free text: what the study is about, and that its data are invented when they are. */
  note: z.string().max(10_000).optional(),
  temperature_C: between(-73.15, 226.85).default(25),
  wafer,
  steps: z.array(stepSchema).max(MAX_STEPS).default([]),
  models: models.prefault({}),
  surface: surface.optional(),
  /** Reverse voltage of each metallurgical junction from the surface down. */
  reverseBias_V: z.array(between(0, 1000)).max(100).optional(),
  measurements: z.array(measurement).max(1000).optional(),
});

/** A study as validated: every default filled in. */
export type Study = z.output<typeof studySchema>;
export type StudyStep = Study['steps'][number];
export type StudyStepKind = StudyStep['step'];
export type TableChoice = z.output<typeof tableChoiceSchema>;
export type Measurement = z.output<typeof measurement>;
