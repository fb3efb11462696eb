/** What a solved study gives: the result document (`ohmstrata-result/1`) and the columns sampled in depth behind it. */

import type { Dopant } from './material/dopants';
import type { MobilityName } from './study/names';
import type { Warning } from './study/problem';
import type { ActivationChoice } from './study/recipe';
import type { Study } from './study/schema';

export const RESULT_FORMAT = 'ohmstrata-result/1';

export interface JunctionResult {
  /** Sign change of net doping; null where carriers alone make a junction, as under a charged surface. */
  metallurgical_um: number | null;
  /** Where n = p; with neutral carriers the same depth; null where a layer beside it is depleted and there is none. */
  electrical_um: number | null;
  /** Edges of the depleted region; null with neutral carriers, and where a fixed surface or an emptied layer leaves none. */
  depletion_um: [number, number] | null;
  /** Potential between the nearest neutral silicon above and below, bias apart; null with neutral carriers. */
  builtIn_V: number | null;
  /** Small-signal capacitance per area; permittivity over the distance of the two edges. */
  capacitance_nFcm2: number | null;
}

export interface LayerResult {
  /** Counted from 1 at the surface. */
  index: number;
  type: 'n' | 'p';
  top_um: number;
  bottom_um: number;
  /** What ends the layer below. */
  bottomEdge: 'junction' | 'wafer' | 'buriedOxide';
  sheetResistance_ohmSq: number;
  /** Lowest and highest sheet resistance by the published mobility models that apply here. */
  sheetResistanceSpread_ohmSq: [number, number];
  /** By each mobility model; those that do not apply here are in `models.unfit`. */
  sheetResistanceByMobility_ohmSq: Record<MobilityName, number>;
  sheetConductance_S: number;
  /** Integral of |active donors - active acceptors|, and of the majority carriers. */
  netDose_cm2: number;
  carrierDose_cm2: number;
  meanResistivity_ohmCm: number;
  conductivityMobility_cm2Vs: number;
  /** Hall averages of the majority carriers, Hall factor 1. */
  hallMobility_cm2Vs: number;
  hallDose_cm2: number;
  surfaceNet_cm3: number;
  peakNet_cm3: number;
  peakDepth_um: number;
  /** First-order temperature coefficient of the sheet resistance; null where the mobility model knows one temperature only. */
  tcr1_ppmK: number | null;
}

/** A measured four-point value beside the prediction for its layer. */
export interface MeasurementResult {
  kind: 'fourPoint';
  layer: number;
  measured_ohmSq: number;
  sigma_ohmSq: number | null;
  /** Null when the prediction has no such layer. */
  predicted_ohmSq: number | null;
  difference_percent: number | null;
  /** Difference in units of the stated uncertainty. */
  difference_sigma: number | null;
}

/** What one recipe step did, for people: `figures` are short name-value pairs with units in the name. */
export interface StepResult {
  /** Position in the document, from 1. */
  index: number;
  kind: string;
  title: string;
  figures: Record<string, number | string>;
}

export interface ResultDocument {
  format: typeof RESULT_FORMAT;
  study: { name: string; sha256: string };
  program: { name: 'Ohmstrata'; version: string };
  temperature_C: number;
  models: {
    mobility: MobilityName;
    mobilitySource: string;
    carriers: Study['models']['carriers'];
    /** What was used: a mobility model made from dopant densities implies `complete`. */
    ionisation: Study['models']['ionisation'];
    ionisationSource: string;
    statistics: Study['models']['statistics'];
    narrowing: Study['models']['narrowing'];
    /** Mobility models that do not apply to this study, and why. */
    unfit: Partial<Record<MobilityName, string>>;
    activation: ActivationChoice;
    intrinsic: string;
  };
  wafer: {
    type: 'n' | 'p';
    dopant: Dopant;
    concentration_cm3: number;
    /** Of the wafer as delivered: by the standard (SEMI MF723, 23 C), and by the study's mobility model and temperature. */
    resistivity_ohmCm: number;
    modelResistivity_ohmCm: number;
  };
  junctions: JunctionResult[];
  layers: LayerResult[];
  measurements: MeasurementResult[];
  steps: StepResult[];
  mesh: { nodes: number };
  warnings: Warning[];
}

/** Columns in depth, all of one length; the nodes are those of the mesh, surface first. */
export interface SolvedColumns {
  depth_um: Float64Array;
  /** Only the dopants that are present. */
  dopants: { dopant: Dopant; chemical_cm3: Float64Array; active_cm3: Float64Array }[];
  /** Ionised: what carriers scatter at. */
  donors_cm3: Float64Array;
  acceptors_cm3: Float64Array;
  /** Active donors - active acceptors, with its sign. */
  net_cm3: Float64Array;
  electrons_cm3: Float64Array;
  holes_cm3: Float64Array;
  /** From where n = p in undoped silicon; NaN with neutral carriers, which have none. */
  potential_V: Float64Array;
  electronMobility_cm2Vs: Float64Array;
  holeMobility_cm2Vs: Float64Array;
  /** Parts of the majority carriers' mobility at each depth; NaN where the model has none. */
  latticeMobility_cm2Vs: Float64Array;
  impurityMobility_cm2Vs: Float64Array;
  conductivity_Scm: Float64Array;
  /** Fraction of its layer's sheet conductance that a micrometre of depth contributes there. */
  share_perUm: Float64Array;
  /** Share of its layer above this depth, 0 to 1. */
  cumulativeShare: Float64Array;
}

export interface Solution {
  result: ResultDocument;
  columns: SolvedColumns;
}
