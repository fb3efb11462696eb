/**
 * The recipe: a validated study in the core's own units (cm, cm^-3, cm^-2, K, s), disabled steps left out.
 * Everything behind `study/` reads this and never the document.
 */

import type { Dopant, ImplantSpecies } from '../material/dopants';
import type { DiffusionName, DiffusivitySet, MobilityName, NarrowingName, RangeSet } from './names';

interface Numbered {
  /** Position in the document, counted from 1, disabled steps included. */
  readonly index: number;
}

export interface GaussianStep extends Numbered {
  readonly kind: 'gaussian';
  readonly dopant: Dopant;
  readonly peak: number;
  readonly depth: number;
  readonly sigma: number;
}

export interface ErfcStep extends Numbered {
  readonly kind: 'erfc';
  readonly dopant: Dopant;
  readonly surface: number;
  readonly length: number;
}

export interface UniformStep extends Numbered {
  readonly kind: 'uniform';
  readonly dopant: Dopant;
  readonly concentration: number;
  readonly from: number;
  readonly to: number;
}

export interface TableStep extends Numbered {
  readonly kind: 'table';
  readonly dopant: Dopant;
  /** Ascending, in cm; concentration in cm^-3, >= 0. */
  readonly depth: Float64Array;
  readonly concentration: Float64Array;
}

export interface ImplantStep extends Numbered {
  readonly kind: 'implant';
  readonly species: ImplantSpecies;
  readonly dose: number;
  readonly energy_keV: number;
  readonly screen?: { readonly material: 'oxide' | 'nitride'; readonly thickness: number };
  readonly shape: 'pearson' | 'gaussian';
  /** An exponential tail for channelling, boron alone. */
  readonly hasTail: boolean;
  readonly ranges: RangeSet;
}

export interface PredepositionStep extends Numbered {
  readonly kind: 'predeposition';
  readonly dopant: Dopant;
  readonly temperature: number;
  readonly time: number;
  readonly surface?: number;
}

export interface AnnealStep extends Numbered {
  readonly kind: 'anneal';
  readonly temperature: number;
  /** Equal to `temperature` unless the step is a linear ramp. */
  readonly endTemperature: number;
  readonly time: number;
  /** The "+1" estimate of transient enhanced diffusion is accepted. */
  readonly hasTransient: boolean;
}

export interface EpitaxyStep extends Numbered {
  readonly kind: 'epitaxy';
  readonly thickness: number;
  readonly dopant?: Dopant;
  readonly concentration: number;
}

export interface EtchStep extends Numbered {
  readonly kind: 'etch';
  readonly thickness: number;
}

export interface OxidationStep extends Numbered {
  readonly kind: 'oxidation';
  readonly ambient: 'dry' | 'wet';
  readonly temperature: number;
  readonly time: number;
}

export interface StripOxideStep extends Numbered {
  readonly kind: 'stripOxide';
}

export type RecipeStep =
  | GaussianStep
  | ErfcStep
  | UniformStep
  | TableStep
  | ImplantStep
  | PredepositionStep
  | AnnealStep
  | EpitaxyStep
  | EtchStep
  | OxidationStep
  | StripOxideStep;

export type ActivationChoice = 'full' | 'solubility' | Readonly<Partial<Record<Dopant, number>>>;

export interface Recipe {
  readonly name: string;
  /** Temperature of the reading, K. */
  readonly temperature: number;
  readonly wafer: {
    readonly dopant: Dopant;
    readonly concentration: number;
    readonly thickness: number;
    readonly orientation: '100' | '111';
    readonly buriedOxide?: number;
  };
  readonly steps: readonly RecipeStep[];
  readonly models: {
    readonly mobility: MobilityName;
    readonly activation: ActivationChoice;
    readonly diffusivity: DiffusivitySet;
    readonly diffusion: DiffusionName;
    readonly carriers: 'poisson' | 'neutral';
    readonly ionisation: 'levels' | 'complete';
    readonly statistics: 'boltzmann' | 'fermi-dirac';
    readonly narrowing: NarrowingName;
  };
  /** Charge on the surface, cm^-2 of q, or its potential, V. */
  readonly surface: { readonly charge: number } | { readonly potential: number };
  /** V, by metallurgical junction from the surface down. */
  readonly reverseBias: readonly number[];
}
