/** The kinds of recipe steps for people: what each is called and does, how a new one begins, what to be careful about. */

import type { StudyStep, StudyStepKind } from '../../core/index';

export interface StepKind {
  readonly title: string;
  /** One line for the menu. */
  readonly what: string;
  /** Where the work behind the step can hurt someone. */
  readonly caution?: string;
  /** A new step; null where data must be chosen first. */
  readonly fresh: StudyStep | null;
}

const SITE = 'Follow your site’s safety rules and its qualified staff.';

export const STEP_KINDS: Record<StudyStepKind, StepKind> = {
  implant: {
    title: 'Implant',
    what: 'Ions of a dose and energy, through a screen film or bare',
    caution: `Implanters hold toxic source gases and high voltage. ${SITE}`,
    fresh: { step: 'implant', dopant: 'boron', dose_cm2: 1e13, energy_keV: 60, shape: 'pearson' },
  },
  anneal: {
    title: 'Anneal',
    what: 'Time at temperature, or a ramp: everything so far diffuses',
    caution: `Furnaces and their boats stay dangerously hot. ${SITE}`,
    fresh: { step: 'anneal', temperature_C: 1000, time_min: 30, ambient: 'inert' },
  },
  predeposition: {
    title: 'Predeposition',
    what: 'A dopant source at the surface at temperature',
    caution: `Dopant sources can be toxic, corrosive or flammable, and furnaces hot. ${SITE}`,
    fresh: { step: 'predeposition', dopant: 'phosphorus', temperature_C: 950, time_min: 20 },
  },
  epitaxy: {
    title: 'Epitaxy',
    what: 'Silicon grown on top, doped or not',
    caution: `Growth gases can be toxic, pyrophoric or explosive. ${SITE}`,
    fresh: { step: 'epitaxy', thickness_um: 1, dopant: 'phosphorus', concentration_cm3: 1e16 },
  },
  etch: {
    title: 'Etch',
    what: 'Silicon removed from the top',
    caution: `Etchants, hydrofluoric acid above all, injure severely and late. ${SITE}`,
    fresh: { step: 'etch', thickness_um: 0.1 },
  },
  oxidation: {
    title: 'Oxidation',
    what: 'Thermal oxide, dry or wet: consumes silicon and screens later implants',
    caution: `Furnaces stay dangerously hot, and hydrogen for steam is explosive. ${SITE}`,
    fresh: { step: 'oxidation', ambient: 'dry', temperature_C: 1000, time_min: 30 },
  },
  stripOxide: {
    title: 'Strip oxide',
    what: 'Takes away all oxide that the recipe has grown',
    caution: `Hydrofluoric acid injures severely and late. ${SITE}`,
    fresh: { step: 'stripOxide' },
  },
  table: {
    title: 'Measured profile',
    what: 'A depth profile from a text table (SIMS, SRP, a simulation)',
    fresh: null,
  },
  gaussian: {
    title: 'Gaussian',
    what: 'Stated directly: peak, its depth, its width',
    fresh: { step: 'gaussian', dopant: 'boron', peak_cm3: 1e18, depth_um: 0, sigma_um: 0.2 },
  },
  erfc: {
    title: 'Erfc',
    what: 'Stated directly: surface value falling as erfc(depth / length)',
    fresh: { step: 'erfc', dopant: 'phosphorus', surface_cm3: 1e20, length_um: 0.3 },
  },
  uniform: {
    title: 'Uniform',
    what: 'Stated directly: one concentration between two depths',
    fresh: { step: 'uniform', dopant: 'boron', concentration_cm3: 1e17, from_um: 0, to_um: 1 },
  },
};

/** In the order of the menu: process steps first, then profiles stated directly. */
export const STEP_ORDER: readonly StudyStepKind[] = [
  'implant',
  'anneal',
  'predeposition',
  'epitaxy',
  'etch',
  'oxidation',
  'stripOxide',
  'table',
  'gaussian',
  'erfc',
  'uniform',
];
