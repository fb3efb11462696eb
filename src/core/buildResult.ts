/** The way out: what the chain computed, in the units and names of the result document. */

import type { CarrierChoice } from './carriers/carriers';
import { IONISATION_SOURCE } from './carriers/ionisation';
import type { CarrierState } from './carriers/state';
import { ZERO_CELSIUS } from './material/constants';
import { DOPANT_FACTS } from './material/dopants';
import { INTRINSIC_SOURCE } from './material/intrinsic';
import { resistivityOf } from './material/mf723';
import type { MobilityModel } from './mobility/model';
import { uniformSilicon } from './mobility/uniform';
import { accumulate } from './numeric/simpson';
import type { ProcessResult } from './process/runRecipe';
import {
  type JunctionResult,
  type LayerResult,
  type MeasurementResult,
  RESULT_FORMAT,
  type ResultDocument,
  type SolvedColumns,
} from './result';
import type { Conduction } from './sheet/conduction';
import type { LayerReadings, LayerSpan } from './sheet/layers';
import type { ModelReading } from './sheet/modelSpread';
import { fingerprint } from './study/fingerprint';
import type { MobilityName } from './study/names';
import type { Warning } from './study/problem';
import type { Recipe } from './study/recipe';
import type { Measurement, Study } from './study/schema';
import { PROGRAM_VERSION } from './version';

const UM_PER_CM = 1e4;

export interface BuiltParts {
  study: Study;
  recipe: Recipe;
  process: ProcessResult;
  model: MobilityModel;
  choice: CarrierChoice;
  state: CarrierState;
  flow: Conduction;
  spans: readonly LayerSpan[];
  readings: readonly LayerReadings[];
  /** 1/K for each layer. */
  coefficients: readonly (number | null)[];
  spread: readonly ModelReading[];
  warnings: readonly Warning[];
}

export function buildResult(parts: BuiltParts): ResultDocument {
  const { study, recipe, process, model } = parts;
  const { wafer } = recipe;
  const layers = parts.spans.map((_, i) => layerResult(parts, i));
  return {
    format: RESULT_FORMAT,
    study: { name: study.name, sha256: fingerprint(study) },
    program: { name: 'Ohmstrata', version: PROGRAM_VERSION },
    temperature_C: recipe.temperature - ZERO_CELSIUS,
    models: {
      mobility: model.name,
      mobilitySource: model.source,
      carriers: parts.choice.carriers,
      ionisation: parts.choice.ionisation,
      ionisationSource: parts.choice.ionisation === 'levels' ? IONISATION_SOURCE : 'every active dopant',
      statistics: parts.choice.statistics,
      narrowing: parts.choice.narrowing,
      unfit: Object.fromEntries(
        parts.spread.flatMap(({ mobility, unfit }) => (unfit === null ? [] : [[mobility, unfit]])),
      ),
      activation: recipe.models.activation,
      intrinsic: INTRINSIC_SOURCE,
    },
    wafer: {
      type: DOPANT_FACTS[wafer.dopant].role === 'donor' ? 'n' : 'p',
      dopant: wafer.dopant,
      concentration_cm3: wafer.concentration,
      resistivity_ohmCm: resistivityOf(wafer.dopant, wafer.concentration).value,
      modelResistivity_ohmCm: uniformSilicon(
        wafer.dopant,
        wafer.concentration,
        recipe.temperature,
        model.name,
        parts.choice.ionisation,
      ).resistivity,
    },
    junctions: junctionResults(parts.state),
    layers,
    measurements: (study.measurements ?? []).map((measurement) => measurementResult(measurement, layers)),
    steps: process.reports,
    mesh: { nodes: parts.state.doping.depth.length },
    warnings: [...parts.warnings],
  };
}

/** Every sign change of net doping and every place where n = p, in order of depth. */
function junctionResults({ doping, electrostatics, cuts }: CarrierState): JunctionResult[] {
  const um = (depth: number): number => depth * UM_PER_CM;
  const metallurgical = doping.junctions.map((i) => um(doping.depth[i]));
  if (!electrostatics)
    return cuts.map((_, k) => ({
      metallurgical_um: metallurgical[k],
      electrical_um: metallurgical[k],
      depletion_um: null,
      builtIn_V: null,
      capacitance_nFcm2: null,
    }));
  const electrical = electrostatics.junctions.map(
    (junction): JunctionResult => ({
      metallurgical_um: junction.metallurgical === null ? null : metallurgical[junction.metallurgical],
      electrical_um: um(junction.depth),
      depletion_um: junction.depletion && [um(junction.depletion.edges[0]), um(junction.depletion.edges[1])],
      builtIn_V: junction.builtIn,
      capacitance_nFcm2: junction.depletion && junction.depletion.capacitance * 1e9,
    }),
  );
  const matched = new Set(electrostatics.junctions.map((junction) => junction.metallurgical));
  const alone = metallurgical.flatMap((depth, k): JunctionResult[] =>
    matched.has(k)
      ? []
      : [
          {
            metallurgical_um: depth,
            electrical_um: null,
            depletion_um: null,
            builtIn_V: null,
            capacitance_nFcm2: null,
          },
        ],
  );
  return [...electrical, ...alone].sort((a, b) => depthOf(a) - depthOf(b));
}

