/** How sheet resistance moves with temperature: the whole chain behind the doping, solved a little colder and warmer. */

import { type CarrierChoice, carriersNear } from '../carriers/carriers';
import type { CarrierState } from '../carriers/state';
import type { MobilityModel } from '../mobility/model';
import { conduction } from './conduction';
import { type LayerSpan, sheetConductance } from './layers';

/** Half the temperature difference of the central difference, K: its error is of second order, about 1e-3 of TC1. */
const STEP = 2;

/**
 * First-order temperature coefficient of every layer's sheet resistance, 1/K, by central difference at the temperature of
 * `choice`; null for a model of one temperature only.
 */
export function temperatureCoefficients(
  state: CarrierState,
  choice: CarrierChoice,
  model: MobilityModel,
  spans: readonly LayerSpan[],
): (number | null)[] {
  if (!model.dependsOnTemperature) return spans.map(() => null);
  const conductivityAt = (temperature: number): Float64Array =>
    conduction(carriersNear(state, { ...choice, temperature }), model).conductivity;
  const cold = conductivityAt(choice.temperature - STEP);
  const warm = conductivityAt(choice.temperature + STEP);
  return spans.map((span) => {
    const colder = 1 / sheetConductance(state.doping.depth, cold, span);
    const warmer = 1 / sheetConductance(state.doping.depth, warm, span);
    return (warmer - colder) / (STEP * (warmer + colder));
  });
}
