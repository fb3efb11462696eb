/** How far the published mobility models agree: every layer's sheet resistance by each of them. */

import { type CarrierChoice, carriersNear } from '../carriers/carriers';
import type { CarrierState } from '../carriers/state';
import { MOBILITY_MODELS } from '../mobility/list';
import { ionisationFor, type MobilityInput, type MobilityModel } from '../mobility/model';
import type { MobilityName } from '../study/names';
import { conduction } from './conduction';
import { type LayerSpan, sheetConductance } from './layers';

export interface ModelReading {
  readonly mobility: MobilityName;
  /** Why the model does not count here; null when it does. */
  readonly unfit: string | null;
  /** S, by layer; of a model that does not count too. */
  readonly conductances: readonly number[];
}

/** `ionisation` is what the study asks for; models made from dopant densities are given complete ionisation. */
export function modelSpread(
  state: CarrierState,
  choice: CarrierChoice,
  ionisation: 'complete' | 'levels',
  spans: readonly LayerSpan[],
): ModelReading[] {
  const states = new Map([[choice.ionisation, state]]);
  const stateFor = (model: MobilityModel): CarrierState => {
    const wanted = ionisationFor(model, ionisation);
    const known = states.get(wanted) ?? carriersNear(state, { ...choice, ionisation: wanted });
    states.set(wanted, known);
    return known;
  };
  return MOBILITY_MODELS.map((model) => {
    const flow = conduction(stateFor(model), model);
    return {
      mobility: model.name,
      unfit: unfitness(model, flow.input),
      conductances: spans.map((span) => sheetConductance(state.doping.depth, flow.conductivity, span)),
    };
  });
}

function unfitness(model: MobilityModel, { temperature, donors, acceptors }: MobilityInput): string | null {
  const [coldest, hottest] = model.range.temperature;
  if (temperature < coldest || temperature > hottest) return 'temperature outside its range';
  let most = 0;
  for (let i = 0; i < donors.length; i++) most = Math.max(most, donors[i] + acceptors[i]);
  if (most > model.range.concentration[1]) return 'doping above its range';
  return model.caution ?? null;
}