const depthOf = ({ electrical_um, metallurgical_um }: JunctionResult): number =>
  electrical_um ?? metallurgical_um ?? 0;

function layerResult(parts: BuiltParts, i: number): LayerResult {
  const { recipe, spans, readings, coefficients, spread } = parts;
  const { doping } = parts.state;
  const span = spans[i];
  const reading = readings[i];
  const coefficient = coefficients[i];
  const [top, bottom] = [doping.depth[span.from], doping.depth[span.to]];
  const { buriedOxide, thickness } = recipe.wafer;
  const film = buriedOxide !== undefined && buriedOxide < thickness ? 'buriedOxide' : 'wafer';
  return {
    index: i + 1,
    type: span.type,
    top_um: top * UM_PER_CM,
    bottom_um: bottom * UM_PER_CM,
    bottomEdge: span.to < doping.depth.length - 1 ? 'junction' : film,
    sheetResistance_ohmSq: 1 / reading.sheetConductance,
    ...spreadOf(spread, i, reading.sheetConductance),
    sheetConductance_S: reading.sheetConductance,
    netDose_cm2: reading.netDose,
    carrierDose_cm2: reading.carrierDose,
    meanResistivity_ohmCm: (bottom - top) / reading.sheetConductance,
    conductivityMobility_cm2Vs: reading.conductivityMobility,
    hallMobility_cm2Vs: reading.hallMobility,
    hallDose_cm2: reading.hallDose,
    surfaceNet_cm3: reading.surfaceNet,
    peakNet_cm3: reading.peakNet,
    peakDepth_um: reading.peakDepth * UM_PER_CM,
    tcr1_ppmK: coefficient === null ? null : coefficient * 1e6,
  };
}

function spreadOf(
  spread: readonly ModelReading[],
  layer: number,
  own: number,
): Pick<LayerResult, 'sheetResistanceSpread_ohmSq' | 'sheetResistanceByMobility_ohmSq'> {
  const values = spread.map(({ mobility, conductances }) => [mobility, 1 / conductances[layer]] as const);
  const fit = values.filter((_, k) => spread[k].unfit === null).map(([, value]) => value);
  return {
    sheetResistanceSpread_ohmSq: [Math.min(1 / own, ...fit), Math.max(1 / own, ...fit)],
    sheetResistanceByMobility_ohmSq: Object.fromEntries(values) as Record<MobilityName, number>,
  };
}

function measurementResult(measurement: Measurement, layers: readonly LayerResult[]): MeasurementResult {
  const { layer, sheetResistance_ohmSq: measured, sigma_ohmSq: sigma = null } = measurement;
  const predicted = layers[layer - 1]?.sheetResistance_ohmSq ?? null;
  const difference = predicted === null ? null : measured - predicted;
  return {
    kind: measurement.kind,
    layer,
    measured_ohmSq: measured,
    sigma_ohmSq: sigma,
    predicted_ohmSq: predicted,
    difference_percent: difference === null || predicted === null ? null : (100 * difference) / predicted,
    difference_sigma: difference === null || !sigma ? null : difference / sigma,
  };
}

/** Every column against depth, in the order of the mesh. */
export function buildColumns({ state, flow, spans, readings }: BuiltParts): SolvedColumns {
  const { doping, electrostatics } = state;
  const count = doping.depth.length;
  const lattice = new Float64Array(count);
  const impurity = new Float64Array(count);
  const share = new Float64Array(count);
  const cumulative = new Float64Array(count);
  spans.forEach(({ from, to, type }, k) => {
    const parts = type === 'n' ? flow.electronParts : flow.holeParts;
    const perConductance = 1 / readings[k].sheetConductance;
    accumulate(doping.depth, flow.conductivity, from, to, cumulative);
    for (let i = from; i <= to; i++) {
      lattice[i] = parts.lattice[i];
      impurity[i] = parts.impurity[i];
      share[i] = (flow.conductivity[i] * perConductance) / UM_PER_CM;
      cumulative[i] *= perConductance;
    }
  });
  return {
    depth_um: doping.depth.map((x) => x * UM_PER_CM),
    dopants: doping.dopants.map(({ dopant, chemical, active }) => ({
      dopant,
      chemical_cm3: chemical,
      active_cm3: active,
    })),
    donors_cm3: flow.input.donors,
    acceptors_cm3: flow.input.acceptors,
    net_cm3: doping.net,
    electrons_cm3: flow.input.electrons,
    holes_cm3: flow.input.holes,
    potential_V: electrostatics?.potential ?? new Float64Array(count).fill(Number.NaN),
    electronMobility_cm2Vs: flow.electronMobility,
    holeMobility_cm2Vs: flow.holeMobility,
    latticeMobility_cm2Vs: lattice,
    impurityMobility_cm2Vs: impurity,
    conductivity_Scm: flow.conductivity,
    share_perUm: share,
    cumulativeShare: cumulative,
  };
}
