/** Carriers, mobility and conductivity at every depth, from the active dopants there and the temperature. */

import { neutralCarriers } from '../carriers/neutral';
import { ELEMENTARY_CHARGE } from '../material/constants';
import { DOPANT_FACTS, type Dopant } from '../material/dopants';
import { intrinsicDensity } from '../material/intrinsic';
import type { DopantColumn, MobilityInput, MobilityModel, MobilityParts } from '../mobility/model';

/** Active dopants on the mesh; all columns of one length, cm and cm^-3. */
export interface ActiveDoping {
  readonly depth: Float64Array;
  /** Only dopants that are present. */
  readonly dopants: readonly { readonly dopant: Dopant; readonly active: Float64Array }[];
  readonly donors: Float64Array;
  readonly acceptors: Float64Array;
  /** donors - acceptors, exactly 0 at a junction. */
  readonly net: Float64Array;
}

/** What conducts at each depth: cm^-3, cm^2/Vs, S/cm. */
export interface Conduction {
  readonly input: MobilityInput;
  readonly electronMobility: Float64Array;
  readonly holeMobility: Float64Array;
  readonly electronParts: MobilityParts;
  readonly holeParts: MobilityParts;
  readonly conductivity: Float64Array;
}

/** Conduction of neutral silicon with all active dopants ionised, at `temperature` (K). */
export function conduction(doping: ActiveDoping, model: MobilityModel, temperature: number): Conduction {
  const count = doping.depth.length;
  const column = () => new Float64Array(count);
  const [electrons, holes] = [column(), column()];
  neutralCarriers(doping.net, intrinsicDensity(temperature), electrons, holes);
  const input: MobilityInput = {
    temperature,
    donors: doping.donors,
    acceptors: doping.acceptors,
    electrons,
    holes,
    donorParts: partsOf(doping, 'donor'),
    acceptorParts: partsOf(doping, 'acceptor'),
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

function partsOf(doping: ActiveDoping, role: 'donor' | 'acceptor'): DopantColumn[] {
  return doping.dopants
    .filter(({ dopant }) => DOPANT_FACTS[dopant].role === role)
    .map(({ dopant, active }) => ({ dopant, ionised: active }));
}
