/** A layer between reverse-biased junctions: sheet resistance, depletion and capacitance against voltage, and pinch-off. */

import { type CarrierChoice, carriersOf } from '../carriers/carriers';
import type { CarrierState, Depletion } from '../carriers/state';
import { brent } from '../numeric/brent';
import { conduction } from '../sheet/conduction';
import { FILLED, filling } from '../sheet/depletion';
import { sheetConductance } from '../sheet/layers';
import { type Prepared, prepare } from '../solve';
import { InputProblem, NoSolution } from '../study/problem';
import type { Study } from '../study/schema';
import { type FollowedLayer, findLayer, followedLayer } from './layerOf';

export interface BiasSpan {
  /** Counted from 1 at the surface. */
  readonly layer: number;
  /** Which of its junctions carry the voltage. */
  readonly junctions: 'both' | 'upper' | 'lower';
  readonly from_V: number;
  readonly to_V: number;
  readonly points: number;
}

export interface BiasJunction {
  position: 'upper' | 'lower';
  metallurgical_um: number;
  /** By voltage. */
  depletion_um: ([number, number] | null)[];
  capacitance_nFcm2: (number | null)[];
}

export interface BiasResult {
  format: 'ohmstrata-bias/1';
  study: string;
  layer: number;
  type: 'n' | 'p';
  reverse_V: number[];
  /** By voltage; null where nothing of the layer is left to conduct. */
  sheetResistance_ohmSq: (number | null)[];
  junctions: BiasJunction[];
  /** (1/R) dR/dV at no bias. */
  voltageCoefficient_percentV: number | null;
  /** Reverse voltage at which the majority nowhere reaches half the net doping any more; null when it does up to 200 V. */
  pinchOff_V: number | null;
}

const UM_PER_CM = 1e4;
const MOST_VOLTS = 1000;
const MOST_POINTS = 1000;
/** Junctions of ordinary silicon break down long before. */
const HIGHEST_PINCH_OFF = 200;
/** Voltage step of the one-sided difference behind the voltage coefficient. */
const STEP_V = 0.05;

/**
 * Sweeps a reverse voltage over the junctions of one layer, on top of what the study itself states. Fermi levels are flat in each
 * layer: no current, no breakdown, no generation.
 * @throws InputProblem for a span that cannot be used, NoSolution when the layer or its junctions do not exist.
 */
export function biasSweep(study: Study, span: BiasSpan): BiasResult {
  checkSpan(span);
  const prepared = prepare({ ...study, models: { ...study.models, carriers: 'poisson' } });
  const still = carriersOf(prepared.doping, prepared.choice);
  const layer = followedLayer(still, span.layer);
  const biased = biasedJunctions(layer, span);
  const at = (volts: number): CarrierState =>
    carriersOf(prepared.doping, biasBy(prepared.choice, biased, volts));
  const { from_V, to_V, points } = span;
  const reverse = Array.from({ length: points }, (_, i) => from_V + ((to_V - from_V) * i) / (points - 1));
  const states = reverse.map(at);
  const resistance = (state: CarrierState): number | null => sheetResistanceOf(state, layer, prepared);
  return {
    format: 'ohmstrata-bias/1',
    study: study.name,
    layer: span.layer,
    type: layer.type,
    reverse_V: reverse,
    sheetResistance_ohmSq: states.map(resistance),
    junctions: (['upper', 'lower'] as const).flatMap((position) => {
      const junction = layer[position];
      if (junction === null) return [];
      const found = states.map((state) => depletionOf(state, junction));
      return [
        {
          position,
          metallurgical_um: prepared.doping.depth[prepared.doping.junctions[junction]] * UM_PER_CM,
          depletion_um: found.map((each) =>
            each ? [each.edges[0] * UM_PER_CM, each.edges[1] * UM_PER_CM] : null,
          ),
          capacitance_nFcm2: found.map((each) => (each ? each.capacitance * 1e9 : null)),
        },
      ];
    }),
    voltageCoefficient_percentV: voltageCoefficient(
      [0, STEP_V, 2 * STEP_V].map((volts) => resistance(at(volts))),
    ),
    pinchOff_V: pinchOff((volts) => filling(at(volts), layer)),
  };
}

function checkSpan({ from_V, to_V, points }: BiasSpan): void {
  for (const [key, value] of [
    ['from_V', from_V],
    ['to_V', to_V],
  ] as const)
    if (!(value >= 0 && value <= MOST_VOLTS))
      throw new InputProblem(`found ${value}; reverse voltages of 0 to ${MOST_VOLTS} V are allowed`, { key });
  if (!(to_V > from_V))
    throw new InputProblem(`found ${to_V}; it must be above from_V ${from_V}`, { key: 'to_V' });
  if (!(Number.isInteger(points) && points >= 2 && points <= MOST_POINTS))
    throw new InputProblem(`found ${points}; 2 to ${MOST_POINTS} are allowed`, { key: 'points' });
}

function biasedJunctions({ upper, lower, index }: FollowedLayer, { junctions }: BiasSpan): number[] {
  const wanted = junctions === 'both' ? [upper, lower] : [junctions === 'upper' ? upper : lower];
  const found = wanted.filter((junction) => junction !== null);
  if (found.length === 0)
    throw new NoSolution(
      `layer ${index} has no ${junctions === 'both' ? '' : `${junctions} `}junction that a voltage could be put across`,
    );
  return found;
}

function biasBy(choice: CarrierChoice, junctions: readonly number[], volts: number): CarrierChoice {
  const reverseBias = [...choice.reverseBias];
  for (const k of junctions) {
    while (reverseBias.length <= k) reverseBias.push(0);
    reverseBias[k] += volts;
  }
  return { ...choice, reverseBias };
}

function sheetResistanceOf(state: CarrierState, layer: FollowedLayer, { model }: Prepared): number | null {
  const span = findLayer(state, layer);
  if (!span || filling(state, layer) < FILLED) return null;
  return 1 / sheetConductance(state.doping.depth, conduction(state, model).conductivity, span);
}

const depletionOf = (state: CarrierState, metallurgical: number): Depletion | null =>
  state.electrostatics?.junctions.find((junction) => junction.metallurgical === metallurgical)?.depletion ??
  null;

/** Per cent a volt, by the one-sided difference of second order. */
function voltageCoefficient([zero, one, two]: (number | null)[]): number | null {
  if (!zero || !one || !two) return null;
  return (100 * (-3 * zero + 4 * one - two)) / (2 * STEP_V * zero);
}

function pinchOff(fillingAt: (volts: number) => number): number | null {
  const excess = (volts: number): number => fillingAt(volts) - FILLED;
  if (excess(0) <= 0) return 0;
  if (excess(HIGHEST_PINCH_OFF) > 0) return null;
  return brent(excess, 0, HIGHEST_PINCH_OFF, 1e-4);
}
