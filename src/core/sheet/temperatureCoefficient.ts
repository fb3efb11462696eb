/** How sheet resistance moves with temperature: the whole chain behind the doping, solved a little colder and warmer. */

import type { MobilityModel } from '../mobility/model';
import { type ActiveDoping, conduction } from './conduction';
import { type LayerSpan, sheetConductance } from './layers';

/** Half the temperature difference of the central difference, K: its error is of second order, about 1e-3 of TC1. */
const STEP = 2;

/**
 * First-order temperature coefficient of every layer's sheet resistance, 1/K, by central difference at `temperature` (K);
 * null for a model of one temperature only.
 */
export function temperatureCoefficients(
  doping: ActiveDoping,
  model: MobilityModel,
  temperature: number,
  spans: readonly LayerSpan[],
): (number | null)[] {
  if (!model.dependsOnTemperature) return spans.map(() => null);
  const cold = conduction(doping, model, temperature - STEP).conductivity;
  const warm = conduction(doping, model, temperature + STEP).conductivity;
  return spans.map((span) => {
    const colder = 1 / sheetConductance(doping.depth, cold, span);
    const warmer = 1 / sheetConductance(doping.depth, warm, span);
    return (warmer - colder) / (STEP * (warmer + colder));
  });
}
