/** Mobility and conductivity at every depth, from the carriers and the ionised dopants there. */

import type { CarrierState } from '../carriers/state';
import { ELEMENTARY_CHARGE } from '../material/constants';
import { DOPANT_FACTS, type DopantRole } from '../material/dopants';
import type { DopantColumn, MobilityInput, MobilityModel, MobilityParts } from '../mobility/model';

/** What conducts at each depth: cm^-3, cm^2/Vs, S/cm. */
export interface Conduction {
  readonly input: MobilityInput;
  readonly electronMobility: Float64Array;
  readonly holeMobility: Float64Array;
  readonly electronParts: MobilityParts;
  readonly holeParts: MobilityParts;
  readonly conductivity: Float64Array;
}

export function conduction(state: CarrierState, model: MobilityModel): Conduction {
  const { electrons, holes, temperature } = state;
  const count = electrons.length;
  const column = () => new Float64Array(count);
  const donorParts = partsOf(state, 'donor');
  const acceptorParts = partsOf(state, 'acceptor');
  const input: MobilityInput = {
    temperature,
    donors: summed(donorParts, count),
    acceptors: summed(acceptorParts, count),
    electrons,
    holes,
    donorParts,
    acceptorParts,
  };
  const electronParts = { lattice: column(), impurity: column() };
  const holeParts = { lattice: column(), impurity: column() };
  const [electronMobility, holeMobility] = [column(), column()];
  model.evaluate(input, { electrons: electronMobility, holes: holeMobility, electronParts, holeParts });
  const conductivity = column();
  for (let i = 0; i < count; i++)
    conductivity[i] = ELEMENTARY_CHARGE * (electrons[i] * electronMobility[i] + holes[i] * holeMobility[i]);
  return { input, electronMobility, holeMobility, electronParts, holeParts, conductivity };
}

function partsOf({ ionised }: CarrierState, role: DopantRole): DopantColumn[] {
  return ionised.filter(({ dopant }) => DOPANT_FACTS[dopant].role === role);
}

function summed(parts: readonly DopantColumn[], count: number): Float64Array {
  if (parts.length === 1) return parts[0].ionised;
  const sum = new Float64Array(count);
  for (const { ionised } of parts) for (let i = 0; i < count; i++) sum[i] += ionised[i];
  return sum;
}
