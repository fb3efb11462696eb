/** What every mobility model takes and gives: columns in depth, so that one call serves a whole profile. */

import type { Dopant } from '../material/dopants';
import type { MobilityName } from '../study/names';

/** Ionised impurities and carriers at each depth. All columns have the same length; concentrations in cm^-3. */
export interface MobilityInput {
  /** K */
  readonly temperature: number;
  /** All ionised donors, all ionised acceptors: scattering centres whatever their sign. */
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  /** Which dopants make up `donors` and `acceptors` (only those that are present; they add up to the columns above). */
  readonly donorParts: readonly DopantColumn[];
  readonly acceptorParts: readonly DopantColumn[];
}

export interface DopantColumn {
  readonly dopant: Dopant;
  readonly ionised: Float64Array;
}

/** What limits the mobility: 1/total = 1/lattice + 1/impurity (Matthiessen). cm^2/Vs; NaN where a model has no such part. */
export interface MobilityParts {
  readonly lattice: Float64Array;
  readonly impurity: Float64Array;
}

/** Columns a model fills; cm^2/Vs. The caller owns and reuses them. */
export interface MobilityOutput {
  readonly electrons: Float64Array;
  readonly holes: Float64Array;
  readonly electronParts?: MobilityParts;
  readonly holeParts?: MobilityParts;
}

export interface MobilityModel {
  readonly name: MobilityName;
  /** Short name for people: "Klaassen 1992 (unified)". */
  readonly title: string;
  /** Author, year, journal, pages. */
  readonly source: string;
  /**
   * What the published argument is. A model of dopants was made from resistivities by taking every dopant for a carrier, so that
   * it must be used with complete ionisation; one of carriers takes what is ionised.
   */
  readonly argument: 'dopants' | 'carriers';
  /** What is known to be wrong with the model even inside its range. */
  readonly caution?: string;
  /** Published ranges; outside them the value is still given, with a warning. cm^-3, K. */
  readonly range: {
    readonly concentration: readonly [number, number];
    readonly temperature: readonly [number, number];
  };
  /** False for a model of one temperature only: no temperature coefficient can come from it. */
  readonly dependsOnTemperature: boolean;
  /** True when it fills `electronParts` and `holeParts`. */
  readonly hasParts: boolean;
  /** Dopants with coefficients of their own; others borrow, and a warning says so. */
  readonly ownDopants: readonly Dopant[];
  /** Fills `output` for every depth. Allocates nothing that grows with depth. */
  evaluate(input: MobilityInput, output: MobilityOutput): void;
}

/** The ionisation to use with a model when `wanted` is asked for. */
export function ionisationFor(model: MobilityModel, wanted: 'complete' | 'levels'): 'complete' | 'levels' {
  return model.argument === 'dopants' ? 'complete' : wanted;
}
